import { fork, type ChildProcess } from "node:child_process";
import { fileURLToPath } from "node:url";
import type { RunInput } from "../../sandbox/engine/model.ts";
import type { JudgedRun } from "../../sandbox/checks/judge-run.ts";
import { FairQueue } from "./fair-queue.ts";
import type { ChildMessage, RunAnswer, RunRequest, RunWork, TimedOutcome } from "./messages.ts";
import { createStoppedAnswer } from "./stopped-answer.ts";

const CHILD = fileURLToPath(new URL("./run-child.ts", import.meta.url));
/** A child that does not answer so long after a thread's deadline is stuck itself. */
const CHILD_GRACE_MS = 2000;
/** Old instances leave some memory behind; a fresh child has none. */
const RUNS_PER_CHILD = 500;
/** How often a run is tried when the child dies under it, which another run may have done. */
const MAX_TRIES = 2;
const NO_CLASS = "";
/** How much of the queue one class may fill: the others still get in. */
const MOST_OF_ONE_CLASS = 0.5;
/** Loading the compiler and the engine takes seconds on a busy machine. */
const START_TIMEOUT_MS = 60_000;
/** Children that may fail in a row before the pool tells its callers. */
const MAX_FAILED_STARTS = 3;

/** Runs scripts away from the server's own thread. */
export interface RunPool {
  /**
   * Runs a script; its outcome is a value whatever it does. Rejects with `RunQueueFullError` when too
   * many runs wait, in all or of the class, and with `RunPoolClosedError` after `close`.
   */
  run(input: RunInput, options?: RunOptions): Promise<TimedOutcome>;
  /**
   * Runs a script as `run` does and works out everything that is kept of it: the show check, the
   * timeline's bytes, the ribbon and its words. Rejects with `JudgingFailedError` when that fails.
   */
  judge(input: RunInput, options?: RunOptions): Promise<JudgedRun>;
  /** Ends the child process; runs under way are rejected. */
  close(): Promise<void>;
}

export interface RunOptions {
  /** Whose turn it is; runs without a class share one. */
  readonly classId?: string;
  /** Wall time of this run, when it is not the pool's. */
  readonly deadlineMs?: number;
}

export interface RunPoolOptions {
  /** Runs at once. */
  readonly threads?: number;
  /** Wall time of one run: the backstop for what fuel can not count. */
  readonly deadlineMs?: number;
  /** Runs that may wait; of one class half as many. */
  readonly maxWaiting?: number;
}

/** Too many runs wait: the caller should say so and try again later. */
export class RunQueueFullError extends Error {
  override readonly name = "RunQueueFullError";
}

/** The child process does not start: a broken installation, not a script's doing. */
export class RunPoolBrokenError extends Error {
  override readonly name = "RunPoolBrokenError";
}

/** A run was made and could not be judged: a bug of the show check. */
export class JudgingFailedError extends Error {
  override readonly name = "JudgingFailedError";
}

/** The pool was closed. */
export class RunPoolClosedError extends Error {
  override readonly name = "RunPoolClosedError";
}

interface Job {
  readonly group: string;
  readonly work: RunWork;
  readonly input: RunInput;
  readonly deadlineMs: number;
  readonly resolve: (answer: RunAnswer) => void;
  readonly reject: (error: Error) => void;
  tries: number;
}

/** Gives a pool; its child process starts at once, so that the first run finds it warm. */
export function createRunPool(options: RunPoolOptions = {}): RunPool {
  return new ChildRunPool(options.threads ?? 2, options.deadlineMs ?? 5000, options.maxWaiting ?? 200);
}

class ChildRunPool implements RunPool {
  readonly #threads: number;
  readonly #deadlineMs: number;
  readonly #maxWaiting: number;
  readonly #queue = new FairQueue<Job>();
  readonly #running = new Map<number, { readonly job: Job; timer: NodeJS.Timeout }>();
  #child: ChildProcess;
  #nextId = 1;
  #runsOfChild = 0;
  #isReady = false;
  #failedStarts = 0;
  #startTimer: NodeJS.Timeout | undefined;
  #isClosed = false;

  constructor(threads: number, deadlineMs: number, maxWaiting: number) {
    this.#threads = threads;
    this.#deadlineMs = deadlineMs;
    this.#maxWaiting = maxWaiting;
    this.#child = this.#startChild();
  }

  async run(input: RunInput, options: RunOptions = {}): Promise<TimedOutcome> {
    const answer = await this.#ask("run", input, options);
    if (answer.work !== "run") throw new Error(`The pool was asked to run and answered "${answer.work}".`);
    return answer.outcome;
  }

  async judge(input: RunInput, options: RunOptions = {}): Promise<JudgedRun> {
    const answer = await this.#ask("judge", input, options);
    if (answer.work !== "judge") throw new Error(`The pool was asked to judge and answered "${answer.work}".`);
    return answer.judged;
  }

  #ask(
    work: RunWork,
    input: RunInput,
    { classId = NO_CLASS, deadlineMs = this.#deadlineMs }: RunOptions,
  ): Promise<RunAnswer> {
    if (this.#isClosed) return Promise.reject(new RunPoolClosedError("The run pool is closed."));
    if (this.#queue.size >= this.#maxWaiting)
      return Promise.reject(new RunQueueFullError(`${this.#queue.size} runs wait already.`));
    if (this.#queue.sizeOf(classId) >= Math.max(1, this.#maxWaiting * MOST_OF_ONE_CLASS))
      return Promise.reject(new RunQueueFullError(`${this.#queue.sizeOf(classId)} runs of this class wait already.`));
    return new Promise((resolve, reject) => {
      this.#queue.add(classId, { group: classId, work, input, deadlineMs, resolve, reject, tries: 0 });
      this.#advance();
    });
  }

  async close(): Promise<void> {
    if (this.#isClosed) return;
    this.#isClosed = true;
    clearTimeout(this.#startTimer);
    const child = this.#child;
    const gone = new Promise<void>((resolve) => child.once("exit", () => resolve()));
    this.#rejectAll(new RunPoolClosedError("The run pool was closed."));
    if (child.exitCode !== null || child.signalCode !== null) return;
    child.kill("SIGKILL");
    await gone;
  }

  #rejectAll(error: Error): void {
    for (const { job, timer } of this.#running.values()) {
      clearTimeout(timer);
      job.reject(error);
    }
    this.#running.clear();
    for (let job = this.#queue.take(); job !== undefined; job = this.#queue.take()) job.reject(error);
  }

  #startChild(): ChildProcess {
    // Typed arrays cross as they are; the child gets no more of the environment than it needs.
    const child = fork(CHILD, [], {
      serialization: "advanced",
      execArgv: ["--import", "tsx"],
      env: {
        NODE_ENV: process.env["NODE_ENV"] ?? "production",
        PATH: process.env["PATH"] ?? "",
        DUSKBELL_RUN_THREADS: String(this.#threads),
      },
    });
    child.on("message", (message: ChildMessage) => this.#hear(child, message));
    child.on("error", () => this.#replaceChild(child));
    child.on("exit", () => this.#replaceChild(child));
    this.#runsOfChild = 0;
    this.#isReady = false;
    this.#startTimer = setTimeout(() => this.#replaceChild(child), START_TIMEOUT_MS);
    return child;
  }

  #hear(child: ChildProcess, message: ChildMessage): void {
    if (child !== this.#child) return;
    if (message.kind === "ready") return this.#heardReady();
    const running = this.#running.get(message.id);
    if (running === undefined) return;
    clearTimeout(running.timer);
    if (message.kind === "started") {
      running.timer = setTimeout(() => this.#replaceChild(child), running.job.deadlineMs + CHILD_GRACE_MS);
      return;
    }
    this.#running.delete(message.id);
    if (message.kind === "failed") running.job.reject(new JudgingFailedError(message.reason));
    else running.job.resolve(message.answer);
    if (this.#runsOfChild >= RUNS_PER_CHILD && this.#running.size === 0) this.#replaceChild(child);
    this.#advance();
  }

  #heardReady(): void {
    clearTimeout(this.#startTimer);
    this.#isReady = true;
    this.#failedStarts = 0;
    this.#advance();
  }

  #advance(): void {
    while (
      this.#isReady &&
      !this.#isClosed &&
      this.#running.size < this.#threads &&
      this.#runsOfChild < RUNS_PER_CHILD
    ) {
      const job = this.#queue.take();
      if (job === undefined) return;
      this.#start(job);
    }
  }

  #start(job: Job): void {
    const id = this.#nextId++;
    job.tries++;
    this.#runsOfChild++;
    const child = this.#child;
    const { work, input, deadlineMs } = job;
    // Until a thread takes it up: after several were ended, new ones are still loading.
    const timer = setTimeout(() => this.#replaceChild(child), START_TIMEOUT_MS);
    this.#running.set(id, { job, timer });
    const request: RunRequest = { id, work, input, deadlineMs };
    child.send(request, (error) => {
      if (error !== null) this.#replaceChild(child);
    });
  }

  /** Ends a child that died, hangs or is used up; the runs it had are tried once more in the next. */
  #replaceChild(child: ChildProcess): void {
    if (this.#isClosed || child !== this.#child) return;
    child.removeAllListeners();
    child.on("error", () => {});
    child.kill("SIGKILL");
    clearTimeout(this.#startTimer);
    if (!this.#isReady && ++this.#failedStarts >= MAX_FAILED_STARTS) {
      this.#failedStarts = 0;
      this.#rejectAll(
        new RunPoolBrokenError(`The process that runs scripts failed to start ${MAX_FAILED_STARTS} times.`),
      );
    }
    const lost = [...this.#running.values()];
    this.#running.clear();
    this.#child = this.#startChild();
    for (const { job, timer } of lost) {
      clearTimeout(timer);
      if (job.tries < MAX_TRIES) this.#queue.addFirst(job.group, job);
      else {
        const details = "The process that ran it ended.";
        job.resolve(createStoppedAnswer(job.work, job.input, { code: "could-not-run", details, engineMs: 0 }));
      }
    }
    this.#advance();
  }
}
