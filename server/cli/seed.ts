import { pino } from "pino";
import { systemClock } from "../clock.ts";
import { parseConfig } from "../config.ts";
import { isEmptyDatabase } from "../db/is-empty-database.ts";
import { seedDemoWorld } from "../db/seed/index.ts";
import { createRunPool } from "../runs/run-pool.ts";
import { openDataDir } from "../start-server.ts";
import { COMMAND_DEADLINE_MS } from "./run-input.ts";
import { type Command, parseOptions, UsageError } from "./command.ts";

/** `seed`: the demo world into an empty database. */
export const seed: Command = {
  name: "seed",
  usage: "seed",
  summary: "Fills an empty database with the demo world and says how to sign in.",
  async run(args, say) {
    const { rest } = parseOptions(args, {});
    if (rest.length > 0) throw new UsageError("seed takes nothing more. Set DATA_DIR to choose the folder.");
    const { dataDir, runThreads } = parseConfig(process.env);
    const connection = openDataDir(dataDir);
    const runs = createRunPool({ threads: runThreads, deadlineMs: COMMAND_DEADLINE_MS });
    try {
      if (!isEmptyDatabase(connection.db))
        throw new UsageError(`The database in ${dataDir} is not empty. Choose an empty folder with DATA_DIR.`);
      const lines = await seedDemoWorld({
        db: connection.db,
        clock: systemClock,
        runs,
        log: pino({ level: "silent" }),
      });
      for (const line of lines) say(line);
      return 0;
    } finally {
      await runs.close();
      connection.close();
    }
  },
};
