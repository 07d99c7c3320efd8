import { action, beats, call, describe, moment, number, tidy, type Callback } from "./arguments.ts";
import { fail, notice, state, toTick } from "./state.ts";

const MICROSECONDS = 1_000_000;
/** A wait of more bars than this is a likely mix-up of beats with something else. */
const LONG_WAIT_BARS = 32;

/** Lets beats pass. */
export function wait(length: number): void {
  if (arguments.length === 0) fail("missing-value", { word: "wait", count: 1, what: "the beats", example: "wait(1)" });
  const passed = beats("wait", length, 0);
  const bars = passed / state.tables.song.beatsPerBar;
  if (bars > LONG_WAIT_BARS) notice("long-wait", { bars: Math.floor(bars) });
  state.clock = number("wait", state.clock + passed, 0);
}

/** Goes on to a later place; half a tick early counts as there (rule 24). */
export function waitUntil(place: number): void {
  const wanted = moment("waitUntil", place, 0);
  if (wanted < state.clock - 1 / 1920) fail("already-passed", { beat: tidy(wanted), now: tidy(state.clock) }, 0);
  if (wanted > state.clock) state.clock = wanted;
}

/** Where the clock is: whole ticks as beats (rule 3). */
export function now(): number {
  return toTick(state.clock) / 960;
}

/** Runs an action at a moment, or at each of a list with its turn; then the clock goes back (rule 4). */
export function at(when: number | readonly number[], run: Callback): void {
  const started = state.clock;
  if (!Array.isArray(when)) {
    const place = moment("at", when, 0);
    if (typeof run !== "function") fail("not-an-action", { word: "at", got: describe(run), when: tidy(place) }, 1);
    state.clock = place;
    call(run, 0, undefined);
    state.clock = started;
    return;
  }
  const each = action("at", run, 1);
  for (let turn = 0; turn < when.length; turn++) {
    state.clock = moment("at", when[turn], 0);
    call(each, turn, undefined);
  }
  state.clock = started;
}

/** Starts all actions now; then the clock is at the latest of their ends (rule 5). */
export function together(...actions: readonly Callback[]): void {
  const started = state.clock;
  let end = started;
  for (let i = 0; i < actions.length; i++) {
    const run = action("together", actions[i], i);
    state.clock = started;
    call(run, undefined, undefined);
    if (state.clock > end) end = state.clock;
  }
  state.clock = end;
}

/** Runs an action again and again, the clock running on (rule 6). */
export function repeat(times: number, run: Callback): void {
  const asked = number("repeat", times, 0);
  if (asked < 0) fail("wants-whole", { word: "repeat", least: 0, got: tidy(asked) }, 0);
  const each = action("repeat", run, 1);
  const count = Math.floor(asked);
  if (count !== asked) notice("count-rounded", { asked: tidy(asked), used: count });
  for (let turn = 0; turn < count; turn++) call(each, turn, undefined);
}

/** Microseconds of a moment: straight lines between beats, the last tempo after the end. */
function timeOf(place: number): number {
  const { beats: times } = state.tables.song;
  const from = Math.min(Math.max(Math.floor(place), 0), times.length - 2);
  const start = times[from] ?? 0;
  return start + (place - from) * ((times[from + 1] ?? 0) - start);
}

/** The moment of a time; the other way round. */
function momentOf(time: number): number {
  const { beats: times } = state.tables.song;
  let low = 0;
  let high = times.length - 2;
  while (low < high) {
    const middle = (low + high + 1) >> 1;
    if ((times[middle] ?? 0) <= time) low = middle;
    else high = middle - 1;
  }
  const start = times[low] ?? 0;
  return low + (time - start) / ((times[low + 1] ?? 0) - start);
}

/** Beats in so many seconds, counted from now. */
export function beatsIn(seconds: number): number {
  const length = beats("beatsIn", seconds, 0);
  const start = timeOf(state.clock);
  // Rounded to a tick, so that equal tempos give equal numbers wherever the clock is.
  return toTick(momentOf(start + length * MICROSECONDS) - state.clock) / 960;
}
