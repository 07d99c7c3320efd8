import type { RunPool } from "../runs/run-pool.ts";

/** For commands that never run a script: nothing is started, and a run says so. */
export const notNeeded: RunPool = {
  run: () => Promise.reject(new Error("This command runs no scripts.")),
  judge: () => Promise.reject(new Error("This command runs no scripts.")),
  close: () => Promise.resolve(),
};
