import type { RunInput } from "../../sandbox/engine/model.ts";
import { ProblemError } from "../../shared/problem.ts";
import type { FeatureDeps } from "../deps.ts";
import { RunQueueFullError } from "../runs/run-pool.ts";

/** Runs a script that somebody waits for, in the class's turn. Throws `busy` when too many runs wait. */
export async function runOrSayBusy({ runs }: Pick<FeatureDeps, "runs">, input: RunInput, classId: string | null) {
  try {
    return await runs.run(input, classId === null ? {} : { classId });
  } catch (error) {
    if (error instanceof RunQueueFullError)
      throw new ProblemError("busy", {
        detail: "Many scripts are running. Yours is safe. Please try again in a moment.",
        cause: error,
      });
    throw error;
  }
}
