import { createHash } from "node:crypto";
import type { Request } from "express";
import { ProblemError } from "../../shared/problem.ts";
import type { Actor } from "./actor.ts";
import type { AnswerStore } from "./answer-store.ts";

export interface Answer {
  readonly status: number;
  readonly body: string;
}

/** Runs writes in one transaction together with keeping their answer for retries. */
export type Commit = <T>(work: () => T, toAnswer: (result: T) => Answer) => T;

const KEY_PATTERN = /^[A-Za-z0-9_-]{8,80}$/;

/**
 * Answers a request once: a retry with the same key gets the first answer again, also while the first
 * is still being worked on, and also after a crash if the answer was kept by `commit`. The same key
 * for another request is `key-reused`; a missing or odd key is `malformed-request`. Problems are not
 * kept: a retry tries again. Source: the Idempotency-Key header of the IETF HTTPAPI working group.
 */
export function createAnswerOnce(answers: AnswerStore) {
  const inFlight = new Map<string, { requestHash: string; answer: Promise<Answer> }>();

  return async (req: Request, actor: Actor, work: (commit: Commit) => Promise<Answer>): Promise<Answer> => {
    const key = req.get("idempotency-key");
    if (key === undefined || !KEY_PATTERN.test(key)) {
      throw new ProblemError("malformed-request", {
        detail: "Send an Idempotency-Key of 8 to 80 letters, numbers, hyphens or underscores.",
      });
    }
    const requestHash = hashRequest(req);
    const slot = `${actor.userId} ${key}`;
    const running = inFlight.get(slot);
    const known = running ?? answers.find(actor.userId, key);
    if (known && known.requestHash !== requestHash) {
      throw new ProblemError("key-reused", { detail: "Use a new Idempotency-Key for a new request." });
    }
    if (running) return running.answer;
    if (known && "status" in known) return known;

    let isKept = false;
    const keep = (answer: Answer) => {
      answers.keep(actor.userId, key, { ...answer, requestHash });
      isKept = true;
    };
    const commit: Commit = (write, toAnswer) =>
      answers.transact(() => {
        const result = write();
        keep(toAnswer(result));
        return result;
      });
    const answer = work(commit).then((made) => {
      if (!isKept) keep(made);
      return made;
    });
    inFlight.set(slot, { requestHash, answer });
    try {
      return await answer;
    } finally {
      inFlight.delete(slot);
    }
  };
}

function hashRequest(req: Request): string {
  const body = JSON.stringify((req.body as unknown) ?? null);
  return createHash("sha256").update(`${req.method} ${req.originalUrl}\n${body}`).digest("hex");
}
