import { createHash } from "node:crypto";
import { type DestinationStream, type Logger, pino } from "pino";
import type { Config } from "./config.ts";

/**
 * The server's log: one JSON object a line. It carries no names, addresses, bodies, tokens or script
 * text; a person appears as `toLogId(userId)` only.
 */
export function createLog(level: Config["logLevel"], destination?: DestinationStream): Logger {
  const options = { level, base: null, timestamp: pino.stdTimeFunctions.isoTime };
  return destination ? pino(options, destination) : pino(options);
}

/** Ten hex digits that tell people apart in the log without naming a row of the database. */
export function toLogId(userId: string): string {
  return createHash("sha256").update(`log:${userId}`).digest("hex").slice(0, 10);
}
