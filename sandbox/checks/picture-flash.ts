import { SIDES, type Side } from "../../shared/contracts/square.ts";
import type { Finding } from "../engine/model.ts";
import type { Light } from "../square/lights.ts";
import { colourToLinear, relativeLuminance, WARM_WHITE } from "../timeline/colour.ts";
import type { LightCurve } from "../timeline/curves.ts";
import { nameBar } from "../timeline/words.ts";
import type { CheckContext } from "./context.ts";
import { buildFinding, linesAt } from "./finding.ts";
import { FORMER_STEP, formerRed, isRedChange, isSaturatedRed, type LinearColour } from "./flash-series.ts";
import {
  BLOCK_COUNT,
  FLASH_AREA_PIXELS,
  listPictureAreas,
  sumAll,
  sumBlocks,
  type PictureAreas,
} from "./picture-area.ts";
import { isWithinSecond, sortRises, type Rise } from "./rises.ts";
import { countStreetFlashes } from "./street-flash.ts";
import { findTransitions } from "./transitions.ts";

/**
 * The picture rule: what flashes on a screen that shows a side of the square. WCAG 2.2, success
 * criterion 2.3.1, on the reference picture of 1024 x 768 pixels: more than three general or three
 * red flashes in a second, over a quarter (21 824 pixels) of any block of 341 x 256 pixels, fail.
 *
 * Lit areas are those of the drawn panes and lamps; changes within 20 ms add up, also of different
 * lights. A red flash is one by the definition of 2.2 or by that of 2.1, whichever finds more: the
 * first can not judge red against black. A screen that passes does not prove that the street does.
 */
export interface PictureCount {
  readonly side: Side;
  readonly kind: "general" | "red";
  /** Most flashes in any half-open second in any block. */
  readonly worst: number;
  /** Tick and lights of the flash that made it so many, or of the last one that counted most. */
  readonly tick: number;
  readonly lights: readonly number[];
}

type RiseTimes = (curve: LightCurve, light: Light) => readonly number[];

/** Gives the flash counts of the reference picture of each side that has lights: general, then red. */
export function countPictureFlashes(context: CheckContext): readonly PictureCount[] {
  const sides = SIDES.filter((side) => context.lights.some((light) => light.side === side));
  const general = listRises(context, generalRises);
  const reds = [formerRedRises, currentRedRises].map((measure) => listRises(context, measure));
  return sides.flatMap((side) => {
    const areas = listPictureAreas(context.layout, side);
    const [former, current] = reds.map((rises) => countBlocks(context, side, "red", areas, rises));
    const red = former !== undefined && current !== undefined && current.worst > former.worst ? current : former;
    return [countBlocks(context, side, "general", areas, general), ...(red === undefined ? [] : [red])];
  });
}

/** Plain strings shine in warm white, which has less luminance than the white of the definition. */
const WARM_LUMINANCE = relativeLuminance(...colourToLinear(WARM_WHITE));

function generalRises({ tick, luminance }: LightCurve, { hasColour }: Light): readonly number[] {
  const full = hasColour ? 1 : WARM_LUMINANCE;
  return risingTimes(tick, luminance, 0.1 / full, 0.8 / full);
}

/** A red that is saturated counts with its strength, any other colour as none: on the strict side. */
function formerRedRises({ tick, rgb }: LightCurve): readonly number[] {
  if (rgb.length === 0) return [];
  const strength = Float64Array.from(tick, (_, point) => {
    const colour = colourAt(rgb, point);
    return isSaturatedRed(colour) ? formerRed(colour) : 0;
  });
  return risingTimes(tick, strength, FORMER_STEP, Infinity);
}

/** Changes of chromaticity towards a saturated red. */
function currentRedRises({ tick, rgb }: LightCurve): readonly number[] {
  if (rgb.length === 0) return [];
  const times: number[] = [];
  let state: LinearColour = [0, 0, 0];
  for (let point = 0; point < tick.length; point++) {
    const colour = colourAt(rgb, point);
    if (colour.every((channel) => channel <= 0)) continue;
    if (state.every((channel) => channel <= 0)) state = colour;
    if (!isRedChange(state, colour, "current")) continue;
    if (isSaturatedRed(colour)) times.push(tick[point] ?? 0);
    state = colour;
  }
  return times;
}

function risingTimes(
  tick: Float64Array,
  values: ArrayLike<number>,
  step: number,
  darkerBelow: number,
): readonly number[] {
  return findTransitions(tick, values, { step, darkerBelow }, 0)
    .filter((transition) => transition.isRising)
    .map((transition) => transition.time);
}

const colourAt = (rgb: Float32Array, point: number): LinearColour => [
  rgb[point * 3] ?? 0,
  rgb[point * 3 + 1] ?? 0,
  rgb[point * 3 + 2] ?? 0,
];

function listRises(context: CheckContext, measure: RiseTimes): readonly Rise[] {
  const known = new Map<LightCurve, readonly number[]>();
  const curves = context.curves();
  return sortRises(
    context.lights.flatMap((light) => {
      const curve = curves[light.index];
      if (curve === undefined) return [];
      const ticks = known.get(curve) ?? measure(curve, light);
      known.set(curve, ticks);
      return ticks.map((tick) => ({ light: light.index, tick, seconds: context.tempo.toSeconds(tick) }));
    }),
  );
}

function countBlocks(
  { rules }: CheckContext,
  side: Side,
  kind: PictureCount["kind"],
  areas: PictureAreas,
  rises: readonly Rise[],
): PictureCount {
  const inView = rises.filter(({ light }) => areas.has(light));
  const times: number[][] = Array.from({ length: BLOCK_COUNT }, () => []);
  let most: PictureCount = { side, kind, worst: 0, tick: 0, lights: [] };
  for (let start = 0; start < inView.length;) {
    const first = inView[start];
    if (first === undefined) break;
    let end = start;
    const lights = new Set<number>();
    for (
      let rise = inView[end];
      rise !== undefined && rise.seconds - first.seconds <= rules.flashTogetherSeconds;
      rise = inView[++end]
    )
      lights.add(rise.light);
    let isEvent = false;
    if (sumAll(areas, lights) >= FLASH_AREA_PIXELS)
      sumBlocks(areas, lights).forEach((pixels, block) => {
        if (pixels < FLASH_AREA_PIXELS) return;
        isEvent = true;
        const earlier = (times[block] ?? []).filter((time) => isWithinSecond(time, first.seconds));
        earlier.push(first.seconds);
        times[block] = earlier;
        if (earlier.length > most.worst)
          most = { side, kind, worst: earlier.length, tick: first.tick, lights: [...lights] };
      });
    start = isEvent ? end : start + 1;
  }
  return most;
}

/** Finds sides whose picture flashes too often, where the street rule did not stop them already. */
export function findPictureFlashes(context: CheckContext): Finding[] {
  const limit = context.rules.flashesPerSecond;
  const stopped = new Set(
    countStreetFlashes(context)
      .filter(({ worst }) => worst > limit)
      .map(({ side }) => side),
  );
  return countPictureFlashes(context)
    .filter(({ side, worst }) => worst > limit && !stopped.has(side))
    .map(({ side, kind, worst, tick, lights }) =>
      buildFinding(context, kind === "red" ? "picture-red-flash" : "picture-flash", {
        sentence: `On a screen the ${side} side flashes ${kind === "red" ? "red " : ""}${worst} times in one second in ${nameBar(context.song, tick)}. The most is ${limit}.`,
        hint: "Pulse on whole beats, let fewer lights pulse at once, or use fades. The event's safety officer decides.",
        measured: { value: worst, limit, unit: "flashes a second" },
        moments: [tick],
        lights,
        lines: linesAt(context, tick, lights),
      }),
    );
}
