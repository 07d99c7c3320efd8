import type { ForwardSummary } from "../../../shared/contracts/lineup.ts";
import { ForwardIdSchema, SongIdSchema, SubmissionIdSchema, VersionIdSchema } from "../../../shared/ids.ts";
import type { Db } from "../../db/connection.ts";
import { listSongFacts } from "../../event/song.queries.ts";
import { presentRibbonFace } from "../../show-runs/ribbon-blob.ts";
import { listLatestRuns, type RunFace } from "../../show-runs/runs.queries.ts";
import { listSlotCounts, toForwardState } from "../../work/work.queries.ts";
import { type ForwardContext, listNamedAuthors } from "./lineup.queries.ts";
import { toPublicName } from "./public-name.ts";

/** A forward with everything worked out that lists, the plan and a publication need of it. */
export interface ForwardFacts extends ForwardContext {
  readonly publicName: string;
  readonly authors: readonly string[];
  /** Every author's family agreed that the name may be public. */
  readonly isNamePublic: boolean;
  readonly songTitle: string;
  readonly seconds: number;
  readonly slotCount: number;
  /** Null while the server has not run the version. */
  readonly run: RunFace | null;
}

/** Facts of these forwards: what is common to all is fetched once. */
export function gatherForwardFacts(db: Db, rows: readonly ForwardContext[]): ForwardFacts[] {
  const songs = listSongFacts(db);
  const named = listNamedAuthors(
    db,
    rows.map((row) => row.show.id),
  );
  const runs = listLatestRuns(
    db,
    rows.map((row) => row.forward.versionId),
  );
  const slotCounts = listSlotCounts(
    db,
    rows.map((row) => row.forward.id),
  );
  return rows.map((row) => {
    const authors = named.get(row.show.id) ?? [];
    const song = songs.get(row.show.songId);
    return {
      ...row,
      publicName: toPublicName({ authors, className: row.className, schoolShortName: row.schoolShortName }),
      authors: authors.map((author) => author.displayName),
      isNamePublic: authors.every((author) => author.isNamePublic),
      songTitle: song?.title ?? "",
      seconds: song?.seconds ?? 0,
      slotCount: slotCounts.get(row.forward.id) ?? 0,
      run: runs.get(row.forward.versionId) ?? null,
    };
  });
}

/** Counts the findings of a severity in a run; none while there is no run. */
export function countFindings(run: RunFace | null, severity: "stop" | "warn"): number {
  return run?.summary.findings.filter((finding) => finding.severity === severity).length ?? 0;
}

/**
 * A forward for the wire. Full names go to the class's teachers (`seesNames`); the event gets them only
 * where every family agreed, and else none: it has the public name.
 */
export function presentForward(facts: ForwardFacts, seesNames: boolean): ForwardSummary {
  const { forward, show, run } = facts;
  return {
    id: ForwardIdSchema.parse(forward.id),
    submissionId: SubmissionIdSchema.parse(forward.submissionId),
    versionId: VersionIdSchema.parse(forward.versionId),
    title: show.title,
    authors: seesNames || facts.isNamePublic ? [...facts.authors] : [],
    publicName: facts.publicName,
    schoolName: facts.schoolName,
    className: facts.className,
    songId: SongIdSchema.parse(show.songId),
    songTitle: facts.songTitle,
    seconds: facts.seconds,
    state: toForwardState(forward.state, facts.slotCount > 0),
    note: forward.note,
    answer: forward.answer,
    teacherName: facts.teacherName,
    forwardedAt: forward.forwardedAt,
    stopCount: countFindings(run, "stop"),
    warnCount: countFindings(run, "warn"),
    slotCount: facts.slotCount,
    ribbon: presentRibbonFace(run?.ribbon ?? null),
  };
}
