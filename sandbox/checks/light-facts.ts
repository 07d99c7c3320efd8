import type { Light } from "../square/lights.ts";
import { colourToLinear, relativeLuminance, WARM_WHITE } from "../timeline/colour.ts";
import { createTracer, type LightCurve } from "../timeline/curves.ts";
import type { Timeline } from "../timeline/model.ts";
import type { Tracks } from "../timeline/tracks.ts";
import { listLeaders } from "../timeline/twins.ts";
import { highestPerBin } from "./bins.ts";
import type { CheckMemory } from "./check-memory.ts";
import { FORMER_STEP, formerRed, isRedChange, isSaturatedRed, type LinearColour } from "./flash-series.ts";
import type { EventRules } from "./rules.ts";
import { findTransitions, GENERAL_FLASH } from "./transitions.ts";

/** Ticks (may be fractional), in order, at which a light has got brighter by a step, and darker. */
export interface LightTransitions {
  readonly rising: Float64Array;
  readonly falling: Float64Array;
}

/** What the rules need to know of one light's way through the show; each measure has its own transitions. */
export interface LightFacts {
  readonly isLit: boolean;
  /** Highest level (0 to 100) in each bin (see `bins.ts`). */
  readonly highest: Float32Array;
  /** Street rule: by the light's own luminance, and by its strongest channel. */
  readonly byLuminance: LightTransitions;
  readonly byStrongest: LightTransitions;
  /** Picture rule: general flash, and red flash (to red and away) by the definitions of WCAG 2.1 and of 2.2. */
  readonly general: LightTransitions;
  readonly formerRed: LightTransitions;
  readonly currentRed: LightTransitions;
}

/**
 * Gives the facts of every light, by index; lights that do the same share one object. A light's curve
 * is dropped as soon as its facts are known: those of a big square would not fit into memory together.
 */
export function listFacts(
  timeline: Timeline,
  lights: readonly Light[],
  tracks: Tracks,
  rules: EventRules,
  memory: CheckMemory,
): readonly LightFacts[] {
  const trace = createTracer(timeline, lights, tracks);
  const leaders = listLeaders(lights, tracks);
  const facts: LightFacts[] = [];
  lights.forEach((light, index) => {
    const leader = leaders[index] ?? index;
    const known = leader < index ? facts[leader] : undefined;
    facts.push(
      known ??
        memory.recallFacts(contentOf(timeline, light, tracks), () =>
          readFacts(trace(light), light.hasColour, timeline.endTick, rules),
        ),
    );
  });
  return facts;
}

/** Everything that a light's curve is made from: what it is told and when, and what kind of light it is. */
function contentOf({ cues, endTick }: Timeline, { index, hasColour, isSwitched }: Light, tracks: Tracks): Uint32Array {
  const { level, pulse, colour } = tracks;
  const countOf = ({ first }: { readonly first: Uint32Array }) => (first[index + 1] ?? 0) - (first[index] ?? 0);
  const colours = hasColour ? countOf(colour) : 0;
  const content = new Uint32Array(4 + 3 * countOf(level) + 4 * countOf(pulse) + 3 * colours);
  let at = 0;
  const add = (value: number) => {
    content[at++] = value;
  };
  add((hasColour ? 1 : 0) + (isSwitched ? 2 : 0));
  add(endTick);
  add(countOf(level));
  add(countOf(pulse));
  for (let entry = level.first[index] ?? 0; entry < (level.first[index + 1] ?? 0); entry++) {
    add(level.tick[entry] ?? 0);
    add(level.length[entry] ?? 0);
    add(Math.round((level.to[entry] ?? 0) * 100));
  }
  for (let entry = pulse.first[index] ?? 0; entry < (pulse.first[index + 1] ?? 0); entry++) {
    add(pulse.tick[entry] ?? 0);
    add(pulse.length[entry] ?? 0);
    // An `off` may have ended it.
    add(pulse.end[entry] ?? 0);
    add(hasColour ? (cues.colour[pulse.cue[entry] ?? 0] ?? 0) : 0);
  }
  if (colours === 0) return content;
  for (let entry = colour.first[index] ?? 0; entry < (colour.first[index + 1] ?? 0); entry++) {
    add(colour.tick[entry] ?? 0);
    add(colour.length[entry] ?? 0);
    add(cues.colour[colour.cue[entry] ?? 0] ?? 0);
  }
  return content;
}

/** Plain strings shine in warm white, which has less luminance than the white of the definition. */
const WARM_LUMINANCE = relativeLuminance(...colourToLinear(WARM_WHITE));

function readFacts(curve: LightCurve, hasColour: boolean, endTick: number, rules: EventRules): LightFacts {
  const { tick, level, luminance, strongest } = curve;
  const { flashStep, flashDarkerBelow } = rules;
  const full = hasColour ? 1 : WARM_LUMINANCE;
  const byLuminance = listTransitions(tick, luminance, flashStep, flashDarkerBelow);
  return {
    isLit: level.some((value) => value > 0),
    highest: highestPerBin(curve, endTick),
    byLuminance,
    byStrongest: hasColour ? listTransitions(tick, strongest, flashStep, flashDarkerBelow) : byLuminance,
    general: listTransitions(tick, luminance, GENERAL_FLASH.step / full, GENERAL_FLASH.darkerBelow / full),
    formerRed: hasColour ? listFormerRed(curve) : NONE,
    currentRed: hasColour ? listCurrentRed(curve) : NONE,
  };
}

const NONE: LightTransitions = { rising: new Float64Array(0), falling: new Float64Array(0) };

function listTransitions(
  tick: Float64Array,
  values: ArrayLike<number>,
  step: number,
  darkerBelow: number,
): LightTransitions {
  const rising: number[] = [];
  const falling: number[] = [];
  for (const { isRising, time } of findTransitions(tick, values, { step, darkerBelow }, 0))
    (isRising ? rising : falling).push(time);
  return { rising: new Float64Array(rising), falling: new Float64Array(falling) };
}

/** A red that is saturated counts with its strength, any other colour as none: on the strict side. */
function listFormerRed({ tick, rgb }: LightCurve): LightTransitions {
  const strength = Float64Array.from(tick, (_, point) => {
    const colour = colourAt(rgb, point);
    return isSaturatedRed(colour) ? formerRed(colour) : 0;
  });
  return listTransitions(tick, strength, FORMER_STEP, Infinity);
}

/** Changes of chromaticity towards a saturated red, and away from it. */
function listCurrentRed({ tick, rgb }: LightCurve): LightTransitions {
  const rising: number[] = [];
  const falling: number[] = [];
  let state: LinearColour = [0, 0, 0];
  for (let point = 0; point < tick.length; point++) {
    const colour = colourAt(rgb, point);
    if (isBlack(colour)) continue;
    if (isBlack(state)) state = colour;
    if (!isRedChange(state, colour, "current")) continue;
    (isSaturatedRed(colour) ? rising : falling).push(tick[point] ?? 0);
    state = colour;
  }
  return { rising: new Float64Array(rising), falling: new Float64Array(falling) };
}

const isBlack = ([red, green, blue]: LinearColour) => red <= 0 && green <= 0 && blue <= 0;

const colourAt = (rgb: Float32Array, point: number): LinearColour => [
  rgb[point * 3] ?? 0,
  rgb[point * 3 + 1] ?? 0,
  rgb[point * 3 + 2] ?? 0,
];
