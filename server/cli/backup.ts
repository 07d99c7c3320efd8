import { existsSync, renameSync, rmSync } from "node:fs";
import { join } from "node:path";
import SqliteDatabase from "better-sqlite3";
import { systemClock } from "../clock.ts";
import { parseConfig } from "../config.ts";
import { appendAudit } from "../identity/audit-log.ts";
import { DATABASE_FILE, openDataDir } from "../start-server.ts";
import { type Command, parseOptions, UsageError } from "./command.ts";

/** `backup FILE`: a whole copy of the database, taken while the server runs, checked before it counts. */
export const backup: Command = {
  name: "backup",
  usage: "backup FILE",
  summary: "Copies the database into FILE and checks the copy. The server may run.",
  async run(args, say) {
    const { rest } = parseOptions(args, {});
    const file = rest[0];
    if (file === undefined || rest.length > 1)
      throw new UsageError("Name one file to write: backup duskbell-2026-12-04.db");
    if (existsSync(file))
      throw new UsageError(`${file} is there already. Name a new file, so that no older backup is lost.`);
    const { dataDir } = parseConfig(process.env);
    if (!existsSync(join(dataDir, DATABASE_FILE)))
      throw new UsageError(`There is no database in ${dataDir}. Set DATA_DIR to the server's folder.`);
    const connection = openDataDir(dataDir);
    const part = `${file}.part`;
    try {
      await connection.sqlite.backup(part);
      assertSound(part);
      renameSync(part, file);
      appendAudit(connection.db, { at: systemClock.now(), actorId: null, event: "backup-made" });
    } finally {
      rmSync(part, { force: true });
      connection.close();
    }
    say(`Backup written and checked: ${file}`);
    return 0;
  },
};

/**
 * Throws `UsageError` unless the file is a sound Duskbell database: SQLite's integrity check passes, no
 * row points nowhere and the tables are ours.
 */
export function assertSound(file: string): void {
  let sqlite: SqliteDatabase.Database | null = null;
  try {
    sqlite = new SqliteDatabase(file, { readonly: true, fileMustExist: true });
    const integrity = String(sqlite.pragma("integrity_check", { simple: true }));
    if (integrity !== "ok") throw new UsageError(`${file} is damaged: ${integrity}`);
    if ((sqlite.pragma("foreign_key_check") as unknown[]).length > 0)
      throw new UsageError(`${file} is damaged: rows point nowhere.`);
    const tables = sqlite
      .prepare("select count(*) from sqlite_master where name in ('users', 'show_versions', 'audit_log')")
      .pluck()
      .get();
    if (tables !== 3) throw new UsageError(`${file} is no Duskbell database.`);
  } catch (error) {
    if (error instanceof UsageError) throw error;
    throw new UsageError(
      `${file} can not be read as a database: ${error instanceof Error ? error.message : String(error)}`,
    );
  } finally {
    sqlite?.close();
  }
}
