import { and, asc, desc, eq } from "drizzle-orm";
import { ProblemError } from "../../../shared/problem.ts";
import type { Db } from "../../db/connection.ts";
import { assignments, drafts, showAuthors, shows, showVersions } from "../../db/schema/index.ts";
import type { VersionRow } from "../../show-runs/runs.queries.ts";

export type ShowRow = typeof shows.$inferSelect;
export type DraftRow = typeof drafts.$inferSelect;

/** A show with its draft and the title of its assignment. */
export interface ShowWithDraft {
  readonly show: ShowRow;
  readonly draft: DraftRow;
  readonly assignmentTitle: string | null;
}

function selectShows(db: Db) {
  return db
    .select({ show: shows, draft: drafts, assignmentTitle: assignments.title })
    .from(shows)
    .innerJoin(drafts, eq(drafts.showId, shows.id))
    .leftJoin(assignments, eq(assignments.id, shows.assignmentId));
}

/** One show. Throws `not-found`. */
export function getShow(db: Db, showId: string): ShowWithDraft {
  const row = selectShows(db).where(eq(shows.id, showId)).get();
  if (!row) throw new ProblemError("not-found");
  return row;
}

/** The shows that a person is an author of, last saved first. */
export function listShowsOf(db: Db, userId: string, isArchived: boolean): ShowWithDraft[] {
  return selectShows(db)
    .innerJoin(showAuthors, eq(showAuthors.showId, shows.id))
    .where(and(eq(showAuthors.userId, userId), eq(shows.isArchived, isArchived)))
    .orderBy(desc(drafts.savedAt))
    .all();
}

/** The assignment that a new show is for, or null. */
export function findAssignment(db: Db, assignmentId: string): typeof assignments.$inferSelect | null {
  return db.select().from(assignments).where(eq(assignments.id, assignmentId)).get() ?? null;
}

export function insertShow(
  db: Db,
  row: {
    readonly show: typeof shows.$inferInsert & { id: string };
    readonly authorId: string;
    readonly source: string;
    readonly ribbon: Buffer | null;
  },
): void {
  db.insert(shows).values(row.show).run();
  db.insert(showAuthors).values({ showId: row.show.id, userId: row.authorId }).run();
  db.insert(drafts)
    .values({
      showId: row.show.id,
      revision: 0,
      source: row.source,
      savedAt: row.show.createdAt,
      savedBy: row.authorId,
      ribbon: row.ribbon,
    })
    .run();
}

export function updateShow(
  db: Db,
  showId: string,
  change: Partial<Pick<ShowRow, "title" | "isArchived" | "seed">>,
): void {
  if (Object.keys(change).length > 0) db.update(shows).set(change).where(eq(shows.id, showId)).run();
}

/** The draft of a show. Throws `not-found`. */
export function getDraft(db: Db, showId: string): DraftRow {
  const row = db.select().from(drafts).where(eq(drafts.showId, showId)).get();
  if (!row) throw new ProblemError("not-found");
  return row;
}

export function updateDraft(
  db: Db,
  showId: string,
  change: Pick<DraftRow, "revision" | "source" | "savedAt" | "savedBy">,
): void {
  db.update(drafts).set(change).where(eq(drafts.showId, showId)).run();
}

/** Every version of a show, newest first. */
export function listVersions(db: Db, showId: string): VersionRow[] {
  return db.select().from(showVersions).where(eq(showVersions.showId, showId)).orderBy(desc(showVersions.number)).all();
}

/** Titles that a person's shows have, to tell a copy from the original. */
export function listShowTitles(db: Db, userId: string): string[] {
  return db
    .select({ title: shows.title })
    .from(shows)
    .innerJoin(showAuthors, eq(showAuthors.showId, shows.id))
    .where(eq(showAuthors.userId, userId))
    .orderBy(asc(shows.title))
    .all()
    .map((row) => row.title);
}
