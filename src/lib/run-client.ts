import * as Comlink from "comlink";
import type { GuestTables } from "../../sandbox/engine/guest.ts";
import type { RunInput, RunOutcome } from "../../sandbox/engine/model.ts";
import type { RuntimeResult } from "../../sandbox/engine/runtime.ts";
import { createStoppedOutcome } from "../../sandbox/engine/stopped.ts";
import type { ShowDescription } from "../../sandbox/timeline/describe.ts";
import type { Timeline } from "../../sandbox/timeline/model.ts";
import type { RibbonCells, RibbonSize } from "../../sandbox/timeline/ribbon.ts";
import type { RunWorker } from "../workers/run.worker.ts";
import type { PrepareAnswer, RunSetting, ScriptWorker } from "../workers/script.worker.ts";
import { makeScriptWorker } from "./script-worker.ts";
import { startSeat, WorkerEndedError, type WorkerMaker, type WorkerSeat } from "./worker-seat.ts";

/** Wall time of one run: the backstop for what fuel can not count. Fuel ends a plain endless loop within about a second. */
const DEADLINE_MS = 5000;

/** How a client gets its workers; tests pass their own. */
export interface RunWorkerMakers {
  readonly engine: WorkerMaker;
  readonly script: WorkerMaker;
}

const MAKERS: RunWorkerMakers = {
  engine: () => new Worker(new URL("../workers/run.worker.ts", import.meta.url), { type: "module", name: "run" }),
  script: makeScriptWorker,
};

/** A run that a newer one took the place of. */
export class RunReplacedError extends Error {
  override readonly name = "RunReplacedError";
}

/** An engine's worker with the tables of a square and a song. */
interface EngineSeat extends WorkerSeat<RunWorker> {
  /** What it was told to open for, and when that is done; rejects when it can not be. */
  opening: { readonly tables: Promise<GuestTables>; readonly done: Promise<void> } | null;
}

/** What the workers are open for. */
interface OpenSetting extends RunSetting {
  readonly tables: Promise<GuestTables>;
}

/**
 * Runs scripts in two workers beside the page: one reads them, one is the engine. The latest run wins: a
 * run that has not ended when the next is asked for is stopped, and its promise rejects with
 * `RunReplacedError`. An engine's worker that had to be ended is never used again; a warm spare takes its
 * place at once. Nothing is loaded before the first question: whoever opens a page sees it first.
 */
export class RunClient {
  readonly #makers: RunWorkerMakers;
  readonly #deadlineMs: number;
  #script: WorkerSeat<ScriptWorker> | null = null;
  #setting: OpenSetting | null = null;
  #engine: EngineSeat | null = null;
  #spare: EngineSeat | null = null;
  /** The run under way. */
  #running: AbortController | null = null;
  #isDisposed = false;

  constructor(makers: RunWorkerMakers = MAKERS, deadlineMs: number = DEADLINE_MS) {
    this.#makers = makers;
    this.#deadlineMs = deadlineMs;
  }

  /**
   * Gives the outcome of a script, a value whatever the script does. Rejects with `RunReplacedError`
   * when a newer run or `dispose` came first, and with a worker's error when one did not start.
   * `deadlineMs`: wall time of this run, when it is not the client's.
   */
  async run(input: RunInput, deadlineMs: number = this.#deadlineMs): Promise<RunOutcome> {
    if (this.#isDisposed) throw new RunReplacedError("The run client is disposed.");
    this.#running?.abort(new RunReplacedError("A newer run took its place."));
    const running = (this.#running = new AbortController());
    const stopped = rejectWhenAborted(running.signal);
    try {
      return await Promise.race([this.#runSteps(input, deadlineMs, running.signal), stopped]);
    } finally {
      if (this.#running === running) this.#running = null;
    }
  }

  async #runSteps(input: RunInput, deadlineMs: number, signal: AbortSignal): Promise<RunOutcome> {
    const engine = this.#openFor(input);
    const script = this.#getScript();
    let atWork: WorkerSeat<unknown> = script;
    let timer: ReturnType<typeof setTimeout> | undefined;
    // Reading a script takes no time worth stopping; only a script that runs is.
    signal.addEventListener("abort", () => atWork === engine && this.#drop(engine));
    const takeSteps = async (): Promise<RunOutcome> => {
      const prepared = await script.ask<PrepareAnswer>((remote) => remote.prepare(input.source, input.seed));
      if ("outcome" in prepared) return prepared.outcome;
      signal.throwIfAborted();
      atWork = engine;
      const result = await engine.ask((remote) => remote.execute(prepared.work));
      signal.throwIfAborted();
      atWork = script;
      const outcome = await script.ask<RunOutcome>((remote) => remote.finish(handOver(result)));
      if (!outcome.ok && outcome.problem.code === "could-not-run") this.#drop(engine);
      return outcome;
    };
    try {
      await engine.opening?.done;
      signal.throwIfAborted();
      const late = new Promise<RunOutcome>((resolve) => {
        timer = setTimeout(() => {
          resolve(createStoppedOutcome(input.source, "too-much-work", `Stopped after ${deadlineMs} ms.`));
          this.#drop(atWork);
        }, deadlineMs);
      });
      const outcome = await Promise.race([takeSteps(), late]);
      if (!this.#isDisposed) this.#readySpare();
      return outcome;
    } catch (error) {
      // A worker that failed by itself: the next run starts both anew.
      if (!signal.aborted) for (const seat of [engine, script]) this.#drop(seat);
      throw error;
    } finally {
      clearTimeout(timer);
    }
  }

  /** The ribbon of a timeline, drawn beside the page. Rejects with `RunReplacedError` after `dispose`. */
  drawRibbon(timeline: Timeline, layout: RunInput["layout"], size: RibbonSize): Promise<RibbonCells> {
    return this.#ask((script) => script.drawRibbon(timeline, layout, size));
  }

  /** A show in words. Rejects with `RunReplacedError` after `dispose`. */
  describe(timeline: Timeline, { layout, song }: Pick<RunInput, "layout" | "song">): Promise<ShowDescription> {
    return this.#ask((script) => script.describe(timeline, { layout, song }));
  }

  /** Asks the worker that reads; when a run ends it, the next one. */
  async #ask<T>(question: (script: Comlink.Remote<ScriptWorker>) => Promise<T>): Promise<T> {
    for (;;) {
      if (this.#isDisposed) throw new RunReplacedError("The run client is disposed.");
      try {
        return await this.#getScript().ask(question);
      } catch (error) {
        if (!(error instanceof WorkerEndedError)) throw error;
      }
    }
  }

  /** Ends the workers; a run under way rejects. */
  dispose(): void {
    this.#isDisposed = true;
    this.#running?.abort(new RunReplacedError("The run client is disposed."));
    for (const seat of [this.#script, this.#engine, this.#spare]) seat?.end();
  }

  #getScript(): WorkerSeat<ScriptWorker> {
    return (this.#script ??= startSeat(this.#makers.script));
  }

  /** The engine's worker, open for a square and a song. */
  #openFor({ layout, song, songId }: RunSetting): EngineSeat {
    let setting = this.#setting;
    if (setting?.layout !== layout || setting.song !== song || setting.songId !== songId) {
      const tables = this.#getScript().ask((script) => script.open({ layout, song, songId }));
      // Whoever runs hears of it.
      tables.catch(() => {});
      setting = this.#setting = { layout, song, songId, tables };
    }
    this.#engine ??= this.#startEngine();
    openEngine(this.#engine, setting);
    return this.#engine;
  }

  #startEngine(): EngineSeat {
    return { ...startSeat<RunWorker>(this.#makers.engine), opening: null };
  }

  /** Ends a worker and puts another in its place. */
  #drop(seat: WorkerSeat<unknown>): void {
    seat.end();
    if (this.#isDisposed) return;
    if (seat === this.#script) {
      this.#script = null;
      // The next one has to be told.
      this.#setting = null;
    } else if (seat === this.#engine) {
      this.#engine = this.#spare ?? this.#startEngine();
      this.#spare = null;
      if (this.#setting) openEngine(this.#engine, this.#setting);
    }
  }

  #readySpare(): void {
    this.#spare ??= this.#startEngine();
    if (this.#setting) openEngine(this.#spare, this.#setting);
  }
}

/** Tells an engine's worker the tables, once. */
function openEngine(seat: EngineSeat, { tables }: OpenSetting): void {
  if (seat.opening?.tables === tables) return;
  const done = tables.then((given) => seat.ask((remote) => remote.open(given)));
  // A spare that fails is noticed when it is needed.
  done.catch(() => {});
  seat.opening = { tables, done };
}

function rejectWhenAborted(signal: AbortSignal): Promise<never> {
  const stopped = new Promise<never>((_, reject) => {
    signal.addEventListener("abort", () => reject(signal.reason as RunReplacedError));
  });
  // A rejection that comes after the outcome is nobody's.
  stopped.catch(() => {});
  return stopped;
}

/** The result as it goes on to the next worker: its bytes are handed over, not copied. */
function handOver(result: RuntimeResult): RuntimeResult {
  return result.buffer ? Comlink.transfer(result, [result.buffer.buffer]) : result;
}
