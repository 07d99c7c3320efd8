import type { Light } from "../square/lights.ts";
import { relativeLuminance } from "./colour.ts";
import { createLightsCursor, type Cursor } from "./cursor.ts";
import type { Timeline } from "./model.ts";
import { listOnSpans } from "./switching.ts";
import type { Tracks } from "./tracks.ts";

/**
 * How one light runs through the whole show, as points to be joined by straight lines. Where it
 * jumps there are two points, one just before. Ticks rise; before the first point it is dark, after
 * the last it stays as it is.
 */
export interface LightCurve {
  readonly tick: Float64Array;
  /** Lightness as seen, 0 to 100. */
  readonly level: Float32Array;
  /** Light as a share of the light's own full light (white for a colour light), 0 to 1. */
  readonly luminance: Float32Array;
  /** The strongest of its linear channels, 0 to 1: full for a saturated red or blue, too. */
  readonly strongest: Float32Array;
  /** Linear red, green and blue, three numbers a point; empty for a light without colour. */
  readonly rgb: Float32Array;
}

/** "Just before" a tick: two points this close together are a jump. */
export const JUMP_TICKS = 1e-3;
/** Moving stretches get a point at least this often: 1/16 beat. */
export const CURVE_STEP_TICKS = 60;

/** Gives what traces lights of a show one by one. Cost of a light: about its points, and one reading for each. */
export function createTracer(
  timeline: Timeline,
  lights: readonly Light[],
  tracks: Tracks,
): (light: Light) => LightCurve {
  const cursor = createLightsCursor(timeline, lights, tracks);
  return (light) => (light.isSwitched ? traceSwitched(tracks, light.index) : traceLight(cursor, tracks, light));
}

function traceSwitched(tracks: Tracks, light: number): LightCurve {
  const spans = listOnSpans(tracks, light);
  const tick = new Float64Array(spans.length * 4);
  const on = new Float32Array(spans.length * 4);
  spans.forEach(({ start, end }, span) => {
    tick.set([start - JUMP_TICKS, start, end - JUMP_TICKS, end], span * 4);
    on.set([0, 1, 1, 0], span * 4);
  });
  return { tick, level: on.map((value) => value * 100), luminance: on, strongest: on, rgb: new Float32Array(0) };
}

function traceLight(cursor: Cursor, tracks: Tracks, light: Light): LightCurve {
  const tick = Float64Array.from(listPoints(tracks, light));
  const count = tick.length;
  const { frame } = cursor;
  const level = new Float32Array(count);
  const luminance = new Float32Array(count);
  // Red is the full channel of the warm white that plain strings have, so it is their light, too.
  const strongest = light.hasColour ? new Float32Array(count) : luminance;
  const rgb = new Float32Array(light.hasColour ? count * 3 : 0);
  for (let point = 0; point < count; point++) {
    cursor.seekLight(light.index, tick[point] ?? 0);
    level[point] = frame.level[light.index] ?? 0;
    const red = frame.rgb[light.index * 3] ?? 0;
    if (!light.hasColour) {
      luminance[point] = red;
      continue;
    }
    const green = frame.rgb[light.index * 3 + 1] ?? 0;
    const blue = frame.rgb[light.index * 3 + 2] ?? 0;
    luminance[point] = relativeLuminance(red, green, blue);
    strongest[point] = Math.max(red, green, blue);
    rgb[point * 3] = red;
    rgb[point * 3 + 1] = green;
    rgb[point * 3 + 2] = blue;
  }
  return { tick, level, luminance, strongest, rgb };
}

/** The ticks of a light's curve: where it may jump or bend, just before that, and steps where it moves. */
function listPoints(tracks: Tracks, light: Light): number[] {
  const { starts, ends } = listMoves(tracks, light);
  const breaks = Float64Array.from([...starts, ...ends, ...(starts.length > 0 ? [tracks.endTick] : [])]).sort();
  const points: number[] = [];
  let nextMove = 0;
  let movesUntil = 0;
  for (let place = 0; place < breaks.length; place++) {
    const tick = breaks[place] ?? 0;
    if (tick > tracks.endTick) break;
    const next = breaks[place + 1] ?? tick;
    if (next === tick && place + 1 < breaks.length) continue;
    if (tick > 0) points.push(tick - JUMP_TICKS);
    points.push(tick);
    while (nextMove < starts.length && (starts[nextMove] ?? 0) <= tick) {
      movesUntil = Math.max(movesUntil, ends[nextMove] ?? 0);
      nextMove++;
    }
    const until = movesUntil > tick ? Math.min(next, tracks.endTick) : tick;
    for (let between = tick + CURVE_STEP_TICKS; between < until; between += CURVE_STEP_TICKS) points.push(between);
  }
  return points;
}

/** What a light is told, by start: where each fade and pulse starts and ends; at once is both at one tick. */
function listMoves(
  { level, colour, pulse }: Tracks,
  { index, hasColour }: Light,
): { readonly starts: readonly number[]; readonly ends: readonly number[] } {
  const starts: number[] = [];
  const ends: number[] = [];
  for (const { first, tick, length } of hasColour ? [level, colour] : [level])
    for (let entry = first[index] ?? 0; entry < (first[index + 1] ?? 0); entry++) {
      starts.push(tick[entry] ?? 0);
      ends.push((tick[entry] ?? 0) + (length[entry] ?? 0));
    }
  for (let entry = pulse.first[index] ?? 0; entry < (pulse.first[index + 1] ?? 0); entry++) {
    starts.push(pulse.tick[entry] ?? 0);
    ends.push(pulse.end[entry] ?? 0);
  }
  const order = Uint32Array.from(starts.keys()).sort((a, b) => (starts[a] ?? 0) - (starts[b] ?? 0));
  return {
    starts: Array.from(order, (move) => starts[move] ?? 0),
    ends: Array.from(order, (move) => ends[move] ?? 0),
  };
}
