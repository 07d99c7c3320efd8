import {
  BUFFER_MARK,
  CUE_WORDS,
  HEAD_WORDS,
  MAX_CHANGES,
  MAX_CUES,
  STOOD_STILL_CHANGES,
  STOOD_STILL_CUES,
} from "../guest.ts";
import { fail, notice, state, toTick } from "./state.ts";

/**
 * The cues of the run, seven words each, in the order they were written. Selections and chains of
 * call sites are interned: a show repeats the same few thousands of times.
 */
const FIRST_CUES = 256;
const HASH_START = 0x81_1c_9d_c5;
const HASH_FACTOR = 0x01_00_01_93;
/** More call sites than a script of 64 KiB can hold. */
const SITE_RANGE = 0x1_00_00;
/** The colour of a cue that names none. */
export const NO_COLOUR = 0xff_ff_ff_ff;

let words = new Uint32Array(FIRST_CUES * CUE_WORDS);
let kept = 0;
let written = 0;
let changes = 0;
/** Cues and changes written before the clock came to where it is. */
let stoodSince = 0;
let stoodSinceChanges = 0;
let lastClock = -1;

const selections: Uint16Array[] = [];
const selectionsByHash = new Map<number, number[]>();
let selectedLights = 0;

/** A chain is a call site below the chain of its callers; chain 0 is empty. */
const chainParent: number[] = [0];
const chainSite: number[] = [0];
const chainIndex = new Map<number, number>();

function isSame(a: Uint16Array, b: Uint16Array): boolean {
  if (a.length !== b.length) return false;
  for (let i = 0; i < a.length; i++) if (a[i] !== b[i]) return false;
  return true;
}

/** Index of a list of lights among those already used; the list is kept, not copied. */
export function internSelection(lights: Uint16Array): number {
  let hash = HASH_START;
  for (let i = 0; i < lights.length; i++) hash = Math.imul(hash ^ (lights[i] as number), HASH_FACTOR);
  let bucket = selectionsByHash.get(hash);
  if (bucket === undefined) {
    bucket = [];
    selectionsByHash.set(hash, bucket);
  }
  for (const candidate of bucket) {
    const known = selections[candidate];
    if (known !== undefined && isSame(known, lights)) return candidate;
  }
  const index = selections.length;
  selections.push(lights);
  selectedLights += lights.length;
  bucket.push(index);
  return index;
}

function chainBelow(parent: number, site: number): number {
  const key = parent * SITE_RANGE + site;
  const known = chainIndex.get(key);
  if (known !== undefined) return known;
  const index = chainParent.length;
  chainParent.push(parent);
  chainSite.push(site);
  chainIndex.set(key, index);
  return index;
}

function chainNow(): number {
  const { callers, depth, site } = state.frames;
  const count = depth();
  let chain = 0;
  for (let i = 0; i < count; i++) chain = chainBelow(chain, callers[i] as number);
  return chainBelow(chain, site());
}

function grow(): void {
  const larger = new Uint32Array(words.length * 2);
  larger.set(words);
  words = larger;
}

function failTooMuch(code: "too-many-cues" | "too-many-changes", limit: number): never {
  const stoodStill = written - stoodSince > STOOD_STILL_CUES || changes - stoodSinceChanges > STOOD_STILL_CHANGES;
  return fail(stoodStill ? "clock-stood-still" : code, { limit });
}

/**
 * Writes one cue at the clock (rule 12). Fields that the action does not have are 0 or `NO_COLOUR`.
 * `isQuiet`: nobody needs to hear that it came at the very end. Flat and without objects, since its
 * steps count on every script's fuel.
 */
export function writeCue(
  selection: number,
  lights: number,
  action: number,
  level: number,
  length: number,
  colour: number,
  isQuiet: boolean,
): void {
  if (lights === 0) {
    notice("nothing-to-light");
    return;
  }
  const { clock, endTick } = state;
  if (clock !== lastClock) {
    lastClock = clock;
    stoodSince = written;
    stoodSinceChanges = changes;
  }
  changes += lights;
  // What is dropped counts too: a loop that writes behind the end has to stop.
  if (++written > MAX_CUES) failTooMuch("too-many-cues", MAX_CUES);
  if (changes > MAX_CHANGES) failTooMuch("too-many-changes", MAX_CHANGES);
  const tick = toTick(clock);
  if (tick >= endTick) {
    if (tick > endTick || !isQuiet) notice("after-the-end");
    return;
  }
  let at = kept * CUE_WORDS;
  if (at === words.length) grow();
  kept++;
  words[at] = tick;
  words[++at] = action;
  words[++at] = selection;
  words[++at] = level;
  words[++at] = length;
  words[++at] = colour;
  words[++at] = chainNow();
}

/**
 * Everything written, as one buffer of 32-bit words: head, cues, length of every selection, lights of
 * all selections, callers and sites of all chains.
 */
export function takeBuffer(): ArrayBuffer {
  const size = HEAD_WORDS + kept * CUE_WORDS + selections.length + selectedLights + 2 * chainParent.length;
  const out = new Uint32Array(size);
  out.set([BUFFER_MARK, kept, selections.length, selectedLights, chainParent.length]);
  out.set(words.subarray(0, kept * CUE_WORDS), HEAD_WORDS);
  let at = HEAD_WORDS + kept * CUE_WORDS;
  let lightsAt = at + selections.length;
  for (const lights of selections) {
    out[at++] = lights.length;
    out.set(lights, lightsAt);
    lightsAt += lights.length;
  }
  out.set(chainParent, lightsAt);
  out.set(chainSite, lightsAt + chainParent.length);
  return out.buffer;
}
