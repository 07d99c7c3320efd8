import type { CheckInput } from "../../../sandbox/checks/context.ts";
import type { Finding } from "../../../sandbox/engine/model.ts";
import { startSeat, type WorkerMaker, type WorkerSeat } from "../../lib/worker-seat.ts";
import type { CheckWorker } from "../../workers/check.worker.ts";

/** Far more than any show takes; tens of thousands of pulses nested in each other take longer. */
const DEADLINE_MS = 20_000;

const makeCheckWorker: WorkerMaker = () =>
  new Worker(new URL("../../workers/check.worker.ts", import.meta.url), { type: "module", name: "check" });

/** Checks timelines in a worker beside the page, which starts with the first. The newest timeline is checked; one that waits behind a check that does not end is not lost. */
export class CheckClient {
  readonly #makeWorker: WorkerMaker;
  readonly #deadlineMs: number;
  #seat: WorkerSeat<CheckWorker> | null = null;

  constructor(makeWorker: WorkerMaker = makeCheckWorker, deadlineMs: number = DEADLINE_MS) {
    this.#makeWorker = makeWorker;
    this.#deadlineMs = deadlineMs;
  }

  /** The findings. Rejects with `WorkerEndedError` when they can not be had in time; the next check finds a new worker. */
  async check(input: CheckInput): Promise<readonly Finding[]> {
    const seat = (this.#seat ??= startSeat(this.#makeWorker));
    const timer = setTimeout(() => this.#end(seat), this.#deadlineMs);
    try {
      return await seat.ask((remote) => remote.check(input));
    } finally {
      clearTimeout(timer);
    }
  }

  dispose(): void {
    if (this.#seat) this.#end(this.#seat);
  }

  #end(seat: WorkerSeat<CheckWorker>): void {
    seat.end();
    if (this.#seat === seat) this.#seat = null;
  }
}
