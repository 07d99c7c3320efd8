import { and, asc, desc, eq, inArray, ne } from "drizzle-orm";
import { ProblemError } from "../../../shared/problem.ts";
import type { Db } from "../../db/connection.ts";
import {
  assignments,
  classes,
  classTeachers,
  consents,
  forwards,
  lineupPublications,
  nights,
  schools,
  seasons,
  showAuthors,
  shows,
  showVersions,
  slots,
  submissions,
  users,
} from "../../db/schema/index.ts";

export type NightRow = typeof nights.$inferSelect;
export type SlotRow = typeof slots.$inferSelect;
export type SeasonRow = typeof seasons.$inferSelect;
export type ForwardRow = typeof forwards.$inferSelect;

/** A forward with all that says whose show it is. */
export interface ForwardContext {
  readonly forward: ForwardRow;
  readonly show: typeof shows.$inferSelect;
  readonly classId: string;
  readonly className: string;
  readonly schoolName: string;
  readonly schoolShortName: string;
  readonly teacherName: string;
  readonly layoutId: string;
}

function selectForwards(db: Db) {
  return db
    .select({
      forward: forwards,
      show: shows,
      classId: classes.id,
      className: classes.name,
      schoolName: schools.name,
      schoolShortName: schools.shortName,
      teacherName: users.displayName,
      layoutId: showVersions.layoutId,
    })
    .from(forwards)
    .innerJoin(submissions, eq(submissions.id, forwards.submissionId))
    .innerJoin(showVersions, eq(showVersions.id, forwards.versionId))
    .innerJoin(shows, eq(shows.id, submissions.showId))
    .innerJoin(assignments, eq(assignments.id, submissions.assignmentId))
    .innerJoin(classes, eq(classes.id, assignments.classId))
    .innerJoin(schools, eq(schools.id, classes.schoolId))
    .innerJoin(users, eq(users.id, forwards.forwardedBy));
}

/** One forward. Throws `not-found`. */
export function getForward(db: Db, forwardId: string): ForwardContext {
  const row = selectForwards(db).where(eq(forwards.id, forwardId)).get();
  if (!row) throw new ProblemError("not-found");
  return row;
}

/** Every forward, newest first. */
export function listForwards(db: Db): ForwardContext[] {
  return selectForwards(db).orderBy(desc(forwards.forwardedAt)).all();
}

/** The forwards of the classes that a person teaches, newest first. */
export function listForwardsOfTeacher(db: Db, userId: string): ForwardContext[] {
  return selectForwards(db)
    .innerJoin(classTeachers, eq(classTeachers.classId, classes.id))
    .where(eq(classTeachers.userId, userId))
    .orderBy(desc(forwards.forwardedAt))
    .all();
}

/** Every approved forward, by title. */
export function listApprovedForwards(db: Db): ForwardContext[] {
  return selectForwards(db).where(eq(forwards.state, "approved")).orderBy(asc(shows.title)).all();
}

/** Submission, show and class of what is to be forwarded. Throws `not-found`. */
export function getSubmissionToForward(db: Db, submissionId: string) {
  const row = db
    .select({ submission: submissions, classId: assignments.classId })
    .from(submissions)
    .innerJoin(assignments, eq(assignments.id, submissions.assignmentId))
    .where(eq(submissions.id, submissionId))
    .get();
  if (!row) throw new ProblemError("not-found");
  return row;
}

/** Authors of these shows and whether their names may be public. */
export function listNamedAuthors(
  db: Db,
  showIds: readonly string[],
): Map<string, { displayName: string; isNamePublic: boolean }[]> {
  const authors = new Map<string, { displayName: string; isNamePublic: boolean }[]>();
  if (showIds.length === 0) return authors;
  const rows = db
    .select({ showId: showAuthors.showId, displayName: users.displayName, isNamePublic: consents.isNamePublic })
    .from(showAuthors)
    .innerJoin(users, eq(users.id, showAuthors.userId))
    .leftJoin(consents, eq(consents.userId, users.id))
    .where(inArray(showAuthors.showId, [...showIds]))
    .orderBy(asc(users.displayName))
    .all();
  for (const { showId, displayName, isNamePublic } of rows) {
    authors.set(showId, [...(authors.get(showId) ?? []), { displayName, isNamePublic: isNamePublic ?? false }]);
  }
  return authors;
}

export function insertForward(db: Db, row: typeof forwards.$inferInsert & { id: string }): void {
  db.insert(forwards).values(row).run();
}

export function answerForward(
  db: Db,
  forwardId: string,
  answer: Pick<ForwardRow, "state" | "answer" | "answeredBy" | "answeredAt">,
): void {
  db.update(forwards).set(answer).where(eq(forwards.id, forwardId)).run();
}

/** The season of the event that ends last, or null before one is set up. */
export function findSeason(db: Db): SeasonRow | null {
  return db.select().from(seasons).orderBy(desc(seasons.lastDate)).limit(1).get() ?? null;
}

export function listNights(db: Db, seasonId: string): NightRow[] {
  return db.select().from(nights).where(eq(nights.seasonId, seasonId)).orderBy(asc(nights.date)).all();
}

/** One night. Throws `not-found`. */
export function getNight(db: Db, nightId: string): NightRow {
  const row = db.select().from(nights).where(eq(nights.id, nightId)).get();
  if (!row) throw new ProblemError("not-found");
  return row;
}

export function updateNight(
  db: Db,
  nightId: string,
  change: Partial<Pick<NightRow, "opensAt" | "closesAt" | "closedReason">>,
): void {
  if (Object.keys(change).length > 0) db.update(nights).set(change).where(eq(nights.id, nightId)).run();
}

/** Every slot of a season, by start time. */
export function listSlots(db: Db, seasonId: string): SlotRow[] {
  return db
    .select({ slot: slots })
    .from(slots)
    .innerJoin(nights, eq(nights.id, slots.nightId))
    .where(eq(nights.seasonId, seasonId))
    .orderBy(asc(nights.date), asc(slots.startsAt))
    .all()
    .map((row) => row.slot);
}

/** One slot. Throws `not-found`. */
export function getSlot(db: Db, slotId: string): SlotRow {
  const row = db.select().from(slots).where(eq(slots.id, slotId)).get();
  if (!row) throw new ProblemError("not-found");
  return row;
}

/** Another slot at this time of this night, or null. */
export function findSlotAt(db: Db, nightId: string, startsAt: string, exceptSlotId: string | null): SlotRow | null {
  const at = and(eq(slots.nightId, nightId), eq(slots.startsAt, startsAt));
  return (
    db
      .select()
      .from(slots)
      .where(exceptSlotId === null ? at : and(at, ne(slots.id, exceptSlotId)))
      .get() ?? null
  );
}

export function insertSlot(db: Db, row: typeof slots.$inferInsert): void {
  db.insert(slots).values(row).run();
}

export function updateSlot(
  db: Db,
  slotId: string,
  change: Partial<Pick<SlotRow, "nightId" | "startsAt" | "isPinned">>,
): void {
  db.update(slots).set(change).where(eq(slots.id, slotId)).run();
}

export function deleteSlot(db: Db, slotId: string): void {
  db.delete(slots).where(eq(slots.id, slotId)).run();
}

export function deleteSlotsOfForward(db: Db, forwardId: string): void {
  db.delete(slots).where(eq(slots.forwardId, forwardId)).run();
}

/** The last publication of a season with who published it, or null. */
export function findLastPublication(db: Db, seasonId: string) {
  return (
    db
      .select({ publication: lineupPublications, by: users.displayName })
      .from(lineupPublications)
      .innerJoin(users, eq(users.id, lineupPublications.publishedBy))
      .where(eq(lineupPublications.seasonId, seasonId))
      .orderBy(desc(lineupPublications.number))
      .limit(1)
      .get() ?? null
  );
}

export function insertPublication(db: Db, row: typeof lineupPublications.$inferInsert): void {
  db.insert(lineupPublications).values(row).run();
}
