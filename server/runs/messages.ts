import type { RunInput, RunOutcome } from "../../sandbox/engine/model.ts";

/** An outcome with the milliseconds that the engine took, start-up apart. */
export type TimedOutcome = RunOutcome & { readonly engineMs: number };

/** Pool to child process, and child process to worker thread: one run. */
export interface RunRequest {
  readonly id: number;
  readonly input: RunInput;
  /** Wall time after which the thread is ended. */
  readonly deadlineMs: number;
}

/** Child process to pool. */
export type ChildMessage =
  { readonly kind: "ready" } | { readonly kind: "done"; readonly id: number; readonly outcome: TimedOutcome };

/** Worker thread to child process. `isSpent`: the run ended in a way after which the thread is not used again. */
export type ThreadMessage =
  | { readonly kind: "ready" }
  | { readonly kind: "done"; readonly id: number; readonly outcome: TimedOutcome; readonly isSpent: boolean };
