import type { Rubric } from "../../shared/contracts/assignments.ts";

/** Levels of a criterion: the strongest counts 4 points. */
export const LEVELS_PER_CRITERION = 4;

/** Points of chosen levels out of what the rubric can give; a level of a criterion that is gone counts nothing. */
export function countPoints(rubric: Rubric, levels: Readonly<Record<string, number>>): { got: number; of: number } {
  const got = rubric.reduce((sum, criterion) => sum + (levels[criterion.id] ?? 0), 0);
  return { got, of: rubric.length * LEVELS_PER_CRITERION };
}
