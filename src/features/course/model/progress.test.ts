import { describe, expect, it } from "vitest";
import type { LessonSummary } from "../../../../shared/contracts/course.ts";
import { findNextLesson, findStepIndex, stepsDone } from "./progress.ts";

const lesson = (number: number, done: readonly boolean[]): LessonSummary => ({
  id: `lesson-${number}`,
  number,
  title: `Lesson ${number}`,
  summary: "",
  words: [],
  minutes: 40,
  steps: done.map((isDone, i) => ({ id: `step-${i}`, kind: "run", title: "", isDone })),
});

describe("stepsDone", () => {
  it("counts up to the first open step, even when a later one is done", () => {
    expect(stepsDone(lesson(1, [true, false, true]))).toBe(1);
    expect(stepsDone(lesson(1, [true, true, true]))).toBe(3);
  });
});

describe("findNextLesson", () => {
  it("prefers the lesson under way to an earlier one not begun", () => {
    const lessons = [lesson(1, [true, true]), lesson(2, [false, false]), lesson(3, [true, false])];
    expect(findNextLesson(lessons)?.number).toBe(3);
  });

  it("gives nothing when all are done", () => {
    expect(findNextLesson([lesson(1, [true])])).toBeUndefined();
  });
});

describe("findStepIndex", () => {
  it("opens the step asked for, else the first open one, else the last", () => {
    expect(findStepIndex(lesson(1, [true, false, false]), "step-2")).toBe(2);
    expect(findStepIndex(lesson(1, [true, false, false]), null)).toBe(1);
    expect(findStepIndex(lesson(1, [true, true]), "gone")).toBe(1);
  });
});
