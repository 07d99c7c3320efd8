import type { BeatMap } from "../../../../shared/contracts/songs.ts";

/** One stroke of the metronome. */
export interface BeatClick {
  /** Seconds from the start of the audio. */
  readonly start: number;
  /** The first beat of a bar sounds higher. */
  readonly isFirst: boolean;
}

const MICROSECONDS = 1_000_000;

/** A stroke for every beat of a song; its end has none. */
export function listBeatClicks({ beats, bars }: Pick<BeatMap, "beats" | "bars">): readonly BeatClick[] {
  const firsts = new Set(bars.map((bar) => Math.round(bar.start)));
  return beats.slice(0, -1).map((time, beat) => ({ start: time / MICROSECONDS, isFirst: firsts.has(beat) }));
}

/** How many strokes lead in, and how far apart they are in seconds of the song. */
export interface CountIn {
  readonly beats: number;
  readonly beatSeconds: number;
}

/** One bar in the meter and the tempo of a moment. A bar of one beat is counted twice. */
export function findCountIn({ beats, bars }: Pick<BeatMap, "beats" | "bars">, seconds: number): CountIn {
  const time = seconds * MICROSECONDS + 1;
  const beat = Math.max(
    0,
    Math.min(
      beats.length - 2,
      beats.findLastIndex((start) => start <= time),
    ),
  );
  const bar = bars.findLast((candidate) => candidate.number > 0 && candidate.start <= beat + 1e-6) ?? bars.at(-1);
  return {
    beats: Math.max(2, bar?.beats ?? 4),
    beatSeconds: ((beats[beat + 1] ?? 0) - (beats[beat] ?? 0)) / MICROSECONDS,
  };
}
