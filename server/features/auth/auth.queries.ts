import { and, asc, eq, inArray, sql } from "drizzle-orm";
import type { Role } from "../../../shared/roles.ts";
import type { Db } from "../../db/connection.ts";
import { classes, classTeachers, enrolments, schools, signInResets, userRoles, users } from "../../db/schema/index.ts";

/** What signing in needs to know of an account. */
export interface Account {
  readonly id: string;
  readonly secretHash: string | null;
  readonly isDisabled: boolean;
  readonly displayName: string;
}

const accountColumns = {
  id: users.id,
  secretHash: users.secretHash,
  isDisabled: users.isDisabled,
  displayName: users.displayName,
};

/** The student with this username in the class of this code. */
export function findStudentAccount(db: Db, classCode: string, username: string): Account | null {
  const row = db
    .select(accountColumns)
    .from(enrolments)
    .innerJoin(classes, eq(classes.id, enrolments.classId))
    .innerJoin(users, eq(users.id, enrolments.userId))
    .innerJoin(userRoles, and(eq(userRoles.userId, users.id), eq(userRoles.role, "student")))
    .where(and(eq(classes.code, classCode), eq(users.username, username)))
    .get();
  return row ?? null;
}

const STAFF_ROLES: Role[] = ["teacher", "coordinator", "admin"];

/** The staff account with this e-mail, whatever its capitals. */
export function findStaffAccount(db: Db, email: string): Account | null {
  const row = db
    .select(accountColumns)
    .from(users)
    .innerJoin(userRoles, and(eq(userRoles.userId, users.id), inArray(userRoles.role, STAFF_ROLES)))
    .where(eq(sql`lower(${users.email})`, email.toLowerCase()))
    .get();
  return row ?? null;
}

export function getAccount(db: Db, userId: string): Account & { readonly email: string | null } {
  const row = db
    .select({ ...accountColumns, email: users.email })
    .from(users)
    .where(eq(users.id, userId))
    .get();
  if (!row) throw new Error("A signed-in person has an account.");
  return row;
}

/** The school's name and the classes that the person is in or teaches. */
export function getPlace(db: Db, userId: string, schoolId: string | null) {
  const school =
    schoolId === null
      ? undefined
      : db.select({ name: schools.name }).from(schools).where(eq(schools.id, schoolId)).get();
  const columns = { id: classes.id, name: classes.name, code: classes.code };
  const enrolled = db
    .select(columns)
    .from(classes)
    .innerJoin(enrolments, eq(enrolments.classId, classes.id))
    .where(eq(enrolments.userId, userId));
  const taught = db
    .select(columns)
    .from(classes)
    .innerJoin(classTeachers, eq(classTeachers.classId, classes.id))
    .where(eq(classTeachers.userId, userId));
  return { schoolName: school?.name ?? null, classes: enrolled.union(taught).orderBy(asc(classes.name)).all() };
}

/** The unused one-time code of a student, whether it is still valid or not; making one drops the one before. */
export function findOpenReset(db: Db, userId: string) {
  return db
    .select()
    .from(signInResets)
    .where(and(eq(signInResets.userId, userId), sql`${signInResets.usedAt} is null`))
    .get();
}

/** Marks a code as used. False when another request was faster. */
export function useReset(db: Db, resetId: string, at: number): boolean {
  const { changes } = db
    .update(signInResets)
    .set({ usedAt: at })
    .where(and(eq(signInResets.id, resetId), sql`${signInResets.usedAt} is null`))
    .run();
  return changes === 1;
}

export function updateSecret(db: Db, userId: string, secretHash: string): void {
  db.update(users).set({ secretHash }).where(eq(users.id, userId)).run();
}
