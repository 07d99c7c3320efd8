import { and, desc, eq } from "drizzle-orm";
import { ProblemError } from "../../../shared/problem.ts";
import type { Db } from "../../db/connection.ts";
import { draftHistory, users } from "../../db/schema/index.ts";
import { isSameText } from "./same-text.ts";
import type { DraftRow } from "./shows.queries.ts";

/** Edits of one person within this time are one row. */
const ROW_MS = 5 * 60 * 1000;
/** Rows kept for a show; the oldest go first. About ten lessons of work. */
const MOST_ROWS = 100;

/**
 * Keeps the text that was just saved. It takes the place of the row before when that is of the same
 * person, a few minutes old at most, and most of its text is still there: a script that was deleted or
 * replaced keeps its own row. The first save of a show keeps the text it was written over as well.
 */
export function keepInHistory(
  db: Db,
  held: DraftRow,
  saved: { readonly revision: number; readonly source: string; readonly savedAt: number; readonly savedBy: string },
): void {
  const ofShow = eq(draftHistory.showId, held.showId);
  const last = db.select().from(draftHistory).where(ofShow).orderBy(desc(draftHistory.revision)).limit(1).get();
  if (!last) {
    const { showId, revision, source, savedAt, savedBy, ribbon } = held;
    db.insert(draftHistory)
      .values({ showId, revision, source, savedAt, beganAt: savedAt, savedBy, ribbon })
      .onConflictDoNothing()
      .run();
  }
  const isSameWork =
    last?.savedBy === saved.savedBy && saved.savedAt - last.beganAt < ROW_MS && isSameText(last.source, saved.source);
  const beganAt = isSameWork ? last.beganAt : saved.savedAt;
  if (isSameWork)
    db.delete(draftHistory)
      .where(and(ofShow, eq(draftHistory.revision, last.revision)))
      .run();
  db.insert(draftHistory)
    .values({ ...saved, showId: held.showId, beganAt })
    .run();
  const old = db
    .select({ revision: draftHistory.revision })
    .from(draftHistory)
    .where(ofShow)
    .orderBy(desc(draftHistory.revision))
    .limit(1000)
    .offset(MOST_ROWS)
    .all();
  for (const { revision } of old)
    db.delete(draftHistory)
      .where(and(ofShow, eq(draftHistory.revision, revision)))
      .run();
}

/** Every kept text of a show with its writer's name, newest first. */
export function listDraftHistory(db: Db, showId: string) {
  return db
    .select({
      revision: draftHistory.revision,
      savedAt: draftHistory.savedAt,
      by: users.displayName,
      ribbon: draftHistory.ribbon,
    })
    .from(draftHistory)
    .leftJoin(users, eq(users.id, draftHistory.savedBy))
    .where(eq(draftHistory.showId, showId))
    .orderBy(desc(draftHistory.revision))
    .all();
}

/** One kept text. Throws `not-found`. */
export function getEarlierText(db: Db, showId: string, revision: number) {
  const row = db
    .select({ revision: draftHistory.revision, source: draftHistory.source, savedAt: draftHistory.savedAt })
    .from(draftHistory)
    .where(and(eq(draftHistory.showId, showId), eq(draftHistory.revision, revision)))
    .get();
  if (!row) throw new ProblemError("not-found");
  return row;
}
