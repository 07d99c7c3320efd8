import { and, asc, desc, eq, inArray, isNull, sql } from "drizzle-orm";
import type { Db } from "../db/connection.ts";
import { runs, showVersions } from "../db/schema/index.ts";

export type VersionRow = typeof showVersions.$inferSelect;
export type RunRow = typeof runs.$inferSelect;
/** A run without its timeline, which is fetched only where it is played or judged. */
export type RunFace = Omit<RunRow, "timeline">;

const faceColumns = {
  id: runs.id,
  versionId: runs.versionId,
  layoutId: runs.layoutId,
  beatMapId: runs.beatMapId,
  engine: runs.engine,
  rulesVersion: runs.rulesVersion,
  summary: runs.summary,
  hash: runs.hash,
  ribbon: runs.ribbon,
  createdAt: runs.createdAt,
};

/** One version, or null. */
export function findVersion(db: Db, versionId: string): VersionRow | null {
  return db.select().from(showVersions).where(eq(showVersions.id, versionId)).get() ?? null;
}

/** The latest run of each of these versions. */
export function listLatestRuns(db: Db, versionIds: readonly string[]): Map<string, RunFace> {
  if (versionIds.length === 0) return new Map();
  const rows = db
    .select(faceColumns)
    .from(runs)
    .where(inArray(runs.versionId, [...versionIds]))
    .orderBy(asc(runs.createdAt), asc(sql`runs.rowid`))
    .all();
  return new Map(rows.map((row) => [row.versionId, row]));
}

/** The runs with these ids. */
export function listRuns(db: Db, runIds: readonly string[]): Map<string, RunFace> {
  if (runIds.length === 0) return new Map();
  const rows = db
    .select(faceColumns)
    .from(runs)
    .where(inArray(runs.id, [...runIds]))
    .all();
  return new Map(rows.map((row) => [row.id, row]));
}

/** The latest run of a version with its timeline, or null while the server has not run it. */
export function findLatestRun(db: Db, versionId: string): RunRow | null {
  return (
    db
      .select()
      .from(runs)
      .where(eq(runs.versionId, versionId))
      .orderBy(desc(runs.createdAt), desc(sql`runs.rowid`))
      .limit(1)
      .get() ?? null
  );
}

/** Versions that were handed in and never ran: the process ended between the two. Oldest first. */
export function listVersionsWithoutRun(db: Db): VersionRow[] {
  return db
    .select({ version: showVersions })
    .from(showVersions)
    .leftJoin(runs, eq(runs.versionId, showVersions.id))
    .where(and(isNull(runs.id)))
    .orderBy(asc(showVersions.createdAt))
    .all()
    .map((row) => row.version);
}

export function insertRun(db: Db, row: typeof runs.$inferInsert): void {
  db.insert(runs).values(row).run();
}
