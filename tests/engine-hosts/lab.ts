import type { RunInput } from "../../sandbox/engine/model.ts";
import type { RunEnd } from "./ends.ts";
import type { StraightInput } from "./straight-client.ts";

/** The two ways of a script into a lab: through the whole pipeline, or straight into the engine. */
export const WAYS = ["whole", "straight"] as const;
export type Way = (typeof WAYS)[number];

/** A host of the engine with both ways to run a script on it. Any number of runs may be under way. */
export interface Lab {
  readonly name: string;
  /** Through the whole pipeline, as the product runs a script there. */
  whole(input: RunInput, deadlineMs: number): Promise<RunEnd>;
  /** Straight into the engine. */
  straight(input: StraightInput, deadlineMs: number): Promise<RunEnd>;
  /** Workers alive that run scripts straight. */
  countWorkers(): Promise<number>;
  /** Ends all of it. */
  close(): Promise<void>;
}

/** Wall time for a script that nothing but its worker's end stops; the shorter the cheaper. */
export const SHORT_DEADLINE_MS = 1000;
/** Wall time for all others: fuel ends them long before, on a busy machine too. */
export const LONG_DEADLINE_MS = 60_000;
