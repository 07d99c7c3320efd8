import { near } from "../../language/near-name.ts";
import { MAX_CALLBACK_DEPTH } from "../guest.ts";
import { fail, state } from "./state.ts";

/** Letters of a name that a sentence shows; longer than any name of a layout or a song. */
const LONGEST_NAME = 80;

/** An action of the script: any function; the library passes as many arguments as it names. */
export type Callback = (...values: never[]) => unknown;

/** How a value is named in a sentence: its kind and, when short, itself. */
export function describe(value: unknown): string {
  if (typeof value === "string") return `the text "${value.length > 20 ? `${value.slice(0, 20)}...` : value}"`;
  if (typeof value === "number" || typeof value === "boolean") return String(value);
  if (typeof value === "function") return "a function";
  if (value === undefined) return "nothing";
  if (value === null) return "null";
  return Array.isArray(value) ? "a list" : "a thing that is no number";
}

/** A finite number, or the problem that says what came instead. */
export function number(word: string, value: unknown, argument: number): number {
  if (typeof value !== "number") return fail("wants-a-number", { word, got: describe(value) }, argument);
  if (!Number.isFinite(value)) return fail("not-finite", { word }, argument);
  return value;
}

/** A length in beats: finite, not below 0. */
export function beats(word: string, value: unknown, argument: number): number {
  const length = number(word, value, argument);
  if (length < 0) return fail("negative-time", { word, beats: tidy(length) }, argument);
  return length;
}

/** A moment: finite, not before the song starts. */
export function moment(word: string, value: unknown, argument: number): number {
  const place = number(word, value, argument);
  // Half a tick: a sum of fractions may end a hair below beat 0.
  if (place < -1 / 1920) return fail("before-start", { beat: tidy(place) }, argument);
  return place < 0 ? 0 : place;
}

/** A whole number of at least `least`. */
export function whole(word: string, value: unknown, argument: number, least: number): number {
  const count = number(word, value, argument);
  if (!Number.isInteger(count) || count < least)
    return fail("wants-whole", { word, least, got: tidy(count) }, argument);
  return count;
}

/** A name, as text. */
export function text(word: string, value: unknown, argument: number): string {
  if (typeof value !== "string") return fail("wants-text", { word, got: describe(value) }, argument);
  return value;
}

/** A function. */
export function action(word: string, value: unknown, argument: number): Callback {
  if (typeof value !== "function") return fail("not-an-action", { word, got: describe(value) }, argument);
  return value as Callback;
}

/** Stops with the unknown name and, when one is near enough, the name that was meant. */
export function unknownName(code: string, name: string, names: readonly string[], argument = 0): never {
  // A script can build a name of any length: no name is near it, and the report must not carry it.
  const meant = near(name, names);
  const shown = name.length > LONGEST_NAME ? `${name.slice(0, LONGEST_NAME)}...` : name;
  return fail(code, meant === null ? { name: shown, names: names.slice(0, 4).join(", ") } : { name, meant }, argument);
}

/** Runs an action of the script with as many of `first` and `second` as it names without a default (rule 7). */
export function call(callback: Callback, first: unknown, second: unknown): unknown {
  if (state.callbackDepth >= MAX_CALLBACK_DEPTH)
    return fail("calls-itself", { name: callback.name || "This function" });
  state.callbackDepth++;
  const run = callback as (...values: unknown[]) => unknown;
  const named = callback.length;
  const answer = named === 1 ? run(first) : named === 0 ? run() : run(first, second);
  state.callbackDepth--;
  return answer;
}

/** A number as a sentence shows it: at most three decimals. */
export function tidy(value: number): number {
  return Math.round(value * 1000) / 1000;
}
