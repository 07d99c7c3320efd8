import { CURVE_STEP_TICKS, JUMP_TICKS, type LightCurve } from "../timeline/curves.ts";
import type { CheckContext } from "./context.ts";

/** Spans of 1/16 beat in which loads and darkness are added up. */
export const BIN_TICKS = CURVE_STEP_TICKS;

/** Gives the number of bins of a show. */
export function countBins(endTick: number): number {
  return Math.ceil(endTick / BIN_TICKS);
}

/** Gives the highest level (0 to 100) that a curve reaches in each bin of a show that ends at `endTick`. */
export function highestPerBin({ tick, level }: LightCurve, endTick: number): Float32Array {
  const bins = countBins(endTick);
  const highest = new Float32Array(bins);
  for (let point = 0; point < tick.length; point++) {
    const start = tick[point] ?? 0;
    const end = tick[point + 1] ?? bins * BIN_TICKS;
    const from = level[point] ?? 0;
    // Of a jump the bin before sees only the start, the bin it leads to only the end.
    const isJump = end - start <= JUMP_TICKS * 1.5;
    const to = isJump ? from : (level[point + 1] ?? from);
    const slope = end > start ? (to - from) / (end - start) : 0;
    const first = Math.max(0, Math.floor(start / BIN_TICKS));
    const last = isJump ? first : Math.min(bins - 1, Math.floor(end / BIN_TICKS));
    for (let bin = first; bin <= last && bin < bins; bin++) {
      // A straight line is highest at one of the two ends of its part in the bin.
      const left = Math.max(start, bin * BIN_TICKS);
      const right = Math.min(end, (bin + 1) * BIN_TICKS);
      const top = Math.max(from + slope * (left - start), from + slope * (right - start));
      if (top > (highest[bin] ?? 0)) highest[bin] = top;
    }
  }
  return highest;
}

/** Gives for each bin whether any light of the square is lit in it. */
export function litBins(context: CheckContext): Uint8Array {
  const bins = countBins(context.timeline.endTick);
  const lit = new Uint8Array(bins);
  for (const { isLit, highest } of new Set(context.facts()))
    if (isLit) for (let bin = 0; bin < bins; bin++) if ((highest[bin] ?? 0) > 0) lit[bin] = 1;
  return lit;
}
