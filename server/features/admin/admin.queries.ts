import { asc, count, desc, eq, inArray, lt, sql } from "drizzle-orm";
import type { Role } from "../../../shared/roles.ts";
import type { Db } from "../../db/connection.ts";
import { auditLog, classes, schools, userRoles, users } from "../../db/schema/index.ts";

const STAFF_ROLES: Role[] = ["teacher", "coordinator", "admin"];

const staffColumns = {
  id: users.id,
  displayName: users.displayName,
  email: users.email,
  schoolId: users.schoolId,
  schoolName: schools.name,
  isDisabled: users.isDisabled,
  lastSeenAt: users.lastSeenAt,
};

/** Everybody with a staff role, by name; `roles` in the order of the role list. */
export function listStaff(db: Db) {
  const roles = listStaffRoles(db);
  return db
    .select(staffColumns)
    .from(users)
    .leftJoin(schools, eq(schools.id, users.schoolId))
    .where(inArray(users.id, [...roles.keys()]))
    .orderBy(asc(users.displayName))
    .all()
    .map((row) => ({ ...row, roles: roles.get(row.id) ?? [] }));
}

/** One person of the staff, or null: also for students, whom teachers look after. */
export function findStaff(db: Db, userId: string) {
  return listStaff(db).find((row) => row.id === userId) ?? null;
}

function listStaffRoles(db: Db): Map<string, Role[]> {
  const roles = new Map<string, Role[]>();
  for (const row of db
    .select()
    .from(userRoles)
    .where(inArray(userRoles.role, STAFF_ROLES))
    .orderBy(asc(userRoles.role))
    .all()) {
    roles.set(row.userId, [...(roles.get(row.userId) ?? []), row.role]);
  }
  return roles;
}

/** Schools by name, with how many classes and students they have. */
export function listSchools(db: Db) {
  const classCounts = countBySchool(
    db.select({ schoolId: classes.schoolId, count: count() }).from(classes).groupBy(classes.schoolId).all(),
  );
  const studentCounts = countBySchool(
    db
      .select({ schoolId: users.schoolId, count: count() })
      .from(users)
      .innerJoin(userRoles, eq(userRoles.userId, users.id))
      .where(eq(userRoles.role, "student"))
      .groupBy(users.schoolId)
      .all(),
  );
  const rows = db.select({ id: schools.id, name: schools.name }).from(schools).orderBy(asc(schools.name)).all();
  return rows.map((row) => ({
    ...row,
    classCount: classCounts.get(row.id) ?? 0,
    studentCount: studentCounts.get(row.id) ?? 0,
  }));
}

function countBySchool(rows: readonly { schoolId: string | null; count: number }[]): Map<string | null, number> {
  return new Map(rows.map((row) => [row.schoolId, row.count]));
}

export function findSchoolById(db: Db, schoolId: string) {
  return db.select({ id: schools.id }).from(schools).where(eq(schools.id, schoolId)).get() ?? null;
}

export function isEmailTaken(db: Db, email: string): boolean {
  const row = db
    .select({ id: users.id })
    .from(users)
    .where(eq(sql`lower(${users.email})`, email.toLowerCase()))
    .get();
  return row !== undefined;
}

export function insertStaff(db: Db, row: typeof users.$inferInsert & { id: string }, roles: readonly Role[]): void {
  db.insert(users).values(row).run();
  for (const role of new Set(roles)) db.insert(userRoles).values({ userId: row.id, role }).run();
}

export function updateDisabled(db: Db, userId: string, isDisabled: boolean): void {
  db.update(users).set({ isDisabled }).where(eq(users.id, userId)).run();
}

/** Size of the database file and the version of SQLite that reads it. */
export function getDatabaseFacts(db: Db): { bytes: number; sqliteVersion: string } {
  return db.get<{ bytes: number; sqliteVersion: string }>(
    sql`select p.page_count * s.page_size as bytes, sqlite_version() as sqliteVersion from pragma_page_count() p, pragma_page_size() s`,
  );
}

export function findLastBackupAt(db: Db): number | null {
  const row = db
    .select({ at: auditLog.at })
    .from(auditLog)
    .where(eq(auditLog.event, "backup-made"))
    .orderBy(desc(auditLog.id))
    .limit(1)
    .get();
  return row?.at ?? null;
}

/** Rows of the audit log from newest to oldest, older than `before` if given, with the actor's name. */
export function listAuditRows(db: Db, options: { before: number | undefined; limit: number }) {
  return db
    .select({
      id: auditLog.id,
      at: auditLog.at,
      actorName: users.displayName,
      event: auditLog.event,
      subject: auditLog.subject,
    })
    .from(auditLog)
    .leftJoin(users, eq(users.id, auditLog.actorId))
    .where(options.before === undefined ? undefined : lt(auditLog.id, options.before))
    .orderBy(desc(auditLog.id))
    .limit(options.limit)
    .all();
}
