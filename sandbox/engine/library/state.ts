import type { GuestFailure, GuestFinding, GuestLuck, GuestNote, GuestTables } from "../guest.ts";
import { MAX_FINDINGS, MAX_NOTES } from "../guest.ts";
import { TICKS_PER_BEAT } from "../../../shared/units.ts";

/**
 * The state of the one run of this engine. The marked script keeps its own call site and call stack
 * in local variables, because that is what costs least; it lends the library the readers below.
 */

/** What the marked script lends: the call site now, the sites of the callers, and how many those are. */
export interface ScriptFrames {
  readonly site: () => number;
  readonly callers: readonly number[];
  readonly depth: () => number;
}

interface RunState {
  tables: GuestTables;
  luck: GuestLuck;
  frames: ScriptFrames;
  /** Beats; never rounded. */
  clock: number;
  /** The song's end. */
  endTick: number;
  /** Callbacks of the library running inside each other. */
  callbackDepth: number;
  failure: GuestFailure | null;
  readonly notes: GuestNote[];
  readonly findings: GuestFinding[];
}

export const state: RunState = {
  tables: {
    lightCount: 0,
    boxOf: [],
    partOf: [],
    fronts: [],
    sides: [],
    song: { beats: [], beatsPerBar: 4, bars: [], sections: [], instruments: [], loudness: [] },
    colours: {},
  },
  luck: { seed: 0, streamOf: [], streams: [] },
  frames: { site: () => 0, callers: [], depth: () => 0 },
  clock: 0,
  endTick: 0,
  callbackDepth: 0,
  failure: null,
  notes: [],
  findings: [],
};

/** Thrown to unwind the script after `state.failure` is set. */
export class Stop {}

/** Stops the script with a problem of the catalogue. */
export function fail(
  code: string,
  values: { readonly [name: string]: string | number } = {},
  argument?: number,
): never {
  state.failure ??= argument === undefined ? { code, values } : { code, values, argument };
  throw new Stop();
}

/** Stops the script with a problem at a site that is not a call. */
export function failAt(site: number, code: string, values: { readonly [name: string]: string | number }): never {
  state.failure ??= { code, values, site };
  throw new Stop();
}

/** The tick of a moment: rounded once, here. */
export function toTick(moment: number): number {
  return Math.round(moment * TICKS_PER_BEAT);
}

const findingIndex = new Map<string, number>();
const findingCount = new Map<string, number>();
const MAX_MOMENTS = 50;

/** Notes something about the call being run; equal ones of one call are gathered. */
export function notice(rule: string, values: { readonly [name: string]: string | number } = {}): void {
  const site = state.frames.site();
  const key = `${rule} ${site} ${JSON.stringify(values)}`;
  const known = findingIndex.get(key);
  const tick = toTick(state.clock);
  if (known !== undefined) {
    const ticks = state.findings[known]?.ticks as number[];
    if (ticks.length < MAX_MOMENTS) ticks.push(tick);
    return;
  }
  const count = findingCount.get(rule) ?? 0;
  if (count >= MAX_FINDINGS) return;
  findingCount.set(rule, count + 1);
  findingIndex.set(key, state.findings.length);
  state.findings.push({ rule, site, values, ticks: [tick] });
}

/** Keeps one line of `console.log`. */
export function keepNote(text: string): void {
  if (state.notes.length >= MAX_NOTES) fail("too-many-notes", { limit: MAX_NOTES });
  state.notes.push({ site: state.frames.site(), text, tick: toTick(state.clock) });
}
