import type { Finding } from "../engine/model.ts";
import { LinePairs, nameLine } from "./by-line.ts";
import type { CheckContext } from "./context.ts";
import { buildFinding } from "./finding.ts";

/** A fade counts as whole when it is cut this short before its end: ticks are rounded. */
const ROUNDING_TICKS = 2;

/** Rule 32: a fade of level or colour that is replaced before its end on any of its lights. */
export function findFadeCut(context: CheckContext): Finding[] {
  const { tracks, lights } = context;
  const pairs = new LinePairs(context);
  for (const light of lights)
    for (const track of light.hasColour ? [tracks.level, tracks.colour] : [tracks.level])
      for (let entry = track.first[light.index] ?? 0; entry + 1 < (track.first[light.index + 1] ?? 0); entry++) {
        const tick = track.tick[entry] ?? 0;
        const next = track.tick[entry + 1] ?? 0;
        const isCut = next > tick && next < tick + (track.length[entry] ?? 0) - ROUNDING_TICKS;
        if (isCut) pairs.add(track.cue[entry] ?? 0, track.cue[entry + 1] ?? 0, [light.index]);
      }
  return pairs.list().map((pair) =>
    buildFinding(context, "fade-cut", {
      sentence: `This fade stops half way. ${nameLine(pair)} cuts it off.`,
      hint: "Wait for as many beats as the fade lasts.",
      moments: pair.ticks,
      lights: pair.lights,
      lines: [pair.line],
    }),
  );
}
