import type { SignInCard } from "../../../shared/contracts/classes.ts";
import { UserIdSchema } from "../../../shared/ids.ts";
import { ProblemError } from "../../../shared/problem.ts";
import { inTransaction } from "../../db/connection.ts";
import { newId } from "../../db/schema/columns.ts";
import type { FeatureDeps } from "../../deps.ts";
import type { Actor } from "../../http/actor.ts";
import { appendAudit } from "../../identity/audit-log.ts";
import { dealOneTimeCode, dealPassphrase } from "../../identity/passphrases.ts";
import type { SecretHasher } from "../../identity/secret-hasher.ts";
import { endSessionsOf } from "../../identity/sessions.ts";
import type { SignInLimits } from "../../identity/sign-in-limits.ts";
import { makeUsername } from "../../identity/usernames.ts";
import {
  deleteOpenResets,
  insertReset,
  insertStudent,
  listStudents,
  listUsernames,
  updateSecret,
} from "./classes.queries.ts";
import { getOwnClass, getStudentOf } from "./classes.service.ts";

export interface ClassesDeps extends FeatureDeps {
  readonly hasher: SecretHasher;
  readonly limits: SignInLimits;
}

/** How long a one-time code is good for: a lesson and a bit. */
const RESET_LIFE_MS = 60 * 60 * 1000;

/**
 * Adds students by display name, each with a username of its own in the class and freshly dealt words.
 * The words are in the answer and nowhere else. Throws `not-found` or `busy`.
 */
export async function addStudents(
  deps: ClassesDeps,
  actor: Actor,
  input: { classId: string; displayNames: readonly string[] },
): Promise<SignInCard[]> {
  const { db, clock } = deps;
  getOwnClass(db, actor, input.classId);
  const secrets = await dealSecrets(deps, input.displayNames.length);
  return inTransaction(db, (tx) => {
    // Loaded again: it may have changed while the words were hashed.
    const row = getOwnClass(tx, actor, input.classId);
    const taken = listUsernames(tx, row.id);
    const cards = input.displayNames.map((displayName, index) => {
      const secret = secrets[index];
      if (!secret) throw new Error("Each student gets words.");
      const username = makeUsername(displayName, taken);
      taken.add(username);
      const id = newId();
      const { schoolId } = row;
      insertStudent(
        tx,
        { id, schoolId, displayName, username, secretHash: secret.secretHash, createdAt: clock.now() },
        row.id,
      );
      return {
        studentId: UserIdSchema.parse(id),
        displayName,
        classCode: row.code,
        username,
        passphrase: secret.passphrase,
      };
    });
    const detail = { count: cards.length };
    appendAudit(tx, { at: clock.now(), actorId: actor.userId, event: "students-added", subject: row.id, detail });
    return cards;
  });
}

/**
 * Deals new words for these students of the class; old words, codes and sessions stop working.
 * Throws `not-found` when one of them is not in the class (nothing is changed then), or `busy`.
 */
export async function makeCards(
  deps: ClassesDeps,
  actor: Actor,
  input: { classId: string; studentIds: readonly string[] },
): Promise<SignInCard[]> {
  const { db, clock } = deps;
  const wanted = new Set<string>(input.studentIds);
  const listWanted = () =>
    listStudents(db, getOwnClass(db, actor, input.classId).id).filter((student) => wanted.has(student.id));
  if (listWanted().length !== wanted.size) throw new ProblemError("not-found");
  const secrets = await dealSecrets(deps, wanted.size);
  return inTransaction(db, (tx) => {
    const row = getOwnClass(tx, actor, input.classId);
    const students = listWanted();
    if (students.length !== wanted.size) throw new ProblemError("not-found");
    const cards = students.map((student, index) => {
      const secret = secrets[index];
      if (!secret) throw new Error("Each student gets words.");
      const studentId = UserIdSchema.parse(student.id);
      updateSecret(tx, studentId, secret.secretHash);
      deleteOpenResets(tx, studentId);
      endSessionsOf(tx, studentId);
      deps.limits.forget(["user", studentId]);
      const { displayName, username } = student;
      return { studentId, displayName, classCode: row.code, username: username ?? "", passphrase: secret.passphrase };
    });
    const detail = { count: cards.length };
    appendAudit(tx, { at: clock.now(), actorId: actor.userId, event: "cards-made", subject: row.id, detail });
    return cards;
  });
}

/**
 * Makes a one-time code with which the student chooses new words, and ends their sessions. The
 * teacher sees the code and never the words. Failures are forgotten: a locked account opens.
 * Throws `not-found` or `busy`.
 */
export async function resetSignIn(
  deps: ClassesDeps,
  actor: Actor,
  input: { classId: string; studentId: string },
): Promise<{ code: string; expiresAt: number }> {
  const { db, clock, limits } = deps;
  const getStudent = () => getStudentOf(db, getOwnClass(db, actor, input.classId).id, input.studentId);
  getStudent();
  const code = dealOneTimeCode();
  const codeHash = await deps.hasher.hash(code);
  const expiresAt = clock.now() + RESET_LIFE_MS;
  inTransaction(db, (tx) => {
    const studentId = UserIdSchema.parse(getStudent().id);
    deleteOpenResets(tx, studentId);
    insertReset(tx, { userId: studentId, codeHash, expiresAt, madeBy: actor.userId });
    endSessionsOf(tx, studentId);
    limits.forget(["user", studentId]);
    limits.forget(["reset", "user", studentId]);
    appendAudit(tx, { at: clock.now(), actorId: actor.userId, event: "reset-made", subject: studentId });
  });
  return { code, expiresAt };
}

async function dealSecrets(
  { hasher }: ClassesDeps,
  count: number,
): Promise<{ passphrase: string; secretHash: string }[]> {
  const passphrases = Array.from({ length: count }, dealPassphrase);
  return Promise.all(
    passphrases.map(async (passphrase) => ({ passphrase, secretHash: await hasher.hash(passphrase) })),
  );
}
