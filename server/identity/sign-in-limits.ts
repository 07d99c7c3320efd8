import { createHash } from "node:crypto";
import { eq, lt, sql } from "drizzle-orm";
import { ProblemError } from "../../shared/problem.ts";
import type { Clock } from "../clock.ts";
import { type Db, inTransaction } from "../db/connection.ts";
import { signInFailures } from "../db/schema/index.ts";
import type { AddressFailures } from "./address-failures.ts";
import { appendAudit } from "./audit-log.ts";

const SECOND_MS = 1000;
const DAY_MS = 24 * 60 * 60 * SECOND_MS;

/** So many wrong tries cost nothing: a person who mistypes is not made to wait. */
const FREE_FAILURES = 5;
/** While an address sends hundreds of wrong tries, accounts tried from there are free only so often. */
const FREE_FAILURES_UNDER_ATTACK = 2;
/** Then each wrong try makes the next one wait longer. */
const WAITS_MS = [5, 10, 30, 60].map((seconds) => seconds * SECOND_MS);
/** Then nothing more until a reset by the teacher, or a day. Source: NIST SP 800-63B-4, 3.2.2 (at most 100). */
const FAILURES_A_DAY = 50;
const WAIT_UNDER_ATTACK_SECONDS = 10;

const WRONG = "Check each part, also capitals and spaces, and try again.";

/** A try that has begun. It already counts as wrong, so that tries sent at once can not slip through. */
export interface SignInAttempt {
  /** Forgets the account's failures. */
  succeed(): void;
  /** Takes the try back: it could not be judged. */
  cancel(): void;
  /** Throws `wrong-sign-in`, or `slow-down` while the address is under attack. */
  fail(): never;
}

export interface SignInLimits {
  /**
   * Begins a try. `accountParts` name the account as it was typed, whether it exists or not, so that
   * waits do not tell which names exist. Throws `slow-down` when the account has to wait.
   */
  begin(accountParts: readonly string[], address: string): SignInAttempt;
  /** Forgets the failures of an account: a teacher has reset it. */
  forget(accountParts: readonly string[]): void;
  prune(): void;
}

/**
 * Limits on guessing. Waits belong to accounts. An address is only counted, never closed: a whole
 * class, or a whole district, sits behind one.
 */
export function createSignInLimits(db: Db, clock: Clock, addresses: AddressFailures): SignInLimits {
  return {
    begin(accountParts, address) {
      const key = toAccountKey(accountParts);
      const isUnderAttack = addresses.isOverLimit(address);
      const free = isUnderAttack ? FREE_FAILURES_UNDER_ATTACK : FREE_FAILURES;
      countTry(db, clock.now(), key, free);
      return {
        succeed: () => void db.delete(signInFailures).where(eq(signInFailures.accountKey, key)).run(),
        cancel: () =>
          void db
            .update(signInFailures)
            .set({ count: sql`max(${signInFailures.count} - 1, 0)` })
            .where(eq(signInFailures.accountKey, key))
            .run(),
        fail: () => {
          addresses.add(address);
          if (!isUnderAttack) throw new ProblemError("wrong-sign-in", { detail: WRONG });
          throw slowDown(
            WAIT_UNDER_ATTACK_SECONDS,
            "There were very many wrong tries from your network. Check what you typed and wait a moment.",
          );
        },
      };
    },
    forget(accountParts) {
      db.delete(signInFailures)
        .where(eq(signInFailures.accountKey, toAccountKey(accountParts)))
        .run();
    },
    prune() {
      db.delete(signInFailures)
        .where(lt(signInFailures.lastAt, clock.now() - DAY_MS))
        .run();
    },
  };
}

function countTry(db: Db, now: number, accountKey: string, free: number): void {
  inTransaction(db, (tx) => {
    const row = tx.select().from(signInFailures).where(eq(signInFailures.accountKey, accountKey)).get();
    const failures = row && now - row.lastAt < DAY_MS ? row.count : 0;
    const lastAt = row?.lastAt ?? 0;
    if (failures >= FAILURES_A_DAY) {
      throw slowDown(
        (lastAt + DAY_MS - now) / SECOND_MS,
        "Too many wrong tries today. Ask your teacher, or your admin, to reset your sign-in.",
      );
    }
    const waitMs = failures >= free ? (WAITS_MS[Math.min(failures - free, WAITS_MS.length - 1)] ?? 0) : 0;
    if (now < lastAt + waitMs) {
      const seconds = Math.ceil((lastAt + waitMs - now) / SECOND_MS);
      throw slowDown(seconds, `Too many wrong tries. Try again in ${seconds} seconds.`);
    }
    const count = failures + 1;
    tx.insert(signInFailures)
      .values({ accountKey, count, lastAt: now })
      .onConflictDoUpdate({ target: signInFailures.accountKey, set: { count, lastAt: now } })
      .run();
    // One row where a limit is reached; a row a try would let anybody fill the log.
    if (count === FREE_FAILURES)
      appendAudit(tx, { at: now, actorId: null, event: "sign-in-slowed", subject: accountKey });
    if (count === FAILURES_A_DAY)
      appendAudit(tx, { at: now, actorId: null, event: "sign-in-locked", subject: accountKey });
  });
}

/** A hash: people type their words into the wrong box, and those must not be kept. */
function toAccountKey(parts: readonly string[]): string {
  return createHash("sha256").update(JSON.stringify(parts)).digest("base64url").slice(0, 24);
}

function slowDown(seconds: number, detail: string): ProblemError {
  return new ProblemError("slow-down", { detail, extensions: { retryAfterSeconds: Math.ceil(seconds) } });
}
