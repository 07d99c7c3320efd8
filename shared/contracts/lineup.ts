import { z } from "zod";
import { defineContract } from "../contract.ts";
import {
  ForwardIdSchema,
  LayoutIdSchema,
  NightIdSchema,
  SlotIdSchema,
  SongIdSchema,
  SubmissionIdSchema,
  VersionIdSchema,
} from "../ids.ts";
import type { Grant } from "../roles.ts";
import {
  FindingSchema,
  InstantSchema,
  LocalDateSchema,
  LocalTimeSchema,
  paragraphText,
  RibbonSchema,
  RunSummarySchema,
  SeveritySchema,
} from "./common.ts";
import { ForwardStateSchema } from "./shows.ts";

const coordinator: readonly Grant[] = [{ role: "coordinator" }];
const forwardParams = z.object({ forwardId: ForwardIdSchema });
const slotParams = z.object({ slotId: SlotIdSchema });

export const ForwardSummarySchema = z.object({
  id: ForwardIdSchema,
  submissionId: SubmissionIdSchema,
  versionId: VersionIdSchema,
  title: z.string(),
  authors: z.array(z.string()),
  /** What the public programme says, by consent: "Wren, Tarn Road" or the class. */
  publicName: z.string(),
  schoolName: z.string(),
  className: z.string(),
  songId: SongIdSchema,
  songTitle: z.string(),
  seconds: z.number(),
  state: ForwardStateSchema,
  note: z.string(),
  /** The coordinator's words, when declined (always) or approved (if any). */
  answer: z.string().nullable(),
  teacherName: z.string(),
  forwardedAt: InstantSchema,
  stopCount: z.int(),
  warnCount: z.int(),
  slotCount: z.int(),
  ribbon: RibbonSchema.nullable(),
});
export type ForwardSummary = z.infer<typeof ForwardSummarySchema>;

export const SlotSchema = z.object({
  id: SlotIdSchema,
  nightId: NightIdSchema,
  startsAt: LocalTimeSchema,
  forwardId: ForwardIdSchema,
  isPinned: z.boolean(),
});
export type Slot = z.infer<typeof SlotSchema>;

export const NightSchema = z.object({
  id: NightIdSchema,
  date: LocalDateSchema,
  opensAt: LocalTimeSchema,
  /** Quiet hour: every show must be over. */
  closesAt: LocalTimeSchema,
  /** Set when nothing runs: "Market day". */
  closedReason: z.string().nullable(),
});
export type Night = z.infer<typeof NightSchema>;

/** Something about the plan, not about one show's script. */
export const LineupFindingSchema = z.object({
  rule: z.enum([
    "overlap",
    "past-quiet-hour",
    "closed-night",
    "show-has-stop",
    "same-class-twice",
    "not-placed",
    "layout-changed",
    "does-not-run",
  ]),
  severity: SeveritySchema,
  slotId: SlotIdSchema.nullable(),
  forwardId: ForwardIdSchema.nullable(),
  cause: z.string(),
  sentence: z.string(),
  /** The smallest fix, as one move: to another time, or off the plan. */
  fix: z
    .discriminatedUnion("kind", [
      z.object({
        kind: z.literal("move"),
        slotId: SlotIdSchema,
        nightId: NightIdSchema,
        startsAt: LocalTimeSchema,
        label: z.string(),
      }),
      z.object({ kind: z.literal("remove"), slotId: SlotIdSchema, label: z.string() }),
    ])
    .nullable(),
});
export type LineupFinding = z.infer<typeof LineupFindingSchema>;

export const LineupSchema = z.object({
  season: z.object({ name: z.string(), firstDate: LocalDateSchema, lastDate: LocalDateSchema, timeZone: z.string() }),
  /** The start times that the board offers. */
  times: z.array(LocalTimeSchema),
  nights: z.array(NightSchema),
  slots: z.array(SlotSchema),
  /** Every show that is approved or scheduled. */
  shows: z.array(ForwardSummarySchema),
  findings: z.array(LineupFindingSchema),
  publication: z.object({ number: z.int(), publishedAt: InstantSchema, by: z.string() }).nullable(),
  /** Slots that differ from the last publication. */
  changeCount: z.int(),
  tonight: LocalDateSchema,
});
export type Lineup = z.infer<typeof LineupSchema>;

export const ProgrammeShowSchema = z.object({
  slotId: SlotIdSchema,
  date: LocalDateSchema,
  startsAt: LocalTimeSchema,
  title: z.string(),
  publicName: z.string(),
  schoolName: z.string(),
  songTitle: z.string(),
  seconds: z.number(),
  /** For people who can not see the ribbon. */
  description: z.string(),
  ribbon: RibbonSchema.nullable(),
});
export type ProgrammeShow = z.infer<typeof ProgrammeShowSchema>;

export const lineupContract = defineContract({
  forward: {
    method: "POST",
    path: "/api/submissions/:submissionId/forward",
    summary: "Forwards a marked show to the event, with a note.",
    access: [{ role: "teacher", relation: "class-teacher" }],
    params: z.object({ submissionId: SubmissionIdSchema }),
    body: z.object({ note: paragraphText(1000) }),
    status: 201,
    response: z.object({ forward: ForwardSummarySchema }),
    problems: ["invalid-request", "not-found", "already-done", "wrong-state", "blocked-by-stop"],
  },
  forwards: {
    method: "GET",
    path: "/api/forwards",
    summary: "Lists forwarded shows: all for the coordinator, their own for a teacher.",
    access: [{ role: "coordinator" }, { role: "teacher" }],
    response: z.object({ forwards: z.array(ForwardSummarySchema) }),
  },
  forwardDetail: {
    method: "GET",
    path: "/api/forwards/:forwardId",
    summary: "Gives a forwarded show with its check.",
    access: [
      { role: "coordinator", relation: "forwarded" },
      { role: "teacher", relation: "class-teacher" },
    ],
    params: forwardParams,
    response: z.object({
      forward: ForwardSummarySchema,
      run: RunSummarySchema,
      layoutId: LayoutIdSchema,
      findings: z.array(FindingSchema),
    }),
    problems: ["not-found"],
  },
  approve: {
    method: "POST",
    path: "/api/forwards/:forwardId/approve",
    summary: "Approves a forwarded show for the lineup.",
    access: [{ role: "coordinator", relation: "forwarded" }],
    params: forwardParams,
    body: z.object({ note: paragraphText(1000).default("") }),
    response: z.object({ forward: ForwardSummarySchema }),
    problems: ["invalid-request", "not-found", "wrong-state", "blocked-by-stop"],
  },
  decline: {
    method: "POST",
    path: "/api/forwards/:forwardId/decline",
    summary: "Sends a show back to its teacher, always with a note; its slots are freed.",
    access: [{ role: "coordinator", relation: "forwarded" }],
    params: forwardParams,
    body: z.object({ note: paragraphText(1000).pipe(z.string().min(1, "Say why, so that they can mend it.")) }),
    response: z.object({ forward: ForwardSummarySchema }),
    problems: ["invalid-request", "not-found", "wrong-state"],
  },
  lineup: {
    method: "GET",
    path: "/api/lineup",
    summary: "Gives the season's plan with its findings.",
    access: coordinator,
    response: LineupSchema,
  },
  place: {
    method: "POST",
    path: "/api/lineup/slots",
    summary: "Places a show at a night and start time.",
    access: coordinator,
    body: z.object({ forwardId: ForwardIdSchema, nightId: NightIdSchema, startsAt: LocalTimeSchema }),
    status: 201,
    response: LineupSchema,
    problems: ["invalid-request", "not-found", "slot-taken", "wrong-state"],
  },
  move: {
    method: "PATCH",
    path: "/api/lineup/slots/:slotId",
    summary: "Moves or pins a slot; moving onto a taken time swaps when asked to.",
    access: coordinator,
    params: slotParams,
    body: z.object({
      nightId: NightIdSchema.optional(),
      startsAt: LocalTimeSchema.optional(),
      isPinned: z.boolean().optional(),
      swap: z.boolean().default(false),
    }),
    response: LineupSchema,
    problems: ["invalid-request", "not-found", "slot-taken", "wrong-state"],
  },
  remove: {
    method: "DELETE",
    path: "/api/lineup/slots/:slotId",
    summary: "Takes a slot off the plan; the show goes back to the tray.",
    access: coordinator,
    params: slotParams,
    response: LineupSchema,
    problems: ["not-found"],
  },
  setNight: {
    method: "PATCH",
    path: "/api/lineup/nights/:nightId",
    summary: "Changes a night's hours, or closes it with a reason.",
    access: coordinator,
    params: z.object({ nightId: NightIdSchema }),
    body: z.object({
      opensAt: LocalTimeSchema.optional(),
      closesAt: LocalTimeSchema.optional(),
      closedReason: paragraphText(80).nullable().optional(),
    }),
    response: LineupSchema,
    problems: ["invalid-request", "not-found"],
  },
  publish: {
    method: "POST",
    path: "/api/lineup/publish",
    summary: "Publishes the plan as it stands; a stop refuses it.",
    access: coordinator,
    response: z.object({ number: z.int(), publishedAt: InstantSchema }),
    problems: ["lineup-has-stops", "already-done"],
  },
  programme: {
    method: "GET",
    path: "/api/programme",
    summary: "Gives the published programme for everybody.",
    access: "anyone",
    response: z.object({
      eventName: z.string(),
      townName: z.string(),
      timeZone: z.string(),
      tonight: LocalDateSchema,
      publishedAt: InstantSchema.nullable(),
      nights: z.array(z.object({ date: LocalDateSchema, closedReason: z.string().nullable() })),
      shows: z.array(ProgrammeShowSchema),
    }),
  },
});
