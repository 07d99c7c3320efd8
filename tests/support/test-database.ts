import { mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { type Connection, migrateDatabase, openDatabase } from "../../server/db/connection.ts";

let template: Buffer | null = null;

/** The bytes of an empty, migrated database; made once a worker, copied for each test. */
function readTemplate(): Buffer {
  if (template) return template;
  const folder = mkdtempSync(join(tmpdir(), "duskbell-template-"));
  const file = join(folder, "template.db");
  const connection = openDatabase(file);
  migrateDatabase(connection);
  // Fold the write-ahead log into the file, so that one file is the whole database.
  connection.sqlite.pragma("wal_checkpoint(TRUNCATE)");
  connection.close();
  template = readFileSync(file);
  rmSync(folder, { recursive: true });
  return template;
}

export interface TestDatabase {
  readonly connection: Connection;
  /** Folder that holds `duskbell.db`; gone after `dispose`. */
  readonly folder: string;
  readonly file: string;
  dispose(): void;
}

/** A migrated, empty SQLite file of its own, opened as the server opens it. */
export function createTestDatabase(): TestDatabase {
  const folder = mkdtempSync(join(tmpdir(), "duskbell-test-"));
  const file = join(folder, "duskbell.db");
  writeFileSync(file, readTemplate());
  const connection = openDatabase(file);
  return {
    connection,
    folder,
    file,
    dispose: () => {
      connection.close();
      rmSync(folder, { recursive: true, force: true });
    },
  };
}
