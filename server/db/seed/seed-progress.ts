import { LESSONS } from "../../../lessons/index.ts";
import type { LessonFile } from "../../../lessons/schema.ts";
import { hashText, numbersFrom } from "../../../sandbox/square/stable-chance.ts";
import type { FeatureDeps } from "../../deps.ts";
import { inTransaction } from "../connection.ts";
import { exerciseAttempts, lessonProgress } from "../schema/index.ts";
import type { SeedDay } from "./seed-day.ts";
import type { SeededPeople } from "./seed-people.ts";
import { getId } from "./seed-shows.ts";
import { CLASSES, STUDENTS } from "./world/people.ts";

const DAYS_A_LESSON = 7;

/** Adds how far each student is: the lessons before the class's are done, its own in part. Some have begun nothing. */
export function seedProgress({ db }: FeatureDeps, day: SeedDay, people: SeededPeople): void {
  inTransaction(db, (tx) => {
    for (const student of STUDENTS) {
      const reached = CLASSES.find((one) => one.code === student.classCode)?.lesson ?? 0;
      const next = numbersFrom(hashText(`progress of ${student.key}`));
      for (const lesson of LESSONS) {
        const done = stepsDone(lesson, reached, next());
        const at = day.before(-1 - DAYS_A_LESSON * (reached - lesson.number), "11:20");
        for (const step of lesson.steps.slice(0, done)) {
          const userId = getId(people.userIds, student.key);
          const attempts = step.checks.length > 0 ? 1 + Math.floor(next() * 3) : 0;
          const answer = step.question ? step.question.choices.findIndex((choice) => choice.isRight) : null;
          tx.insert(lessonProgress)
            .values({
              userId,
              lessonId: lesson.id,
              lessonVersion: lesson.version,
              stepId: step.id,
              isDone: true,
              attempts,
              answer,
              source: step.solution,
              updatedAt: at,
            })
            .run();
          for (let attempt = 1; attempt <= attempts; attempt += 1) {
            tx.insert(exerciseAttempts)
              .values({
                userId,
                lessonId: lesson.id,
                stepId: step.id,
                at: at + attempt,
                passed: attempt === attempts,
                problemCode: null,
              })
              .run();
          }
        }
      }
    }
  });
}

function stepsDone(lesson: LessonFile, reached: number, share: number): number {
  if (lesson.number < reached) return lesson.steps.length;
  return lesson.number === reached ? Math.floor(share * lesson.steps.length) : 0;
}
