import type { LessonSummary } from "../../../../shared/contracts/course.ts";

/** Steps of a lesson that are done, counted from its start: the next one is where the pupil is. */
export function stepsDone(lesson: LessonSummary): number {
  const open = lesson.steps.findIndex((step) => !step.isDone);
  return open === -1 ? lesson.steps.length : open;
}

/** The lesson to go on with: one under way before one not begun, by number; undefined when all are done. */
export function findNextLesson(lessons: readonly LessonSummary[]): LessonSummary | undefined {
  const open = lessons.filter((lesson) => stepsDone(lesson) < lesson.steps.length).sort((a, b) => a.number - b.number);
  return open.find((lesson) => lesson.steps.some((step) => step.isDone)) ?? open[0];
}

/** Index of the step asked for; without one, or for one that is not there, the step the pupil is at. */
export function findStepIndex(lesson: LessonSummary, stepId: string | null): number {
  const asked = lesson.steps.findIndex((step) => step.id === stepId);
  return asked === -1 ? Math.min(stepsDone(lesson), lesson.steps.length - 1) : asked;
}
