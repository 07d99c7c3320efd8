import type { Score } from "../../shared/contracts/songs.ts";

/** Seconds in which a struck sound falls to about a third. */
const DECAY_SECONDS = 1.2;
/** Share of a sound's strength that stays while it is held. */
const HELD = 0.35;

/** Strength of a note (0 to 1) `since` seconds after it began: a stroke that dies away to a held tone. */
const strength = (velocity: number, since: number): number =>
  velocity * (HELD + (1 - HELD) * Math.exp(-since / DECAY_SECONDS));

/**
 * How loud a score is at given times, 0 to 100 for each. The powers of the notes that sound are
 * added, as for sounds that have nothing to do with each other; 100 is the loudest of the times
 * given. Each time stands for the `window` seconds that follow it.
 */
export function loudnessAt(score: Score, times: readonly number[], window: (index: number) => number): number[] {
  const power = times.map(() => 0);
  for (const track of score.tracks) {
    for (const note of track.notes) {
      const end = note.start + note.lasts;
      let i = firstAfter(times, window, note.start);
      for (; i < times.length; i += 1) {
        const from = times[i] ?? 0;
        const length = window(i);
        if (from >= end) break;
        const heard = Math.min(end, from + length) - Math.max(note.start, from);
        if (heard <= 0) continue;
        const level = strength(note.velocity, Math.max(0, from - note.start));
        power[i] = (power[i] ?? 0) + level * level * (heard / length);
      }
    }
  }
  const most = power.reduce((a, b) => Math.max(a, b), Number.MIN_VALUE);
  return power.map((value) => Math.round(100 * Math.sqrt(value / most)));
}

/** Index of the first window that ends after this time. */
function firstAfter(times: readonly number[], window: (index: number) => number, time: number): number {
  let low = 0;
  let high = times.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((times[middle] ?? 0) + window(middle) > time) high = middle;
    else low = middle + 1;
  }
  return low;
}
