import * as Comlink from "comlink";

/** Makes a worker; tests pass their own. */
export type WorkerMaker = () => Worker;

/** What a worker that was ended, or replaced, did not answer. */
export class WorkerEndedError extends Error {
  override readonly name = "WorkerEndedError";
}

/** One worker with its remote half. */
export interface WorkerSeat<T> {
  readonly remote: Comlink.Remote<T>;
  /** The answer; rejects with `WorkerEndedError` when the worker is ended first, and with its error when it does not start. */
  ask<Answer>(question: (remote: Comlink.Remote<T>) => Promise<Answer>): Promise<Answer>;
  readonly end: () => void;
}

/** Starts a worker. What it was asked never hangs: it is answered, or rejects when the worker fails or is ended. */
export function startSeat<T>(makeWorker: WorkerMaker): WorkerSeat<T> {
  const worker = makeWorker();
  const remote = Comlink.wrap<T>(worker);
  let end = () => {};
  const gone = new Promise<never>((_, reject) => {
    worker.addEventListener("error", (event) => reject(new Error(event.message || "A worker did not start.")));
    end = () => {
      worker.terminate();
      reject(new WorkerEndedError("The worker was ended."));
    };
  });
  // Whoever asked hears of it.
  gone.catch(() => {});
  return { remote, ask: (question) => Promise.race([question(remote), gone]), end };
}
