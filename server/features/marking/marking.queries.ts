import { and, asc, eq, inArray, isNull, sql } from "drizzle-orm";
import { ProblemError } from "../../../shared/problem.ts";
import type { Db } from "../../db/connection.ts";
import {
  assignments,
  classes,
  classTeachers,
  comments,
  marks,
  shows,
  showVersions,
  submissionEvents,
  submissions,
  userRoles,
  users,
} from "../../db/schema/index.ts";

export type CommentRow = typeof comments.$inferSelect;
export type MarkRow = typeof marks.$inferSelect;
export type SubmissionRow = typeof submissions.$inferSelect;

/** A submission with everything that says where it belongs. */
export interface SubmissionContext {
  readonly submission: SubmissionRow;
  readonly show: typeof shows.$inferSelect;
  readonly version: typeof showVersions.$inferSelect;
  readonly assignment: typeof assignments.$inferSelect;
  readonly className: string;
}

function selectSubmissions(db: Db) {
  return db
    .select({
      submission: submissions,
      show: shows,
      version: showVersions,
      assignment: assignments,
      className: classes.name,
    })
    .from(submissions)
    .innerJoin(shows, eq(shows.id, submissions.showId))
    .innerJoin(showVersions, eq(showVersions.id, submissions.versionId))
    .innerJoin(assignments, eq(assignments.id, submissions.assignmentId))
    .innerJoin(classes, eq(classes.id, assignments.classId));
}

/** One submission. Throws `not-found`. */
export function getSubmission(db: Db, submissionId: string): SubmissionContext {
  const row = selectSubmissions(db).where(eq(submissions.id, submissionId)).get();
  if (!row) throw new ProblemError("not-found");
  return row;
}

/** What was handed in for these assignments, in the order it came in. */
export function listSubmissions(db: Db, assignmentIds: readonly string[]): SubmissionContext[] {
  if (assignmentIds.length === 0) return [];
  return selectSubmissions(db)
    .where(inArray(submissions.assignmentId, [...assignmentIds]))
    .orderBy(asc(submissions.handedInAt))
    .all();
}

/** States of what was handed in for these assignments, in the order it came in; no scripts are read. */
export function listSubmissionStates(db: Db, assignmentIds: readonly string[]) {
  if (assignmentIds.length === 0) return [];
  return db
    .select({ id: submissions.id, assignmentId: submissions.assignmentId, state: submissions.state })
    .from(submissions)
    .where(inArray(submissions.assignmentId, [...assignmentIds]))
    .orderBy(asc(submissions.handedInAt))
    .all();
}

/** The assignments of the classes that a person teaches, next due first. */
export function listTaughtAssignments(db: Db, userId: string) {
  return db
    .select({ id: assignments.id, title: assignments.title, dueAt: assignments.dueAt, className: classes.name })
    .from(assignments)
    .innerJoin(classes, eq(classes.id, assignments.classId))
    .innerJoin(classTeachers, eq(classTeachers.classId, classes.id))
    .where(eq(classTeachers.userId, userId))
    .orderBy(asc(assignments.dueAt), asc(assignments.title))
    .all();
}

/** One assignment with its class. Throws `not-found`. */
export function getAssignment(db: Db, assignmentId: string) {
  const row = db
    .select({ assignment: assignments, className: classes.name })
    .from(assignments)
    .innerJoin(classes, eq(classes.id, assignments.classId))
    .where(eq(assignments.id, assignmentId))
    .get();
  if (!row) throw new ProblemError("not-found");
  return row;
}

export function listMarks(db: Db, submissionIds: readonly string[]): Map<string, MarkRow> {
  if (submissionIds.length === 0) return new Map();
  const rows = db
    .select()
    .from(marks)
    .where(inArray(marks.submissionId, [...submissionIds]))
    .all();
  return new Map(rows.map((row) => [row.submissionId, row]));
}

export function findMark(db: Db, submissionId: string): MarkRow | null {
  return db.select().from(marks).where(eq(marks.submissionId, submissionId)).get() ?? null;
}

export function saveMarkRow(db: Db, row: typeof marks.$inferInsert): void {
  const { levels, note, markedBy, savedAt } = row;
  db.insert(marks)
    .values(row)
    .onConflictDoUpdate({ target: marks.submissionId, set: { levels, note, markedBy, savedAt } })
    .run();
}

export function setReleased(db: Db, submissionId: string, releasedAt: number | null): void {
  db.update(marks).set({ releasedAt }).where(eq(marks.submissionId, submissionId)).run();
}

export function setState(db: Db, submissionId: string, state: SubmissionRow["state"]): void {
  db.update(submissions).set({ state }).where(eq(submissions.id, submissionId)).run();
}

/** State history, oldest first. */
export function listEvents(db: Db, submissionId: string) {
  return db
    .select({
      at: submissionEvents.at,
      state: submissionEvents.state,
      by: users.displayName,
      versionNumber: showVersions.number,
    })
    .from(submissionEvents)
    .innerJoin(users, eq(users.id, submissionEvents.by))
    .innerJoin(showVersions, eq(showVersions.id, submissionEvents.versionId))
    .where(eq(submissionEvents.submissionId, submissionId))
    .orderBy(asc(submissionEvents.at), asc(sql`submission_events.rowid`))
    .all();
}

/** A comment with its writer, whether that is staff, and the number of the version it points into. */
export interface CommentWithAuthor {
  readonly comment: CommentRow;
  readonly authorName: string;
  readonly isTeacher: boolean;
  readonly versionNumber: number;
}

/** The comments that stand, oldest first. */
export function listComments(db: Db, submissionId: string): CommentWithAuthor[] {
  const rows = db
    .select({
      comment: comments,
      authorName: users.displayName,
      versionNumber: showVersions.number,
      teacherId: userRoles.userId,
    })
    .from(comments)
    .innerJoin(users, eq(users.id, comments.authorId))
    .innerJoin(showVersions, eq(showVersions.id, comments.versionId))
    .leftJoin(userRoles, and(eq(userRoles.userId, comments.authorId), eq(userRoles.role, "teacher")))
    .where(and(eq(comments.submissionId, submissionId), isNull(comments.deletedAt)))
    .orderBy(asc(comments.createdAt), asc(sql`comments.rowid`))
    .all();
  return rows.map(({ teacherId, ...row }) => ({ ...row, isTeacher: teacherId !== null }));
}

/** One comment that was not taken back. Throws `not-found`. */
export function getComment(db: Db, commentId: string): CommentRow {
  const row = db
    .select()
    .from(comments)
    .where(and(eq(comments.id, commentId), isNull(comments.deletedAt)))
    .get();
  if (!row) throw new ProblemError("not-found");
  return row;
}

export function insertComment(db: Db, row: typeof comments.$inferInsert & { id: string }): void {
  db.insert(comments).values(row).run();
}

export function setCommentDeleted(db: Db, commentId: string, deletedAt: number): void {
  db.update(comments).set({ deletedAt }).where(eq(comments.id, commentId)).run();
}
