import type { AssignmentSummary } from "../../../shared/contracts/assignments.ts";
import type { WorkState } from "../../../shared/contracts/shows.ts";
import {
  AssignmentIdSchema,
  ClassIdSchema,
  ShowIdSchema,
  SongIdSchema,
  SubmissionIdSchema,
} from "../../../shared/ids.ts";
import type { Db } from "../../db/connection.ts";
import { listSongFacts } from "../../event/song.queries.ts";
import type { Actor } from "../../http/actor.ts";
import { countPoints } from "../../work/points.ts";
import {
  type AssignmentWithClass,
  countComments,
  countStudents,
  listAuthorWork,
  listEnrolledClassIds,
  listOwnWork,
  listReleasedMarks,
  listTaughtClassIds,
} from "./assignments.queries.ts";

/** Assignments for a list: a student's own work, a teacher's counts. */
export function presentAssignments(db: Db, actor: Actor, rows: readonly AssignmentWithClass[]): AssignmentSummary[] {
  const songs = listSongFacts(db);
  const mine = ownWork(db, actor, rows);
  const counts = workCounts(db, actor, rows);
  return rows.map(({ assignment, className }) => ({
    id: AssignmentIdSchema.parse(assignment.id),
    classId: ClassIdSchema.parse(assignment.classId),
    className,
    title: assignment.title,
    songId: SongIdSchema.parse(assignment.songId),
    songTitle: songs.get(assignment.songId)?.title ?? "",
    dueAt: assignment.dueAt,
    lateRule: assignment.lateRule,
    mine: mine.get(assignment.id) ?? null,
    counts: counts.get(assignment.id) ?? null,
  }));
}

export function presentAssignment(db: Db, actor: Actor, row: AssignmentWithClass): AssignmentSummary {
  const [summary] = presentAssignments(db, actor, [row]);
  if (!summary) throw new Error("An assignment that was loaded has a summary.");
  return summary;
}

type OwnWork = NonNullable<AssignmentSummary["mine"]>;

/** The caller's work in classes that they are enrolled in, by assignment. */
function ownWork(db: Db, actor: Actor, rows: readonly AssignmentWithClass[]): Map<string, OwnWork> {
  const enrolled = new Set(listEnrolledClassIds(db, actor.userId));
  const wanted = rows.filter((row) => enrolled.has(row.assignment.classId));
  const work = listOwnWork(
    db,
    actor.userId,
    wanted.map((row) => row.assignment.id),
  );
  const submissionIds = work.flatMap((row) => (row.submission ? [row.submission.id] : []));
  const comments = countComments(db, submissionIds);
  const marks = listReleasedMarks(db, submissionIds);
  const rubrics = new Map(wanted.map((row) => [row.assignment.id, row.assignment.rubric]));
  const mine = new Map<string, OwnWork>();
  for (const { assignmentId, showId, showTitle, submission } of work) {
    // Rows come in the order saved; what was handed in stands before what was saved later.
    if (assignmentId === null || (mine.get(assignmentId)?.submissionId && !submission)) continue;
    const levels = submission && marks.get(submission.id);
    mine.set(assignmentId, {
      showId: ShowIdSchema.parse(showId),
      showTitle,
      state: submission?.state ?? "working",
      submissionId: submission ? SubmissionIdSchema.parse(submission.id) : null,
      commentCount: submission ? (comments.get(submission.id) ?? 0) : 0,
      points: levels ? countPoints(rubrics.get(assignmentId) ?? [], levels) : null,
    });
  }
  return mine;
}

/** Furthest first: a student with two shows counts once, by the one that got furthest. */
const FURTHEST: readonly WorkState[] = ["marked", "revise", "submitted", "working"];

/** How many students of each assignment are how far, for classes that the caller teaches. */
function workCounts(
  db: Db,
  actor: Actor,
  rows: readonly AssignmentWithClass[],
): Map<string, NonNullable<AssignmentSummary["counts"]>> {
  const taught = new Set(listTaughtClassIds(db, actor.userId));
  const wanted = rows.filter((row) => taught.has(row.assignment.classId));
  const students = countStudents(
    db,
    wanted.map((row) => row.assignment.classId),
  );
  const states = new Map<string, Map<string, WorkState>>(wanted.map((row) => [row.assignment.id, new Map()]));
  for (const { assignmentId, userId, state } of listAuthorWork(
    db,
    wanted.map((row) => row.assignment.id),
  )) {
    const byStudent = states.get(assignmentId ?? "");
    const now = state ?? "working";
    const before = byStudent?.get(userId);
    if (before === undefined || FURTHEST.indexOf(now) < FURTHEST.indexOf(before)) byStudent?.set(userId, now);
  }
  return new Map(
    wanted.map(({ assignment }) => {
      const reached = [...(states.get(assignment.id)?.values() ?? [])];
      const count = (state: WorkState) => reached.filter((one) => one === state).length;
      return [
        assignment.id,
        {
          students: students.get(assignment.classId) ?? 0,
          working: count("working"),
          submitted: count("submitted"),
          revise: count("revise"),
          marked: count("marked"),
        },
      ];
    }),
  );
}
