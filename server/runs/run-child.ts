import { Worker } from "node:worker_threads";
import type { ChildMessage, RunRequest, ThreadMessage } from "./messages.ts";
import { createStoppedAnswer } from "./stopped-answer.ts";
import { bundleWorker } from "./worker-bundle.ts";

/**
 * The child process of the pool: a few worker threads, one more than run at once, so that a thread
 * that had to be ended leaves a warm one in its place. A thread that ended out of turn is never used
 * again. An abort of the engine takes this process down and not the server.
 */
const THREADS = Number(process.env["DUSKBELL_RUN_THREADS"] ?? 2) + 1;
const code = await bundleWorker();
/** Threads that may fail in a row before one is ready; then the process gives up and its parent decides. */
const MAX_FAILED_STARTS = 3;
let failedStarts = 0;

const idle: Thread[] = [];
const waiting: RunRequest[] = [];

function send(message: ChildMessage): void {
  process.send?.(message);
}

/** A worker thread and the run it is busy with. */
class Thread {
  readonly #worker = new Worker(code, { eval: true, execArgv: [], resourceLimits: { maxOldGenerationSizeMb: 256 } });
  #request: RunRequest | null = null;
  #timer: NodeJS.Timeout | undefined;
  #isReady = false;

  constructor() {
    this.#worker.on("message", (message: ThreadMessage) => this.#hear(message));
    this.#worker.on("error", (error) => this.#fail(error));
  }

  start(request: RunRequest): void {
    this.#request = request;
    this.#timer = setTimeout(
      () => this.#end("too-much-work", `Stopped after ${request.deadlineMs} ms.`),
      request.deadlineMs,
    );
    this.#worker.postMessage(request);
    send({ kind: "started", id: request.id });
  }

  #fail(error: Error): void {
    if (!this.#isReady && ++failedStarts >= MAX_FAILED_STARTS) {
      process.stderr.write(`${error.stack ?? error.message}\n`);
      process.exit(1);
    }
    this.#end("could-not-run", `${error.name}: ${error.message}`);
  }

  #hear(message: ThreadMessage): void {
    if (message.kind === "ready") {
      this.#isReady = true;
      failedStarts = 0;
      send({ kind: "ready" });
      return takeUp(this);
    }
    if (this.#request?.id !== message.id) return;
    clearTimeout(this.#timer);
    this.#request = null;
    send(message.kind === "failed" ? message : { kind: "done", id: message.id, answer: message.answer });
    if (message.kind === "failed" || message.isSpent) this.#replace();
    else takeUp(this);
  }

  #end(code: "too-much-work" | "could-not-run", details: string): void {
    clearTimeout(this.#timer);
    const request = this.#request;
    this.#request = null;
    if (request !== null) {
      const { id, work, input, deadlineMs } = request;
      const engineMs = code === "too-much-work" ? deadlineMs : 0;
      send({ kind: "done", id, answer: createStoppedAnswer(work, input, { code, details, engineMs }) });
    }
    this.#replace();
  }

  #replace(): void {
    const at = idle.indexOf(this);
    if (at >= 0) idle.splice(at, 1);
    this.#worker.removeAllListeners();
    // A thread that is torn down may still report an error; nobody waits for it.
    this.#worker.on("error", () => {});
    void this.#worker.terminate();
    new Thread();
  }
}

function takeUp(thread: Thread): void {
  const request = waiting.shift();
  if (request === undefined) idle.push(thread);
  else thread.start(request);
}

process.on("message", (request: RunRequest) => {
  const thread = idle.shift();
  if (thread === undefined) waiting.push(request);
  else thread.start(request);
});
process.on("disconnect", () => process.exit(0));

for (let i = 0; i < THREADS; i++) new Thread();
