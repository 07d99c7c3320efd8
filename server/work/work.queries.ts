import { asc, count, desc, eq, inArray, sql } from "drizzle-orm";
import type { ForwardState } from "../../shared/contracts/shows.ts";
import type { Db } from "../db/connection.ts";
import { forwards, showAuthors, slots, submissionEvents, submissions, users } from "../db/schema/index.ts";

export type SubmissionRow = typeof submissions.$inferSelect;
export type ForwardRow = typeof forwards.$inferSelect;

/** Display names of the authors of each show, in the order of the names. */
export function listAuthorNames(db: Db, showIds: readonly string[]): Map<string, string[]> {
  const names = new Map<string, string[]>();
  for (const author of listAuthors(db, showIds))
    names.set(author.showId, [...(names.get(author.showId) ?? []), author.displayName]);
  return names;
}

/** Authors of these shows. */
export function listAuthors(
  db: Db,
  showIds: readonly string[],
): { showId: string; userId: string; displayName: string }[] {
  if (showIds.length === 0) return [];
  return db
    .select({ showId: showAuthors.showId, userId: users.id, displayName: users.displayName })
    .from(showAuthors)
    .innerJoin(users, eq(users.id, showAuthors.userId))
    .where(inArray(showAuthors.showId, [...showIds]))
    .orderBy(asc(users.displayName))
    .all();
}

/** The submissions of these shows, by show; the latest when a show was handed in for two assignments. */
export function listSubmissionsByShow(db: Db, showIds: readonly string[]): Map<string, SubmissionRow> {
  if (showIds.length === 0) return new Map();
  const rows = db
    .select()
    .from(submissions)
    .where(inArray(submissions.showId, [...showIds]))
    .orderBy(asc(submissions.handedInAt))
    .all();
  return new Map(rows.map((row) => [row.showId, row]));
}

/** The latest forward of each submission, with its state as people see it. */
export function listLatestForwards(
  db: Db,
  submissionIds: readonly string[],
): Map<string, ForwardRow & { shownState: ForwardState }> {
  if (submissionIds.length === 0) return new Map();
  const rows = db
    .select()
    .from(forwards)
    .where(inArray(forwards.submissionId, [...submissionIds]))
    .orderBy(asc(forwards.forwardedAt), asc(sql`forwards.rowid`))
    .all();
  const placed = listSlotCounts(
    db,
    rows.map((row) => row.id),
  );
  return new Map(
    rows.map((row) => [row.submissionId, { ...row, shownState: toForwardState(row.state, placed.has(row.id)) }]),
  );
}

/** How many slots each of these forwards has in the plan; none means that it is missing. */
export function listSlotCounts(db: Db, forwardIds: readonly string[]): Map<string, number> {
  if (forwardIds.length === 0) return new Map();
  const rows = db
    .select({ id: slots.forwardId, count: count() })
    .from(slots)
    .where(inArray(slots.forwardId, [...forwardIds]))
    .groupBy(slots.forwardId)
    .all();
  return new Map(rows.map((row) => [row.id, row.count]));
}

/** `scheduled` is no stored state: it means approved and placed in a night. */
export function toForwardState(state: ForwardRow["state"], isPlaced: boolean): ForwardState {
  return state === "approved" && isPlaced ? "scheduled" : state;
}

/** The latest forward of one submission, or null. */
export function findLatestForward(db: Db, submissionId: string): ForwardRow | null {
  return (
    db
      .select()
      .from(forwards)
      .where(eq(forwards.submissionId, submissionId))
      .orderBy(desc(forwards.forwardedAt), desc(sql`forwards.rowid`))
      .limit(1)
      .get() ?? null
  );
}

/** Adds a step to the history of a submission. */
export function insertSubmissionEvent(db: Db, row: typeof submissionEvents.$inferInsert): void {
  db.insert(submissionEvents).values(row).run();
}
