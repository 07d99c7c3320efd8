import { parentPort } from "node:worker_threads";
import { judgeRun } from "../../sandbox/checks/judge-run.ts";
import { createEngine, type Engine } from "../../sandbox/engine/engine.ts";
import { createStoppedOutcome } from "../../sandbox/engine/stopped.ts";
import type { RunInput, RunOutcome } from "../../sandbox/engine/model.ts";
import type { RunAnswer, RunRequest, RunWork, ThreadMessage, TimedOutcome } from "./messages.ts";
import { createNodeHost } from "./node-host.worker.ts";

function toAnswer(work: RunWork, { layout, song }: RunInput, outcome: TimedOutcome): RunAnswer {
  return work === "run" ? { work, outcome } : { work, judged: judgeRun(outcome, layout, song) };
}

/** One thread that runs scripts, one after the other. It has no way to end itself: its parent does that. */
function start(engine: Engine): void {
  const port = parentPort;
  if (port === null) throw new Error("run.worker.ts only runs as a worker thread.");
  const send = (message: ThreadMessage): void => port.postMessage(message);

  async function answer({ id, work, input }: RunRequest): Promise<void> {
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
    const engineMs = performance.now() - started;
    const isSpent = !outcome.ok && outcome.problem.code === "could-not-run";
    try {
      send({ kind: "done", id, answer: toAnswer(work, input, { ...outcome, engineMs }), isSpent });
    } catch (error) {
      send({ kind: "failed", id, reason: error instanceof Error ? (error.stack ?? error.message) : String(error) });
    }
  }

  port.on("message", (request: RunRequest) => void answer(request));
  send({ kind: "ready" });
}

void createNodeHost().then((host) => start(createEngine(host)));
