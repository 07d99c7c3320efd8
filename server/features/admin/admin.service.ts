import type { AuditRow, StaffRow } from "../../../shared/contracts/admin.ts";
import { SchoolIdSchema, type UserId, UserIdSchema } from "../../../shared/ids.ts";
import { ProblemError } from "../../../shared/problem.ts";
import type { Role } from "../../../shared/roles.ts";
import { type Db, inTransaction } from "../../db/connection.ts";
import { newId } from "../../db/schema/columns.ts";
import type { FeatureDeps } from "../../deps.ts";
import { AUDIT_EVENTS } from "../../identity/audit-events.ts";
import { appendAudit, verifyAuditChain } from "../../identity/audit-log.ts";
import type { SecretHasher } from "../../identity/secret-hasher.ts";
import { findPasswordFault } from "../../identity/secret-policy.ts";
import { endSessionsOf } from "../../identity/sessions.ts";
import { fieldProblem } from "../../work/field-problem.ts";
import {
  findLastBackupAt,
  findSchoolById,
  findStaff,
  getDatabaseFacts,
  insertStaff,
  isEmailTaken,
  listAuditRows,
  listSchools,
  listStaff,
  updateDisabled,
} from "./admin.queries.ts";

export interface AdminDeps extends FeatureDeps {
  readonly hasher: SecretHasher;
}

export interface NewStaff {
  readonly displayName: string;
  readonly email: string;
  readonly roles: readonly Exclude<Role, "student">[];
  readonly schoolId: string | null;
  readonly password: string;
}

/** Rows of the audit log on one page. */
const AUDIT_PAGE = 50;

/** Schools, staff and the state of the database. */
export function getOverview(db: Db) {
  return {
    schools: listSchools(db).map((school) => ({ ...school, id: SchoolIdSchema.parse(school.id) })),
    staff: listStaff(db).map(presentStaff),
    database: { ...getDatabaseFacts(db), lastBackupAt: findLastBackupAt(db) },
  };
}

/**
 * Adds a staff account with its first password. `actorId` is null on the operator's command line.
 * Throws `invalid-request` for a weak password, an unknown school or a teacher without one,
 * `already-done` when the e-mail is taken, `busy`.
 */
export async function addStaff(deps: AdminDeps, actorId: UserId | null, input: NewStaff): Promise<StaffRow> {
  const { db, clock } = deps;
  assertNewStaff(db, input);
  const secretHash = await deps.hasher.hash(input.password);
  return inTransaction(db, (tx) => {
    assertNewStaff(tx, input);
    const id = newId();
    const { schoolId, displayName, email } = input;
    insertStaff(tx, { id, schoolId, displayName, email, secretHash, createdAt: clock.now() }, input.roles);
    const detail = { roles: input.roles.join(" ") };
    appendAudit(tx, { at: clock.now(), actorId, event: "staff-added", subject: id, detail });
    return getStaff(tx, id);
  });
}

/**
 * Disables an account, which ends its sessions at once, or enables it again. Throws `not-found` for
 * anybody who is not staff and `wrong-state` for one's own account: somebody has to be left.
 */
export function setDisabled(
  deps: FeatureDeps,
  actorId: UserId,
  input: { userId: string; isDisabled: boolean },
): StaffRow {
  const { db, clock } = deps;
  return inTransaction(db, (tx) => {
    const staff = getStaff(tx, input.userId);
    if (staff.id === actorId)
      throw new ProblemError("wrong-state", { detail: "You can not disable the account you are signed in with." });
    if (staff.isDisabled !== input.isDisabled) {
      updateDisabled(tx, staff.id, input.isDisabled);
      if (input.isDisabled) endSessionsOf(tx, staff.id);
      const event = input.isDisabled ? "staff-disabled" : "staff-enabled";
      appendAudit(tx, { at: clock.now(), actorId, event, subject: staff.id });
    }
    return getStaff(tx, staff.id);
  });
}

/** A page of the audit log, newest first, and whether the whole log is as it was written. */
export function getAuditPage(
  db: Db,
  before: number | undefined,
): { rows: AuditRow[]; hasMore: boolean; isChainWhole: boolean } {
  const rows = listAuditRows(db, { before, limit: AUDIT_PAGE + 1 });
  return {
    rows: rows.slice(0, AUDIT_PAGE).map((row) => ({ ...row, event: sayEvent(row.event) })),
    hasMore: rows.length > AUDIT_PAGE,
    isChainWhole: verifyAuditChain(db).isWhole,
  };
}

function sayEvent(event: string): string {
  return event in AUDIT_EVENTS ? AUDIT_EVENTS[event as keyof typeof AUDIT_EVENTS] : event;
}

function getStaff(db: Db, userId: string): StaffRow {
  const row = findStaff(db, userId);
  if (row === null) throw new ProblemError("not-found");
  return presentStaff(row);
}

function presentStaff(row: NonNullable<ReturnType<typeof findStaff>>): StaffRow {
  return {
    id: UserIdSchema.parse(row.id),
    displayName: row.displayName,
    email: row.email ?? "",
    roles: row.roles,
    schoolName: row.schoolName,
    isDisabled: row.isDisabled,
    lastSeenAt: row.lastSeenAt,
  };
}

function assertNewStaff(db: Db, input: NewStaff): void {
  const fault = findPasswordFault(input.password, [input.displayName, input.email]);
  if (fault !== null) throw fieldProblem("/password", fault);
  if (input.schoolId !== null && findSchoolById(db, input.schoolId) === null)
    throw fieldProblem("/schoolId", "There is no such school.");
  if (input.schoolId === null && input.roles.includes("teacher"))
    throw fieldProblem("/schoolId", "A teacher belongs to a school: choose one.");
  if (isEmailTaken(db, input.email))
    throw new ProblemError("already-done", { detail: "There is an account with this e-mail address." });
}
