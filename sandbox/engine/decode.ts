import type { Timeline, CueTable } from "../timeline/model.ts";
import { assertTimeline } from "../timeline/validate.ts";
import { BUFFER_MARK, CUE_WORDS, HEAD_WORDS, MAX_CHANGES, MAX_CUES } from "./guest.ts";

/** The engine handed out something that it can not have written: the run is thrown away. */
export class DamagedResultError extends Error {
  override readonly name = "DamagedResultError";
}

/** What a timeline holds besides its cues. */
export type DecodedHead = Omit<Timeline, "version" | "cues" | "selections" | "chains">;

interface Parts {
  readonly cues: Uint32Array;
  readonly selections: readonly Uint16Array[];
  readonly chains: readonly (readonly number[])[];
}

function split(bytes: Uint8Array, lineOf: (site: number) => number): Parts {
  if (bytes.byteLength % 4 !== 0 || bytes.byteLength < HEAD_WORDS * 4)
    throw new DamagedResultError("The buffer has no head.");
  // A copy: the guest's memory goes away with the engine, and may not be aligned.
  const words = new Uint32Array(bytes.slice().buffer);
  const [mark, cueCount = 0, selectionCount = 0, lightTotal = 0, chainCount = 0] = words;
  if (mark !== BUFFER_MARK) throw new DamagedResultError("The buffer has a wrong mark.");
  if (cueCount > MAX_CUES || lightTotal > MAX_CHANGES)
    throw new DamagedResultError("The buffer holds more than a run can write.");
  const size = HEAD_WORDS + cueCount * CUE_WORDS + selectionCount + lightTotal + 2 * chainCount;
  if (words.length !== size) throw new DamagedResultError(`The buffer has ${words.length} words, not ${size}.`);
  const lengthsAt = HEAD_WORDS + cueCount * CUE_WORDS;
  const lightsAt = lengthsAt + selectionCount;
  const chainsAt = lightsAt + lightTotal;
  return {
    cues: words.subarray(HEAD_WORDS, lengthsAt),
    selections: readSelections(words.subarray(lengthsAt, lightsAt), words.subarray(lightsAt, chainsAt)),
    chains: readChains(words.subarray(chainsAt, chainsAt + chainCount), words.subarray(chainsAt + chainCount), lineOf),
  };
}

function readSelections(lengths: Uint32Array, lights: Uint32Array): Uint16Array[] {
  const selections: Uint16Array[] = [];
  let at = 0;
  for (const length of lengths) {
    if (at + length > lights.length) throw new DamagedResultError("A selection ends outside the buffer.");
    selections.push(Uint16Array.from(lights.subarray(at, at + length)));
    at += length;
  }
  return selections;
}

/** The lines of every chain, outermost first; a line that calls itself is named once. */
function readChains(parents: Uint32Array, sites: Uint32Array, lineOf: (site: number) => number): number[][] {
  const chains: number[][] = [[]];
  for (let chain = 1; chain < parents.length; chain++) {
    const parent = chains[parents[chain] ?? 0];
    if (parent === undefined) throw new DamagedResultError("A chain hangs on one that comes after it.");
    const line = lineOf(sites[chain] ?? 0);
    chains.push(parent.at(-1) === line ? parent : [...parent, line]);
  }
  return chains;
}

/** Gives each distinct list the index of its first use. */
class Renumbering<T> {
  readonly kept: T[] = [];
  readonly #indexByKey = new Map<string, number>();
  readonly #indexByInput = new Map<number, number>();
  readonly #values: readonly T[];
  readonly #keyOf: (value: T) => string;

  constructor(values: readonly T[], keyOf: (value: T) => string) {
    this.#values = values;
    this.#keyOf = keyOf;
  }

  indexOf(input: number): number {
    const known = this.#indexByInput.get(input);
    if (known !== undefined) return known;
    const value = this.#values[input];
    if (value === undefined) throw new DamagedResultError("A cue names something that the buffer does not hold.");
    const key = this.#keyOf(value);
    const index = this.#indexByKey.get(key) ?? this.kept.push(value) - 1;
    this.#indexByKey.set(key, index);
    this.#indexByInput.set(input, index);
    return index;
  }
}

/**
 * The timeline of the buffer that a run handed out: cues sorted by tick and then as written, lists
 * interned by first use. Everything is fresh. Throws `DamagedResultError` or `TimelineFormatError`
 * when the buffer is not what the library writes.
 */
export function decodeTimelineBuffer(bytes: Uint8Array, head: DecodedHead, lineOf: (site: number) => number): Timeline {
  const parts = split(bytes, lineOf);
  const count = parts.cues.length / CUE_WORDS;
  const tickOf = (cue: number): number => parts.cues[cue * CUE_WORDS] ?? 0;
  const order = Uint32Array.from({ length: count }, (_, cue) => cue).sort((a, b) => tickOf(a) - tickOf(b) || a - b);
  const selections = new Renumbering(parts.selections, (lights) => lights.join(","));
  const chains = new Renumbering(parts.chains, (lines) => lines.join(","));
  const cues = emptyCues(count);
  order.forEach((cue, index) => {
    const [tick = 0, action = 0, selection = 0, level = 0, length = 0, colour = 0, chain = 0] = parts.cues.subarray(
      cue * CUE_WORDS,
      (cue + 1) * CUE_WORDS,
    );
    cues.tick[index] = tick;
    cues.action[index] = action;
    cues.selection[index] = selections.indexOf(selection);
    cues.level[index] = level;
    cues.length[index] = length;
    cues.colour[index] = colour;
    cues.chain[index] = chains.indexOf(chain);
  });
  const timeline: Timeline = { version: 1, ...head, cues, selections: selections.kept, chains: chains.kept };
  assertTimeline(timeline);
  return timeline;
}

function emptyCues(count: number): CueTable {
  return {
    count,
    tick: new Uint32Array(count),
    action: new Uint8Array(count),
    selection: new Uint32Array(count),
    level: new Uint16Array(count),
    length: new Uint32Array(count),
    colour: new Uint32Array(count),
    chain: new Uint32Array(count),
  };
}
