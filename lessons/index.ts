import { CHANGING_COLOURS } from "./02-changing-colours.ts";
import { FIRST_LIGHT } from "./01-first-light.ts";
import { FOR_EACH_FRONT } from "./03-for-each-front.ts";
import { LessonFileSchema } from "./schema.ts";
import type { LessonFile } from "./schema.ts";

/** The course in order. Every file is checked against its schema when it is loaded. */
export const LESSONS: readonly LessonFile[] = [FIRST_LIGHT, CHANGING_COLOURS, FOR_EACH_FRONT].map((lesson) =>
  LessonFileSchema.parse(lesson),
);
