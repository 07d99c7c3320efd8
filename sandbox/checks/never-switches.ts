import type { Finding } from "../engine/model.ts";
import { SWITCH_LEVEL } from "../timeline/cursor.ts";
import { LinePairs, listOf } from "./by-line.ts";
import type { CheckContext } from "./context.ts";
import { buildFinding, lineOfCue } from "./finding.ts";

/**
 * A line whose levels above 0 never bring a switched light to 50, at which it comes on (rule 20). A
 * fade down from above 50 is a way to switch off and is left alone, and so are the low steps of a loop
 * that reaches 50 in a later turn.
 */
export function findNeverSwitches(context: CheckContext): Finding[] {
  const { tracks, lights } = context;
  const { level } = tracks;
  /** Lines that bring some switched light to 50, or down from there. */
  const reachingLines = new Set<number>();
  const darkLights = new Map<number, number[]>();
  for (const { index, isSwitched } of lights) {
    if (!isSwitched) continue;
    for (let entry = level.first[index] ?? 0; entry < (level.first[index + 1] ?? 0); entry++) {
      const cue = level.cue[entry] ?? 0;
      const to = level.to[entry] ?? 0;
      if (to >= SWITCH_LEVEL || to === 0 || (level.from[entry] ?? 0) >= SWITCH_LEVEL)
        reachingLines.add(lineOfCue(context, cue));
      else listOf(darkLights, cue).push(index);
    }
  }
  const pairs = new LinePairs(context);
  for (const [cue, dark] of darkLights) if (!reachingLines.has(lineOfCue(context, cue))) pairs.add(cue, -1, dark);
  return pairs.list().map((pair) =>
    buildFinding(context, "never-switches", {
      sentence: "This box is on or off. The level stays below 50, so its lights stay off.",
      hint: "Use 50 or more for these lights.",
      measured: { value: highestLevel(context, pair.ticks, pair.lights), limit: SWITCH_LEVEL, unit: "level" },
      moments: pair.ticks,
      lights: pair.lights,
      lines: [pair.line],
    }),
  );
}

function highestLevel(
  { tracks: { level } }: CheckContext,
  ticks: ReadonlySet<number>,
  lights: ReadonlySet<number>,
): number {
  let highest = 0;
  for (const light of lights)
    for (let entry = level.first[light] ?? 0; entry < (level.first[light + 1] ?? 0); entry++) {
      const to = level.to[entry] ?? 0;
      if (ticks.has(level.tick[entry] ?? 0) && to < SWITCH_LEVEL) highest = Math.max(highest, to);
    }
  return highest;
}
