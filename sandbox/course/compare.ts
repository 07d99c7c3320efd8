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

/**
 * Compares what is seen at every moment that either run is looked at. Every light counts once a
 * moment, so many small differences and a few long ones weigh alike.
 */
export function compareRuns(mine: CheckedRun, aim: CheckedRun): Difference {
  const ticks = [...new Set([...mine.momentsSeen(), ...aim.momentsSeen()])].sort((a, b) => a - b);
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
      const isAlike = Math.abs(levelA - levelB) <= LEVEL_ALIKE &&
        [0, 1, 2].every((channel) => Math.abs((a.rgb[light * 3 + channel] ?? 0) - (b.rgb[light * 3 + channel] ?? 0)) <= COLOUR_ALIKE);
      if (isAlike) continue;
      different += 1;
      first ??= { tick, light };
    }
  }
  return { share: lit === 0 ? 0 : different / lit, tick: first?.tick ?? null, light: first?.light ?? null };
}
