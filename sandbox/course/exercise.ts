import { z } from "zod";
import { SIDES } from "../../shared/sides.ts";

/**
 * What an exercise looks at to say whether a script does what was asked. Each check is data: a
 * sentence for the learner, one thing to try, and what is to be seen on the timeline, in the notes or
 * in the script itself. Times are in beats of the song, levels 0 to 100.
 */

/** Which lights a check looks at; fields left out do not narrow it. */
export const LightChoiceSchema = z
  .object({ front: z.string().optional(), side: z.enum(SIDES).optional(), part: z.string().optional() })
  .strict();
export type LightChoice = z.infer<typeof LightChoiceSchema>;

const said = {
  id: z.string().regex(/^[a-z][a-z0-9-]{0,40}$/),
  /** What is asked for, as a sentence: "The bakery is lit at beat 1." */
  text: z.string().min(5).max(160),
  /** One thing to try when it is not so yet. */
  hint: z.string().min(5).max(160),
};
const beat = z.number().min(0).max(2000);
const count = z.int().min(0).max(100_000);

/** Things that a script can use; each is found in its syntax tree. */
export const USES = [
  "for-of",
  "for",
  "variable",
  "changing-variable",
  "constant",
  "function",
  "if",
  "nested-loop",
] as const;
export type Use = (typeof USES)[number];

export const ExerciseCheckSchema = z.discriminatedUnion("kind", [
  /** At a beat, at least `share` of the lights have `atLeast`. */
  z.object({
    ...said,
    kind: z.literal("lit"),
    lights: LightChoiceSchema,
    atBeat: beat,
    atLeast: z.number().min(1).max(100).default(20),
    share: z.number().min(0.01).max(1).default(1),
  }),
  /** At a beat, none of the lights can be seen. */
  z.object({ ...said, kind: z.literal("dark"), lights: LightChoiceSchema, atBeat: beat }),
  /** At a beat, every light that is lit and can show a colour shows this one; at least one does. */
  z.object({ ...said, kind: z.literal("colour"), lights: LightChoiceSchema, atBeat: beat, colour: z.string() }),
  /** The fronts come on for the first time in this order, each later than the one before. */
  z.object({ ...said, kind: z.literal("order"), fronts: z.array(z.string()).min(2) }),
  /** Every front of the square comes on, in walking order, each later than the one before. */
  z.object({ ...said, kind: z.literal("in-walking-order"), atLeast: z.int().min(2) }),
  /** So many fronts are lit at some time. */
  z.object({ ...said, kind: z.literal("fronts-lit"), atLeast: z.int().min(1) }),
  /** So many different colours are seen at some time. */
  z.object({ ...said, kind: z.literal("colours-seen"), atLeast: z.int().min(1) }),
  /** The ribbon agrees with the aim's: at most `tolerance` of what lights in either may differ. */
  z.object({ ...said, kind: z.literal("same-as-aim"), tolerance: z.number().min(0).max(1).default(0.02) }),
  /** Cues of one action, or of all. */
  z.object({
    ...said,
    kind: z.literal("cue-count"),
    action: z.enum(["on", "off", "fadeTo", "pulse", "colour"]).optional(),
    atLeast: count,
    atMost: count.optional(),
  }),
  /** Something still changes at or after this beat. */
  z.object({ ...said, kind: z.literal("lasts-until"), beat }),
  /** From this beat on, or from the last change on when left out, all is dark. */
  z.object({ ...said, kind: z.literal("dark-at-the-end") }),
  /** The script prints notes; one of them has this text when it is given. */
  z.object({ ...said, kind: z.literal("note"), atLeast: count, says: z.string().optional() }),
  /** The script uses this. */
  z.object({ ...said, kind: z.literal("uses"), what: z.enum(USES), atLeast: z.int().min(1).default(1) }),
  /** The script names this word so many times. */
  z.object({ ...said, kind: z.literal("word"), word: z.string(), atLeast: count, atMost: count.optional() }),
  /** The script holds this text in quotes so many times. */
  z.object({ ...said, kind: z.literal("quoted"), quoted: z.string(), atLeast: count, atMost: count.optional() }),
]);
export type ExerciseCheck = z.infer<typeof ExerciseCheckSchema>;
export type CheckOf<Kind extends ExerciseCheck["kind"]> = Extract<ExerciseCheck, { kind: Kind }>;

/** A check as a lesson writes it, with defaults left out. */
export type ExerciseCheckInput = z.input<typeof ExerciseCheckSchema>;
