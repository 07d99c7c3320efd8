import type { Criterion } from "../../../../shared/contracts/assignments.ts";

export const LEVEL_NAMES = ["not yet", "nearly", "yes", "and more"] as const;

/** A criterion with the usual four level names; `texts` say what each level means. */
export function buildCriterion(id: string, name: string, texts: readonly string[] = []): Criterion {
  return { id, name, levels: LEVEL_NAMES.map((level, index) => ({ name: level, text: texts[index] ?? "" })) };
}

/** A rubric to begin with: what a light show of a song can be asked for. The teacher changes it freely. */
export const STARTING_RUBRIC: readonly Criterion[] = [
  buildCriterion("song", "Fits the song", [
    "The lights do not follow the song.",
    "Some changes land on beats, bars or sections.",
    "Changes follow the beat, and the sections look different.",
    "The lights tell something about the song that one would not hear otherwise.",
  ]),
  buildCriterion("code", "Uses a loop or a function well", [
    "Every change is written out by hand.",
    "There is a loop or a function, but it saves little.",
    "A loop or a function does work that would be long by hand.",
    "Own functions with parameters are used again with other values.",
  ]),
  buildCriterion("square", "Uses the square", [
    "Few fronts are lit.",
    "Several fronts are lit, mostly all alike.",
    "Fronts, sides and parts are used on purpose.",
    "The whole square works as one picture.",
  ]),
  buildCriterion("ready", "Safe and ready for the square", [
    "A stop of the show check is open.",
    "It runs, with things to look at.",
    "No stop, and every warning has a reason.",
    "Nothing is left to look at from the first beat to the last.",
  ]),
];

/** An id for a new criterion that none of the others has. */
export function toFreeCriterionId(taken: readonly string[]): string {
  let number = taken.length + 1;
  while (taken.includes(`criterion-${number}`)) number += 1;
  return `criterion-${number}`;
}
