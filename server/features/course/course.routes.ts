import type { courseContract } from "../../../shared/contracts/course.ts";
import type { FeatureDeps } from "../../deps.ts";
import type { Handlers } from "../../http/mount.ts";
import { createExercises } from "./attempt.service.ts";
import { answerStep, getLessonToWork, listLessons } from "./course.service.ts";

/** The handlers of the course contract. */
export function createCourseHandlers(deps: FeatureDeps): Handlers<typeof courseContract> {
  const exercises = createExercises(deps);
  return {
    lessons: ({ actor }) => ({ lessons: listLessons(deps.db, actor) }),
    lesson: ({ actor, params }) => getLessonToWork(deps.db, actor, params.lessonId),
    answer: ({ actor, params, body }) => ({ progress: answerStep(deps, actor, { ...params, ...body }) }),
    attempt: ({ actor, params, body }) => exercises.attempt(actor, { ...params, ...body }),
  };
}
