import * as Comlink from "comlink";
import type { NameTable } from "../../../../sandbox/language/names.ts";
import type { LanguageWorker } from "../../../workers/language.worker.ts";

/** A question that takes this long has lost its way in the types; the worker is ended and made anew. */
const DEADLINE_MS = 15_000;

const makeLanguageWorker = (): Worker =>
  new Worker(new URL("../../../workers/language.worker.ts", import.meta.url), { type: "module", name: "language" });

type Question = keyof LanguageWorker;
/** What a question takes after the names. */
type Asked<Q extends Question> = Parameters<LanguageWorker[Q]> extends [NameTable, ...infer Rest] ? Rest : never;
type Answer<Q extends Question> = ReturnType<LanguageWorker[Q]>;

interface Started {
  readonly end: () => void;
  readonly remote: Comlink.Remote<LanguageWorker>;
}

/**
 * Asks the type checker, in a worker that starts with the first question. A convenience: whatever
 * goes wrong there gives null, and the editor does without.
 */
export class LanguageClient {
  readonly #makeWorker: () => Worker;
  readonly #deadlineMs: number;
  #names: NameTable;
  #worker: Started | null = null;
  #isDisposed = false;

  constructor(names: NameTable, makeWorker: () => Worker = makeLanguageWorker, deadlineMs: number = DEADLINE_MS) {
    this.#names = names;
    this.#makeWorker = makeWorker;
    this.#deadlineMs = deadlineMs;
  }

  setNames(names: NameTable): void {
    this.#names = names;
  }

  /** The answer, or null when there is none in time. */
  async ask<Q extends Question>(question: Q, ...asked: Asked<Q>): Promise<Answer<Q> | null> {
    if (this.#isDisposed) return null;
    const worker = (this.#worker ??= this.#start());
    let timer: ReturnType<typeof setTimeout> | undefined;
    const late = new Promise<null>((resolve) => {
      timer = setTimeout(() => {
        if (this.#worker === worker) this.#end();
        resolve(null);
      }, this.#deadlineMs);
    });
    try {
      const remote = worker.remote[question] as unknown as (...all: unknown[]) => Promise<Answer<Q>>;
      return await Promise.race([remote(this.#names, ...asked), late]);
    } catch {
      return null;
    } finally {
      clearTimeout(timer);
    }
  }

  dispose(): void {
    this.#isDisposed = true;
    this.#end();
  }

  #start(): Started {
    const worker = this.#makeWorker();
    return { remote: Comlink.wrap<LanguageWorker>(worker), end: () => worker.terminate() };
  }

  #end(): void {
    this.#worker?.end();
    this.#worker = null;
  }
}
