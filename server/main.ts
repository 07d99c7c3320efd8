import { rmSync } from "node:fs";
import { join } from "node:path";
import { destination } from "pino";
import { systemClock } from "./clock.ts";
import { type Config, parseConfig } from "./config.ts";
import { createLog } from "./log.ts";
import { isEmptyDatabase } from "./db/is-empty-database.ts";
import { DATABASE_FILE, startServer } from "./start-server.ts";

const EXIT_FAILED = 1;
const EXIT_BAD_CONFIG = 2;
const EXIT_PORT_TAKEN = 3;

const config = readConfig();
// The terminal's standard output is for people; machines read the log from standard error.
const log = createLog(config.logLevel, destination(2));
let welcome: string[] = [];
let isSeeding = false;

try {
  const server = await startServer(config, log, async ({ connection, runs }) => {
    if (!config.demoWorld || !isEmptyDatabase(connection.db)) return;
    console.log("Seeding the demo world, once ...");
    // Loaded only here: a server with its own world never needs it.
    const { seedDemoWorld } = await import("./db/seed/index.ts");
    isSeeding = true;
    welcome = await seedDemoWorld({ db: connection.db, clock: systemClock, runs, log });
    isSeeding = false;
  });
  printAddress(server.address);
  stopOnSignals(() => server.stop());
} catch (error) {
  fail(error);
}

function readConfig(): Config {
  try {
    return parseConfig(process.env);
  } catch (error) {
    console.error(error instanceof Error ? error.message : error);
    process.exit(EXIT_BAD_CONFIG);
  }
}

function printAddress(address: string): void {
  const rule = "-".repeat(72);
  const lines = [`Duskbell is at ${config.publicUrl ?? address}`, `Database: ${join(config.dataDir, DATABASE_FILE)}`];
  console.log([rule, ...lines, ...(welcome.length > 0 ? ["", ...welcome] : []), rule].join("\n"));
}

function stopOnSignals(stop: () => Promise<void>): void {
  let isStopping = false;
  const handleSignal = () => {
    // A second signal means "now".
    if (isStopping) process.exit(EXIT_FAILED);
    isStopping = true;
    stop().then(
      () => process.exit(0),
      (error: unknown) => {
        log.fatal({ err: error }, "stopping failed");
        process.exit(EXIT_FAILED);
      },
    );
  };
  process.on("SIGTERM", handleSignal);
  process.on("SIGINT", handleSignal);
}

function fail(error: unknown): never {
  const code = (error as { code?: unknown } | null)?.code;
  if (code === "EADDRINUSE") {
    console.error(`Port ${config.port} on ${config.host} is taken. Stop the other program, or set PORT to a free one.`);
    process.exit(EXIT_PORT_TAKEN);
  }
  // Half a demo world would be taken for a world of one's own at the next start.
  if (isSeeding)
    for (const end of ["", "-wal", "-shm"]) rmSync(join(config.dataDir, DATABASE_FILE + end), { force: true });
  console.error(`Duskbell could not start: ${error instanceof Error ? error.message : String(error)}`);
  log.fatal({ err: error }, "start failed");
  process.exit(EXIT_FAILED);
}
