import type { CheckResult } from "../../shared/contracts/course.ts";
import type { BeatMap } from "../../shared/contracts/songs.ts";
import type { Layout } from "../../shared/contracts/square.ts";
import type { RunOutcome } from "../engine/model.ts";
import type { Timeline } from "../timeline/model.ts";
import type { ExerciseCheck } from "./exercise.ts";
import { judge } from "./rules.ts";
import { CheckedRun } from "./stage.ts";

/** The part of a lesson's step that is checked. */
export interface CheckedExercise {
  readonly checks: readonly ExerciseCheck[];
}

/** One run of a learner's script, with all that it was run on. */
export interface CheckInput {
  readonly outcome: RunOutcome;
  readonly source: string;
  readonly layout: Layout;
  readonly song: BeatMap;
  /** The timeline of the aim's script; null when the exercise has no aim. */
  readonly aim: Timeline | null;
}

function waiting(check: ExerciseCheck): CheckResult {
  return { id: check.id, text: check.text, state: "waiting", seen: null, hint: null, line: null, tick: null };
}

/**
 * Says of every check whether it is passed, in the order of the exercise: what was seen, on which
 * script line and at which tick (null where no place can be named), and one thing to try when it is
 * not yet passed. A script that a problem stopped leaves all its checks waiting.
 */
export function checkExercise(exercise: CheckedExercise, input: CheckInput): readonly CheckResult[] {
  const { outcome, source, layout, song } = input;
  if (!outcome.ok) return exercise.checks.map(waiting);
  const evidence = {
    outcome,
    source,
    run: new CheckedRun(outcome.timeline, layout, song),
    aim: input.aim === null ? null : new CheckedRun(input.aim, layout, song),
  };
  return exercise.checks.map((check) => {
    const { isPassed, seen, line, tick } = judge(check, evidence);
    return {
      id: check.id,
      text: check.text,
      state: isPassed ? "passed" : "not-yet",
      seen,
      hint: isPassed ? null : check.hint,
      line: line ?? null,
      tick: tick ?? null,
    };
  });
}
