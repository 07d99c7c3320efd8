import type { Session } from "../../../shared/contracts/auth.ts";
import { ClassIdSchema, type UserId } from "../../../shared/ids.ts";
import { ProblemError } from "../../../shared/problem.ts";
import { type Db, inTransaction } from "../../db/connection.ts";
import type { FeatureDeps } from "../../deps.ts";
import type { Actor } from "../../http/actor.ts";
import { appendAudit } from "../../identity/audit-log.ts";
import { findPassphraseFault, findPasswordFault } from "../../identity/secret-policy.ts";
import type { SecretHasher } from "../../identity/secret-hasher.ts";
import { endSessionsOf, type LiveSession, type Sessions } from "../../identity/sessions.ts";
import { fieldProblem } from "../../work/field-problem.ts";
import type { SignInLimits } from "../../identity/sign-in-limits.ts";
import {
  type Account,
  findOpenReset,
  findStaffAccount,
  findStudentAccount,
  getAccount,
  getPlace,
  updateSecret,
  useReset,
} from "./auth.queries.ts";

export interface AuthDeps extends FeatureDeps {
  readonly sessions: Sessions;
  readonly hasher: SecretHasher;
  readonly limits: SignInLimits;
}

/** Checks a student's words and gives their id. Throws `wrong-sign-in`, `slow-down` or `busy`. */
export async function checkStudentSignIn(
  deps: AuthDeps,
  input: { classCode: string; username: string; passphrase: string },
  address: string,
): Promise<UserId> {
  const account = findStudentAccount(deps.db, input.classCode, input.username);
  const parts = toAccountParts(account, [input.classCode, input.username]);
  return checkSecret(deps, {
    account,
    parts,
    secretHash: account?.secretHash ?? null,
    secret: input.passphrase,
    address,
  });
}

/** Checks a staff password and gives the person's id. Throws `wrong-sign-in`, `slow-down` or `busy`. */
export async function checkStaffSignIn(
  deps: AuthDeps,
  input: { email: string; password: string },
  address: string,
): Promise<UserId> {
  const account = findStaffAccount(deps.db, input.email);
  const parts = toAccountParts(account, [input.email.toLowerCase()]);
  return checkSecret(deps, {
    account,
    parts,
    secretHash: account?.secretHash ?? null,
    secret: input.password,
    address,
  });
}

/**
 * Uses a one-time code to set new words: the code is spent, every session of the student ends and
 * failures are forgotten. Throws `invalid-request` for weak words, `wrong-sign-in` for a code that
 * is wrong, spent or too old, `slow-down` or `busy`.
 */
export async function redeemReset(
  deps: AuthDeps,
  input: { classCode: string; username: string; code: string; passphrase: string },
  address: string,
): Promise<UserId> {
  const fault = findPassphraseFault(input.passphrase, [input.username, input.classCode]);
  if (fault !== null) throw fieldProblem("/passphrase", fault);
  const account = findStudentAccount(deps.db, input.classCode, input.username);
  const reset = account ? findOpenReset(deps.db, account.id) : undefined;
  const isOpen = reset !== undefined && deps.clock.now() < reset.expiresAt;
  const userId = await checkSecret(deps, {
    account,
    // Apart from sign-in: an account that is locked there is opened by the code.
    parts: ["reset", ...toAccountParts(account, [input.classCode, input.username])],
    secretHash: isOpen ? reset.codeHash : null,
    secret: input.code,
    address,
  });
  const secretHash = await deps.hasher.hash(input.passphrase);
  const at = deps.clock.now();
  inTransaction(deps.db, (tx) => {
    if (!reset || !useReset(tx, reset.id, at))
      throw new ProblemError("wrong-sign-in", { detail: "This code was used already." });
    updateSecret(tx, userId, secretHash);
    endSessionsOf(tx, userId);
    appendAudit(tx, { at, actorId: userId, event: "reset-redeemed", subject: userId });
  });
  deps.limits.forget(["user", userId]);
  return userId;
}

/**
 * Sets a new staff password and ends the person's other sessions. Throws `wrong-sign-in` when the
 * current one is wrong, `invalid-request` when the new one is easy to guess, `slow-down` or `busy`.
 */
export async function changePassword(
  deps: AuthDeps,
  actor: Actor,
  input: { current: string; next: string; sessionId: string },
  address: string,
): Promise<void> {
  const account = getAccount(deps.db, actor.userId);
  const fault =
    input.next === input.current
      ? "This is the password you have now."
      : findPasswordFault(input.next, [account.displayName, account.email ?? ""]);
  if (fault !== null) throw fieldProblem("/next", fault);
  await checkSecret(deps, {
    account,
    parts: ["change", account.id],
    secretHash: account.secretHash,
    secret: input.current,
    address,
  });
  const secretHash = await deps.hasher.hash(input.next);
  inTransaction(deps.db, (tx) => {
    updateSecret(tx, account.id, secretHash);
    endSessionsOf(tx, actor.userId, input.sessionId);
    appendAudit(tx, { at: deps.clock.now(), actorId: account.id, event: "password-changed", subject: account.id });
  });
}

/** The session as its owner sees it. */
export function presentSession(db: Db, session: LiveSession): Session {
  const place = getPlace(db, session.userId, session.schoolId);
  return {
    user: {
      id: session.userId,
      displayName: session.displayName,
      roles: [...session.roles],
      schoolId: session.schoolId,
      schoolName: place.schoolName,
      classes: place.classes.map((row) => ({ id: ClassIdSchema.parse(row.id), name: row.name, code: row.code })),
    },
    endsAt: session.endsAt,
    idleEndsAt: session.idleEndsAt,
  };
}

interface SecretCheck {
  readonly account: Account | null;
  readonly parts: readonly string[];
  readonly secretHash: string | null;
  readonly secret: string;
  readonly address: string;
}

/** The same work and the same answers whether the account exists, is disabled, or the secret is wrong. */
async function checkSecret({ limits, hasher }: AuthDeps, check: SecretCheck): Promise<UserId> {
  const attempt = limits.begin(check.parts, check.address);
  const isRight = await hasher.verify(check.secretHash, check.secret).catch((error: unknown) => {
    attempt.cancel();
    throw error;
  });
  if (!isRight || check.account === null || check.account.isDisabled) return attempt.fail();
  attempt.succeed();
  return check.account.id;
}

/** A known account has one set of failures, whichever class code it is tried with. */
function toAccountParts(account: Account | null, typed: readonly string[]): string[] {
  return account ? ["user", account.id] : ["typed", ...typed];
}
