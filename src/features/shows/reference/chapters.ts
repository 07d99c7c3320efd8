import type { WordGroup } from "../../../../sandbox/language/reference/index.ts";

/** The chapters of the words, in the order of the reference. */
export const CHAPTER_TITLES: Readonly<Record<WordGroup, string>> = {
  time: "Time",
  song: "The song",
  square: "The square",
  act: "Light them",
  choose: "Choose lights",
  colour: "Colour",
  chance: "Luck",
  notes: "Notes",
};
