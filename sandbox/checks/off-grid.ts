import { TICKS_PER_BEAT } from "../../shared/units.ts";
import type { Finding } from "../engine/model.ts";
import type { CheckContext } from "./context.ts";
import { buildFinding, lineOfCue } from "./finding.ts";

/** The beat grid: eighths of a beat and sixths of a beat. Common practice, no source. */
const GRIDS = [TICKS_PER_BEAT / 8, TICKS_PER_BEAT / 6] as const;
/** Ticks are rounded, and sums of thirds are not exact. */
const ROUNDING_TICKS = 2;

/** Notes cues that lie neither on the beat grid nor on a hit or note of the song. One finding for all. */
export function findOffGrid(context: CheckContext): Finding[] {
  const { cues } = context.timeline;
  const sounds = listSounds(context);
  const off: number[] = [];
  for (let cue = 0; cue < cues.count; cue++) {
    const tick = cues.tick[cue] ?? 0;
    if (!isOnGrid(tick) && !sounds.has(tick)) off.push(cue);
  }
  if (off.length === 0) return [];
  return [
    buildFinding(context, "off-grid", {
      sentence: `${off.length} of ${cues.count} steps are off the beat.`,
      hint: "If you want them on the beat, wait for 1, 0.5 or 0.25 beats.",
      measured: { value: off.length, limit: 0, unit: "steps" },
      moments: off.map((cue) => cues.tick[cue] ?? 0),
      lines: off.map((cue) => lineOfCue(context, cue)),
    }),
  ];
}

function isOnGrid(tick: number): boolean {
  return GRIDS.some((grid) => Math.abs(tick - Math.round(tick / grid) * grid) <= ROUNDING_TICKS);
}

/** Ticks of every hit and note, and the ticks beside them. */
function listSounds({ song }: CheckContext): ReadonlySet<number> {
  const ticks = new Set<number>();
  for (const { hits, notes } of song.instruments)
    for (const moment of [...hits, ...notes.map((note) => note.start)])
      for (let near = -ROUNDING_TICKS; near <= ROUNDING_TICKS; near++)
        ticks.add(Math.round(moment * TICKS_PER_BEAT) + near);
  return ticks;
}
