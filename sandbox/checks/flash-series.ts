import { findTransitions, GENERAL_FLASH } from "./transitions.ts";

/**
 * Flashes counted in a series of frames, as WCAG 2.2 success criterion 2.3.1 defines them: the
 * measure for one place of a picture. A flash is a pair of opposing transitions, so seven transitions
 * are three and a half flashes and too many; six are three and pass (technique G19).
 */
export interface SeriesCount {
  /** Frames in which a transition is complete. */
  readonly transitions: readonly number[];
  /** Most transitions in any half-open second. */
  readonly worst: number;
  readonly isPass: boolean;
}

/** Three flashes are six transitions (technique G19). */
export const MOST_TRANSITIONS = 6;

/** Counts general flashes in relative luminances (0 to 1), one a frame: changes of 0.1 or more, the darker below 0.80. */
export function countFlashes(luminances: ArrayLike<number>, framesPerSecond: number): SeriesCount {
  const frames = Float64Array.from({ length: luminances.length }, (_, frame) => frame);
  // A transition is complete in the frame that reaches the step, so the time between two frames does not count.
  const transitions = findTransitions(frames, luminances, GENERAL_FLASH).map(({ time }) => Math.ceil(time - 1e-9));
  return judge(transitions, framesPerSecond);
}

/** Linear red, green and blue, 0 to 1. */
export type LinearColour = readonly [number, number, number];

/**
 * Which definition of a red flash: `current` is WCAG 2.2 as it stands (chromaticity), `former` that
 * of 2.0 and 2.1 ((R - G - B) x 320). They do not agree, and `current` can not judge black, which has
 * no chromaticity; a check takes the stricter of the two.
 */
export type RedRule = "current" | "former";

/** Counts red flashes in linear colours, one a frame: pairs of opposing changes to or from a saturated red. */
export function countRedFlashes(colours: readonly LinearColour[], framesPerSecond: number, rule: RedRule): SeriesCount {
  const transitions: number[] = [];
  let state = colours[0] ?? BLACK;
  colours.forEach((colour, frame) => {
    if (!isRedChange(state, colour, rule)) return;
    transitions.push(frame);
    state = colour;
  });
  return judge(transitions, framesPerSecond);
}

const BLACK: LinearColour = [0, 0, 0];
const SATURATED = 0.8;
const CHROMATICITY_STEP = 0.2;
export const FORMER_STEP = 20;

/** Says whether two colours are the two states of a red transition. */
export function isRedChange(a: LinearColour, b: LinearColour, rule: RedRule): boolean {
  if (!isSaturatedRed(a) && !isSaturatedRed(b)) return false;
  if (rule === "current") return chromaticityDistance(a, b) > CHROMATICITY_STEP;
  return Math.abs(formerRed(a) - formerRed(b)) > FORMER_STEP;
}

/** WCAG 2.2: R / (R + G + B) of at least 0.8, in linear RGB. */
export function isSaturatedRed([red, green, blue]: LinearColour): boolean {
  const sum = red + green + blue;
  return sum > 0 && red / sum >= SATURATED;
}

/** WCAG 2.0 and 2.1: (R - G - B) x 320, not below 0; a change of more than 20 counts. */
export function formerRed([red, green, blue]: LinearColour): number {
  return Math.max(0, (red - green - blue) * 320);
}

/** Gives the distance of two colours in CIE 1976 u'v'; 0 when one of them is black and has no chromaticity. Source: WCAG 2.2, working definition of red flash (ISO 9241-391). */
export function chromaticityDistance(a: LinearColour, b: LinearColour): number {
  const [from, to] = [chromaticity(a), chromaticity(b)];
  return from === null || to === null ? 0 : Math.hypot(from[0] - to[0], from[1] - to[1]);
}

function chromaticity([red, green, blue]: LinearColour): readonly [number, number] | null {
  const x = 0.4124564 * red + 0.3575761 * green + 0.1804375 * blue;
  const y = 0.2126729 * red + 0.7151522 * green + 0.072175 * blue;
  const z = 0.0193339 * red + 0.119192 * green + 0.9503041 * blue;
  const sum = x + 15 * y + 3 * z;
  return sum <= 0 ? null : [(4 * x) / sum, (9 * y) / sum];
}

/** Half-open: transitions exactly one second apart are not in one second. */
function judge(transitions: readonly number[], framesPerSecond: number): SeriesCount {
  let worst = 0;
  let oldest = 0;
  transitions.forEach((frame, newest) => {
    while (frame - (transitions[oldest] ?? frame) >= framesPerSecond) oldest++;
    worst = Math.max(worst, newest - oldest + 1);
  });
  return { transitions, worst, isPass: worst <= MOST_TRANSITIONS };
}
