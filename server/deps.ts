import type { Logger } from "pino";
import type { contracts } from "../shared/contracts/index.ts";
import type { Clock } from "./clock.ts";
import type { Config } from "./config.ts";
import type { Connection, Db } from "./db/connection.ts";
import type { RunPool } from "./runs/run-pool.ts";

/** What every feature's handlers are made from: `create<Feature>Handlers(deps: FeatureDeps)`. */
export interface FeatureDeps {
  readonly db: Db;
  readonly clock: Clock;
  readonly runs: RunPool;
  readonly log: Logger;
}

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
  /** Check what handlers return against the contract; tests and development. */
  readonly checkResponses?: boolean;
}
