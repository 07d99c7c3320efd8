import { SWITCH_LEVEL } from "./cursor.ts";
import type { LevelTrack, Tracks } from "./tracks.ts";

/** A span in which a switched light is on: ticks (may be fractional in a fade), end outside. */
export interface OnSpan {
  readonly start: number;
  readonly end: number;
  /** Index of the cue that switched it on. */
  readonly cue: number;
}

/**
 * Gives the spans in which a light that can only be on or off is on (rule 20): level at least 50 or
 * a pulse running; sorted, with a gap between any two, cut at the song's end. Exact, not sampled.
 */
export function listOnSpans(tracks: Tracks, light: number): readonly OnSpan[] {
  const spans = [...levelSpans(tracks, light), ...pulseSpans(tracks, light)].sort(
    (a, b) => a.start - b.start || a.cue - b.cue,
  );
  const merged: OnSpan[] = [];
  for (const span of spans) {
    const end = Math.min(span.end, tracks.endTick);
    if (span.start >= end) continue;
    const last = merged.at(-1);
    if (last !== undefined && span.start <= last.end)
      merged[merged.length - 1] = { ...last, end: Math.max(last.end, end) };
    else merged.push({ ...span, end });
  }
  return merged;
}

function levelSpans({ level, endTick }: Tracks, light: number): OnSpan[] {
  const spans: OnSpan[] = [];
  const until = level.first[light + 1] ?? 0;
  for (let entry = level.first[light] ?? 0; entry < until; entry++) {
    const start = level.tick[entry] ?? 0;
    const end = entry + 1 < until ? (level.tick[entry + 1] ?? 0) : endTick;
    const cue = level.cue[entry] ?? 0;
    const from = level.from[entry] ?? 0;
    const to = level.to[entry] ?? 0;
    const crossing = crossingOf(level, entry);
    const isOnFirst = (level.length[entry] ?? 0) === 0 ? to >= SWITCH_LEVEL : from >= SWITCH_LEVEL;
    const isOnLast = to >= SWITCH_LEVEL;
    if (isOnFirst && isOnLast) spans.push({ start, end, cue });
    else if (isOnFirst) spans.push({ start, end: Math.min(end, crossing), cue });
    else if (isOnLast && crossing < end) spans.push({ start: crossing, end, cue });
  }
  return spans;
}

/** Tick at which a fade passes the switching level. */
function crossingOf(level: LevelTrack, entry: number): number {
  const from = level.from[entry] ?? 0;
  const to = level.to[entry] ?? 0;
  return (level.tick[entry] ?? 0) + ((SWITCH_LEVEL - from) / (to - from)) * (level.length[entry] ?? 0);
}

function pulseSpans({ pulse }: Tracks, light: number): OnSpan[] {
  const spans: OnSpan[] = [];
  for (let entry = pulse.first[light] ?? 0; entry < (pulse.first[light + 1] ?? 0); entry++)
    spans.push({ start: pulse.tick[entry] ?? 0, end: pulse.end[entry] ?? 0, cue: pulse.cue[entry] ?? 0 });
  return spans;
}
