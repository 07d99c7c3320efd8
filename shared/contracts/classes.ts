import { z } from "zod";
import { defineContract } from "../contract.ts";
import { ClassIdSchema, UserIdSchema } from "../ids.ts";
import type { Grant } from "../roles.ts";
import { InstantSchema, lineText } from "./common.ts";

const params = z.object({ classId: ClassIdSchema });
const ofTeacher: readonly Grant[] = [{ role: "teacher", relation: "class-teacher" }];

/** One card to cut out: shown once, at the moment it is made; only a hash is kept. */
export const SignInCardSchema = z.object({
  studentId: UserIdSchema,
  displayName: z.string(),
  classCode: z.string(),
  username: z.string(),
  passphrase: z.string(),
});
export type SignInCard = z.infer<typeof SignInCardSchema>;

export const ClassSummarySchema = z.object({
  id: ClassIdSchema,
  name: z.string(),
  code: z.string(),
  schoolName: z.string(),
  studentCount: z.int(),
  toMarkCount: z.int(),
});
export type ClassSummary = z.infer<typeof ClassSummarySchema>;

export const StudentRowSchema = z.object({
  id: UserIdSchema,
  displayName: z.string(),
  username: z.string(),
  lastSeenAt: InstantSchema.nullable(),
  showCount: z.int(),
  /** Steps done of each lesson, by lesson id. */
  lessons: z.array(z.object({ lessonId: z.string(), stepsDone: z.int(), stepCount: z.int() })),
});
export type StudentRow = z.infer<typeof StudentRowSchema>;

export const classesContract = defineContract({
  list: {
    method: "GET",
    path: "/api/classes",
    summary: "Lists the classes that the teacher teaches.",
    access: [{ role: "teacher" }],
    response: z.object({ classes: z.array(ClassSummarySchema) }),
  },
  get: {
    method: "GET",
    path: "/api/classes/:classId",
    summary: "Gives a class with its students and how far each is in the course.",
    access: ofTeacher,
    params,
    response: z.object({
      class: ClassSummarySchema,
      students: z.array(StudentRowSchema),
      lessons: z.array(z.object({ id: z.string(), number: z.int(), title: z.string() })),
    }),
    problems: ["not-found"],
  },
  addStudents: {
    method: "POST",
    path: "/api/classes/:classId/students",
    summary: "Adds students by display name and gives their sign-in cards, once.",
    access: ofTeacher,
    params,
    body: z.object({
      displayNames: z.array(lineText(40)).min(1, "Write at least one name.").max(40, "Add at most 40 at a time."),
    }),
    status: 201,
    response: z.object({ cards: z.array(SignInCardSchema) }),
    problems: ["invalid-request", "not-found"],
  },
  makeCards: {
    method: "POST",
    path: "/api/classes/:classId/sign-in-cards",
    summary: "Makes new words for these students and gives the cards to print; old words stop working.",
    access: ofTeacher,
    params,
    body: z.object({ studentIds: z.array(UserIdSchema).min(1, "Choose at least one student.").max(40) }),
    response: z.object({ cards: z.array(SignInCardSchema) }),
    problems: ["invalid-request", "not-found"],
  },
  resetSignIn: {
    method: "POST",
    path: "/api/classes/:classId/students/:studentId/reset",
    summary: "Makes a one-time code with which the student chooses new words; ends their sessions.",
    access: ofTeacher,
    params: params.extend({ studentId: UserIdSchema }),
    response: z.object({ code: z.string(), expiresAt: InstantSchema }),
    problems: ["not-found"],
  },
  removeStudent: {
    method: "DELETE",
    path: "/api/classes/:classId/students/:studentId",
    summary: "Takes a student out of the class; their work stays.",
    access: ofTeacher,
    params: params.extend({ studentId: UserIdSchema }),
    status: 204,
    response: z.void(),
    problems: ["not-found"],
  },
});
