import { z } from "zod";

/** UTC milliseconds. */
export const InstantSchema = z.int().min(0);

/** A calendar date in the event's time zone. */
export const LocalDateSchema = z.string().regex(/^\d{4}-\d{2}-\d{2}$/, "Write the date as 2026-12-04.");

/** A time of day in the event's time zone, 24 hours. */
export const LocalTimeSchema = z.string().regex(/^([01]\d|2[0-3]):[0-5]\d$/, "Write the time as 18:20.");

/** A person's title or sentence: trimmed, no control characters. */
export const lineText = (max: number) =>
  z
    .string()
    .trim()
    .min(1, "Please write something here.")
    .max(max, `Use at most ${max} characters.`)
    .regex(/^[^\p{Cc}]*$/u, "Leave out line breaks and control characters.");

export const paragraphText = (max: number) =>
  z
    .string()
    .trim()
    .max(max, `Use at most ${max} characters.`)
    .regex(/^[^\u0000-\u0008\u000b\u000c\u000e-\u001f]*$/, "Leave out control characters.");

/** The largest script: 64 KiB of UTF-8. Length in characters is checked here, bytes by the engine. */
export const SCRIPT_LIMIT_BYTES = 65_536;
export const SourceSchema = z
  .string()
  .max(SCRIPT_LIMIT_BYTES, "The script is too long: 65 536 characters are the most.");

/** A show's face: `cells` is base64 of rows x columns x 4 bytes (r, g, b, alpha), row by row. */
export const RibbonSchema = z.object({
  rows: z.int().min(1).max(64),
  columns: z.int().min(1).max(400),
  cells: z.string(),
});
export type RibbonPicture = z.infer<typeof RibbonSchema>;

export const SourceRangeSchema = z.object({
  line: z.int(),
  column: z.int(),
  endLine: z.int(),
  endColumn: z.int(),
});

/** Mirrors `Problem` of `sandbox/engine/model.ts`. */
export const ScriptProblemSchema = z.object({
  code: z.string(),
  sentence: z.string(),
  hint: z.string(),
  range: SourceRangeSchema,
  excerpt: z.string(),
  details: z.string().optional(),
});

export const SeveritySchema = z.enum(["stop", "warn", "note"]);

/** Mirrors `Finding` of `sandbox/engine/model.ts`. */
export const FindingSchema = z.object({
  rule: z.string(),
  severity: SeveritySchema,
  sentence: z.string(),
  hint: z.string().optional(),
  measured: z.object({ value: z.number(), limit: z.number(), unit: z.string() }).optional(),
  moments: z.array(z.number()),
  lights: z.array(z.string()),
  lines: z.array(z.int()),
});

export const HashSchema = z.string().regex(/^[0-9a-f]{64}$/, "A hash is 64 hex digits.");

/** What a run on the server came to; the timeline itself is fetched apart. */
export const RunSummarySchema = z.object({
  isOk: z.boolean(),
  problem: ScriptProblemSchema.nullable(),
  hash: HashSchema.nullable(),
  cueCount: z.int(),
  findings: z.array(FindingSchema),
  /** Length of the song in seconds. */
  seconds: z.number(),
  /** What happens in words, for people who can not see it. */
  description: z.string(),
});
export type RunSummary = z.infer<typeof RunSummarySchema>;
