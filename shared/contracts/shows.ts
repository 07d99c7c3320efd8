import { z } from "zod";
import { defineContract } from "../contract.ts";
import { AssignmentIdSchema, LayoutIdSchema, ShowIdSchema, SongIdSchema, VersionIdSchema } from "../ids.ts";
import type { Grant } from "../roles.ts";
import { partnersContract } from "./partners.ts";
import { InstantSchema, lineText, RibbonSchema, RunSummarySchema, SourceSchema } from "./common.ts";

const params = z.object({ showId: ShowIdSchema });
const ofAuthor: readonly Grant[] = [{ role: "student", relation: "author" }];
/** Staff may read what was handed in to them; drafts stay with their authors and their teachers. */
const ofAuthorOrTeacher: readonly Grant[] = [...ofAuthor, { role: "teacher", relation: "class-teacher" }];
const readers: readonly Grant[] = [...ofAuthorOrTeacher, { role: "coordinator", relation: "forwarded" }];

/** Work on an assignment. */
export const WORK_STATES = ["working", "submitted", "revise", "marked"] as const;
export const WorkStateSchema = z.enum(WORK_STATES);
export type WorkState = z.infer<typeof WorkStateSchema>;

/** A forwarded show. */
export const FORWARD_STATES = ["waiting", "approved", "declined", "scheduled"] as const;
export const ForwardStateSchema = z.enum(FORWARD_STATES);
export type ForwardState = z.infer<typeof ForwardStateSchema>;

export const SeedSchema = z.int().min(0).max(0xff_ff_ff_ff);

export const ShowSummarySchema = z.object({
  id: ShowIdSchema,
  title: z.string(),
  songId: SongIdSchema,
  songTitle: z.string(),
  seconds: z.number(),
  /** Display names of the authors. */
  authors: z.array(z.string()),
  assignmentId: AssignmentIdSchema.nullable(),
  assignmentTitle: z.string().nullable(),
  workState: WorkStateSchema.nullable(),
  forwardState: ForwardStateSchema.nullable(),
  savedAt: InstantSchema,
  isArchived: z.boolean(),
  /** Of the last good run; null before the first. */
  ribbon: RibbonSchema.nullable(),
});
export type ShowSummary = z.infer<typeof ShowSummarySchema>;

export const DraftSchema = z.object({
  /** Counts up by one with every save. */
  revision: z.int().min(0),
  source: z.string(),
  savedAt: InstantSchema,
});
export type Draft = z.infer<typeof DraftSchema>;

export const EarlierDraftSchema = z.object({
  revision: z.int().min(0),
  savedAt: InstantSchema,
  /** Display name of the author who wrote it; null for a text that nobody has saved yet. */
  by: z.string().nullable(),
  ribbon: RibbonSchema.nullable(),
});
export type EarlierDraft = z.infer<typeof EarlierDraftSchema>;

export const VersionSummarySchema = z.object({
  id: VersionIdSchema,
  number: z.int(),
  createdAt: InstantSchema,
  run: RunSummarySchema,
  ribbon: RibbonSchema.nullable(),
});
export type VersionSummary = z.infer<typeof VersionSummarySchema>;

export const ShowDetailSchema = z.object({
  show: ShowSummarySchema,
  seed: SeedSchema,
  layoutId: LayoutIdSchema,
  draft: DraftSchema,
  versions: z.array(VersionSummarySchema),
});
export type ShowDetail = z.infer<typeof ShowDetailSchema>;

export const VersionDetailSchema = z.object({
  version: VersionSummarySchema,
  showId: ShowIdSchema,
  title: z.string(),
  source: z.string(),
  seed: SeedSchema,
  songId: SongIdSchema,
  layoutId: LayoutIdSchema,
  /** Base64 of the binary codec (`sandbox/timeline/codec.ts`); null when nothing was written. */
  timeline: z.string().nullable(),
});
export type VersionDetail = z.infer<typeof VersionDetailSchema>;

export const showsContract = defineContract({
  ...partnersContract,
  list: {
    method: "GET",
    path: "/api/shows",
    summary: "Lists the shows that the caller is an author of.",
    access: [{ role: "student" }],
    query: z.object({ archived: z.enum(["yes", "no"]).default("no") }),
    response: z.object({ shows: z.array(ShowSummarySchema) }),
  },
  create: {
    method: "POST",
    path: "/api/shows",
    summary: "Starts a show from a song, for an assignment or for oneself.",
    access: [{ role: "student" }],
    body: z.object({
      title: lineText(60),
      songId: SongIdSchema,
      assignmentId: AssignmentIdSchema.nullable().default(null),
    }),
    status: 201,
    response: z.object({ show: ShowSummarySchema }),
    problems: ["invalid-request", "not-found"],
    isIdempotent: true,
  },
  get: {
    method: "GET",
    path: "/api/shows/:showId",
    summary: "Gives a show with its draft and versions.",
    access: ofAuthorOrTeacher,
    params,
    response: ShowDetailSchema,
    problems: ["not-found"],
  },
  update: {
    method: "PATCH",
    path: "/api/shows/:showId",
    summary: "Renames, archives or brings back a show; deals new luck with a new seed.",
    access: ofAuthor,
    params,
    body: z.object({ title: lineText(60).optional(), isArchived: z.boolean().optional(), seed: SeedSchema.optional() }),
    response: z.object({ show: ShowSummarySchema, seed: SeedSchema }),
    problems: ["invalid-request", "not-found"],
  },
  duplicate: {
    method: "POST",
    path: "/api/shows/:showId/duplicate",
    summary: "Copies a show's draft into a new show of the caller.",
    access: ofAuthor,
    params,
    status: 201,
    response: z.object({ show: ShowSummarySchema }),
    problems: ["not-found"],
  },
  saveDraft: {
    method: "PUT",
    path: "/api/shows/:showId/draft",
    summary: "Saves the draft on top of the revision it was written from; never overwrites another.",
    access: ofAuthor,
    params,
    body: z.object({ baseRevision: z.int().min(0), source: SourceSchema }),
    response: z.object({ revision: z.int(), savedAt: InstantSchema }),
    // `draft-conflict` carries { draft: Draft }: what the server holds.
    problems: ["invalid-request", "not-found", "draft-conflict", "key-reused", "too-large"],
    isIdempotent: true,
  },
  history: {
    method: "GET",
    path: "/api/shows/:showId/history",
    summary: "Lists earlier texts of a draft, newest first; the first is the draft itself.",
    access: ofAuthorOrTeacher,
    params,
    response: z.object({ drafts: z.array(EarlierDraftSchema) }),
    problems: ["not-found"],
  },
  earlierDraft: {
    method: "GET",
    path: "/api/shows/:showId/history/:revision",
    summary: "Gives one earlier text of a draft.",
    access: ofAuthorOrTeacher,
    params: z.object({ showId: ShowIdSchema, revision: z.coerce.number().int().min(0) }),
    response: DraftSchema,
    problems: ["not-found"],
  },
  version: {
    method: "GET",
    path: "/api/versions/:versionId",
    summary: "Gives an immutable version with the server's timeline.",
    access: readers,
    params: z.object({ versionId: VersionIdSchema }),
    response: VersionDetailSchema,
    problems: ["not-found"],
  },
});
