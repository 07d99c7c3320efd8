import { createHash } from "node:crypto";
import { asc, desc, sql } from "drizzle-orm";
import { type Db, inTransaction } from "../db/connection.ts";
import { auditLog } from "../db/schema/index.ts";
import type { AuditEvent } from "./audit-events.ts";

export interface AuditEntry {
  /** UTC milliseconds, from the clock. */
  readonly at: number;
  /** Who did it; null for nobody signed in, or the operator's command line. */
  readonly actorId: string | null;
  readonly event: AuditEvent;
  /** Id of what it was done to. */
  readonly subject?: string | null;
  /** Counts and reasons; never a secret. */
  readonly detail?: Readonly<Record<string, string | number | boolean>> | null;
}

type AuditRow = typeof auditLog.$inferSelect;

/** What the first row is chained to. */
const GENESIS = "0".repeat(64);

/**
 * Appends a row whose hash covers the row before it. Joins the caller's transaction, so that a change
 * and its row stand or fall together.
 */
export function appendAudit(db: Db, entry: AuditEntry): void {
  inTransaction(db, (tx) => {
    const last = tx.select({ hash: auditLog.hash }).from(auditLog).orderBy(desc(auditLog.id)).limit(1).get();
    const row = {
      at: entry.at,
      actorId: entry.actorId,
      event: entry.event,
      subject: entry.subject ?? null,
      detail: entry.detail ?? null,
    };
    tx.insert(auditLog)
      .values({ ...row, hash: chainHash(last?.hash ?? GENESIS, row) })
      .run();
  });
}

/**
 * Whether the log is as it was written: every hash fits its row and the one before, the ids have no
 * gap, and the last row is the last that SQLite ever numbered (so a cut-off end shows too). Reads the
 * whole table.
 */
export function verifyAuditChain(db: Db): { isWhole: boolean; firstBrokenId: number | null } {
  let before = GENESIS;
  let expectedId = 1;
  for (const row of db.select().from(auditLog).orderBy(asc(auditLog.id)).all()) {
    if (row.id !== expectedId || row.hash !== chainHash(before, row))
      return { isWhole: false, firstBrokenId: expectedId };
    before = row.hash;
    expectedId++;
  }
  const numbered = db.get<{ seq: number } | undefined>(sql`select seq from sqlite_sequence where name = 'audit_log'`);
  const isCut = (numbered?.seq ?? 0) !== expectedId - 1;
  return { isWhole: !isCut, firstBrokenId: isCut ? expectedId : null };
}

function chainHash(before: string, row: Omit<AuditRow, "id" | "hash">): string {
  // An array has one order; keys of `detail` keep theirs through JSON in SQLite.
  const text = JSON.stringify([before, row.at, row.actorId, row.event, row.subject, row.detail]);
  return createHash("sha256").update(text).digest("hex");
}
