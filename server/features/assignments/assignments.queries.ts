import { and, asc, count, desc, eq, inArray, isNull, max, or } from "drizzle-orm";
import { ProblemError } from "../../../shared/problem.ts";
import type { Db } from "../../db/connection.ts";
import {
  assignments,
  classes,
  classTeachers,
  comments,
  drafts,
  enrolments,
  marks,
  showAuthors,
  shows,
  showVersions,
  submissions,
  users,
} from "../../db/schema/index.ts";
import type { SubmissionRow } from "../../work/work.queries.ts";

export type AssignmentRow = typeof assignments.$inferSelect;

/** An assignment with the name of its class and of who set it. */
export interface AssignmentWithClass {
  readonly assignment: AssignmentRow;
  readonly className: string;
  readonly teacherName: string;
}

function selectAssignments(db: Db) {
  return db
    .select({ assignment: assignments, className: classes.name, teacherName: users.displayName })
    .from(assignments)
    .innerJoin(classes, eq(classes.id, assignments.classId))
    .innerJoin(users, eq(users.id, assignments.createdBy));
}

/** One assignment. Throws `not-found`. */
export function getAssignment(db: Db, assignmentId: string): AssignmentWithClass {
  const row = selectAssignments(db).where(eq(assignments.id, assignmentId)).get();
  if (!row) throw new ProblemError("not-found");
  return row;
}

/** The assignments of these classes, next due first. */
export function listAssignments(db: Db, classIds: readonly string[]): AssignmentWithClass[] {
  if (classIds.length === 0) return [];
  return selectAssignments(db)
    .where(inArray(assignments.classId, [...classIds]))
    .orderBy(asc(assignments.dueAt), asc(assignments.title))
    .all();
}

export function listEnrolledClassIds(db: Db, userId: string): string[] {
  return db
    .select({ id: enrolments.classId })
    .from(enrolments)
    .where(eq(enrolments.userId, userId))
    .all()
    .map((row) => row.id);
}

export function listTaughtClassIds(db: Db, userId: string): string[] {
  return db
    .select({ id: classTeachers.classId })
    .from(classTeachers)
    .where(eq(classTeachers.userId, userId))
    .all()
    .map((row) => row.id);
}

/** The person's show for each of these assignments: the one handed in, else the one saved last. */
export function listOwnWork(db: Db, userId: string, assignmentIds: readonly string[]) {
  if (assignmentIds.length === 0) return [];
  return db
    .select({
      assignmentId: shows.assignmentId,
      showId: shows.id,
      showTitle: shows.title,
      submission: submissions,
      savedAt: drafts.savedAt,
    })
    .from(shows)
    .innerJoin(showAuthors, eq(showAuthors.showId, shows.id))
    .innerJoin(drafts, eq(drafts.showId, shows.id))
    .leftJoin(submissions, and(eq(submissions.showId, shows.id), eq(submissions.assignmentId, shows.assignmentId)))
    .where(
      and(eq(showAuthors.userId, userId), inArray(shows.assignmentId, [...assignmentIds]), eq(shows.isArchived, false)),
    )
    .orderBy(asc(drafts.savedAt))
    .all();
}

/** How many comments stand on each submission. */
export function countComments(db: Db, submissionIds: readonly string[]): Map<string, number> {
  if (submissionIds.length === 0) return new Map();
  const rows = db
    .select({ id: comments.submissionId, count: count() })
    .from(comments)
    .where(and(inArray(comments.submissionId, [...submissionIds]), isNull(comments.deletedAt)))
    .groupBy(comments.submissionId)
    .all();
  return new Map(rows.map((row) => [row.id, row.count]));
}

/** The levels of released marks, by submission. */
export function listReleasedMarks(db: Db, submissionIds: readonly string[]): Map<string, Record<string, number>> {
  if (submissionIds.length === 0) return new Map();
  const rows = db
    .select()
    .from(marks)
    .where(inArray(marks.submissionId, [...submissionIds]))
    .all();
  return new Map(rows.filter((row) => row.releasedAt !== null).map((row) => [row.submissionId, row.levels]));
}

export function countStudents(db: Db, classIds: readonly string[]): Map<string, number> {
  if (classIds.length === 0) return new Map();
  const rows = db
    .select({ id: enrolments.classId, count: count() })
    .from(enrolments)
    .where(inArray(enrolments.classId, [...classIds]))
    .groupBy(enrolments.classId)
    .all();
  return new Map(rows.map((row) => [row.id, row.count]));
}

/** Every author's work on these assignments: one row an author and show. */
export function listAuthorWork(db: Db, assignmentIds: readonly string[]) {
  if (assignmentIds.length === 0) return [];
  return db
    .select({ assignmentId: shows.assignmentId, userId: showAuthors.userId, state: submissions.state })
    .from(shows)
    .innerJoin(showAuthors, eq(showAuthors.showId, shows.id))
    .leftJoin(submissions, and(eq(submissions.showId, shows.id), eq(submissions.assignmentId, shows.assignmentId)))
    .where(
      and(
        inArray(shows.assignmentId, [...assignmentIds]),
        or(eq(shows.isArchived, false), inArray(submissions.state, ["submitted", "revise", "marked"])),
      ),
    )
    .all();
}

export function insertAssignment(db: Db, row: typeof assignments.$inferInsert & { id: string }): void {
  db.insert(assignments).values(row).run();
}

export function updateAssignment(db: Db, assignmentId: string, change: Partial<typeof assignments.$inferInsert>): void {
  if (Object.keys(change).length > 0) db.update(assignments).set(change).where(eq(assignments.id, assignmentId)).run();
}

/** Tells whether something was marked with the assignment's rubric, released or not. */
export function hasMarks(db: Db, assignmentId: string): boolean {
  const row = db
    .select({ id: marks.submissionId })
    .from(marks)
    .innerJoin(submissions, eq(submissions.id, marks.submissionId))
    .where(eq(submissions.assignmentId, assignmentId))
    .limit(1)
    .get();
  return row !== undefined;
}

export function hasShows(db: Db, assignmentId: string): boolean {
  return (
    db.select({ id: shows.id }).from(shows).where(eq(shows.assignmentId, assignmentId)).limit(1).get() !== undefined
  );
}

/** The show to hand in with its draft, or null. */
export function findShowWithDraft(db: Db, showId: string) {
  return (
    db
      .select({ show: shows, draft: drafts })
      .from(shows)
      .innerJoin(drafts, eq(drafts.showId, shows.id))
      .where(eq(shows.id, showId))
      .get() ?? null
  );
}

export function setShowAssignment(db: Db, showId: string, assignmentId: string): void {
  db.update(shows).set({ assignmentId }).where(eq(shows.id, showId)).run();
}

export function findSubmission(db: Db, assignmentId: string, showId: string): SubmissionRow | null {
  return (
    db
      .select()
      .from(submissions)
      .where(and(eq(submissions.assignmentId, assignmentId), eq(submissions.showId, showId)))
      .get() ?? null
  );
}

/** What the authors of a show handed in for an assignment with another show, or null. */
export function findOtherSubmission(
  db: Db,
  assignmentId: string,
  showId: string,
  authorIds: readonly string[],
): { title: string } | null {
  const rows = db
    .select({ showId: submissions.showId, title: shows.title })
    .from(submissions)
    .innerJoin(shows, eq(shows.id, submissions.showId))
    .innerJoin(showAuthors, eq(showAuthors.showId, shows.id))
    .where(and(eq(submissions.assignmentId, assignmentId), inArray(showAuthors.userId, [...authorIds])))
    .orderBy(desc(submissions.handedInAt))
    .all();
  return rows.find((row) => row.showId !== showId) ?? null;
}

export function nextVersionNumber(db: Db, showId: string): number {
  const row = db
    .select({ last: max(showVersions.number) })
    .from(showVersions)
    .where(eq(showVersions.showId, showId))
    .get();
  return (row?.last ?? 0) + 1;
}

export function insertVersion(db: Db, row: typeof showVersions.$inferInsert & { id: string }): void {
  db.insert(showVersions).values(row).run();
}

/** Keeps the submission of a show: a first one is inserted, a later one takes the new version. */
export function saveSubmission(db: Db, row: typeof submissions.$inferInsert & { id: string }): void {
  const { versionId, state, handedInAt, isLate, hashesAgree } = row;
  db.insert(submissions)
    .values(row)
    .onConflictDoUpdate({
      target: [submissions.assignmentId, submissions.showId],
      set: { versionId, state, handedInAt, isLate, hashesAgree },
    })
    .run();
}

export function setHashesAgree(db: Db, submissionId: string, versionId: string, hashesAgree: boolean): void {
  db.update(submissions)
    .set({ hashesAgree })
    .where(and(eq(submissions.id, submissionId), eq(submissions.versionId, versionId)))
    .run();
}
