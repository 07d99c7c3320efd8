import { TICKS_PER_BEAT } from "../../shared/units.ts";
import type { Timeline } from "../timeline/model.ts";
import type { CheckedRun } from "./stage.ts";

/** How far two runs of one song and layout are from each other. */
export interface Difference {
  /** Share of what lights in either run that is not alike, 0 to 1; 0 when both stay dark. */
  readonly share: number;
  /** Where they differ first; null when nowhere. */
  readonly tick: number | null;
  readonly light: number | null;
}

/** Levels this near, and colours this near in every channel of light, are taken as alike. */
const LEVEL_ALIKE = 6;
const COLOUR_ALIKE = 0.05;

/** The tick by which everything has come to rest: a beat after the last change has ended. */
function restTick({ cues }: Timeline): number {
  let rest = 0;
  for (let cue = 0; cue < cues.count; cue += 1) rest = Math.max(rest, (cues.tick[cue] ?? 0) + (cues.length[cue] ?? 0));
  return rest + TICKS_PER_BEAT;
}

/**
 * Compares what is seen at every moment that either run is looked at. Every light counts once a
 * moment, so many small differences and a few long ones weigh alike. What stays lit when both have
 * come to rest is not looked at: a long end would outweigh everything before it.
 */
export function compareRuns(mine: CheckedRun, aim: CheckedRun): Difference {
  const rest = Math.max(restTick(mine.timeline), restTick(aim.timeline));
  const ticks = [...new Set([...mine.momentsSeen(), ...aim.momentsSeen()])]
    .filter((tick) => tick <= rest)
    .sort((a, b) => a - b);
  let lit = 0;
  let different = 0;
  let first: { tick: number; light: number } | null = null;
  for (const tick of ticks) {
    const a = mine.frameAtTick(tick);
    const b = aim.frameAtTick(tick);
    for (let light = 0; light < mine.lights.length; light += 1) {
      const [levelA, levelB] = [a.level[light] ?? 0, b.level[light] ?? 0];
      if (levelA === 0 && levelB === 0) continue;
      lit += 1;
      const isAlike =
        Math.abs(levelA - levelB) <= LEVEL_ALIKE &&
        [0, 1, 2].every(
          (channel) => Math.abs((a.rgb[light * 3 + channel] ?? 0) - (b.rgb[light * 3 + channel] ?? 0)) <= COLOUR_ALIKE,
        );
      if (isAlike) continue;
      different += 1;
      first ??= { tick, light };
    }
  }
  return { share: lit === 0 ? 0 : different / lit, tick: first?.tick ?? null, light: first?.light ?? null };
}
