import express, { type RequestHandler } from "express";
import { SCRIPT_LIMIT_BYTES } from "../../shared/contracts/common.ts";
import { ProblemError } from "../../shared/problem.ts";

/** In JSON a quote or a line end takes two bytes, so the largest script can double; the rest is slack. */
export const JSON_LIMIT_BYTES = 2 * SCRIPT_LIMIT_BYTES + 16 * 1024;

const parseJson = express.json({ limit: JSON_LIMIT_BYTES, type: "application/json", strict: true });

/**
 * Reads a JSON body. Any other media type is refused, since a form of another site can send those
 * without asking first. Problems: `malformed-request`, `too-large` (see `toProblem`).
 */
export const jsonBody: RequestHandler = (req, res, next) => {
  const hasBody = req.headers["transfer-encoding"] !== undefined || Number(req.headers["content-length"] ?? 0) > 0;
  if (hasBody && !req.is("application/json")) {
    next(new ProblemError("malformed-request", { detail: "Send the body as application/json." }));
    return;
  }
  parseJson(req, res, next);
};
