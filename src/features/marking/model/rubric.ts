import type { Criterion, Rubric } from "../../../../shared/contracts/assignments.ts";

/** Level chosen by criterion id, 1 to 4. */
export type Levels = Readonly<Record<string, number>>;

/** The most points of one criterion: one for each level. */
export const LEVEL_COUNT = 4;

export interface Points {
  readonly got: number;
  readonly of: number;
}

/** Points so far: the levels chosen, of four for every criterion. */
export function countPoints(rubric: Rubric, levels: Levels): Points {
  return {
    got: rubric.reduce((sum, criterion) => sum + (levels[criterion.id] ?? 0), 0),
    of: rubric.length * LEVEL_COUNT,
  };
}

/** The criteria that have no level yet, in the rubric's order. */
export function listOpenCriteria(rubric: Rubric, levels: Levels): readonly Criterion[] {
  return rubric.filter((criterion) => levels[criterion.id] === undefined);
}

export interface RubricState {
  readonly levels: Levels;
  /** The criterion that the number keys set; null when the rubric is empty. */
  readonly currentId: string | null;
}

/** The criterion to begin with: the first open one, else the first. */
export function findCurrent(rubric: Rubric, levels: Levels): string | null {
  return (listOpenCriteria(rubric, levels)[0] ?? rubric[0])?.id ?? null;
}

/** Sets the current criterion's level and goes on to the next one in the rubric; the last one stays current. */
export function pressLevel(rubric: Rubric, state: RubricState, level: number): RubricState {
  const at = rubric.findIndex((criterion) => criterion.id === state.currentId);
  const current = rubric[at];
  if (!current || level < 1 || level > LEVEL_COUNT) return state;
  return { levels: { ...state.levels, [current.id]: level }, currentId: (rubric[at + 1] ?? current).id };
}

/** Why the mark cannot be released yet, as a sentence; null when it can. */
export function findReleaseObstacle(rubric: Rubric, levels: Levels): string | null {
  const open = listOpenCriteria(rubric, levels);
  if (open.length === 0) return null;
  return open.length === 1 ? `“${open[0]?.name}” has no level yet.` : `${open.length} criteria have no level yet.`;
}
