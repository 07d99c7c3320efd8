import { ProblemError } from "../../shared/problem.ts";
import { RunPoolClosedError, RunQueueFullError } from "../runs/run-pool.ts";

/** Codes of SQLite that mean "try again": another connection holds the lock. */
const BUSY_CODES: ReadonlySet<unknown> = new Set(["SQLITE_BUSY", "SQLITE_BUSY_SNAPSHOT", "SQLITE_LOCKED"]);
const BUSY_RETRY_SECONDS = 2;

/**
 * Gives the problem that answers a thrown value: problems as they are, unreadable requests of the
 * body parser and the router as 4xx, a locked database or a full run queue as `busy`, and null for everything else,
 * which is a bug.
 */
export function toProblem(error: unknown): ProblemError | null {
  if (error instanceof ProblemError) return error;
  if (typeof error !== "object" || error === null) return null;
  const { type, status, code } = error as { type?: unknown; status?: unknown; code?: unknown };
  if (type === "entity.too.large") return new ProblemError("too-large", { cause: error });
  if (type === "entity.parse.failed") {
    return new ProblemError("malformed-request", { detail: "The body is not valid JSON.", cause: error });
  }
  if (typeof status === "number" && status >= 400 && status < 500) {
    return new ProblemError("malformed-request", { cause: error });
  }
  if (BUSY_CODES.has(code) || error instanceof RunQueueFullError || error instanceof RunPoolClosedError) {
    return new ProblemError("busy", { extensions: { retryAfterSeconds: BUSY_RETRY_SECONDS }, cause: error });
  }
  return null;
}
