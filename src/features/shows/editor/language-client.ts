import type { NameTable } from "../../../../sandbox/language/names.ts";
import { makeScriptWorker } from "../../../lib/script-worker.ts";
import { startSeat, type WorkerMaker, type WorkerSeat } from "../../../lib/worker-seat.ts";
import type { LanguageWorker } from "../../../workers/script.worker.ts";

/** A question that takes this long has lost its way in the types; the worker is ended and made anew. */
const DEADLINE_MS = 15_000;

type Question = keyof LanguageWorker;
/** What a question takes after the names. */
type Asked<Q extends Question> = Parameters<LanguageWorker[Q]> extends [NameTable, ...infer Rest] ? Rest : never;
type Answer<Q extends Question> = ReturnType<LanguageWorker[Q]>;

/**
 * Asks the type checker, in a worker that starts with the first question. A convenience: whatever
 * goes wrong there gives null, and the editor does without.
 */
export class LanguageClient {
  readonly #makeWorker: WorkerMaker;
  readonly #deadlineMs: number;
  #names: NameTable;
  #seat: WorkerSeat<LanguageWorker> | null = null;
  #isDisposed = false;

  constructor(names: NameTable, makeWorker: WorkerMaker = makeScriptWorker, deadlineMs: number = DEADLINE_MS) {
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
    const seat = (this.#seat ??= startSeat(this.#makeWorker));
    const timer = setTimeout(() => this.#end(seat), this.#deadlineMs);
    try {
      return await seat.ask((remote) => {
        const put = remote[question] as unknown as (...all: unknown[]) => Promise<Answer<Q>>;
        return put(this.#names, ...asked);
      });
    } catch {
      return null;
    } finally {
      clearTimeout(timer);
    }
  }

  dispose(): void {
    this.#isDisposed = true;
    if (this.#seat) this.#end(this.#seat);
  }

  #end(seat: WorkerSeat<LanguageWorker>): void {
    seat.end();
    if (this.#seat === seat) this.#seat = null;
  }
}
