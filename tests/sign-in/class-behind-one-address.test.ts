import { afterEach, beforeAll, beforeEach, describe, expect, it } from "vitest";
import { createSecretHasher } from "../../server/identity/secret-hasher.ts";
import { authContract } from "../../shared/contracts/auth.ts";
import { buildClass, buildUser } from "../support/factories.ts";
import { createTestServer, type TestServer } from "../support/test-server.ts";

/**
 * A school sends everybody from one address. Guessing has to be slowed, and a class must get in all
 * the same. supertest calls from 127.0.0.1, so every call here shares one address.
 */

const CLASS_SIZE = 30;
const GUESSES = 1000;
const LONG = 180_000;
/** The longest wait of an account that is not locked. */
const LONGEST_WAIT_MS = 60_000;

let hashes: string[];
beforeAll(async () => {
  const hasher = createSecretHasher();
  hashes = await Promise.all(Array.from({ length: CLASS_SIZE }, (_, index) => hasher.hash(wordsOf(index))));
}, LONG);

let server: TestServer;
beforeEach(() => {
  server = createTestServer();
  const pupils = hashes.map((secretHash, index) => buildUser(server.db, { username: `pupil${index}`, secretHash }));
  buildClass(server.db, { code: "7B-TARN", studentIds: pupils.map((pupil) => pupil.id) });
});
afterEach(() => server.dispose());

function wordsOf(index: number): string {
  return `acorn-lantern-river-maple${index}`;
}

async function signIn(index: number, passphrase = wordsOf(index)): Promise<number> {
  const body = { classCode: "7B-TARN", username: `pupil${index}`, passphrase };
  return (await server.call(authContract.studentSignIn, { body })).status;
}

const pupils = Array.from({ length: CLASS_SIZE }, (_, index) => index);
const mistypes = (index: number) => index % 5 === 0;

/** Signs in; a fifth of the class mistypes twice first. */
async function signInAsPupil(index: number): Promise<number> {
  if (mistypes(index)) {
    expect(await signIn(index, "acorn-lantern-river-mople")).toBe(401);
    expect(await signIn(index, "acorn-lantern")).toBe(401);
  }
  return signIn(index);
}

describe("a class of 30 behind one address", () => {
  it(
    "gets in one after the other, a fifth after two wrong tries",
    async () => {
      for (const index of pupils) expect(await signInAsPupil(index)).toBe(200);
    },
    LONG,
  );

  it(
    "gets in all at once, a fifth after two wrong tries",
    async () => {
      const statuses = await Promise.all(pupils.map(signInAsPupil));
      expect(statuses).toEqual(pupils.map(() => 200));
    },
    LONG,
  );
});

describe("1 000 guesses from the address of a class", () => {
  /** Sends the guesses in lots of 50, as fast as they are answered; counts answers by status. */
  async function guess(target: (guess: number) => number): Promise<Map<number, number>> {
    const counts = new Map<number, number>();
    for (let start = 0; start < GUESSES; start += 50) {
      const lot = Array.from({ length: 50 }, (_, n) => signIn(target(start + n), `guess-number-${start + n}`));
      for (const status of await Promise.all(lot)) counts.set(status, (counts.get(status) ?? 0) + 1);
    }
    return counts;
  }

  it(
    "at one account are slowed after the fifth, and everybody else gets in at once",
    async () => {
      const counts = await guess(() => 0);
      expect(counts).toEqual(
        new Map([
          [401, 5],
          [429, GUESSES - 5],
        ]),
      );
      for (const index of pupils.slice(1)) expect(await signInAsPupil(index)).toBe(200);
      server.clock.advance(LONGEST_WAIT_MS);
      expect(await signIn(0)).toBe(200);
    },
    LONG,
  );

  it(
    "across all accounts are slowed after five each, and the class gets in when the waits are over",
    async () => {
      const counts = await guess((n) => n % CLASS_SIZE);
      expect(counts).toEqual(
        new Map([
          [401, 5 * CLASS_SIZE],
          [429, GUESSES - 5 * CLASS_SIZE],
        ]),
      );
      server.clock.advance(LONGEST_WAIT_MS);
      for (const index of pupils) expect(await signIn(index)).toBe(200);
    },
    LONG,
  );

  it(
    "over many names turn into 429 alone, and the class still gets in with the right words",
    async () => {
      const guessName = (n: number) =>
        server.call(authContract.studentSignIn, {
          body: { classCode: "7B-TARN", username: `nobody${n}`, passphrase: "acorn-lantern" },
        });
      // 300 wrong tries in ten minutes are what one address has; no account reaches its own limit.
      for (let start = 0; start < 300; start += 50) {
        const lot = await Promise.all(Array.from({ length: 50 }, (_, n) => guessName(start + n)));
        expect(new Set(lot.map((answer) => answer.status))).toEqual(new Set([401]));
      }
      expect((await guessName(300)).status).toBe(429);
      expect(await signIn(1, "one more guess")).toBe(429);
      for (const index of pupils) expect(await signIn(index)).toBe(200);
    },
    LONG,
  );
});
