import type { HandInResult } from "../../../shared/contracts/assignments.ts";
import { SubmissionIdSchema } from "../../../shared/ids.ts";
import { ProblemError } from "../../../shared/problem.ts";
import { listUnmet } from "../../../sandbox/checks/use.ts";
import { LANGUAGE_VERSION } from "../../../sandbox/timeline/model.ts";
import { type Db, inTransaction } from "../../db/connection.ts";
import { newId } from "../../db/schema/columns.ts";
import type { FeatureDeps } from "../../deps.ts";
import { getSong, songSeconds } from "../../event/song.queries.ts";
import { getCurrentLayout } from "../../event/square.queries.ts";
import { type Actor, assertRelation } from "../../http/actor.ts";
import { appendAudit } from "../../identity/audit-log.ts";
import { presentRunSummary } from "../../show-runs/present-run.ts";
import { runVersion } from "../../show-runs/run-version.ts";
import { findVersion, type VersionRow } from "../../show-runs/runs.queries.ts";
import { isAuthor, listClassRelations } from "../../work/relations.queries.ts";
import { insertSubmissionEvent, listAuthors } from "../../work/work.queries.ts";
import {
  type AssignmentRow,
  findOtherSubmission,
  findShowWithDraft,
  findSubmission,
  getAssignment,
  insertVersion,
  nextVersionNumber,
  saveSubmission,
  setHashesAgree,
  setShowAssignment,
} from "./assignments.queries.ts";

/** What the browser hands in: a saved revision, and the hash of its own run (null: it did not run). */
export interface HandIn {
  readonly showId: string;
  readonly revision: number;
  readonly hash: string | null;
}

interface KeptHandIn {
  readonly submissionId: string;
  readonly version: VersionRow;
  readonly isLate: boolean;
}

/**
 * Hands a saved revision in: first an immutable version, the submission and its history in one
 * transaction (from then on the work is safe), then the server's own run of it, which is the one that
 * counts. What the script does refuses nothing. Throws `not-found`, `draft-conflict` with `{ draft }`
 * when the revision is not the saved one, `past-due`, `wrong-state`.
 */
export async function handIn(
  deps: FeatureDeps,
  actor: Actor,
  assignmentId: string,
  input: HandIn,
): Promise<HandInResult> {
  const { db, log } = deps;
  const { assignment } = getAssignment(db, assignmentId);
  assertRelation(actor, listClassRelations(db, actor.userId, assignment.classId));
  const kept = inTransaction(db, (tx) => keepHandIn(tx, deps.clock.now(), actor, assignment, input));
  const run = await runVersion(deps, kept.version, assignment.classId);
  const hashesAgree = run === null || input.hash === null ? null : run.hash === input.hash;
  if (hashesAgree !== null) setHashesAgree(db, kept.submissionId, kept.version.id, hashesAgree);
  if (hashesAgree === false) {
    appendAudit(db, { at: deps.clock.now(), actorId: null, event: "hash-mismatch", subject: kept.version.id });
    log.error(
      { alarm: "hash-mismatch", versionId: kept.version.id, browser: input.hash, server: run?.hash },
      "browser and server disagree on a show; the server's run counts",
    );
  }
  return {
    submissionId: SubmissionIdSchema.parse(kept.submissionId),
    state: "submitted",
    versionNumber: kept.version.number,
    isLate: kept.isLate,
    run: presentRunSummary(run, songSeconds(getSong(db, kept.version.songId).beatMap)),
    hashesAgree,
    unmet: listUnmet(kept.version.source, assignment.requirements),
  };
}

function keepHandIn(db: Db, now: number, actor: Actor, assignment: AssignmentRow, input: HandIn): KeptHandIn {
  const loaded = findShowWithDraft(db, input.showId);
  if (!loaded || !isAuthor(db, actor.userId, input.showId)) throw new ProblemError("not-found");
  const { show, draft } = loaded;
  if (draft.revision !== input.revision) {
    throw new ProblemError("draft-conflict", {
      detail: "The server holds another text. Look at it first, then hand in.",
      extensions: { draft: { revision: draft.revision, source: draft.source, savedAt: draft.savedAt } },
    });
  }
  const before = findSubmission(db, assignment.id, show.id);
  const isLate = assertOpen(assignment, before, now);
  assertFits(db, assignment, show);
  if (show.assignmentId === null) setShowAssignment(db, show.id, assignment.id);

  const song = getSong(db, show.songId);
  const layoutId = getCurrentLayout(db).id;
  const same = before?.state === "submitted" ? findVersion(db, before.versionId) : null;
  if (
    before &&
    same &&
    same.source === draft.source &&
    same.seed === show.seed &&
    same.layoutId === layoutId &&
    same.beatMapId === song.beatMapId
  ) {
    // The very same work again: a retry whose first answer got lost makes no second version.
    return { submissionId: before.id, version: same, isLate: before.isLate };
  }
  const version: VersionRow = {
    id: newId(),
    showId: show.id,
    number: nextVersionNumber(db, show.id),
    source: draft.source,
    seed: show.seed,
    language: LANGUAGE_VERSION,
    songId: show.songId,
    layoutId,
    beatMapId: song.beatMapId,
    createdBy: actor.userId,
    createdAt: now,
  };
  insertVersion(db, version);
  const submissionId = before?.id ?? newId();
  saveSubmission(db, {
    id: submissionId,
    assignmentId: assignment.id,
    showId: show.id,
    versionId: version.id,
    state: "submitted",
    handedInAt: now,
    isLate,
    hashesAgree: null,
  });
  insertSubmissionEvent(db, {
    submissionId,
    versionId: version.id,
    state: "submitted",
    by: actor.userId,
    note: null,
    at: now,
  });
  return { submissionId, version, isLate };
}

/**
 * Whether the work may be handed in now, and whether it is late. Work that was sent back may always
 * come again, and keeps the lateness of its first hand-in: the teacher asked for another pass.
 */
function assertOpen(
  assignment: AssignmentRow,
  before: { readonly state: string; readonly isLate: boolean } | null,
  now: number,
): boolean {
  if (before?.state === "marked")
    throw new ProblemError("wrong-state", { detail: "This is marked already. Ask your teacher to open it again." });
  if (before?.state === "revise") return before.isLate;
  const isOver = now > assignment.dueAt;
  if (isOver && assignment.lateRule === "closed")
    throw new ProblemError("past-due", {
      detail: "The due date is over and this assignment takes nothing more. Your work is saved. Talk to your teacher.",
    });
  return isOver;
}

function assertFits(
  db: Db,
  assignment: AssignmentRow,
  show: { readonly id: string; readonly assignmentId: string | null; readonly songId: string },
): void {
  if (show.assignmentId !== null && show.assignmentId !== assignment.id) {
    throw new ProblemError("wrong-state", {
      detail: "This show belongs to another assignment. Make a copy of it first.",
    });
  }
  if (show.assignmentId === null && show.songId !== assignment.songId) {
    throw new ProblemError("wrong-state", { detail: "This assignment asks for another song." });
  }
  const authorIds = listAuthors(db, [show.id]).map((author) => author.userId);
  const other = findOtherSubmission(db, assignment.id, show.id, authorIds);
  if (other)
    throw new ProblemError("wrong-state", {
      detail: `You handed in "${other.title}" for this assignment. Change that show and hand it in again.`,
    });
}
