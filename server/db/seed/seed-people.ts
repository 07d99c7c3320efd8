import type { FeatureDeps } from "../../deps.ts";
import { createSecretHasher } from "../../identity/secret-hasher.ts";
import { inTransaction } from "../connection.ts";
import { newId } from "../schema/columns.ts";
import { classes, classTeachers, consents, enrolments, schools, userRoles, users } from "../schema/index.ts";
import { CLASSES, SCHOOLS, STAFF, STUDENTS } from "./world/people.ts";
import type { SeedDay } from "./seed-day.ts";

/** Ids of the seeded people and classes by their key in the demo world. */
export interface SeededPeople {
  /** Keys of staff ("marlow") and of students ("7B-TARN/wren"). */
  readonly userIds: ReadonlyMap<string, string>;
  readonly classIds: ReadonlyMap<string, string>;
}

const YEAR_START_DAY = -90;
const LAST_LESSON_DAYS = 4;

/** Adds schools, staff, classes, students, roles, enrolments and the families' answers. */
export async function seedPeople({ db, clock }: FeatureDeps, day: SeedDay): Promise<SeededPeople> {
  const hasher = createSecretHasher();
  const secrets = await Promise.all(
    [...STAFF.map((one) => one.password), ...STUDENTS.map((one) => one.passphrase)].map((secret) =>
      hasher.hash(secret),
    ),
  );
  const hashes = secrets.values();
  const schoolIds = new Map(SCHOOLS.map((school) => [school.key, newId()]));
  const classIds = new Map(CLASSES.map((one) => [one.code as string, newId()]));
  const userIds = new Map([...STAFF, ...STUDENTS].map((one) => [one.key, newId()]));
  const idOf = (ids: ReadonlyMap<string, string>, key: string) => {
    const id = ids.get(key);
    if (id === undefined) throw new Error(`The demo world names "${key}", which it does not have.`);
    return id;
  };
  const createdAt = day.at(YEAR_START_DAY, "09:00");

  inTransaction(db, (tx) => {
    for (const { key, name, shortName, timeZone } of SCHOOLS)
      tx.insert(schools)
        .values({ id: idOf(schoolIds, key), name, shortName, timeZone })
        .run();
    for (const one of STAFF) {
      const id = idOf(userIds, one.key);
      const schoolId = one.school && idOf(schoolIds, one.school);
      tx.insert(users)
        .values({
          id,
          schoolId,
          displayName: one.displayName,
          email: one.email,
          secretHash: hashes.next().value,
          createdAt,
        })
        .run();
      for (const role of one.roles) tx.insert(userRoles).values({ userId: id, role }).run();
    }
    for (const one of CLASSES) {
      const id = idOf(classIds, one.code);
      tx.insert(classes)
        .values({ id, schoolId: idOf(schoolIds, one.school), name: one.name, code: one.code })
        .run();
      for (const teacher of one.teachers)
        tx.insert(classTeachers)
          .values({ classId: id, userId: idOf(userIds, teacher) })
          .run();
    }
    STUDENTS.forEach((one, n) => {
      const id = idOf(userIds, one.key);
      const lastSeenAt = day.before(-1 - (n % LAST_LESSON_DAYS), "11:40");
      tx.insert(users)
        .values({
          id,
          schoolId: idOf(schoolIds, one.school),
          displayName: one.displayName,
          username: one.username,
          secretHash: hashes.next().value,
          createdAt,
          lastSeenAt,
        })
        .run();
      tx.insert(userRoles).values({ userId: id, role: "student" }).run();
      tx.insert(enrolments)
        .values({ classId: idOf(classIds, one.classCode), userId: id })
        .run();
      if (one.consent !== "open") {
        tx.insert(consents)
          .values({
            userId: id,
            isNamePublic: one.consent === "yes",
            recordedBy: idOf(userIds, teacherOf(one.classCode)),
            recordedAt: clock.now(),
          })
          .run();
      }
    });
  });
  return { userIds, classIds };
}

/** Key of the first teacher of a class. */
export function teacherOf(classCode: string): string {
  const [teacher] = CLASSES.find((one) => one.code === classCode)?.teachers ?? [];
  if (teacher === undefined) throw new Error(`Class ${classCode} of the demo world has no teacher.`);
  return teacher;
}
