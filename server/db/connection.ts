import SqliteDatabase from "better-sqlite3";
import { type BetterSQLite3Database, drizzle } from "drizzle-orm/better-sqlite3";
import { migrate } from "drizzle-orm/better-sqlite3/migrator";
import { fileURLToPath } from "node:url";
import * as schema from "./schema/index.ts";

export type Db = BetterSQLite3Database<typeof schema>;

/** A connection: `db` for queries, `sqlite` for pragmas, backup and closing. */
export interface Connection {
  readonly db: Db;
  readonly sqlite: SqliteDatabase.Database;
  close(): void;
}

/**
 * WAL keeps committed work after a crash; FULL also after a power cut. better-sqlite3 is built with
 * DEFAULT_WAL_SYNCHRONOUS=1, so `synchronous` has to be set again on every open.
 */
const PRAGMAS: Readonly<Record<string, string | number>> = {
  journal_mode: "wal",
  synchronous: 2,
  foreign_keys: 1,
  busy_timeout: 5000,
};

/** Before 3.51.3 the WAL could be reset under a second connection and lose commits. */
const SQLITE_MIN_VERSION = [3, 51, 3] as const;

const MIGRATIONS_FOLDER = fileURLToPath(new URL("../../drizzle", import.meta.url));

/**
 * Opens the database file (or ":memory:"), sets the pragmas and reads them back.
 * Throws when a pragma did not take or SQLite is too old. The only place that opens a connection.
 */
export function openDatabase(file: string): Connection {
  const sqlite = new SqliteDatabase(file);
  for (const [name, value] of Object.entries(PRAGMAS)) {
    sqlite.pragma(`${name} = ${value}`);
    const got: unknown = sqlite.pragma(name, { simple: true });
    const isMemory = file === ":memory:" && name === "journal_mode";
    if (!isMemory && got !== value) throw new Error(`SQLite kept ${name} = ${String(got)}, wanted ${value}.`);
  }
  assertSqliteVersion(String(sqlite.prepare("select sqlite_version()").pluck().get()));
  return { db: drizzle(sqlite, { schema }), sqlite, close: () => void sqlite.close() };
}

function assertSqliteVersion(version: string): void {
  const parts = version.split(".").map(Number);
  for (const [i, least] of SQLITE_MIN_VERSION.entries()) {
    const part = parts[i] ?? 0;
    if (part > least) return;
    if (part < least)
      throw new Error(`SQLite ${version} is too old: ${SQLITE_MIN_VERSION.join(".")} or newer is needed.`);
  }
}

/** Brings the schema up to date. Each migration runs in one transaction. */
export function migrateDatabase(connection: Connection): void {
  migrate(connection.db, { migrationsFolder: MIGRATIONS_FOLDER });
}

/** Runs `work` in one IMMEDIATE transaction: the write lock is taken first, so it never fails half way. */
export function inTransaction<T>(db: Db, work: (tx: Db) => T): T {
  return db.transaction((tx) => work(tx as unknown as Db), { behavior: "immediate" });
}
