import { RunClient } from "../../../src/lib/run-client.ts";
import type { RunInput } from "../../../sandbox/engine/model.ts";
import { endOfOutcome, type RunEnd } from "../ends.ts";
import { StraightClient, type StraightInput, type StraightWorker } from "../straight-client.ts";

/** What a test calls on the page. Inputs are JSON, whose escapes carry every character, halves of pairs too. */
export interface PageLab {
  whole(json: string, deadlineMs: number): Promise<RunEnd>;
  straight(json: string, deadlineMs: number): Promise<RunEnd>;
  countWorkers(): number;
  /** Time zone and locale as a worker of this page sees them. */
  askZone(): Promise<Zone>;
}

export interface Zone {
  readonly timeZone: string;
  readonly locale: string;
}

declare global {
  interface Window {
    lab: PageLab;
  }
}

/** The product's own clients; each runs one script at a time. */
const idle: RunClient[] = [];
const straight = new StraightClient(startWorker);

function startWorker(): Promise<StraightWorker> {
  const worker = new Worker(new URL("./straight.worker.ts", import.meta.url), { type: "module" });
  const hear = () => new Promise((resolve) => worker.addEventListener("message", resolve, { once: true }));
  const ask = async (input: StraightInput): Promise<RunEnd> => {
    worker.postMessage(input);
    return ((await hear()) as MessageEvent<RunEnd>).data;
  };
  return hear().then(() => ({ ask, end: () => worker.terminate() }));
}

/** Squares and songs by their JSON: a client that is given the same object again has it open already. */
const settings = new Map<string, unknown>();

function readInput(json: string): RunInput {
  const input = JSON.parse(json) as RunInput;
  const keep = <T>(value: T): T => {
    const key = JSON.stringify(value);
    if (!settings.has(key)) settings.set(key, value);
    return settings.get(key) as T;
  };
  return { ...input, layout: keep(input.layout), song: keep(input.song) };
}

window.lab = {
  whole: async (json, deadlineMs) => {
    const client = idle.pop() ?? new RunClient();
    const outcome = await client.run(readInput(json), deadlineMs);
    idle.push(client);
    return endOfOutcome(outcome);
  },
  straight: (json, deadlineMs) => straight.run(JSON.parse(json) as StraightInput, deadlineMs),
  countWorkers: () => straight.count,
  askZone: () =>
    new Promise((resolve) => {
      const worker = new Worker(new URL("./zone.worker.ts", import.meta.url), { type: "module" });
      worker.addEventListener("message", ({ data }: MessageEvent<Zone>) => {
        worker.terminate();
        resolve(data);
      });
    }),
};
