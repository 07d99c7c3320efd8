import * as Comlink from "comlink";
import type { RunInput, RunOutcome } from "../../sandbox/engine/model.ts";
import { createStoppedOutcome } from "../../sandbox/engine/stopped.ts";
import type { ShowDescription } from "../../sandbox/timeline/describe.ts";
import type { Timeline } from "../../sandbox/timeline/model.ts";
import type { RibbonCells, RibbonSize } from "../../sandbox/timeline/ribbon.ts";
import type { RunWorker } from "../workers/run.worker.ts";

/** Wall time of one run: the backstop for what fuel can not count. Fuel ends a plain endless loop within about a second. */
const DEADLINE_MS = 5000;

/** One worker with its remote half. */
interface Seat {
  readonly remote: Comlink.Remote<RunWorker>;
  /** Settles when the engine is loaded; rejects when it can not be. */
  readonly warm: Promise<void>;
  /** Rejects when the worker is ended: what it was asked is never answered. */
  readonly ended: Promise<never>;
  readonly end: () => void;
}

/** How a client gets its workers; tests pass their own. */
export type WorkerMaker = () => Worker;

const makeRunWorker: WorkerMaker = () =>
  new Worker(new URL("../workers/run.worker.ts", import.meta.url), { type: "module", name: "run" });

/** A run that a newer one took the place of. */
export class RunReplacedError extends Error {
  override readonly name = "RunReplacedError";
}

/**
 * Runs scripts in a worker beside the page. The latest run wins: a run that has not ended when the
 * next is asked for is ended, and its promise rejects with `RunReplacedError`. A worker that had to
 * be ended is never used again; a warm spare takes its place at once.
 */
export class RunClient {
  readonly #makeWorker: WorkerMaker;
  readonly #deadlineMs: number;
  #seat: Seat;
  #spare: Seat | null = null;
  #stop: ((reason: RunReplacedError) => void) | null = null;
  #isDisposed = false;

  constructor(makeWorker: WorkerMaker = makeRunWorker, deadlineMs: number = DEADLINE_MS) {
    this.#makeWorker = makeWorker;
    this.#deadlineMs = deadlineMs;
    this.#seat = this.#createSeat();
  }

  /**
   * Gives the outcome of a script, a value whatever the script does. Rejects with `RunReplacedError`
   * when a newer run or `dispose` came first, and with the worker's error when the engine did not load.
   * `deadlineMs`: wall time of this run, when it is not the client's.
   */
  async run(input: RunInput, deadlineMs: number = this.#deadlineMs): Promise<RunOutcome> {
    if (this.#isDisposed) throw new RunReplacedError("The run client is disposed.");
    this.#stop?.(new RunReplacedError("A newer run took its place."));
    let timer: ReturnType<typeof setTimeout> | undefined;
    const stopped = new Promise<never>((_, reject) => {
      this.#stop = (reason) => {
        this.#replaceSeat();
        reject(reason);
      };
    });
    const stop = this.#stop;
    // Whoever waits for the run hears of it; a rejection that comes after the outcome is nobody's.
    stopped.catch(() => {});
    const seat = this.#seat;
    try {
      await Promise.race([seat.warm, stopped]);
      const late = new Promise<RunOutcome>((resolve) => {
        timer = setTimeout(() => {
          if (this.#seat === seat) this.#replaceSeat();
          resolve(createStoppedOutcome(input.source, "too-much-work", `Stopped after ${deadlineMs} ms.`));
        }, deadlineMs);
      });
      const outcome = await Promise.race([seat.remote.run(input), late, stopped]);
      if (!outcome.ok && outcome.problem.code === "could-not-run" && this.#seat === seat) this.#replaceSeat();
      this.#spare ??= this.#isDisposed ? null : this.#createSeat();
      return outcome;
    } catch (error) {
      if (!(error instanceof RunReplacedError) && this.#seat === seat) this.#replaceSeat();
      throw error;
    } finally {
      clearTimeout(timer);
      if (this.#stop === stop) this.#stop = null;
    }
  }

  /** The ribbon of a timeline, drawn beside the page. Rejects with `RunReplacedError` after `dispose`. */
  drawRibbon(timeline: Timeline, layout: RunInput["layout"], size: RibbonSize): Promise<RibbonCells> {
    return this.#ask((remote) => remote.drawRibbon(timeline, layout, size));
  }

  /** A show in words. Rejects with `RunReplacedError` after `dispose`. */
  describe(timeline: Timeline, { layout, song }: Pick<RunInput, "layout" | "song">): Promise<ShowDescription> {
    return this.#ask((remote) => remote.describe(timeline, layout, song));
  }

  /** Asks the present worker; when a run ends it, the next one. */
  async #ask<T>(question: (remote: Comlink.Remote<RunWorker>) => Promise<T>): Promise<T> {
    for (;;) {
      const seat = this.#seat;
      try {
        return await Promise.race([question(seat.remote), seat.ended]);
      } catch (error) {
        if (this.#isDisposed || !(error instanceof RunReplacedError)) throw error;
      }
    }
  }

  /** Ends the workers; a run under way rejects. */
  dispose(): void {
    this.#isDisposed = true;
    this.#stop?.(new RunReplacedError("The run client is disposed."));
    this.#seat.end();
    this.#spare?.end();
    this.#spare = null;
  }

  #createSeat(): Seat {
    const worker = this.#makeWorker();
    const remote = Comlink.wrap<RunWorker>(worker);
    const failed = new Promise<never>((_, reject) => {
      worker.addEventListener("error", (event) => reject(new Error(event.message || "The run worker did not start.")));
    });
    const warm = Promise.race([remote.warmUp(), failed]);
    // A spare that fails is noticed when it is needed.
    warm.catch(() => {});
    failed.catch(() => {});
    let end = () => {};
    const ended = new Promise<never>((_, reject) => {
      end = () => {
        worker.terminate();
        reject(new RunReplacedError("The worker was ended."));
      };
    });
    ended.catch(() => {});
    return { remote, warm, ended, end };
  }

  #replaceSeat(): void {
    this.#seat.end();
    if (this.#isDisposed) return;
    this.#seat = this.#spare ?? this.#createSeat();
    this.#spare = null;
  }
}
