import type { WordEntry, WordGroup, WordOwner } from "./entry.ts";
import { ACT_ENTRIES, CHOOSE_ENTRIES } from "./lights-words.ts";
import { OTHER_WORDS } from "./other-words.ts";
import { SONG_WORDS } from "./song-words.ts";
import { SQUARE_WORDS } from "./square-words.ts";
import { TIME_WORDS } from "./time-words.ts";

export { findExampleNames, writeExample } from "./example-names.ts";
export { takeFirstBars } from "./first-bars.ts";
export { WORD_GROUPS, type WordEntry, type WordGroup, type WordOwner } from "./entry.ts";

/** Every word of the language, in the order of the reference. */
export const REFERENCE: readonly WordEntry[] = [
  ...TIME_WORDS,
  ...SONG_WORDS,
  ...SQUARE_WORDS,
  ...ACT_ENTRIES,
  ...CHOOSE_ENTRIES,
  ...OTHER_WORDS,
];

/** The words that hang on something, or stand alone. */
export function listWordsOf(owner: WordOwner): readonly WordEntry[] {
  return REFERENCE.filter((entry) => entry.owners.includes(owner));
}

/** The words of one chapter. */
export function listWordsIn(group: WordGroup): readonly WordEntry[] {
  return REFERENCE.filter((entry) => entry.group === group);
}

/** The word with this name that hangs there, or null. */
export function findWord(owner: WordOwner, word: string): WordEntry | null {
  return REFERENCE.find((entry) => entry.word === word && entry.owners.includes(owner)) ?? null;
}

/** Stable and unique: for links to a word on the reference page. */
export function wordId(entry: WordEntry): string {
  const owner = entry.owners[0];
  return owner === "script" ? entry.word : `${owner ?? ""}-${entry.word}`;
}
