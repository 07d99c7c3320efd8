import type { RunInput } from "../../sandbox/engine/model.ts";
import { KILLED_END, type RunEnd } from "./ends.ts";

export type StraightInput = Omit<RunInput, "songId">;

/** A worker that runs one script after the other, whatever host it is on. */
export interface StraightWorker {
  ask(input: StraightInput): Promise<RunEnd>;
  end(): void;
}

/** Runs scripts straight in a worker; one that had to be ended, or may be harmed, is not used again. */
export class StraightClient {
  readonly #make: () => Promise<StraightWorker>;
  readonly #idle: StraightWorker[] = [];
  #count = 0;

  constructor(make: () => Promise<StraightWorker>) {
    this.#make = make;
  }

  /** Workers alive. */
  get count(): number {
    return this.#count;
  }

  async run(input: StraightInput, deadlineMs: number): Promise<RunEnd> {
    const worker = this.#idle.pop() ?? (await this.#start());
    let timer: ReturnType<typeof setTimeout> | undefined;
    const late = new Promise<RunEnd>((resolve) => {
      timer = setTimeout(() => resolve(KILLED_END), deadlineMs);
    });
    const end = await Promise.race([worker.ask(input), late]);
    clearTimeout(timer);
    if (end.end === KILLED_END.end || end.end === "broken" || end.end === "host error") this.#drop(worker);
    else this.#idle.push(worker);
    return end;
  }

  /** Ends the workers; none may be busy. */
  close(): void {
    for (const worker of this.#idle.splice(0)) this.#drop(worker);
  }

  async #start(): Promise<StraightWorker> {
    this.#count++;
    return this.#make();
  }

  #drop(worker: StraightWorker): void {
    worker.end();
    this.#count--;
  }
}
