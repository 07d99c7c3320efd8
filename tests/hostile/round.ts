import { KILLED, type RunEnd } from "../engine-hosts/ends.ts";
import { LONG_DEADLINE_MS, SHORT_DEADLINE_MS, WAYS, type Lab, type Way } from "../engine-hosts/lab.ts";
import type { HostileScript } from "./hostile-script.ts";
import { HONEST, toInput } from "./honest.ts";

/** What came of one script on one way, and of the honest one after it. */
export interface RoundResult {
  readonly end: RunEnd;
  readonly honestAfter: RunEnd;
}

/** A result's key: way and name of the script. */
export const keyOf = (way: Way, script: HostileScript): string => `${way}: ${script.name}`;

interface Job {
  readonly way: Way;
  readonly script: HostileScript;
}

/** A list in an order that a seed decides (mulberry32, from memory). */
export function shuffle<T>(list: readonly T[], seed: number): T[] {
  let state = seed >>> 0;
  const next = (): number => {
    state = (state + 0x6d_2b_79_f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  };
  const mixed = [...list];
  for (let i = mixed.length - 1; i > 0; i--) {
    const j = Math.floor(next() * (i + 1));
    [mixed[i], mixed[j]] = [mixed[j] as T, mixed[i] as T];
  }
  return mixed;
}

/** Every way of every script that has one. */
export function listJobs(scripts: readonly HostileScript[]): Job[] {
  return scripts.flatMap((script) =>
    WAYS.filter((way) => way === "whole" || script.straight !== null).map((way) => ({ way, script })),
  );
}

/**
 * Runs every script on every way it has, shuffled, in `lanes` side by side; each is followed by an
 * honest run on the same way, while the other lanes go on. Gives the results by key.
 */
export async function runRound(
  lab: Lab,
  jobs: readonly Job[],
  { lanes, seed }: { readonly lanes: number; readonly seed: number },
): Promise<Map<string, RoundResult>> {
  const waiting = shuffle(jobs, seed);
  const results = new Map<string, RoundResult>();
  const runLane = async (): Promise<void> => {
    for (let job = waiting.pop(); job !== undefined; job = waiting.pop()) {
      const { way, script } = job;
      const deadlineMs = script[way] === KILLED ? SHORT_DEADLINE_MS : LONG_DEADLINE_MS;
      const end = await lab[way](toInput(script.source), deadlineMs);
      const honestAfter = await lab[way](toInput(HONEST), LONG_DEADLINE_MS);
      results.set(keyOf(way, script), { end, honestAfter });
    }
  };
  await Promise.all(Array.from({ length: lanes }, runLane));
  return results;
}
