import type { ErrorRequestHandler, RequestHandler } from "express";
import type { Logger } from "pino";
import { type ProblemDocument, ProblemError, PROBLEMS } from "../../shared/problem.ts";
import { toProblem } from "./to-problem.ts";

/**
 * The only writer of problems: RFC 9457 documents as `application/problem+json`. A bug becomes a bare
 * 500 that carries the request id; its stack goes to the log only. A `retryAfterSeconds` extension is
 * sent as the `Retry-After` header too.
 */
export function problemHandler(log: Logger): ErrorRequestHandler {
  return (error: unknown, req, res, next) => {
    const problem = toProblem(error) ?? new ProblemError("internal");
    if (problem.slug === "internal") log.error({ requestId: req.requestId, err: error }, "request failed");
    if (res.headersSent) {
      // Too late for a document: Express closes the connection, so that no half answer looks whole.
      next(error);
      return;
    }
    const retryAfter = problem.extensions.retryAfterSeconds;
    if (typeof retryAfter === "number") res.setHeader("Retry-After", String(Math.ceil(retryAfter)));
    res
      .status(PROBLEMS[problem.slug].status)
      .type("application/problem+json")
      .send(JSON.stringify(presentProblem(problem, req.requestId)));
  };
}

/** Answers `not-found` for a path that no endpoint has. */
export const unknownPath: RequestHandler = (_req, _res, next) => {
  next(new ProblemError("not-found"));
};

function presentProblem(problem: ProblemError, requestId: string): ProblemDocument {
  const { status, title } = PROBLEMS[problem.slug];
  return {
    ...problem.extensions,
    type: `/problems/${problem.slug}`,
    title,
    status,
    ...(problem.detail !== undefined && { detail: problem.detail }),
    instance: requestId,
    ...(problem.errors !== undefined && { errors: [...problem.errors] }),
  };
}
