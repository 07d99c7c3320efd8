import { z } from "zod";
import { ExerciseCheckSchema } from "../sandbox/course/exercise.ts";
import { STEP_KINDS } from "../shared/contracts/course.ts";

/** The shape of a lesson file. Text is short paragraphs; `code` in backticks is the only markup. */

const Paragraphs = z.array(z.string().min(1).max(400)).min(1).max(6);
const Script = z.string().min(1).max(4000);

export const ChoiceSchema = z.object({
  text: z.string().min(1).max(120),
  isRight: z.boolean(),
  /** What is said to a learner who picks it. */
  answer: z.string().min(5).max(240),
});

export const LessonFileStepSchema = z.object({
  id: z.string().regex(/^[a-z][a-z0-9-]{1,60}$/),
  kind: z.enum(STEP_KINDS),
  title: z.string().min(3).max(60),
  text: Paragraphs,
  /** The script the editor opens with. */
  starter: Script.nullable().default(null),
  question: z
    .object({ ask: z.string().min(5).max(200), choices: z.array(ChoiceSchema).min(2).max(5) })
    .refine(
      (question) => question.choices.filter((choice) => choice.isRight).length === 1,
      "Exactly one choice is right.",
    )
    .nullable()
    .default(null),
  /** A script whose ribbon is shown as the aim; its text is not. */
  aim: Script.nullable().default(null),
  checks: z.array(ExerciseCheckSchema).max(8).default([]),
  /** One script that passes; for teachers and tests, never sent to learners. */
  solution: Script.nullable().default(null),
});
export type LessonFileStep = z.infer<typeof LessonFileStepSchema>;

export const LessonFileSchema = z.object({
  id: z.string().regex(/^[a-z][a-z0-9-]{1,60}$/),
  /** Goes up with every change of its steps. */
  version: z.int().min(1),
  number: z.int().min(1).max(40),
  title: z.string().min(3).max(60),
  summary: z.string().min(5).max(200),
  /** Words of the language that are new. */
  words: z.array(z.string()).min(1),
  /** What of TypeScript is new. */
  typescript: z.array(z.string()),
  minutes: z.int().min(10).max(90),
  /** Id of the song it is heard with. */
  songId: z.string(),
  /** The luck of its scripts: 32 bits. */
  seed: z.int().min(0).max(0xff_ff_ff_ff),
  steps: z.array(LessonFileStepSchema).min(3).max(12),
  /** Paragraphs for the teacher: the plan of the lesson, what to watch for, what to say. */
  teacherNotes: z.array(z.string().min(5).max(600)).min(3),
});
export type LessonFile = z.infer<typeof LessonFileSchema>;

/** A lesson as its author writes it, with defaults left out. */
export type LessonInput = z.input<typeof LessonFileSchema>;
