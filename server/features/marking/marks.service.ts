import type { Mark } from "../../../shared/contracts/marking.ts";
import type { WorkState } from "../../../shared/contracts/shows.ts";
import { type FieldError, ProblemError } from "../../../shared/problem.ts";
import type { Clock } from "../../clock.ts";
import { type Db, inTransaction } from "../../db/connection.ts";
import { newId } from "../../db/schema/columns.ts";
import type { Actor } from "../../http/actor.ts";
import { appendAudit } from "../../identity/audit-log.ts";
import { insertSubmissionEvent } from "../../work/work.queries.ts";
import { presentMark } from "./marking.presenter.ts";
import {
  findMark,
  insertComment,
  saveMarkRow,
  setReleased,
  setState,
  type SubmissionContext,
  type SubmissionRow,
} from "./marking.queries.ts";
import { getRelatedSubmission } from "./relate.ts";

interface MarksDeps {
  readonly db: Db;
  readonly clock: Clock;
}

/**
 * Keeps levels and note; nobody but the class's teachers sees them before release. Throws
 * `invalid-request` naming each level of no criterion, `wrong-state` once released, `not-found`.
 */
export function saveMark(
  { db, clock }: MarksDeps,
  actor: Actor,
  submissionId: string,
  input: { levels: Record<string, number>; note: string },
): Mark {
  return inTransaction(db, (tx) => {
    const { submission, assignment } = getRelatedSubmission(tx, actor, submissionId);
    if (submission.state === "marked")
      throw new ProblemError("wrong-state", { detail: "This mark is released. Open it again to change it." });
    const known = new Set(assignment.rubric.map((criterion) => criterion.id));
    const unknown = Object.keys(input.levels).filter((criterionId) => !known.has(criterionId));
    refuseFields(
      unknown.map((id) => ({
        pointer: `/levels/${id}`,
        code: "custom",
        detail: `The rubric has no criterion "${id}".`,
      })),
    );
    saveMarkRow(tx, {
      submissionId,
      levels: input.levels,
      note: input.note,
      markedBy: actor.userId,
      savedAt: clock.now(),
      releasedAt: null,
    });
    const mark = findMark(tx, submissionId);
    if (!mark) throw new Error("A mark that was saved is found.");
    return presentMark(assignment.rubric, mark);
  });
}

/**
 * Sends submitted work back for another pass; the note stands among the comments. Throws
 * `wrong-state`, `newer-version` when another version was handed in meanwhile, `not-found`.
 */
export function sendBack(
  deps: MarksDeps,
  actor: Actor,
  submissionId: string,
  { versionId, note }: { versionId: string; note: string },
): WorkState {
  return inTransaction(deps.db, (tx) => {
    const context = getRelatedSubmission(tx, actor, submissionId);
    assertState(context.submission, ["submitted"], "Only work that waits for a mark can be sent back.");
    assertSameVersion(context.submission, versionId);
    insertComment(tx, {
      id: newId(),
      submissionId,
      versionId: context.version.id,
      authorId: actor.userId,
      anchor: { kind: "whole" },
      body: note,
      createdAt: deps.clock.now(),
    });
    return changeState(tx, deps.clock, actor, context, "revise", note);
  });
}

/**
 * Releases the mark to the authors. Throws `invalid-request` naming every criterion without a level,
 * `wrong-state` for work that does not wait for a mark, `newer-version` when another version was
 * handed in meanwhile, `not-found`.
 */
export function releaseMark(
  { db, clock }: MarksDeps,
  actor: Actor,
  submissionId: string,
  versionId: string,
): { state: WorkState; mark: Mark } {
  return inTransaction(db, (tx) => {
    const context = getRelatedSubmission(tx, actor, submissionId);
    assertState(context.submission, ["submitted"], "Only work that waits for a mark can be released.");
    assertSameVersion(context.submission, versionId);
    const { rubric } = context.assignment;
    const levels = findMark(tx, submissionId)?.levels ?? {};
    const open = rubric.filter((criterion) => levels[criterion.id] === undefined);
    refuseFields(
      open.map(({ id, name }) => ({
        pointer: `/levels/${id}`,
        code: "custom",
        detail: `Choose a level for "${name}".`,
      })),
    );
    setReleased(tx, submissionId, clock.now());
    const state = changeState(tx, clock, actor, context, "marked", null);
    appendAudit(tx, { at: clock.now(), actorId: actor.userId, event: "mark-released", subject: submissionId });
    const mark = findMark(tx, submissionId);
    if (!mark) throw new Error("A mark with every level exists.");
    return { state, mark: presentMark(rubric, mark) };
  });
}

/** Takes a released mark, or work sent back, to submitted again. Throws `wrong-state`, `not-found`. */
export function reopenSubmission({ db, clock }: MarksDeps, actor: Actor, submissionId: string): WorkState {
  return inTransaction(db, (tx) => {
    const context = getRelatedSubmission(tx, actor, submissionId);
    assertState(context.submission, ["marked", "revise"], "This waits for a mark already.");
    setReleased(tx, submissionId, null);
    return changeState(tx, clock, actor, context, "submitted", null);
  });
}

function changeState(
  db: Db,
  clock: Clock,
  actor: Actor,
  { submission }: SubmissionContext,
  state: SubmissionRow["state"],
  note: string | null,
): WorkState {
  setState(db, submission.id, state);
  insertSubmissionEvent(db, {
    submissionId: submission.id,
    versionId: submission.versionId,
    state,
    by: actor.userId,
    note,
    at: clock.now(),
  });
  return state;
}

function assertState(submission: SubmissionRow, states: readonly SubmissionRow["state"][], detail: string): void {
  if (!states.includes(submission.state)) throw new ProblemError("wrong-state", { detail });
}

function assertSameVersion(submission: SubmissionRow, versionId: string): void {
  if (submission.versionId !== versionId)
    throw new ProblemError("newer-version", { detail: "A newer version was handed in meanwhile. Look at it first." });
}

function refuseFields(errors: readonly FieldError[]): void {
  const [first] = errors;
  if (first) throw new ProblemError("invalid-request", { detail: first.detail, errors });
}
