import { FIRST_LIGHT } from "./01-first-light.ts";
import { CHANGING_COLOURS } from "./02-changing-colours.ts";
import { FOR_EACH_FRONT } from "./03-for-each-front.ts";
import { COUNTING } from "./04-counting.ts";
import { LOOPS_IN_LOOPS } from "./05-loops-in-loops.ts";
import { DECISIONS } from "./06-decisions.ts";
import { FUNCTIONS } from "./07-functions.ts";
import { SONG_DATA } from "./08-song-data.ts";
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
  FUNCTIONS,
  SONG_DATA,
].map((lesson) => LessonFileSchema.parse(lesson));
