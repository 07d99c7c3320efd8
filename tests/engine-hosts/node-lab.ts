import { once } from "node:events";
import { Worker } from "node:worker_threads";
import { createRunPool } from "../../server/runs/run-pool.ts";
import { bundleWorker } from "../../server/runs/worker-bundle.ts";
import { endOfOutcome, type RunEnd } from "./ends.ts";
import { LONG_DEADLINE_MS, type Lab } from "./lab.ts";
import { StraightClient, type StraightInput, type StraightWorker } from "./straight-client.ts";

const STRAIGHT = new URL("./node-straight.worker.ts", import.meta.url);

/** The server's way to run scripts: its own pool, and threads for what goes straight into the engine. */
export async function openNodeLab(threads: number): Promise<Lab> {
  const pool = createRunPool({ threads, deadlineMs: LONG_DEADLINE_MS });
  const code = await bundleWorker(STRAIGHT);
  const straight = new StraightClient(() => startThread(code));
  return {
    name: "Node",
    whole: async (input, deadlineMs) => endOfOutcome(await pool.run(input, { deadlineMs })),
    straight: (input, deadlineMs) => straight.run(input, deadlineMs),
    countWorkers: () => Promise.resolve(straight.count),
    close: async () => {
      straight.close();
      await pool.close();
    },
  };
}

async function startThread(code: string): Promise<StraightWorker> {
  const worker = new Worker(code, { eval: true, execArgv: [] });
  await once(worker, "message");
  return {
    ask: async (input: StraightInput) => {
      worker.postMessage(input);
      const [end] = (await once(worker, "message")) as [RunEnd];
      return end;
    },
    end: () => void worker.terminate(),
  };
}
