import { randomInt } from "node:crypto";
import { SCRIPT_LIMIT_BYTES } from "../../../shared/contracts/common.ts";
import type { ShowDetail, ShowSummary, VersionDetail } from "../../../shared/contracts/shows.ts";
import { LayoutIdSchema, ShowIdSchema, SongIdSchema } from "../../../shared/ids.ts";
import { ProblemError } from "../../../shared/problem.ts";
import type { Clock } from "../../clock.ts";
import { type Db, inTransaction } from "../../db/connection.ts";
import { newId } from "../../db/schema/columns.ts";
import { findSong, getBeatMap, listSongFacts, songSeconds } from "../../event/song.queries.ts";
import { getCurrentLayout } from "../../event/square.queries.ts";
import { type Actor, assertRelation } from "../../http/actor.ts";
import { presentVersion } from "../../show-runs/present-run.ts";
import { presentRibbon } from "../../show-runs/ribbon-blob.ts";
import { findLatestRun, findVersion, listLatestRuns } from "../../show-runs/runs.queries.ts";
import { fieldProblem } from "../../work/field-problem.ts";
import { listClassRelations, listShowRelations, listVersionRelations } from "../../work/relations.queries.ts";
import { keepInHistory } from "./draft-history.queries.ts";
import { presentDraft, presentShow, presentShows } from "./shows.presenter.ts";
import {
  findAssignment,
  getDraft,
  getShow,
  insertShow,
  listShowsOf,
  listShowTitles,
  listVersions,
  type ShowWithDraft,
  updateDraft,
  updateShow,
} from "./shows.queries.ts";
import { firstScript } from "./first-script.ts";

interface ShowsDeps {
  readonly db: Db;
  readonly clock: Clock;
}

/** The caller's own shows, last saved first. */
export function listOwnShows(db: Db, actor: Actor, isArchived: boolean): ShowSummary[] {
  return presentShows(db, listShowsOf(db, actor.userId, isArchived));
}

/**
 * Starts a show with a first line to run. Throws `not-found` when the assignment is of a class that
 * the caller is not in, `invalid-request` when the song is unknown or not the assignment's.
 */
export function createShow(
  { db, clock }: ShowsDeps,
  actor: Actor,
  input: { title: string; songId: string; assignmentId: string | null },
): ShowSummary {
  const song = findSong(db, input.songId);
  if (!song) throw fieldProblem("/songId", "There is no such song. Choose one from the list.");
  if (input.assignmentId !== null) {
    const assignment = findAssignment(db, input.assignmentId);
    if (!assignment || !listClassRelations(db, actor.userId, assignment.classId).includes("class-member"))
      throw new ProblemError("not-found");
    if (assignment.songId !== song.id) throw fieldProblem("/songId", "This assignment asks for another song.");
  }
  return inTransaction(db, (tx) => {
    const show = {
      id: newId(),
      title: input.title,
      songId: song.id,
      assignmentId: input.assignmentId,
      seed: newSeed(),
      createdAt: clock.now(),
    };
    insertShow(tx, { show, authorId: actor.userId, source: firstScript(song.title), ribbon: null });
    return presentShow(tx, getShow(tx, show.id));
  });
}

/** A show with its draft and every version, newest first. Throws `not-found`. */
export function getShowDetail(db: Db, actor: Actor, showId: string): ShowDetail {
  const row = getRelatedShow(db, actor, showId);
  const versions = listVersions(db, showId);
  const runs = listLatestRuns(
    db,
    versions.map((version) => version.id),
  );
  const seconds = listSongFacts(db).get(row.show.songId)?.seconds ?? 0;
  return {
    show: presentShow(db, row),
    seed: row.show.seed,
    layoutId: LayoutIdSchema.parse(getCurrentLayout(db).id),
    draft: presentDraft(row.draft),
    versions: versions.map((version) => presentVersion(version, runs.get(version.id), seconds)),
  };
}

/** Renames, archives, brings back, or deals new luck. Versions keep their own seed. Throws `not-found`, `invalid-request` for a new title while the show is with the event. */
export function changeShow(
  db: Db,
  actor: Actor,
  showId: string,
  change: { title?: string | undefined; isArchived?: boolean | undefined; seed?: number | undefined },
): { show: ShowSummary; seed: number } {
  return inTransaction(db, (tx) => {
    const { show } = getRelatedShow(tx, actor, showId);
    const forward = presentShow(tx, getShow(tx, showId)).forwardState;
    if (change.title !== undefined && change.title !== show.title && forward !== null && forward !== "declined") {
      // The title was looked at when the show was approved; the programme prints it.
      throw fieldProblem(
        "/title",
        "This show is with the event under this title. Ask your teacher if it has to change.",
      );
    }
    updateShow(tx, showId, {
      ...(change.title === undefined ? {} : { title: change.title }),
      ...(change.isArchived === undefined ? {} : { isArchived: change.isArchived }),
      ...(change.seed === undefined ? {} : { seed: change.seed }),
    });
    const row = getShow(tx, showId);
    return { show: presentShow(tx, row), seed: row.show.seed };
  });
}

/** Copies the draft into a new show of the caller, for no assignment: two shows never stand for one piece of work. */
export function duplicateShow({ db, clock }: ShowsDeps, actor: Actor, showId: string): ShowSummary {
  return inTransaction(db, (tx) => {
    const { show, draft } = getRelatedShow(tx, actor, showId);
    const title = copyTitle(show.title, listShowTitles(tx, actor.userId));
    const copy = {
      id: newId(),
      title,
      songId: show.songId,
      assignmentId: null,
      seed: show.seed,
      createdAt: clock.now(),
    };
    insertShow(tx, { show: copy, authorId: actor.userId, source: draft.source, ribbon: draft.ribbon });
    return presentShow(tx, getShow(tx, copy.id));
  });
}

/**
 * Saves the draft on top of the revision it was written from, in one IMMEDIATE transaction, and gives
 * the new revision. Saving the very same text again (the answer got lost on the way) counts as done.
 * Throws `draft-conflict` with `{ draft }`, what the server holds, and then leaves that as it is;
 * `too-large` above 64 KiB of UTF-8.
 */
export function saveDraft(
  { db, clock }: ShowsDeps,
  actor: Actor,
  showId: string,
  input: { baseRevision: number; source: string },
): { revision: number; savedAt: number } {
  if (Buffer.byteLength(input.source, "utf8") > SCRIPT_LIMIT_BYTES) {
    throw new ProblemError("too-large", { detail: `A script has at most ${SCRIPT_LIMIT_BYTES} bytes.` });
  }
  return inTransaction(db, (tx) => {
    getRelatedShow(tx, actor, showId);
    const held = getDraft(tx, showId);
    if (held.revision === input.baseRevision) {
      const saved = { revision: held.revision + 1, source: input.source, savedAt: clock.now(), savedBy: actor.userId };
      updateDraft(tx, showId, saved);
      keepInHistory(tx, held, saved);
      return { revision: saved.revision, savedAt: saved.savedAt };
    }
    const isRepeat =
      held.revision === input.baseRevision + 1 && held.source === input.source && held.savedBy === actor.userId;
    if (isRepeat) return { revision: held.revision, savedAt: held.savedAt };
    throw new ProblemError("draft-conflict", {
      detail: "The server holds another text. Compare the two and keep what you want.",
      extensions: { draft: presentDraft(held) },
    });
  });
}

/** An immutable version with the server's timeline. Throws `not-found`. */
export function getVersionDetail(db: Db, actor: Actor, versionId: string): VersionDetail {
  const version = findVersion(db, versionId);
  if (!version) throw new ProblemError("not-found");
  assertRelation(actor, listVersionRelations(db, actor.userId, version));
  const run = findLatestRun(db, versionId);
  const seconds = songSeconds(getBeatMap(db, version.beatMapId));
  return {
    version: { ...presentVersion(version, run ?? undefined, seconds), ribbon: presentRibbon(run?.ribbon ?? null) },
    showId: ShowIdSchema.parse(version.showId),
    title: getShow(db, version.showId).show.title,
    source: version.source,
    seed: version.seed,
    songId: SongIdSchema.parse(version.songId),
    layoutId: LayoutIdSchema.parse(run?.layoutId ?? version.layoutId),
    timeline: run?.timeline?.toString("base64") ?? null,
  };
}

/** A show that the caller stands to in a way the endpoint grants. Throws `not-found`. */
export function getRelatedShow(db: Db, actor: Actor, showId: string): ShowWithDraft {
  const row = getShow(db, showId);
  assertRelation(actor, listShowRelations(db, actor.userId, row.show));
  return row;
}

/** 32 bits, unsigned: the luck of a show. */
function newSeed(): number {
  return randomInt(0, 2 ** 32);
}

const TITLE_MAX = 60;

function copyTitle(title: string, taken: readonly string[]): string {
  for (let n = 1; ; n++) {
    const ending = n === 1 ? ", copy" : `, copy ${n}`;
    const copy = title.slice(0, TITLE_MAX - ending.length) + ending;
    if (!taken.includes(copy)) return copy;
  }
}
