import { createProblem } from "../language/problem.ts";
import type { ProblemCode } from "../language/problems/index.ts";
import type { RunOutcome } from "./model.ts";

/**
 * The outcome of a run that a host had to end from outside: nothing can be asked of it any more, so
 * it names no line and holds no timeline. `code`: "too-much-work" when time was up, "could-not-run"
 * when the worker itself failed.
 */
export function createStoppedOutcome(
  source: string,
  code: Extract<ProblemCode, "too-much-work" | "could-not-run">,
  details: string,
): RunOutcome {
  const [firstLine = ""] = source.split("\n");
  const range = { line: 1, column: 1, endLine: 1, endColumn: 1 };
  const problem = createProblem(code, {}, { range, excerpt: firstLine.slice(0, 60), details });
  return { ok: false, problem, timeline: null, notes: [], findings: [], fuel: 0, cueCount: 0 };
}
