import { parentPort } from "node:worker_threads";
import { createNodeHost } from "../../server/runs/node-host.worker.ts";
import type { StraightInput } from "./straight-client.ts";
import { runStraight } from "./straight-run.ts";

/** One thread of the hostile tests: runs scripts straight in the engine, as the pool's threads hold it. */
void createNodeHost().then((host) => {
  parentPort?.on("message", (input: StraightInput) => {
    void runStraight(host, input).then((outcome) => parentPort?.postMessage(outcome));
  });
  parentPort?.postMessage("ready");
});
