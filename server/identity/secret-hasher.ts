import { hash, verify } from "@node-rs/argon2";
import { ProblemError } from "../../shared/problem.ts";

/**
 * argon2id (the default of the package) with 19 MiB, two passes and one lane: the least that the OWASP Password Storage Cheat
 * Sheet asks for. One hash takes some 30 ms of one core.
 */
const ARGON2 = { memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const;

/** At most this many at a time: the thread pool has four, and one stays free for other work. */
const CONCURRENCY = 3;
/** A whole year group may wait; beyond that somebody is flooding and an honest answer is "busy". */
const QUEUE_LIMIT = 400;
const BUSY_RETRY_SECONDS = 5;

/** Hashes and checks passphrases and passwords, a few at a time. */
export interface SecretHasher {
  /** PHC string of argon2id with a fresh salt. Throws `busy` when too many are waiting. */
  hash(secret: string): Promise<string>;
  /**
   * Whether the secret fits. Without a hash (no such account) the same work is done and the answer is
   * false, so that time does not tell which names exist. Throws `busy` as `hash` does.
   */
  verify(secretHash: string | null, secret: string): Promise<boolean>;
}

export function createSecretHasher(): SecretHasher {
  const limit = createLimiter(CONCURRENCY, QUEUE_LIMIT);
  // Made with the first check of all, whatever account that is for.
  let dummy: Promise<string> | null = null;
  return {
    hash: (secret) => limit(() => hash(normalize(secret), ARGON2)),
    verify: (secretHash, secret) =>
      limit(async () => {
        dummy ??= hash("no account has this secret", ARGON2);
        const isRight = await verify(secretHash ?? (await dummy), normalize(secret));
        return isRight && secretHash !== null;
      }),
  };
}

/** One form for one text, whichever keyboard it came from. Source: NIST SP 800-63B-4, 3.1.1.2. */
function normalize(secret: string): string {
  return secret.normalize("NFKC");
}

function createLimiter(concurrency: number, queueLimit: number) {
  const waiting: (() => void)[] = [];
  let running = 0;
  return async <T>(work: () => Promise<T>): Promise<T> => {
    if (running >= concurrency) {
      if (waiting.length >= queueLimit) {
        throw new ProblemError("busy", {
          detail: "Very many people are signing in. Please try again in a moment.",
          extensions: { retryAfterSeconds: BUSY_RETRY_SECONDS },
        });
      }
      await new Promise<void>((resolve) => waiting.push(resolve));
    }
    running++;
    try {
      return await work();
    } finally {
      running--;
      waiting.shift()?.();
    }
  };
}
