import { parentPort } from "node:worker_threads";
import { createEngine, type Engine } from "../../sandbox/engine/engine.ts";
import { createStoppedOutcome } from "../../sandbox/engine/stopped.ts";
import type { RunOutcome } from "../../sandbox/engine/model.ts";
import type { RunRequest, ThreadMessage, TimedOutcome } from "./messages.ts";
import { createNodeHost } from "./node-host.worker.ts";

/** One thread that runs scripts, one after the other. It has no way to end itself: its parent does that. */
function start(engine: Engine): void {
  const port = parentPort;
  if (port === null) throw new Error("run.worker.ts only runs as a worker thread.");
  const send = (message: ThreadMessage): void => port.postMessage(message);

  async function answer({ id, input }: RunRequest): Promise<void> {
    const started = performance.now();
    let outcome: RunOutcome;
    try {
      outcome = await engine.run(input);
    } catch (error) {
      outcome = createStoppedOutcome(
        input.source,
        "could-not-run",
        error instanceof Error ? `${error.name}: ${error.message}` : String(error),
      );
    }
    const timed: TimedOutcome = { ...outcome, engineMs: performance.now() - started };
    send({ kind: "done", id, outcome: timed, isSpent: !outcome.ok && outcome.problem.code === "could-not-run" });
  }

  port.on("message", (request: RunRequest) => void answer(request));
  send({ kind: "ready" });
}

void createNodeHost().then((host) => start(createEngine(host)));
