import { index, integer, primaryKey, sqliteTable, text } from "drizzle-orm/sqlite-core";
import type { Requirement, Rubric } from "../../../shared/contracts/assignments.ts";
import { id, instant } from "./columns.ts";
import { schools, users } from "./identity.ts";
import { songs } from "./event.ts";

export const classes = sqliteTable("classes", {
  id: id(),
  schoolId: text("school_id")
    .notNull()
    .references(() => schools.id),
  name: text("name").notNull(),
  /** The class code: no secret. */
  code: text("code").notNull().unique(),
});

export const classTeachers = sqliteTable(
  "class_teachers",
  {
    classId: text("class_id")
      .notNull()
      .references(() => classes.id, { onDelete: "cascade" }),
    userId: text("user_id")
      .notNull()
      .references(() => users.id, { onDelete: "cascade" }),
  },
  (table) => [primaryKey({ columns: [table.classId, table.userId] }), index("class_teachers_user").on(table.userId)],
);

export const enrolments = sqliteTable(
  "enrolments",
  {
    classId: text("class_id")
      .notNull()
      .references(() => classes.id, { onDelete: "cascade" }),
    userId: text("user_id")
      .notNull()
      .references(() => users.id, { onDelete: "cascade" }),
  },
  (table) => [primaryKey({ columns: [table.classId, table.userId] }), index("enrolments_user").on(table.userId)],
);

/** One row a student and lesson step. */
export const lessonProgress = sqliteTable(
  "lesson_progress",
  {
    userId: text("user_id")
      .notNull()
      .references(() => users.id, { onDelete: "cascade" }),
    lessonId: text("lesson_id").notNull(),
    /** Content version of the lesson that was worked on. */
    lessonVersion: integer("lesson_version").notNull(),
    stepId: text("step_id").notNull(),
    isDone: integer("is_done", { mode: "boolean" }).notNull().default(false),
    attempts: integer("attempts").notNull().default(0),
    answer: integer("answer"),
    source: text("source"),
    updatedAt: instant("updated_at").notNull(),
  },
  (table) => [primaryKey({ columns: [table.userId, table.lessonId, table.stepId] })],
);

/** Every try of an exercise, insert-only: what a teacher sees of being stuck. */
export const exerciseAttempts = sqliteTable(
  "exercise_attempts",
  {
    id: id(),
    userId: text("user_id")
      .notNull()
      .references(() => users.id, { onDelete: "cascade" }),
    lessonId: text("lesson_id").notNull(),
    stepId: text("step_id").notNull(),
    at: instant("at").notNull(),
    passed: integer("passed", { mode: "boolean" }).notNull(),
    problemCode: text("problem_code"),
  },
  (table) => [index("exercise_attempts_user").on(table.userId, table.lessonId)],
);

export const assignments = sqliteTable(
  "assignments",
  {
    id: id(),
    classId: text("class_id")
      .notNull()
      .references(() => classes.id),
    title: text("title").notNull(),
    brief: text("brief").notNull(),
    songId: text("song_id")
      .notNull()
      .references(() => songs.id),
    dueAt: instant("due_at").notNull(),
    lateRule: text("late_rule", { enum: ["accept-late", "closed"] }).notNull(),
    requirements: text("requirements", { mode: "json" }).$type<Requirement[]>().notNull(),
    rubric: text("rubric", { mode: "json" }).$type<Rubric>().notNull(),
    createdBy: text("created_by")
      .notNull()
      .references(() => users.id),
    createdAt: instant("created_at").notNull(),
  },
  (table) => [index("assignments_class").on(table.classId)],
);
