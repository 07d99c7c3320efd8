import { FIRST_LIGHT } from "./01-first-light.ts";
import { CHANGING_COLOURS } from "./02-changing-colours.ts";
import { FOR_EACH_FRONT } from "./03-for-each-front.ts";
import { COUNTING } from "./04-counting.ts";
import { LOOPS_IN_LOOPS } from "./05-loops-in-loops.ts";
import { DECISIONS } from "./06-decisions.ts";
import { LessonFileSchema } from "./schema.ts";
import type { LessonFile } from "./schema.ts";

/** The course in order. Every file is checked against its schema when it is loaded. */
export const LESSONS: readonly LessonFile[] = [
  FIRST_LIGHT,
  CHANGING_COLOURS,
  FOR_EACH_FRONT,
  COUNTING,
  LOOPS_IN_LOOPS,
  DECISIONS,
].map((lesson) => LessonFileSchema.parse(lesson));
