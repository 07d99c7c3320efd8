import type { Logger } from "pino";
import type { Clock } from "./clock.ts";
import type { Config } from "./config.ts";
import type { Connection } from "./db/connection.ts";
import type { RunPool } from "./runs/run-pool.ts";
import type { contracts } from "../shared/contracts/index.ts";

/** Everything the application is made from; `createApp` joins it and opens nothing itself. */
export interface AppDeps {
  readonly config: Config;
  readonly connection: Connection;
  readonly clock: Clock;
  readonly runs: RunPool;
  readonly log: Logger;
  /** Folder of the built client, or null to serve the API alone. */
  readonly clientDir: string | null;
  /** The contracts to mount; tests pass changed ones to prove that the role matrix has teeth. */
  readonly contracts?: typeof contracts;
  readonly checkResponses?: boolean;
}
