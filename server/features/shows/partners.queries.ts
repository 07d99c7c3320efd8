import { and, asc, desc, eq, inArray, notInArray } from "drizzle-orm";
import type { Db } from "../../db/connection.ts";
import { assignments, enrolments, showAuthors, showInvitations, shows, users } from "../../db/schema/index.ts";

export interface PersonRow {
  readonly userId: string;
  readonly name: string;
}

const person = { userId: users.id, name: users.displayName };

/** People who were asked to join a show, by name. */
export function listAsked(db: Db, showId: string): PersonRow[] {
  return db
    .select(person)
    .from(showInvitations)
    .innerJoin(users, eq(users.id, showInvitations.userId))
    .where(eq(showInvitations.showId, showId))
    .orderBy(asc(users.displayName))
    .all();
}

/** Students of these classes but for some, by name. */
export function listStudents(db: Db, classIds: readonly string[], exceptIds: readonly string[]): PersonRow[] {
  return db
    .selectDistinct(person)
    .from(enrolments)
    .innerJoin(users, eq(users.id, enrolments.userId))
    .where(and(inArray(enrolments.classId, [...classIds]), notInArray(users.id, [...exceptIds])))
    .orderBy(asc(users.displayName))
    .all();
}

/** Which of these people have begun a show for the assignment: nobody works on two. */
export function listWithOwnWork(db: Db, assignmentId: string, userIds: readonly string[]): string[] {
  return db
    .selectDistinct({ userId: showAuthors.userId })
    .from(shows)
    .innerJoin(showAuthors, eq(showAuthors.showId, shows.id))
    .where(
      and(eq(shows.assignmentId, assignmentId), eq(shows.isArchived, false), inArray(showAuthors.userId, [...userIds])),
    )
    .all()
    .map((row) => row.userId);
}

/** What a person was asked to join, latest first. */
export function listInvitationsOf(db: Db, userId: string) {
  return db
    .select({
      showId: shows.id,
      title: shows.title,
      songId: shows.songId,
      assignmentTitle: assignments.title,
      by: users.displayName,
      askedAt: showInvitations.askedAt,
    })
    .from(showInvitations)
    .innerJoin(shows, eq(shows.id, showInvitations.showId))
    .innerJoin(users, eq(users.id, showInvitations.askedBy))
    .leftJoin(assignments, eq(assignments.id, shows.assignmentId))
    .where(eq(showInvitations.userId, userId))
    .orderBy(desc(showInvitations.askedAt))
    .all();
}

export function insertInvitation(db: Db, row: typeof showInvitations.$inferInsert): void {
  db.insert(showInvitations).values(row).onConflictDoNothing().run();
}

/** Tells whether there was one. */
export function deleteInvitation(db: Db, showId: string, userId: string): boolean {
  return (
    db
      .delete(showInvitations)
      .where(and(eq(showInvitations.showId, showId), eq(showInvitations.userId, userId)))
      .run().changes > 0
  );
}

export function insertAuthor(db: Db, showId: string, userId: string): void {
  db.insert(showAuthors).values({ showId, userId }).run();
}

export function deleteAuthor(db: Db, showId: string, userId: string): void {
  db.delete(showAuthors)
    .where(and(eq(showAuthors.showId, showId), eq(showAuthors.userId, userId)))
    .run();
}
