import type { Bar } from "../../shared/contracts/songs.ts";
import { TICKS_PER_BEAT } from "../../shared/units.ts";
import type { MidiFile } from "./midi-file.ts";
import { meterGrid } from "./meter-grid.ts";

/**
 * The beats of a song on the ticks of its file. Beat 0 is the last beat at or before the first
 * sound; the last entry is the song's end: the end of the last whole bar at or after the last sound
 * (LANGUAGE rules 2 and 21).
 */
export interface BeatGrid {
  /** MIDI tick of every beat, and of the end: one more than there are beats. */
  readonly ticks: readonly number[];
  readonly bars: readonly Bar[];
}

const toMoment = (beats: number): number => Math.round(beats * TICKS_PER_BEAT) / TICKS_PER_BEAT;

/** Builds the grid for sounds between two MIDI ticks (`firstSound` < `lastSound`). */
export function beatGrid(
  file: Pick<MidiFile, "meters" | "ticksPerQuarter">,
  firstSound: number,
  lastSound: number,
): BeatGrid {
  const ticks: number[] = [];
  const bars: Bar[] = [];
  let number = 0;
  for (const bar of meterGrid(file, lastSound)) {
    const beatTicks = Array.from({ length: bar.beats }, (_, n) => bar.tick + (n * bar.ticks) / bar.beats);
    const ends = [...beatTicks.slice(1), bar.tick + bar.ticks];
    // Beats that are over before the first sound are no part of the song.
    const kept = beatTicks.filter((_, n) => (ends[n] ?? 0) > firstSound);
    if (kept.length === 0) continue;
    const isWhole = kept.length === bar.beats && !bar.isPickUp;
    if (isWhole) number += 1;
    bars.push({ number: isWhole ? number : 0, start: ticks.length, beats: kept.length });
    ticks.push(...kept);
  }
  const last = meterGrid(file, lastSound).at(-1);
  if (last) ticks.push(last.tick + last.ticks);
  return { ticks, bars };
}

/** The moment of a MIDI tick: beats from beat 0, to 1/960 beat; clamped to the song. */
export function momentAt(grid: BeatGrid, tick: number): number {
  const { ticks } = grid;
  const last = ticks.length - 1;
  let low = 0;
  let high = last;
  while (low < high) {
    const middle = Math.ceil((low + high) / 2);
    if ((ticks[middle] ?? 0) <= tick) low = middle;
    else high = middle - 1;
  }
  const from = ticks[low] ?? 0;
  const to = ticks[low + 1];
  if (to === undefined) return last;
  return toMoment(low + Math.max(0, tick - from) / (to - from));
}
