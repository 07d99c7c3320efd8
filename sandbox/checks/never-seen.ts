import type { Finding } from "../engine/model.ts";
import { ACTION_CODE } from "../timeline/model.ts";
import { findEntry } from "../timeline/tracks.ts";
import { LinePairs, nameLine } from "./by-line.ts";
import type { CheckContext } from "./context.ts";
import { buildFinding } from "./finding.ts";

/**
 * Rule 31: a level cue that another replaces on all of its lights at the same tick, or a pulse that
 * is ended at its own tick. What is seen counts: an `on` from which a fade of the same tick starts,
 * and an `off` that ended a running pulse, are. A pulse over a pulse is never looked at.
 */
export function findNeverSeen(context: CheckContext): Finding[] {
  const { cues, selections } = context.timeline;
  const isSeen = new Uint8Array(cues.count);
  const replacedBy = new Int32Array(cues.count).fill(-1);
  for (let light = 0; light < context.lights.length; light++) {
    lookAtLevels(context, light, isSeen, replacedBy);
    lookAtPulses(context, light, isSeen, replacedBy);
  }
  const lost = new LinePairs(context);
  const empty = new LinePairs(context);
  for (let cue = 0; cue < cues.count; cue++) {
    if (isSeen[cue] === 1 || cues.action[cue] === ACTION_CODE.colour) continue;
    const by = replacedBy[cue] ?? -1;
    (by < 0 ? empty : lost).add(cue, by, selections[cues.selection[cue] ?? 0] ?? []);
  }
  return [
    ...lost.list().map((pair) =>
      buildFinding(context, "never-seen", {
        sentence: `Nobody sees this. ${nameLine(pair)} changes the same lights at the same time.`,
        hint: "Put a `wait` between the two.",
        moments: pair.ticks,
        lights: pair.lights,
        lines: [pair.line],
      }),
    ),
    ...empty.list().map((pair) =>
      buildFinding(context, "never-seen", {
        sentence: "Nobody sees this pulse. It lasts for 0 beats.",
        hint: "Give the pulse some beats: `pulse(1)`.",
        moments: pair.ticks,
        lights: pair.lights,
        lines: [pair.line],
      }),
    ),
  ];
}

/** Of the level entries of one tick the last is seen, and the level from which it fades. */
function lookAtLevels(
  { tracks, timeline }: CheckContext,
  light: number,
  isSeen: Uint8Array,
  replacedBy: Int32Array,
): void {
  const { level } = tracks;
  const until = level.first[light + 1] ?? 0;
  for (let start = level.first[light] ?? 0; start < until;) {
    const tick = level.tick[start] ?? 0;
    let end = start + 1;
    while (end < until && level.tick[end] === tick) end++;
    const last = level.cue[end - 1] ?? 0;
    isSeen[last] = 1;
    let isStartOfFade = (level.length[end - 1] ?? 0) > 0;
    for (let entry = end - 2; entry >= start; entry--) {
      const cue = level.cue[entry] ?? 0;
      const isInstant = level.length[entry] === 0;
      replacedBy[cue] = last;
      if (isStartOfFade && isInstant) {
        isSeen[cue] = 1;
        isStartOfFade = false;
      } else if (timeline.cues.action[cue] === ACTION_CODE.off && endsRunningPulse(tracks, light, tick)) {
        isSeen[cue] = 1;
      }
    }
    start = end;
  }
}

function endsRunningPulse({ pulse }: CheckContext["tracks"], light: number, tick: number): boolean {
  const first = pulse.first[light] ?? 0;
  for (let entry = findEntry(pulse, light, tick - 1); entry >= first && (pulse.latestEnd[entry] ?? 0) >= tick; entry--)
    if (pulse.end[entry] === tick && (pulse.tick[entry] ?? 0) + (pulse.length[entry] ?? 0) > tick) return true;
  return false;
}

function lookAtPulses(
  { tracks, timeline }: CheckContext,
  light: number,
  isSeen: Uint8Array,
  replacedBy: Int32Array,
): void {
  const { pulse, level } = tracks;
  for (let entry = pulse.first[light] ?? 0; entry < (pulse.first[light + 1] ?? 0); entry++) {
    const cue = pulse.cue[entry] ?? 0;
    const tick = pulse.tick[entry] ?? 0;
    if ((pulse.end[entry] ?? 0) > tick) {
      isSeen[cue] = 1;
    } else if ((pulse.length[entry] ?? 0) > 0) {
      const offs = findEntry(level, light, tick);
      for (let off = offs; off >= (level.first[light] ?? 0) && level.tick[off] === tick; off--)
        if (timeline.cues.action[level.cue[off] ?? 0] === ACTION_CODE.off) replacedBy[cue] = level.cue[off] ?? -1;
    }
  }
}
