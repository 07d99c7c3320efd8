import type { Light } from "../square/lights.ts";
import { relativeLuminance } from "./colour.ts";
import { createLightsCursor, type Cursor } from "./cursor.ts";
import type { Timeline } from "./model.ts";
import { listOnSpans } from "./switching.ts";
import type { Tracks } from "./tracks.ts";

/**
 * How one light runs through the whole show, as points to be joined by straight lines. Where it
 * jumps there are two points, one just before. Ticks rise; before the first point it is dark, after
 * the last it stays as it is. Equal lights share one curve: treat it as frozen.
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

/** Gives the curve of every light, by index. Cost: about the points, and one reading for each. */
export function traceLights(timeline: Timeline, lights: readonly Light[], tracks: Tracks): readonly LightCurve[] {
  const cursor = createLightsCursor(timeline, lights, tracks);
  const known = new Map<string, LightCurve>();
  return lights.map((light) => {
    const key = keyOf(light, tracks);
    const same = known.get(key);
    if (same !== undefined) return same;
    const curve = light.isSwitched ? traceSwitched(tracks, light.index) : traceLight(cursor, tracks, light);
    known.set(key, curve);
    return curve;
  });
}

/** Two lights of one kind that all the same cues speak to are equal. */
function keyOf(light: Light, { level, colour, pulse }: Tracks): string {
  const cuesOf = (track: { readonly first: Uint32Array; readonly cue: Uint32Array }) =>
    track.cue.subarray(track.first[light.index] ?? 0, track.first[light.index + 1] ?? 0).join(",");
  return `${light.hasColour} ${light.isSwitched} ${cuesOf(level)} ${cuesOf(pulse)} ${light.hasColour ? cuesOf(colour) : ""}`;
}

function traceSwitched(tracks: Tracks, light: number): LightCurve {
  const points = listOnSpans(tracks, light).flatMap(({ start, end }) => [
    [start - JUMP_TICKS, 0],
    [start, 1],
    [end - JUMP_TICKS, 1],
    [end, 0],
  ]);
  const on = Float32Array.from(points, ([, value]) => value ?? 0);
  return {
    tick: Float64Array.from(points, ([tick]) => tick ?? 0),
    level: on.map((value) => value * 100),
    luminance: on,
    strongest: on,
    rgb: new Float32Array(0),
  };
}

function traceLight(cursor: Cursor, tracks: Tracks, light: Light): LightCurve {
  const ticks: number[] = [];
  const levels: number[] = [];
  const luminances: number[] = [];
  const strongests: number[] = [];
  const colours: number[] = [];
  const read = (tick: number) => {
    const { rgb, level } = cursor.seekLight(light.index, tick);
    const at = light.index * 3;
    const [red, green, blue] = [rgb[at] ?? 0, rgb[at + 1] ?? 0, rgb[at + 2] ?? 0];
    // Red is the full channel of the warm white that plain strings have.
    return {
      level: level[light.index] ?? 0,
      luminance: light.hasColour ? relativeLuminance(red, green, blue) : red,
      strongest: Math.max(red, green, blue),
      rgb: [red, green, blue],
    };
  };
  const add = (tick: number) => {
    const { level, luminance, strongest, rgb } = read(tick);
    ticks.push(tick);
    levels.push(level);
    luminances.push(luminance);
    strongests.push(strongest);
    if (light.hasColour) colours.push(...rgb);
  };
  const { breaks, moves } = listBreaks(tracks, light);
  let nextMove = 0;
  let movesUntil = 0;
  breaks.forEach((tick, index) => {
    if (tick > 0) add(tick - JUMP_TICKS);
    add(tick);
    for (let move = moves[nextMove]; move !== undefined && move.start <= tick; move = moves[++nextMove])
      movesUntil = Math.max(movesUntil, move.end);
    const next = breaks[index + 1];
    if (next === undefined || movesUntil <= tick) return;
    for (let between = tick + CURVE_STEP_TICKS; between < next; between += CURVE_STEP_TICKS) add(between);
  });
  return {
    tick: Float64Array.from(ticks),
    level: Float32Array.from(levels),
    luminance: Float32Array.from(luminances),
    strongest: Float32Array.from(strongests),
    rgb: Float32Array.from(colours),
  };
}

/** Ticks at which a light may jump or bend, sorted, the last the song's end; and the fades and pulses between them, by start. */
function listBreaks(
  { level, colour, pulse, endTick }: Tracks,
  light: Light,
): { readonly breaks: readonly number[]; readonly moves: readonly { readonly start: number; readonly end: number }[] } {
  const moves: { start: number; end: number }[] = [];
  const { index } = light;
  for (const track of light.hasColour ? [level, colour] : [level])
    for (let entry = track.first[index] ?? 0; entry < (track.first[index + 1] ?? 0); entry++) {
      const start = track.tick[entry] ?? 0;
      moves.push({ start, end: start + (track.length[entry] ?? 0) });
    }
  for (let entry = pulse.first[index] ?? 0; entry < (pulse.first[index + 1] ?? 0); entry++)
    moves.push({ start: pulse.tick[entry] ?? 0, end: pulse.end[entry] ?? 0 });
  moves.sort((a, b) => a.start - b.start);
  const ticks = new Set(moves.flatMap(({ start, end }) => [start, end]));
  if (ticks.size > 0) ticks.add(endTick);
  return { breaks: [...ticks].filter((tick) => tick <= endTick).sort((a, b) => a - b), moves };
}
