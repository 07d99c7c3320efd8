import { randomBytes } from "node:crypto";
import type { RequestHandler } from "express";

/**
 * Gives every request a random id of its own (a caller's header is not trusted) and sends it back as
 * `X-Request-Id`, so that a person can quote it and the admin can find the log line.
 */
export const requestId: RequestHandler = (req, res, next) => {
  req.requestId = randomBytes(9).toString("base64url");
  res.setHeader("X-Request-Id", req.requestId);
  next();
};
