import type { BeatMap } from "../../../../shared/contracts/songs.ts";
import { TICKS_PER_BEAT } from "../../../../shared/units.ts";

/** A stretch of the song in ticks: from `start` up to `end`. */
export interface TickLoop {
  readonly start: number;
  readonly end: number;
}

/** Where a moment lies in the song, as people say it. */
export interface SongPlace {
  readonly bar: number;
  /** From 1. */
  readonly beat: number;
  /** Beats in this bar. */
  readonly beats: number;
  /** Index into the song's sections, -1 between them. */
  readonly section: number;
}

/** Bar, beat and section of a moment in ticks. Beyond the last bar it is the last beat of it. */
export function findSongPlace(song: BeatMap, tick: number): SongPlace {
  const last = song.beats.length - 1;
  const moment = Math.min(Math.max(0, tick / TICKS_PER_BEAT), last - 1 / TICKS_PER_BEAT);
  const bar = song.bars.findLast((candidate) => candidate.start <= moment + 1e-6) ?? song.bars[0];
  const section = song.sections.findIndex(({ start, end }) => moment >= start - 1e-6 && moment < end - 1e-6);
  if (!bar) return { bar: 1, beat: 1, beats: song.beatsPerBar, section };
  const beat = Math.min(bar.beats, Math.floor(moment - bar.start + 1e-6) + 1);
  return { bar: bar.number, beat: Math.max(1, beat), beats: bar.beats, section };
}

/** "1:05" */
export function presentClock(seconds: number): string {
  const whole = Math.max(0, Math.floor(seconds + 1e-6));
  return `${Math.floor(whole / 60)}:${String(whole % 60).padStart(2, "0")}`;
}

/** The bar line nearest to a tick: bar starts and the song's end. */
export function nearestBarLine(song: BeatMap, tick: number): number {
  const lines = [...song.bars.map((bar) => bar.start), song.beats.length - 1].map((beat) =>
    Math.round(beat * TICKS_PER_BEAT),
  );
  return lines.reduce((best, line) => (Math.abs(line - tick) < Math.abs(best - tick) ? line : best), lines[0] ?? 0);
}
