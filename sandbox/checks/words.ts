import type { BeatMap } from "../../shared/contracts/songs.ts";
import { TICKS_PER_BEAT } from "../../shared/units.ts";

/** Gives "bar 12" for a tick, or "the pick-up" for what lies before bar 1. */
export function nameBar({ song }: { readonly song: BeatMap }, tick: number): string {
  const number = barAt(song, tick);
  return number === 0 ? "the pick-up" : `bar ${number}`;
}

/** Gives the number of the bar that a tick lies in; after the last bar the last. */
export function barAt(song: BeatMap, tick: number): number {
  const moment = tick / TICKS_PER_BEAT;
  return song.bars.findLast((bar) => bar.start <= moment + 1e-9)?.number ?? song.bars[0]?.number ?? 1;
}

/** Gives "a", "a and b", "a, b and c". */
export function joinWords(words: readonly string[]): string {
  return words.length < 2 ? words.join("") : `${words.slice(0, -1).join(", ")} and ${words.at(-1)}`;
}

/** Gives "1 front", "2 fronts". */
export function countWord(count: number, word: string): string {
  return `${count} ${word}${count === 1 ? "" : "s"}`;
}

