import type { JudgedRun } from "../../sandbox/checks/judge-run.ts";
import type { RunInput, RunOutcome } from "../../sandbox/engine/model.ts";

/** An outcome with the milliseconds that the engine took, start-up apart. */
export type TimedOutcome = RunOutcome & { readonly engineMs: number };

/** What is wanted of a run: its outcome, or everything that is kept of it. */
export type RunWork = "run" | "judge";

/** What came of a run, as the work that was wanted. */
export type RunAnswer =
  { readonly work: "run"; readonly outcome: TimedOutcome } | { readonly work: "judge"; readonly judged: JudgedRun };

/** Pool to child process, and child process to worker thread: one run. */
export interface RunRequest {
  readonly id: number;
  readonly work: RunWork;
  readonly input: RunInput;
  /** Wall time after which the thread is ended. */
  readonly deadlineMs: number;
}

/** The script ran, and judging it threw: a bug of ours, not a problem of the script. */
interface Failed {
  readonly kind: "failed";
  readonly id: number;
  readonly reason: string;
}

/** Child process to pool. */
export type ChildMessage =
  | { readonly kind: "ready" }
  /** A thread has taken the run up: its time counts from here. */
  | { readonly kind: "started"; readonly id: number }
  | { readonly kind: "done"; readonly id: number; readonly answer: RunAnswer }
  | Failed;

/** Worker thread to child process. `isSpent`: the run ended in a way after which the thread is not used again. */
export type ThreadMessage =
  | { readonly kind: "ready" }
  | { readonly kind: "done"; readonly id: number; readonly answer: RunAnswer; readonly isSpent: boolean }
  | Failed;
