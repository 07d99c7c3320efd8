import { existsSync, mkdirSync } from "node:fs";
import { createServer, type Server } from "node:http";
import { join, resolve } from "node:path";
import type { Logger } from "pino";
import { createApp } from "./app.ts";
import { systemClock } from "./clock.ts";
import type { Config } from "./config.ts";
import { type Connection, migrateDatabase, openDatabase } from "./db/connection.ts";
import { createRunPool, type RunPool } from "./runs/run-pool.ts";
import { runUnfinishedVersions } from "./show-runs/run-version.ts";
import { tidyDatabase } from "./upkeep.ts";

const CLIENT_DIR = resolve(import.meta.dirname, "../dist/client");
/** Wall time of one run. Fuel decides; on a busy machine an honest show takes seconds, so the backstop is far off. */
const RUN_DEADLINE_MS = 15_000;
const TIDY_EVERY_MS = 60 * 60 * 1000;
/** A version whose run got lost (a crash, a full pool) waits no longer than this. */
const CATCH_UP_EVERY_MS = 60 * 1000;
/** A run at its deadline, and a bit; whoever still waits then asks again. */
const FINISH_MS = 10_000;

/** Name of the database file in DATA_DIR; SQLite keeps `-wal` and `-shm` beside it. */
export const DATABASE_FILE = "duskbell.db";

/** What is running, until `stop` ends it in order. */
export interface RunningServer {
  /** `http://host:port` as it can be opened on this machine. */
  readonly address: string;
  readonly connection: Connection;
  readonly runs: RunPool;
  /** Stops accepting, finishes what is under way, ends the pool, folds the log into the file, closes it. */
  stop(): Promise<void>;
}

/** Opens (and makes, if need be) the database in `dataDir` with the newest schema. */
export function openDataDir(dataDir: string): Connection {
  mkdirSync(dataDir, { recursive: true });
  const connection = openDatabase(join(dataDir, DATABASE_FILE));
  migrateDatabase(connection);
  return connection;
}

/**
 * Opens the database, starts the run pool and listens. `prepare` runs before the first request.
 * Rejects when the database can not be opened or the port is taken (`EADDRINUSE`), with nothing left
 * running.
 */
export async function startServer(
  config: Config,
  log: Logger,
  prepare: (parts: { connection: Connection; runs: RunPool }) => Promise<void>,
): Promise<RunningServer> {
  const connection = openDataDir(config.dataDir);
  const runs = createRunPool({ threads: config.runThreads, deadlineMs: RUN_DEADLINE_MS });
  const close = async () => {
    await runs.close();
    connection.sqlite.pragma("wal_checkpoint(TRUNCATE)");
    connection.close();
  };
  try {
    await tidyDatabase(connection.db, systemClock);
    await prepare({ connection, runs });
    const clientDir = existsSync(join(CLIENT_DIR, "index.html")) ? CLIENT_DIR : null;
    const checkResponses = process.env.NODE_ENV === "development";
    const app = createApp({ config, connection, clock: systemClock, runs, log, clientDir, checkResponses });
    const http = createServer(app);
    const address = await listen(http, config);
    const catchUp = () => {
      runUnfinishedVersions({ db: connection.db, clock: systemClock, runs, log }).catch((error: unknown) =>
        log.error({ err: error }, "catching up on runs failed"),
      );
    };
    catchUp();
    const catchingUp = setInterval(catchUp, CATCH_UP_EVERY_MS);
    const tidying = setInterval(() => void tidyDatabase(connection.db, systemClock), TIDY_EVERY_MS);
    return {
      address,
      connection,
      runs,
      stop: async () => {
        clearInterval(tidying);
        clearInterval(catchingUp);
        await finish(http);
        await close();
      },
    };
  } catch (error) {
    await close();
    throw error;
  }
}

function listen(http: Server, { host, port }: Config): Promise<string> {
  return new Promise((resolve_, reject) => {
    http.once("error", reject);
    http.listen(port, host, () => {
      http.off("error", reject);
      const bound = http.address();
      const boundPort = typeof bound === "object" && bound !== null ? bound.port : port;
      const shown = host === "0.0.0.0" || host === "::" ? "127.0.0.1" : host;
      resolve_(`http://${shown.includes(":") ? `[${shown}]` : shown}:${boundPort}`);
    });
  });
}

/** Waits for requests under way; idle connections are closed at once, stuck ones after a while. */
function finish(http: Server): Promise<void> {
  return new Promise((resolve_) => {
    const giveUp = setTimeout(() => http.closeAllConnections(), FINISH_MS);
    http.close(() => {
      clearTimeout(giveUp);
      resolve_();
    });
    http.closeIdleConnections();
  });
}
