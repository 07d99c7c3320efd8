import { judgeRun } from "../../sandbox/checks/judge-run.ts";
import type { RunInput } from "../../sandbox/engine/model.ts";
import { createStoppedOutcome } from "../../sandbox/engine/stopped.ts";
import type { RunAnswer, RunWork } from "./messages.ts";

/** The answer to a run that had to be ended from outside; see `createStoppedOutcome`. */
export function createStoppedAnswer(
  work: RunWork,
  input: RunInput,
  {
    code,
    details,
    engineMs,
  }: {
    readonly code: "too-much-work" | "could-not-run";
    readonly details: string;
    readonly engineMs: number;
  },
): RunAnswer {
  const outcome = createStoppedOutcome(input.source, code, details);
  return work === "run"
    ? { work, outcome: { ...outcome, engineMs } }
    : { work, judged: judgeRun(outcome, input.layout, input.song) };
}
