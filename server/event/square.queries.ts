import { eq } from "drizzle-orm";
import { ProblemError } from "../../shared/problem.ts";
import type { Db } from "../db/connection.ts";
import { lineupPublications, showVersions, squareLayouts, squares } from "../db/schema/index.ts";

export type SquareRow = typeof squares.$inferSelect;
export type LayoutRow = typeof squareLayouts.$inferSelect;

/** The event's square, or null in a database without one. An installation has one square. */
export function findSquare(db: Db): SquareRow | null {
  return db.select().from(squares).limit(1).get() ?? null;
}

/** The layout that drafts follow now. Throws `not-found` when no square was described yet. */
export function getCurrentLayout(db: Db): LayoutRow {
  const layoutId = findSquare(db)?.currentLayoutId;
  if (layoutId === null || layoutId === undefined)
    throw new ProblemError("not-found", { detail: "The square is not described yet." });
  return getLayout(db, layoutId);
}

/** One layout. Throws `not-found`. */
export function getLayout(db: Db, layoutId: string): LayoutRow {
  const row = db.select().from(squareLayouts).where(eq(squareLayouts.id, layoutId)).get();
  if (!row) throw new ProblemError("not-found");
  return row;
}

/** A layout is frozen once a version was made on it or a lineup was published. */
export function isLayoutFrozen(db: Db, layoutId: string): boolean {
  const version = db
    .select({ id: showVersions.id })
    .from(showVersions)
    .where(eq(showVersions.layoutId, layoutId))
    .limit(1)
    .get();
  if (version) return true;
  const isCurrent = findSquare(db)?.currentLayoutId === layoutId;
  return isCurrent && db.select({ id: lineupPublications.id }).from(lineupPublications).limit(1).get() !== undefined;
}
