import { and, eq, inArray, ne } from "drizzle-orm";
import type { Relation } from "../../shared/roles.ts";
import type { Db } from "../db/connection.ts";
import {
  assignments,
  classTeachers,
  enrolments,
  forwards,
  showAuthors,
  showInvitations,
  shows,
} from "../db/schema/index.ts";

/** How a person stands to a class. */
export function listClassRelations(db: Db, userId: string, classId: string): Relation[] {
  return [
    ...(isEnrolled(db, userId, classId) ? ["class-member" as const] : []),
    ...(teaches(db, userId, [classId]) ? ["class-teacher" as const] : []),
  ];
}

/**
 * How a person stands to a show. Its teachers are those of the assignment's class; a show for no
 * assignment belongs to every class that an author is enrolled in.
 */
export function listShowRelations(
  db: Db,
  userId: string,
  show: { readonly id: string; readonly assignmentId: string | null },
): Relation[] {
  const relations: Relation[] = [];
  if (isAuthor(db, userId, show.id)) relations.push("author");
  if (isAsked(db, userId, show.id)) relations.push("asked");
  if (teaches(db, userId, listShowClassIds(db, show))) relations.push("class-teacher");
  return relations;
}

/** As for the show, and `forwarded` when this very version was sent to the event. */
export function listVersionRelations(
  db: Db,
  userId: string,
  version: { readonly id: string; readonly showId: string },
): Relation[] {
  const show = db
    .select({ id: shows.id, assignmentId: shows.assignmentId })
    .from(shows)
    .where(eq(shows.id, version.showId))
    .get();
  const relations = show ? listShowRelations(db, userId, show) : [];
  const forward = db
    .select({ id: forwards.id })
    .from(forwards)
    .where(and(eq(forwards.versionId, version.id), ne(forwards.state, "declined")))
    .limit(1)
    .get();
  return forward ? [...relations, "forwarded"] : relations;
}

/** Classes that a show belongs to: its assignment's, else those its authors are enrolled in. */
export function listShowClassIds(
  db: Db,
  show: { readonly id: string; readonly assignmentId: string | null },
): string[] {
  if (show.assignmentId !== null) {
    return db
      .select({ id: assignments.classId })
      .from(assignments)
      .where(eq(assignments.id, show.assignmentId))
      .all()
      .map((row) => row.id);
  }
  return db
    .selectDistinct({ id: enrolments.classId })
    .from(enrolments)
    .innerJoin(showAuthors, eq(showAuthors.userId, enrolments.userId))
    .where(eq(showAuthors.showId, show.id))
    .all()
    .map((row) => row.id);
}

/** Tells whether the person wrote the show. */
export function isAuthor(db: Db, userId: string, showId: string): boolean {
  const row = db
    .select({ id: showAuthors.showId })
    .from(showAuthors)
    .where(and(eq(showAuthors.showId, showId), eq(showAuthors.userId, userId)))
    .get();
  return row !== undefined;
}

function isAsked(db: Db, userId: string, showId: string): boolean {
  const row = db
    .select({ id: showInvitations.showId })
    .from(showInvitations)
    .where(and(eq(showInvitations.showId, showId), eq(showInvitations.userId, userId)))
    .get();
  return row !== undefined;
}

function isEnrolled(db: Db, userId: string, classId: string): boolean {
  const row = db
    .select({ id: enrolments.classId })
    .from(enrolments)
    .where(and(eq(enrolments.classId, classId), eq(enrolments.userId, userId)))
    .get();
  return row !== undefined;
}

function teaches(db: Db, userId: string, classIds: readonly string[]): boolean {
  if (classIds.length === 0) return false;
  const row = db
    .select({ id: classTeachers.classId })
    .from(classTeachers)
    .where(and(eq(classTeachers.userId, userId), inArray(classTeachers.classId, [...classIds])))
    .limit(1)
    .get();
  return row !== undefined;
}
