import type { z } from "zod";
import type { courseContract, LessonSummary, StepProgress } from "../../../shared/contracts/course.ts";
import { LayoutIdSchema, SongIdSchema } from "../../../shared/ids.ts";
import { ProblemError } from "../../../shared/problem.ts";
import { LESSONS } from "../../../lessons/index.ts";
import type { LessonFile, LessonFileStep } from "../../../lessons/schema.ts";
import type { Clock } from "../../clock.ts";
import { type Db, inTransaction } from "../../db/connection.ts";
import { getCurrentLayout } from "../../event/square.queries.ts";
import type { Actor } from "../../http/actor.ts";
import { fieldProblem } from "../../work/field-problem.ts";
import { presentLesson, presentProgress, presentStep } from "./course.presenter.ts";
import { findProgress, hasPassedAttempt, listProgress, type ProgressRow, saveProgress } from "./course.queries.ts";

type LessonAnswer = z.input<typeof courseContract.lesson.response>;

/** The lessons in order, with the caller's progress. */
export function listLessons(db: Db, actor: Actor): LessonSummary[] {
  const progress = listProgress(db, actor.userId, null);
  return LESSONS.map((lesson) => presentLesson(lesson, progress));
}

/** A lesson with the caller's progress in every step; teachers also get its notes. Throws `not-found`. */
export function getLessonToWork(db: Db, actor: Actor, lessonId: string): LessonAnswer {
  const lesson = getLesson(lessonId);
  const progress = listProgress(db, actor.userId, lessonId);
  const byStep = new Map(progress.map((row) => [row.stepId, row]));
  return {
    lesson: presentLesson(lesson, progress),
    songId: SongIdSchema.parse(lesson.songId),
    layoutId: LayoutIdSchema.parse(getCurrentLayout(db).id),
    seed: lesson.seed,
    steps: lesson.steps.map(presentStep),
    progress: lesson.steps.map((step) => presentProgress(step.id, byStep.get(step.id))),
    teacherNotes: actor.roles.includes("teacher") ? lesson.teacherNotes : [],
  };
}

/**
 * Keeps the choice of a question. Any answer finishes a predict step, the right one an investigate
 * step. Throws `invalid-request` for a choice that the question has not, `not-found`.
 */
export function answerStep(
  { db, clock }: { readonly db: Db; readonly clock: Clock },
  actor: Actor,
  { lessonId, stepId, choice }: { lessonId: string; stepId: string; choice: number },
): StepProgress {
  const { lesson, step } = getStep(lessonId, stepId);
  if (!step.question) throw fieldProblem("/choice", "This step has no question.");
  if (!step.question.choices[choice])
    throw fieldProblem("/choice", `The question has ${step.question.choices.length} answers.`);
  return inTransaction(db, (tx) => {
    const before = findProgress(tx, actor.userId, lessonId, stepId);
    const isAnswered = isGoodAnswer(step, choice);
    const isDone =
      before?.isDone === true ||
      (isAnswered && (!needsRun(step) || hasPassedAttempt(tx, actor.userId, lessonId, stepId)));
    const row: ProgressRow = {
      ...startProgress(actor, lesson, step),
      ...before,
      lessonVersion: lesson.version,
      answer: choice,
      isDone,
      updatedAt: clock.now(),
    };
    saveProgress(tx, row);
    return presentProgress(stepId, row);
  });
}

/** One lesson of the course. Throws `not-found`. */
export function getLesson(lessonId: string): LessonFile {
  const lesson = LESSONS.find((one) => one.id === lessonId);
  if (!lesson) throw new ProblemError("not-found");
  return lesson;
}

/** One step of a lesson. Throws `not-found`. */
export function getStep(lessonId: string, stepId: string): { lesson: LessonFile; step: LessonFileStep } {
  const lesson = getLesson(lessonId);
  const step = lesson.steps.find((one) => one.id === stepId);
  if (!step) throw new ProblemError("not-found");
  return { lesson, step };
}

/** Whether a script has to pass before the step is done: always, but where a question is all there is. */
export function needsRun(step: LessonFileStep): boolean {
  return step.checks.length > 0 || step.question === null;
}

/** Whether the question, if there is one, is answered well enough to be done with it. */
export function isGoodAnswer(step: LessonFileStep, choice: number | null): boolean {
  if (!step.question) return true;
  if (choice === null) return false;
  return step.kind === "predict" || step.question.choices[choice]?.isRight === true;
}

/** Progress before the first try. */
export function startProgress(actor: Pick<Actor, "userId">, lesson: LessonFile, step: LessonFileStep): ProgressRow {
  return {
    userId: actor.userId,
    lessonId: lesson.id,
    lessonVersion: lesson.version,
    stepId: step.id,
    isDone: false,
    attempts: 0,
    answer: null,
    source: null,
    updatedAt: 0,
  };
}
