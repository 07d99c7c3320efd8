import type { Finding } from "../engine/model.ts";
import { findEntry, levelAt, type Tracks } from "../timeline/tracks.ts";
import { LinePairs, listOf } from "./by-line.ts";
import type { CheckContext } from "./context.ts";
import { buildFinding } from "./finding.ts";

/**
 * Rule 33: a colour cue whose lights all stay dark until their next colour cue or the end. Lights
 * that can not show a colour do not count, and a cue on none but such lights is left alone.
 */
export function findColourNeverLit(context: CheckContext): Finding[] {
  const { tracks, timeline, lights } = context;
  const { colour, endTick } = tracks;
  const darkLights = new Map<number, number[]>();
  const isLit = new Uint8Array(timeline.cues.count);
  for (const { index, hasColour } of lights) {
    if (!hasColour) continue;
    const until = colour.first[index + 1] ?? 0;
    for (let entry = colour.first[index] ?? 0; entry < until; entry++) {
      const cue = colour.cue[entry] ?? 0;
      const end = entry + 1 < until ? (colour.tick[entry + 1] ?? 0) : endTick;
      if (isLitBetween(tracks, index, colour.tick[entry] ?? 0, end)) isLit[cue] = 1;
      else listOf(darkLights, cue).push(index);
    }
  }
  const pairs = new LinePairs(context);
  for (const [cue, dark] of darkLights) if (isLit[cue] === 0) pairs.add(cue, -1, dark);
  return pairs.list().map((pair) =>
    buildFinding(context, "colour-never-lit", {
      sentence: "The lights have a colour, but they are off.",
      hint: "Switch them on: `on()`, `fadeTo(80, 2)` or `pulse(1)`.",
      moments: pair.ticks,
      lights: pair.lights,
      lines: [pair.line],
    }),
  );
}

/** Whether a level or a pulse lights the light at some moment of start <= t < end. */
function isLitBetween(tracks: Tracks, light: number, start: number, end: number): boolean {
  const { level, pulse } = tracks;
  if (start >= end) return false;
  const firstLevel = Math.max(findEntry(level, light, start), level.first[light] ?? 0);
  for (let entry = firstLevel; entry < (level.first[light + 1] ?? 0) && (level.tick[entry] ?? 0) < end; entry++) {
    const from = Math.max(start, level.tick[entry] ?? 0);
    const next = entry + 1 < (level.first[light + 1] ?? 0) ? (level.tick[entry + 1] ?? 0) : end;
    const to = Math.min(end, next);
    // A line is above 0 somewhere inside when it is so at one of its ends; a single moment is not seen.
    if (to > from && (levelAt(level, entry, from) > 0 || levelAt(level, entry, to) > 0)) return true;
  }
  const firstPulse = pulse.first[light] ?? 0;
  for (
    let entry = findEntry(pulse, light, end - 1);
    entry >= firstPulse && (pulse.latestEnd[entry] ?? 0) > start;
    entry--
  )
    if (Math.max(start, pulse.tick[entry] ?? 0) < (pulse.end[entry] ?? 0)) return true;
  return false;
}
