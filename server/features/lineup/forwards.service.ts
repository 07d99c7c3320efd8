import type { ForwardSummary } from "../../../shared/contracts/lineup.ts";
import type { RunSummary } from "../../../shared/contracts/common.ts";
import { type LayoutId, LayoutIdSchema } from "../../../shared/ids.ts";
import { ProblemError } from "../../../shared/problem.ts";
import type { Relation } from "../../../shared/roles.ts";
import type { Clock } from "../../clock.ts";
import { type Db, inTransaction } from "../../db/connection.ts";
import { newId } from "../../db/schema/columns.ts";
import { type Actor, assertRelation } from "../../http/actor.ts";
import { appendAudit } from "../../identity/audit-log.ts";
import { presentRunSummary } from "../../show-runs/present-run.ts";
import { findLatestRun, type RunFace } from "../../show-runs/runs.queries.ts";
import { listClassRelations } from "../../work/relations.queries.ts";
import { findLatestForward } from "../../work/work.queries.ts";
import { countFindings, type ForwardFacts, gatherForwardFacts, presentForward } from "./forward.presenter.ts";
import {
  answerForward,
  deleteSlotsOfForward,
  type ForwardContext,
  getForward,
  getSubmissionToForward,
  insertForward,
  listForwards,
  listForwardsOfTeacher,
} from "./lineup.queries.ts";

interface ForwardsDeps {
  readonly db: Db;
  readonly clock: Clock;
}

/**
 * Forwards marked work to the event. Throws `wrong-state` for work that is not marked or does not
 * run, `blocked-by-stop`, `already-done` while an earlier forward is not declined, `not-found`.
 */
export function forwardSubmission(
  { db, clock }: ForwardsDeps,
  actor: Actor,
  submissionId: string,
  note: string,
): ForwardSummary {
  return inTransaction(db, (tx) => {
    const { submission, classId } = getSubmissionToForward(tx, submissionId);
    assertRelation(actor, listClassRelations(tx, actor.userId, classId));
    if (submission.state !== "marked")
      throw new ProblemError("wrong-state", { detail: "Release the mark first, then forward the show." });
    const earlier = findLatestForward(tx, submissionId);
    if (earlier && earlier.state !== "declined")
      throw new ProblemError("already-done", { detail: "This show is with the event already." });
    assertPlayable(findLatestRun(tx, submission.versionId));
    const id = newId();
    insertForward(tx, {
      id,
      submissionId,
      versionId: submission.versionId,
      note,
      forwardedBy: actor.userId,
      forwardedAt: clock.now(),
      state: "waiting",
    });
    appendAudit(tx, { at: clock.now(), actorId: actor.userId, event: "show-forwarded", subject: id });
    return presentForward(getFacts(tx, getForward(tx, id)), true);
  });
}

/** Forwarded shows, newest first: all for the coordinator, those of their classes for a teacher. */
export function listOwnForwards(db: Db, actor: Actor): ForwardSummary[] {
  const rows = actor.roles.includes("coordinator") ? listForwards(db) : listForwardsOfTeacher(db, actor.userId);
  return gatherForwardFacts(db, rows).map((facts) => presentFor(db, actor, facts));
}

/** A forwarded show with its check. Throws `not-found`. */
export function getForwardDetail(
  db: Db,
  actor: Actor,
  forwardId: string,
): { forward: ForwardSummary; run: RunSummary; layoutId: LayoutId; findings: RunSummary["findings"] } {
  const facts = getFacts(db, getRelatedForward(db, actor, forwardId));
  const run = presentRunSummary(facts.run, facts.seconds);
  return {
    forward: presentFor(db, actor, facts),
    run,
    layoutId: LayoutIdSchema.parse(facts.run?.layoutId ?? facts.layoutId),
    findings: run.findings,
  };
}

/** Approves a waiting show. Throws `wrong-state`, `blocked-by-stop`, `not-found`. */
export function approveForward(
  { db, clock }: ForwardsDeps,
  actor: Actor,
  forwardId: string,
  note: string,
): ForwardSummary {
  return inTransaction(db, (tx) => {
    const { forward } = getRelatedForward(tx, actor, forwardId);
    if (forward.state !== "waiting")
      throw new ProblemError("wrong-state", { detail: "Only a show that waits can be approved." });
    assertPlayable(findLatestRun(tx, forward.versionId));
    answerForward(tx, forwardId, {
      state: "approved",
      answer: note === "" ? null : note,
      answeredBy: actor.userId,
      answeredAt: clock.now(),
    });
    appendAudit(tx, { at: clock.now(), actorId: actor.userId, event: "show-approved", subject: forwardId });
    return presentFor(tx, actor, getFacts(tx, getForward(tx, forwardId)));
  });
}

/** Sends a show back to its teacher with a note and frees its slots. Throws `wrong-state` when declined already, `not-found`. */
export function declineForward(
  { db, clock }: ForwardsDeps,
  actor: Actor,
  forwardId: string,
  note: string,
): ForwardSummary {
  return inTransaction(db, (tx) => {
    const { forward } = getRelatedForward(tx, actor, forwardId);
    if (forward.state === "declined")
      throw new ProblemError("wrong-state", { detail: "This show was sent back already." });
    deleteSlotsOfForward(tx, forwardId);
    answerForward(tx, forwardId, {
      state: "declined",
      answer: note,
      answeredBy: actor.userId,
      answeredAt: clock.now(),
    });
    appendAudit(tx, { at: clock.now(), actorId: actor.userId, event: "show-declined", subject: forwardId });
    return presentFor(tx, actor, getFacts(tx, getForward(tx, forwardId)));
  });
}

function getRelatedForward(db: Db, actor: Actor, forwardId: string): ForwardContext {
  const row = getForward(db, forwardId);
  // Every loaded forward is with the event, whatever came of it.
  const relations: Relation[] = ["forwarded", ...listClassRelations(db, actor.userId, row.classId)];
  assertRelation(actor, relations);
  return row;
}

function presentFor(db: Db, actor: Actor, facts: ForwardFacts): ForwardSummary {
  return presentForward(facts, listClassRelations(db, actor.userId, facts.classId).includes("class-teacher"));
}

function getFacts(db: Db, row: ForwardContext): ForwardFacts {
  const [facts] = gatherForwardFacts(db, [row]);
  if (!facts) throw new Error("A forward that was loaded has facts.");
  return facts;
}

/** Only what ran on the server, without a stop, goes near the square. */
function assertPlayable(run: RunFace | null): void {
  const stops = countFindings(run, "stop");
  if (stops > 0) {
    const detail =
      stops === 1
        ? "The show check has a stop. It has to be mended first."
        : `The show check has ${stops} stops. They have to be mended first.`;
    throw new ProblemError("blocked-by-stop", {
      detail,
      extensions: { findings: run?.summary.findings.filter((finding) => finding.severity === "stop") },
    });
  }
  if (!run?.summary.isOk)
    throw new ProblemError("wrong-state", {
      detail: "This script does not run on the server, so there is nothing to show.",
    });
}
