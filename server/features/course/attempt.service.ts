import type { z } from "zod";
import { SCRIPT_LIMIT_BYTES } from "../../../shared/contracts/common.ts";
import type { courseContract } from "../../../shared/contracts/course.ts";
import { ProblemError } from "../../../shared/problem.ts";
import { checkExercise } from "../../../sandbox/course/check-exercise.ts";
import type { Timeline } from "../../../sandbox/timeline/model.ts";
import type { LessonFile, LessonFileStep } from "../../../lessons/schema.ts";
import { inTransaction } from "../../db/connection.ts";
import type { FeatureDeps } from "../../deps.ts";
import { getSong, type SongRow } from "../../event/song.queries.ts";
import { getCurrentLayout, type LayoutRow } from "../../event/square.queries.ts";
import type { Actor } from "../../http/actor.ts";
import { presentProblem } from "../../show-runs/present-problem.ts";
import { runOrSayBusy } from "../../show-runs/run-or-say-busy.ts";
import { presentProgress } from "./course.presenter.ts";
import { findClassId, findProgress, insertAttempt, type ProgressRow, saveProgress } from "./course.queries.ts";
import { getStep, isGoodAnswer, startProgress } from "./course.service.ts";

type AttemptAnswer = z.input<typeof courseContract.attempt.response>;

/** Tries of the lessons' exercises. */
export interface Exercises {
  /**
   * Runs a learner's script, checks it and keeps it with the progress. The step is done when every
   * check is passed (and its question, if it has one, is answered). Throws `not-found`, `too-large`,
   * `busy` when too many runs wait.
   */
  attempt(actor: Actor, input: { lessonId: string; stepId: string; source: string }): Promise<AttemptAnswer>;
}

/** The exercises of one server. Timelines of aims are worked out once for a lesson's version, song and layout. */
export function createExercises(deps: FeatureDeps): Exercises {
  const { db, clock } = deps;
  const aims = new Map<string, Timeline | null>();

  async function findAim(
    lesson: LessonFile,
    step: LessonFileStep,
    song: SongRow,
    layout: LayoutRow,
  ): Promise<Timeline | null> {
    if (step.aim === null) return null;
    const key = [lesson.id, lesson.version, step.id, song.beatMapId, layout.id].join("/");
    const known = aims.get(key);
    if (known !== undefined) return known;
    const outcome = await runOrSayBusy(
      deps,
      { source: step.aim, songId: song.id, song: song.beatMap, layout: layout.layout, seed: lesson.seed },
      null,
    );
    const aim = outcome.ok ? outcome.timeline : null;
    aims.set(key, aim);
    return aim;
  }

  return {
    async attempt(actor, { lessonId, stepId, source }) {
      if (Buffer.byteLength(source, "utf8") > SCRIPT_LIMIT_BYTES)
        throw new ProblemError("too-large", { detail: `A script has at most ${SCRIPT_LIMIT_BYTES} bytes.` });
      const { lesson, step } = getStep(lessonId, stepId);
      const song = getSong(db, lesson.songId);
      const layout = getCurrentLayout(db);
      const aim = await findAim(lesson, step, song, layout);
      const input = { source, songId: song.id, song: song.beatMap, layout: layout.layout, seed: lesson.seed };
      const outcome = await runOrSayBusy(deps, input, findClassId(db, actor.userId));
      const results = checkExercise(step, { outcome, source, layout: layout.layout, song: song.beatMap, aim });
      const passed = outcome.ok && results.every((result) => result.state === "passed");
      const progress = inTransaction(db, (tx) => {
        const before = findProgress(tx, actor.userId, lessonId, stepId);
        // A question alone is not finished by running its script.
        const isDone = before?.isDone === true || (passed && isGoodAnswer(step, before?.answer ?? null));
        const row: ProgressRow = {
          ...startProgress(actor, lesson, step),
          ...before,
          lessonVersion: lesson.version,
          attempts: (before?.attempts ?? 0) + 1,
          source,
          isDone,
          updatedAt: clock.now(),
        };
        saveProgress(tx, row);
        insertAttempt(tx, {
          userId: actor.userId,
          lessonId,
          stepId,
          at: clock.now(),
          passed,
          problemCode: outcome.ok ? null : outcome.problem.code,
        });
        return presentProgress(stepId, row);
      });
      return {
        progress,
        results: [...results],
        problem: outcome.ok ? null : presentProblem(outcome.problem),
        hash: outcome.ok ? outcome.hash : null,
      };
    },
  };
}
