import type { QueueRow, SubmissionDetail } from "../../../shared/contracts/marking.ts";
import {
  type AssignmentId,
  AssignmentIdSchema,
  ClassIdSchema,
  ShowIdSchema,
  type SubmissionId,
  SubmissionIdSchema,
  VersionIdSchema,
} from "../../../shared/ids.ts";
import type { Db } from "../../db/connection.ts";
import { getBeatMap, listSongFacts, songSeconds } from "../../event/song.queries.ts";
import { type Actor, assertRelation } from "../../http/actor.ts";
import { presentRunSummary } from "../../show-runs/present-run.ts";
import { presentRibbonFace } from "../../show-runs/ribbon-blob.ts";
import { findLatestRun, listLatestRuns } from "../../show-runs/runs.queries.ts";
import { countPoints } from "../../work/points.ts";
import { listClassRelations } from "../../work/relations.queries.ts";
import { listAuthorNames, listLatestForwards } from "../../work/work.queries.ts";
import { listEvidence } from "./evidence.ts";
import { presentComment, presentMark } from "./marking.presenter.ts";
import {
  findMark,
  getAssignment,
  listComments,
  listEvents,
  listMarks,
  listSubmissions,
  listSubmissionStates,
  listTaughtAssignments,
  type SubmissionRow,
} from "./marking.queries.ts";
import { getRelatedSubmission } from "./relate.ts";

/** What a teacher marks first. */
const QUEUE_ORDER: readonly SubmissionRow["state"][] = ["submitted", "revise", "marked"];

export interface InboxRow {
  readonly id: AssignmentId;
  readonly title: string;
  readonly className: string;
  readonly dueAt: number;
  readonly toMark: number;
  readonly sentBack: number;
  readonly marked: number;
  readonly firstSubmissionId: SubmissionId | null;
}

/** The teacher's assignments with how much waits; `firstSubmissionId` has waited longest. */
export function listInbox(db: Db, actor: Actor): InboxRow[] {
  const rows = listTaughtAssignments(db, actor.userId);
  const work = listSubmissionStates(
    db,
    rows.map((row) => row.id),
  );
  return rows.map((row) => {
    const inState = (state: SubmissionRow["state"]) =>
      work.filter((one) => one.assignmentId === row.id && one.state === state);
    const waiting = inState("submitted");
    return {
      id: AssignmentIdSchema.parse(row.id),
      title: row.title,
      className: row.className,
      dueAt: row.dueAt,
      toMark: waiting.length,
      sentBack: inState("revise").length,
      marked: inState("marked").length,
      firstSubmissionId: waiting[0] ? SubmissionIdSchema.parse(waiting[0].id) : null,
    };
  });
}

/** What was handed in: to mark first by the time it came in, then sent back, then marked. Throws `not-found`. */
export function getQueue(
  db: Db,
  actor: Actor,
  assignmentId: string,
): { title: string; className: string; rows: QueueRow[] } {
  const { assignment, className } = getAssignment(db, assignmentId);
  assertRelation(actor, listClassRelations(db, actor.userId, assignment.classId));
  const rows = listSubmissions(db, [assignmentId]).sort(
    (a, b) => QUEUE_ORDER.indexOf(a.submission.state) - QUEUE_ORDER.indexOf(b.submission.state),
  );
  const ids = rows.map((row) => row.submission.id);
  const authors = listAuthorNames(
    db,
    rows.map((row) => row.show.id),
  );
  const runs = listLatestRuns(
    db,
    rows.map((row) => row.version.id),
  );
  const marks = listMarks(db, ids);
  const forwards = listLatestForwards(db, ids);
  return {
    title: assignment.title,
    className,
    rows: rows.map(({ submission, show, version }) => {
      const run = runs.get(version.id);
      const mark = marks.get(submission.id);
      return {
        submissionId: SubmissionIdSchema.parse(submission.id),
        authors: authors.get(show.id) ?? [],
        showTitle: show.title,
        state: submission.state,
        handedInAt: submission.handedInAt,
        isLate: submission.isLate,
        isOk: run?.summary.isOk ?? false,
        stopCount: run?.summary.findings.filter((finding) => finding.severity === "stop").length ?? 0,
        points: mark ? countPoints(assignment.rubric, mark.levels) : null,
        forwardState: forwards.get(submission.id)?.shownState ?? null,
        ribbon: presentRibbonFace(run?.ribbon ?? null),
      };
    }),
  };
}

/**
 * One submission. Its authors see the mark once it is released and no evidence; the notes between
 * teacher and coordinator are for the teacher alone. Throws `not-found`.
 */
export function getSubmissionDetail(db: Db, actor: Actor, submissionId: string): SubmissionDetail {
  const { submission, show, version, assignment, className, relations } = getRelatedSubmission(db, actor, submissionId);
  const isTeacher = actor.roles.includes("teacher") && relations.includes("class-teacher");
  const run = findLatestRun(db, version.id);
  const mark = findMark(db, submission.id);
  const forward = listLatestForwards(db, [submission.id]).get(submission.id);
  const seconds = run
    ? run.summary.seconds
    : (listSongFacts(db).get(version.songId)?.seconds ?? songSeconds(getBeatMap(db, version.beatMapId)));
  return {
    submission: {
      id: SubmissionIdSchema.parse(submission.id),
      assignmentId: AssignmentIdSchema.parse(assignment.id),
      assignmentTitle: assignment.title,
      classId: ClassIdSchema.parse(assignment.classId),
      className,
      showId: ShowIdSchema.parse(show.id),
      showTitle: show.title,
      authors: listAuthorNames(db, [show.id]).get(show.id) ?? [],
      state: submission.state,
      versionId: VersionIdSchema.parse(version.id),
      versionNumber: version.number,
      handedInAt: submission.handedInAt,
      isLate: submission.isLate,
      hashesAgree: submission.hashesAgree,
    },
    run: presentRunSummary(run, seconds),
    rubric: assignment.rubric,
    comments: listComments(db, submission.id).map((comment) => presentComment(actor.userId, comment)),
    mark: mark && (isTeacher || mark.releasedAt !== null) ? presentMark(assignment.rubric, mark) : null,
    evidence: isTeacher ? listEvidence(db, version, run, assignment) : {},
    forward: forward
      ? { state: forward.shownState, note: isTeacher ? forward.note : "", answer: isTeacher ? forward.answer : null }
      : null,
    history: listEvents(db, submission.id),
  };
}
