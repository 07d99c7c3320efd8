import { and, asc, count, eq, inArray, isNull } from "drizzle-orm";
import type { Db } from "../../db/connection.ts";
import {
  assignments,
  classes,
  classTeachers,
  enrolments,
  lessonProgress,
  schools,
  showAuthors,
  signInResets,
  submissions,
  userRoles,
  users,
} from "../../db/schema/index.ts";

export interface ClassRow {
  readonly id: string;
  readonly schoolId: string;
  readonly name: string;
  readonly code: string;
  readonly schoolName: string;
}

const classColumns = {
  id: classes.id,
  schoolId: classes.schoolId,
  name: classes.name,
  code: classes.code,
  schoolName: schools.name,
};

export function findClass(db: Db, classId: string): ClassRow | null {
  const row = db
    .select(classColumns)
    .from(classes)
    .innerJoin(schools, eq(schools.id, classes.schoolId))
    .where(eq(classes.id, classId))
    .get();
  return row ?? null;
}

export function listClassesOfTeacher(db: Db, teacherId: string): ClassRow[] {
  return db
    .select(classColumns)
    .from(classes)
    .innerJoin(schools, eq(schools.id, classes.schoolId))
    .innerJoin(classTeachers, eq(classTeachers.classId, classes.id))
    .where(eq(classTeachers.userId, teacherId))
    .orderBy(asc(classes.name))
    .all();
}

export function isTeacherOf(db: Db, userId: string, classId: string): boolean {
  const row = db
    .select({ id: classTeachers.classId })
    .from(classTeachers)
    .where(and(eq(classTeachers.classId, classId), eq(classTeachers.userId, userId)))
    .get();
  return row !== undefined;
}

/** Students by class. */
export function countStudents(db: Db, classIds: readonly string[]): Map<string, number> {
  const rows = db
    .select({ classId: enrolments.classId, count: count() })
    .from(enrolments)
    .where(inArray(enrolments.classId, [...classIds]))
    .groupBy(enrolments.classId)
    .all();
  return new Map(rows.map((row) => [row.classId, row.count]));
}

/** Submissions that wait for a mark, by class. */
export function countToMark(db: Db, classIds: readonly string[]): Map<string, number> {
  const rows = db
    .select({ classId: assignments.classId, count: count() })
    .from(submissions)
    .innerJoin(assignments, eq(assignments.id, submissions.assignmentId))
    .where(and(inArray(assignments.classId, [...classIds]), eq(submissions.state, "submitted")))
    .groupBy(assignments.classId)
    .all();
  return new Map(rows.map((row) => [row.classId, row.count]));
}

/** Students of a class by name. */
export function listStudents(db: Db, classId: string) {
  return db
    .select({ id: users.id, displayName: users.displayName, username: users.username, lastSeenAt: users.lastSeenAt })
    .from(enrolments)
    .innerJoin(users, eq(users.id, enrolments.userId))
    .where(eq(enrolments.classId, classId))
    .orderBy(asc(users.displayName))
    .all();
}

/** Shows by author. */
export function countShows(db: Db, userIds: readonly string[]): Map<string, number> {
  const rows = db
    .select({ userId: showAuthors.userId, count: count() })
    .from(showAuthors)
    .where(inArray(showAuthors.userId, [...userIds]))
    .groupBy(showAuthors.userId)
    .all();
  return new Map(rows.map((row) => [row.userId, row.count]));
}

/** Steps done, one row a student and lesson. */
export function listStepsDone(db: Db, userIds: readonly string[]) {
  return db
    .select({ userId: lessonProgress.userId, lessonId: lessonProgress.lessonId, stepsDone: count() })
    .from(lessonProgress)
    .where(and(inArray(lessonProgress.userId, [...userIds]), eq(lessonProgress.isDone, true)))
    .groupBy(lessonProgress.userId, lessonProgress.lessonId)
    .all();
}

/** Usernames that a newcomer to the class must not get: of everybody enrolled. */
export function listUsernames(db: Db, classId: string): Set<string> {
  return new Set(listStudents(db, classId).flatMap((row) => (row.username === null ? [] : [row.username])));
}

export function insertStudent(db: Db, row: typeof users.$inferInsert & { id: string }, classId: string): void {
  db.insert(users).values(row).run();
  db.insert(userRoles).values({ userId: row.id, role: "student" }).run();
  db.insert(enrolments).values({ classId, userId: row.id }).run();
}

export function updateSecret(db: Db, userId: string, secretHash: string): void {
  db.update(users).set({ secretHash }).where(eq(users.id, userId)).run();
}

/** Drops the student's unused codes: only the latest works. */
export function deleteOpenResets(db: Db, userId: string): void {
  db.delete(signInResets)
    .where(and(eq(signInResets.userId, userId), isNull(signInResets.usedAt)))
    .run();
}

export function insertReset(db: Db, row: typeof signInResets.$inferInsert): void {
  db.insert(signInResets).values(row).run();
}

export function deleteEnrolment(db: Db, classId: string, userId: string): void {
  db.delete(enrolments)
    .where(and(eq(enrolments.classId, classId), eq(enrolments.userId, userId)))
    .run();
}
