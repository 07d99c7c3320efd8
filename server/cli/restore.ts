import { copyFileSync, existsSync, mkdirSync, renameSync, rmSync } from "node:fs";
import { join } from "node:path";
import SqliteDatabase from "better-sqlite3";
import { systemClock } from "../clock.ts";
import { parseConfig } from "../config.ts";
import { DATABASE_FILE, openDataDir } from "../start-server.ts";
import { assertSound } from "./backup.ts";
import { type Command, parseOptions, UsageError } from "./command.ts";

/** `restore FILE`: puts a backup in place of the database; the one before stays beside it. */
export const restore: Command = {
  name: "restore",
  usage: "restore FILE",
  summary: "Puts a backup in place of the database; the old one is kept beside it. Stop the server first.",
  run(args, say) {
    const { rest } = parseOptions(args, {});
    const file = rest[0];
    if (file === undefined || rest.length > 1)
      throw new UsageError("Name the backup to restore: restore duskbell-2026-12-04.db");
    if (!existsSync(file)) throw new UsageError(`There is no file ${file}.`);
    assertSound(file);
    const { dataDir } = parseConfig(process.env);
    const target = join(dataDir, DATABASE_FILE);
    mkdirSync(dataDir, { recursive: true });
    const part = `${target}.part`;
    copyFileSync(file, part);
    try {
      assertSound(part);
      if (existsSync(target)) {
        foldIntoOneFile(target);
        const kept = `${target}.before-${new Date(systemClock.now()).toISOString().replace(/[:.]/g, "-")}`;
        renameSync(target, kept);
        say(`The database from before is kept: ${kept}`);
      }
      renameSync(part, target);
    } finally {
      rmSync(part, { force: true });
    }
    // Brings an older backup up to the schema of this release.
    openDataDir(dataDir).close();
    say(`Restored ${file} into ${target}. Start the server again.`);
    return Promise.resolve(0);
  },
};

/**
 * Leaves WAL mode, which SQLite allows to the only connection there is: it proves that no server holds
 * the file, and puts everything into it. Throws `UsageError` while a server runs.
 */
function foldIntoOneFile(target: string): void {
  const sqlite = new SqliteDatabase(target, { timeout: 500 });
  try {
    const mode: unknown = sqlite.pragma("journal_mode = delete", { simple: true });
    if (mode !== "delete") throw new UsageError("A server holds this database. Stop it first, then restore.");
  } catch (error) {
    if ((error as { code?: unknown }).code === "SQLITE_BUSY")
      throw new UsageError("A server holds this database. Stop it first, then restore.");
    throw error;
  } finally {
    sqlite.close();
  }
}
