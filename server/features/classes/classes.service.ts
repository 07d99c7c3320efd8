import type { ClassSummary, StudentRow } from "../../../shared/contracts/classes.ts";
import { ClassIdSchema, UserIdSchema } from "../../../shared/ids.ts";
import { ProblemError } from "../../../shared/problem.ts";
import { LESSONS } from "../../../lessons/index.ts";
import { type Db, inTransaction } from "../../db/connection.ts";
import { type Actor, assertRelation } from "../../http/actor.ts";
import { appendAudit } from "../../identity/audit-log.ts";
import { endSessionsOf } from "../../identity/sessions.ts";
import type { Clock } from "../../clock.ts";
import {
  type ClassRow,
  countShows,
  countStudents,
  countToMark,
  deleteEnrolment,
  findClass,
  isTeacherOf,
  listClassesOfTeacher,
  listStepsDone,
  listStudents,
} from "./classes.queries.ts";

/** The class, if the actor may act on it. Throws `not-found`. */
export function getOwnClass(db: Db, actor: Actor, classId: string): ClassRow {
  const row = findClass(db, classId);
  if (row === null) throw new ProblemError("not-found");
  assertRelation(actor, isTeacherOf(db, actor.userId, classId) ? ["class-teacher"] : []);
  return row;
}

/** The student of this class with this id. Throws `not-found`. */
export function getStudentOf(db: Db, classId: string, studentId: string) {
  const student = listStudents(db, classId).find((row) => row.id === studentId);
  if (!student) throw new ProblemError("not-found");
  return student;
}

/** Classes that the actor teaches, by name. */
export function listOwnClasses(db: Db, actor: Actor): ClassSummary[] {
  return presentClasses(db, listClassesOfTeacher(db, actor.userId));
}

/** A class with its students and how far each is in each lesson. */
export function getClassBoard(db: Db, actor: Actor, classId: string) {
  const row = getOwnClass(db, actor, classId);
  const [summary] = presentClasses(db, [row]);
  if (!summary) throw new Error("A class that was loaded has a summary.");
  return {
    class: summary,
    students: presentStudents(db, classId),
    lessons: LESSONS.map((lesson) => ({ id: lesson.id, number: lesson.number, title: lesson.title })),
  };
}

/** Takes a student out of the class and ends their sessions; shows, marks and progress stay. Throws `not-found`. */
export function removeStudent(db: Db, clock: Clock, actor: Actor, input: { classId: string; studentId: string }): void {
  getOwnClass(db, actor, input.classId);
  const student = getStudentOf(db, input.classId, input.studentId);
  inTransaction(db, (tx) => {
    deleteEnrolment(tx, input.classId, student.id);
    endSessionsOf(tx, UserIdSchema.parse(student.id));
    const detail = { class: input.classId };
    appendAudit(tx, { at: clock.now(), actorId: actor.userId, event: "student-removed", subject: student.id, detail });
  });
}

function presentClasses(db: Db, rows: readonly ClassRow[]): ClassSummary[] {
  const ids = rows.map((row) => row.id);
  const students = countStudents(db, ids);
  const toMark = countToMark(db, ids);
  return rows.map((row) => ({
    id: ClassIdSchema.parse(row.id),
    name: row.name,
    code: row.code,
    schoolName: row.schoolName,
    studentCount: students.get(row.id) ?? 0,
    toMarkCount: toMark.get(row.id) ?? 0,
  }));
}

function presentStudents(db: Db, classId: string): StudentRow[] {
  const rows = listStudents(db, classId);
  const ids = rows.map((row) => row.id);
  const shows = countShows(db, ids);
  const done = new Map(listStepsDone(db, ids).map((row) => [`${row.userId} ${row.lessonId}`, row.stepsDone]));
  return rows.map((row) => ({
    id: UserIdSchema.parse(row.id),
    displayName: row.displayName,
    username: row.username ?? "",
    lastSeenAt: row.lastSeenAt,
    showCount: shows.get(row.id) ?? 0,
    lessons: LESSONS.map((lesson) => ({
      lessonId: lesson.id,
      stepsDone: Math.min(done.get(`${row.id} ${lesson.id}`) ?? 0, lesson.steps.length),
      stepCount: lesson.steps.length,
    })),
  }));
}
