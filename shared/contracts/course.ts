import { z } from "zod";
import { defineContract } from "../contract.ts";
import { LayoutIdSchema, SongIdSchema } from "../ids.ts";
import { HashSchema, ScriptProblemSchema, SourceSchema } from "./common.ts";

const LessonIdSchema = z.string().regex(/^[a-z0-9][a-z0-9-]{1,60}$/, "This is not a lesson.");
const StepIdSchema = z.string().regex(/^[a-z0-9][a-z0-9-]{1,60}$/, "This is not a step.");

/** The order of a lesson: predict what happens, run it, find out why, change it, make your own. */
export const STEP_KINDS = ["predict", "run", "investigate", "change", "make"] as const;
export const StepKindSchema = z.enum(STEP_KINDS);

export const StepProgressSchema = z.object({
  stepId: z.string(),
  isDone: z.boolean(),
  attempts: z.int(),
  /** The learner's last script of this step, so that nothing is lost. */
  source: z.string().nullable(),
  /** The choice of a predict or investigate step. */
  answer: z.int().nullable(),
});
export type StepProgress = z.infer<typeof StepProgressSchema>;

export const CheckResultSchema = z.object({
  id: z.string(),
  text: z.string(),
  state: z.enum(["passed", "not-yet", "waiting"]),
  seen: z.string().nullable(),
  hint: z.string().nullable(),
  line: z.int().nullable(),
  tick: z.number().nullable(),
});
export type CheckResult = z.infer<typeof CheckResultSchema>;

export const LessonStepSchema = z.object({
  id: StepIdSchema,
  kind: StepKindSchema,
  title: z.string(),
  /** Short paragraphs; `code` in backticks is the only markup. */
  text: z.array(z.string()),
  starter: z.string().nullable(),
  question: z
    .object({
      ask: z.string(),
      choices: z
        .array(z.object({ text: z.string(), isRight: z.boolean(), answer: z.string() }))
        .min(2)
        .max(5),
    })
    .nullable(),
  /** The script whose ribbon is "the aim". */
  aim: z.string().nullable(),
  checks: z.array(z.object({ id: z.string(), text: z.string() })),
});
export type LessonStep = z.infer<typeof LessonStepSchema>;

export const LessonSummarySchema = z.object({
  id: LessonIdSchema,
  number: z.int(),
  title: z.string(),
  summary: z.string(),
  /** Words of the language that are new here. */
  words: z.array(z.string()),
  minutes: z.int(),
  steps: z.array(z.object({ id: StepIdSchema, kind: StepKindSchema, title: z.string(), isDone: z.boolean() })),
});
export type LessonSummary = z.infer<typeof LessonSummarySchema>;

export const courseContract = defineContract({
  lessons: {
    method: "GET",
    path: "/api/lessons",
    summary: "Lists the lessons with the caller's progress.",
    access: [{ role: "student" }, { role: "teacher" }],
    response: z.object({ lessons: z.array(LessonSummarySchema) }),
  },
  lesson: {
    method: "GET",
    path: "/api/lessons/:lessonId",
    summary: "Gives a lesson with the caller's progress; teachers also get the notes.",
    access: [{ role: "student" }, { role: "teacher" }],
    params: z.object({ lessonId: LessonIdSchema }),
    response: z.object({
      lesson: LessonSummarySchema,
      songId: SongIdSchema,
      layoutId: LayoutIdSchema,
      seed: z.int(),
      steps: z.array(LessonStepSchema),
      progress: z.array(StepProgressSchema),
      teacherNotes: z.array(z.string()),
    }),
    problems: ["not-found"],
  },
  answer: {
    method: "PUT",
    path: "/api/lessons/:lessonId/steps/:stepId/answer",
    summary: "Keeps the choice of a predict or investigate step; any answer finishes a predict step.",
    access: [{ role: "student" }],
    params: z.object({ lessonId: LessonIdSchema, stepId: StepIdSchema }),
    body: z.object({ choice: z.int().min(0).max(9) }),
    response: z.object({ progress: StepProgressSchema }),
    problems: ["invalid-request", "not-found"],
  },
  attempt: {
    method: "POST",
    path: "/api/lessons/:lessonId/steps/:stepId/attempts",
    summary: "Runs a script for a step on the server, checks it and keeps it.",
    access: [{ role: "student" }],
    params: z.object({ lessonId: LessonIdSchema, stepId: StepIdSchema }),
    body: z.object({ source: SourceSchema }),
    response: z.object({
      progress: StepProgressSchema,
      results: z.array(CheckResultSchema),
      problem: ScriptProblemSchema.nullable(),
      hash: HashSchema.nullable(),
    }),
    problems: ["invalid-request", "not-found", "too-large"],
  },
});
