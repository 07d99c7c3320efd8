import type { LessonStep, LessonSummary, StepProgress } from "../../../shared/contracts/course.ts";
import type { LessonFile, LessonFileStep } from "../../../lessons/schema.ts";
import type { ProgressRow } from "./course.queries.ts";

/** A lesson for a list, with which steps are done. */
export function presentLesson(lesson: LessonFile, progress: readonly ProgressRow[]): LessonSummary {
  const done = new Set(progress.filter((row) => row.lessonId === lesson.id && row.isDone).map((row) => row.stepId));
  return {
    id: lesson.id,
    number: lesson.number,
    title: lesson.title,
    summary: lesson.summary,
    words: lesson.words,
    minutes: lesson.minutes,
    steps: lesson.steps.map(({ id, kind, title }) => ({ id, kind, title, isDone: done.has(id) })),
  };
}

/** A step as a learner gets it: never with the solution, and of the checks only what they ask for. */
export function presentStep(step: LessonFileStep): LessonStep {
  return {
    id: step.id,
    kind: step.kind,
    title: step.title,
    text: step.text,
    starter: step.starter,
    question: step.question,
    aim: step.aim,
    checks: step.checks.map(({ id, text }) => ({ id, text })),
  };
}

/** Progress in a step; all zero before the first try. */
export function presentProgress(stepId: string, row: ProgressRow | null | undefined): StepProgress {
  return {
    stepId,
    isDone: row?.isDone ?? false,
    attempts: row?.attempts ?? 0,
    source: row?.source ?? null,
    answer: row?.answer ?? null,
  };
}
