import type { WorkerMaker } from "./worker-seat.ts";

/** The worker that holds the compiler. Made for two jobs that must not wait for each other: running scripts, and helping the editor. */
export const makeScriptWorker: WorkerMaker = () =>
  new Worker(new URL("../workers/script.worker.ts", import.meta.url), { type: "module", name: "script" });
