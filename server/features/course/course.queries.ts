import { and, eq, sql } from "drizzle-orm";
import type { Db } from "../../db/connection.ts";
import { enrolments, exerciseAttempts, lessonProgress } from "../../db/schema/index.ts";

export type ProgressRow = typeof lessonProgress.$inferSelect;

/** A person's progress in every lesson, or in one. */
export function listProgress(db: Db, userId: string, lessonId: string | null): ProgressRow[] {
  const own = eq(lessonProgress.userId, userId);
  return db
    .select()
    .from(lessonProgress)
    .where(lessonId === null ? own : and(own, eq(lessonProgress.lessonId, lessonId)))
    .all();
}

/** A person's progress in one step, or null before the first try. */
export function findProgress(db: Db, userId: string, lessonId: string, stepId: string): ProgressRow | null {
  const step = and(
    eq(lessonProgress.userId, userId),
    eq(lessonProgress.lessonId, lessonId),
    eq(lessonProgress.stepId, stepId),
  );
  return db.select().from(lessonProgress).where(step).get() ?? null;
}

/** Keeps the progress in a step; one row a person and step. */
export function saveProgress(db: Db, row: ProgressRow): void {
  const { lessonVersion, isDone, attempts, answer, source, updatedAt } = row;
  db.insert(lessonProgress)
    .values(row)
    .onConflictDoUpdate({
      target: [lessonProgress.userId, lessonProgress.lessonId, lessonProgress.stepId],
      set: { lessonVersion, isDone, attempts, answer, source, updatedAt },
    })
    .run();
}

export function insertAttempt(db: Db, row: typeof exerciseAttempts.$inferInsert): void {
  db.insert(exerciseAttempts).values(row).run();
}

/** Tells whether one try of the step passed all of its checks. */
export function hasPassedAttempt(db: Db, userId: string, lessonId: string, stepId: string): boolean {
  const row = db
    .select({ one: sql<number>`1` })
    .from(exerciseAttempts)
    .where(
      and(
        eq(exerciseAttempts.userId, userId),
        eq(exerciseAttempts.lessonId, lessonId),
        eq(exerciseAttempts.stepId, stepId),
        eq(exerciseAttempts.passed, true),
      ),
    )
    .limit(1)
    .get();
  return row !== undefined;
}

/** One class of a student, by which the runs of a lesson are shared out fairly; null when enrolled in none. */
export function findClassId(db: Db, userId: string): string | null {
  return (
    db.select({ id: enrolments.classId }).from(enrolments).where(eq(enrolments.userId, userId)).limit(1).get()?.id ??
    null
  );
}
