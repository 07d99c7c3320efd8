import { ProblemError } from "../../shared/problem.ts";

/** The refusal of one field for a reason that only the loaded rows show; `detail` says what to do. */
export function fieldProblem(pointer: string, detail: string): ProblemError {
  return new ProblemError("invalid-request", { detail, errors: [{ pointer, code: "custom", detail }] });
}
