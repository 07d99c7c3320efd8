import { and, eq, lt } from "drizzle-orm";
import type { Clock } from "../clock.ts";
import { type Db, inTransaction } from "../db/connection.ts";
import { idempotencyKeys } from "../db/schema/index.ts";

export interface KeptAnswer {
  readonly requestHash: string;
  readonly status: number;
  readonly body: string;
}

/** Answers of idempotent requests by person and key. */
export interface AnswerStore {
  find(userId: string, key: string): KeptAnswer | null;
  keep(userId: string, key: string, answer: KeptAnswer): void;
  /** Runs `work` in one transaction of the same database, so that writes and their answer stand or fall together. */
  transact<T>(work: () => T): T;
  /** Forgets what is older than two days; a retry never comes that late. */
  prune(): void;
}

const KEEP_MS = 48 * 60 * 60 * 1000;

/** Keeps answers in the database, so that a retry after a crash finds them too. */
export function createAnswerStore(db: Db, clock: Clock): AnswerStore {
  return {
    find(userId, key) {
      const row = db
        .select()
        .from(idempotencyKeys)
        .where(and(eq(idempotencyKeys.userId, userId), eq(idempotencyKeys.key, key)))
        .get();
      return row ? { requestHash: row.requestHash, status: row.status, body: row.response } : null;
    },
    keep(userId, key, answer) {
      const { requestHash, status, body } = answer;
      db.insert(idempotencyKeys)
        .values({ userId, key, requestHash, status, response: body, createdAt: clock.now() })
        .run();
    },
    transact: (work) => inTransaction(db, work),
    prune() {
      db.delete(idempotencyKeys)
        .where(lt(idempotencyKeys.createdAt, clock.now() - KEEP_MS))
        .run();
    },
  };
}
