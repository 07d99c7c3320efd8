import type { Side } from "../../shared/contracts/square.ts";
import { TICKS_PER_BEAT } from "../../shared/units.ts";
import type { Light } from "../square/lights.ts";
import { createLightsCursor } from "./cursor.ts";
import { ACTION_CODE, NO_COLOUR, type Timeline } from "./model.ts";
import type { Tracks } from "./tracks.ts";

/** How the lights of a span move. */
export type Movement = "dark" | "steady" | "in-turn" | "scattered" | "together" | "fading";

/** What happens in a span of a show, for words and evidence. */
export interface Activity {
  /** Ticks; `end` is outside. */
  readonly start: number;
  readonly end: number;
  /** Mean level of all lights, 0 to 1; a strip's pixels count as one light together. */
  readonly light: number;
  /** The same for the first and the last beat of the span. */
  readonly lightFirst: number;
  readonly lightLast: number;
  /** And at its brightest moment. */
  readonly lightMost: number;
  readonly movement: Movement;
  /** Moments at which cues light something or fade. */
  readonly steps: number;
  /** Indexes in walking order of the fronts that are lit at some moment. */
  readonly fronts: ReadonlySet<number>;
  /** Share of its light that each side gives, null for what stands on no side. */
  readonly sides: ReadonlyMap<Side | null, number>;
  /** Colours named by cues and shown, with how much light they gave; strongest first. */
  readonly colours: readonly (readonly [number, number])[];
}

/** Looks a beat; a pulse of half a beat is met twice. */
const LOOKS_PER_BEAT = 4;
/** A fade of at least this many ticks is seen as one. */
const LONG_FADE_TICKS = TICKS_PER_BEAT / 2;

/** Gives what happens in each span of ticks (start, end outside). Spans may be in any order. */
export function measureSpans(
  timeline: Timeline,
  lights: readonly Light[],
  tracks: Tracks,
  spans: readonly (readonly [number, number])[],
): readonly Activity[] {
  const cursor = createLightsCursor(timeline, lights, tracks);
  const shares = lights.map((light) => 1 / (light.pixels ?? 1));
  const total = shares.reduce((sum, share) => sum + share, 0) || 1;
  return spans.map(([start, end]) => {
    const looks = Math.max(1, Math.round(((end - start) / TICKS_PER_BEAT) * LOOKS_PER_BEAT));
    const sides = new Map<Side | null, number>();
    const colours = new Map<number, number>();
    const fronts = new Set<number>();
    const perLook: number[] = [];
    for (let look = 0; look < looks; look++) {
      const frame = cursor.seek(start + ((look + 0.5) / looks) * (end - start));
      let sum = 0;
      for (const { index, frontIndex, side } of lights) {
        const amount = ((frame.level[index] ?? 0) / 100) * (shares[index] ?? 0);
        if (amount <= 0) continue;
        sum += amount;
        fronts.add(frontIndex);
        sides.set(side, (sides.get(side) ?? 0) + amount);
        const colourCue = frame.colourCue[index] ?? -1;
        const colour = timeline.cues.colour[colourCue] ?? NO_COLOUR;
        if (colourCue >= 0 && colour !== NO_COLOUR) colours.set(colour, (colours.get(colour) ?? 0) + amount);
      }
      perLook.push(sum / total);
    }
    const mean = (values: readonly number[]) =>
      values.reduce((sum, value) => sum + value, 0) / Math.max(1, values.length);
    const all = [...sides.values()].reduce((sum, value) => sum + value, 0) || 1;
    const lightFirst = mean(perLook.slice(0, LOOKS_PER_BEAT));
    const lightLast = mean(perLook.slice(-LOOKS_PER_BEAT));
    const { movement, steps } = findMovement(timeline, lights, start, end, fronts.size > 0, perLook);
    return {
      start,
      end,
      light: mean(perLook),
      lightFirst,
      lightLast,
      lightMost: Math.max(...perLook),
      movement,
      steps,
      fronts,
      sides: new Map([...sides].map(([side, amount]) => [side, amount / all])),
      colours: [...colours].sort((a, b) => b[1] - a[1]).map(([colour, amount]) => [colour, amount / all] as const),
    };
  });
}

interface Step {
  readonly tick: number;
  readonly fronts: Set<number>;
}

function findMovement(
  timeline: Timeline,
  lights: readonly Light[],
  start: number,
  end: number,
  isLit: boolean,
  perLook: readonly number[],
): { readonly movement: Movement; readonly steps: number } {
  const { cues, selections } = timeline;
  const steps: Step[] = [];
  let faded = 0;
  let changed = 0;
  for (let cue = firstCueAt(cues.tick, cues.count, start); cue < cues.count && (cues.tick[cue] ?? 0) < end; cue++) {
    const action = cues.action[cue];
    const isFade = action === ACTION_CODE.fadeTo && (cues.length[cue] ?? 0) >= LONG_FADE_TICKS;
    const isLighting =
      action === ACTION_CODE.pulse ||
      ((action === ACTION_CODE.on || action === ACTION_CODE.fadeTo) && (cues.level[cue] ?? 0) > 0);
    if (!isLighting && !isFade) continue;
    const selected = selections[cues.selection[cue] ?? 0] ?? [];
    changed += selected.length;
    if (isFade) faded += selected.length;
    const tick = cues.tick[cue] ?? 0;
    let step = steps.at(-1);
    if (step?.tick !== tick) {
      step = { tick, fronts: new Set() };
      steps.push(step);
    }
    for (const light of selected) step.fronts.add(lights[light]?.frontIndex ?? 0);
  }
  return { movement: nameMovement(steps, isLit, faded > changed / 2, lights, perLook), steps: steps.length };
}

function nameMovement(
  steps: readonly Step[],
  isLit: boolean,
  isFading: boolean,
  lights: readonly Light[],
  perLook: readonly number[],
): Movement {
  if (!isLit) return "dark";
  if (steps.length === 0) return Math.max(...perLook) - Math.min(...perLook) > 0.03 ? "fading" : "steady";
  const frontCount = new Set(lights.map((light) => light.frontIndex)).size;
  const isSmall = (step: Step) => step.fronts.size <= Math.max(1, Math.floor(frontCount / 10));
  const small = steps.filter(isSmall);
  if (small.length < 2 || small.length < steps.length * 0.6) return isFading ? "fading" : "together";
  let neighbours = 0;
  for (let step = 1; step < small.length; step++)
    if (areNeighbours(small[step - 1], small[step], frontCount)) neighbours++;
  return neighbours >= (small.length - 1) * 0.6 ? "in-turn" : "scattered";
}

/** The next front along the walk, either way, or round the corner from the last to the first. */
function areNeighbours(a: Step | undefined, b: Step | undefined, frontCount: number): boolean {
  if (a === undefined || b === undefined) return false;
  return [...a.fronts].some((from) => [...b.fronts].some((to) => [1, frontCount - 1].includes(Math.abs(to - from))));
}

function firstCueAt(ticks: Uint32Array, count: number, tick: number): number {
  let low = 0;
  let high = count;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((ticks[middle] ?? 0) < tick) low = middle + 1;
    else high = middle;
  }
  return low;
}
