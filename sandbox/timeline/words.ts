import type { BeatMap } from "../../shared/contracts/songs.ts";
import { barNumberAt } from "./spans.ts";

/** Gives "bar 12" for a tick, or "the pick-up" for what lies before bar 1. */
export function nameBar(song: BeatMap, tick: number): string {
  const number = barNumberAt(song, tick);
  return number === 0 ? "the pick-up" : `bar ${number}`;
}

/** Gives "a", "a and b", "a, b and c". */
export function joinWords(words: readonly string[]): string {
  return words.length < 2 ? words.join("") : `${words.slice(0, -1).join(", ")} and ${words.at(-1)}`;
}

/** Gives "1 front", "2 fronts". */
export function countWord(count: number, word: string): string {
  return `${count} ${word}${count === 1 ? "" : "s"}`;
}
