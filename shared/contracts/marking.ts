import { z } from "zod";
import { defineContract } from "../contract.ts";
import {
  AssignmentIdSchema,
  ClassIdSchema,
  CommentIdSchema,
  ShowIdSchema,
  SubmissionIdSchema,
  VersionIdSchema,
} from "../ids.ts";
import type { Grant } from "../roles.ts";
import { RubricSchema } from "./assignments.ts";
import { InstantSchema, paragraphText, RibbonSchema, RunSummarySchema } from "./common.ts";
import { ForwardStateSchema, WorkStateSchema } from "./shows.ts";

const params = z.object({ submissionId: SubmissionIdSchema });
/** The version the teacher looked at: an answer never lands on one handed in meanwhile. */
const ofVersion = z.object({ versionId: VersionIdSchema });
const ofTeacher: readonly Grant[] = [{ role: "teacher", relation: "class-teacher" }];
const ofAuthorOrTeacher: readonly Grant[] = [{ role: "student", relation: "author" }, ...ofTeacher];

/** Where a comment points: lines of the version's script, a moment of its timeline, or the whole. */
export const CommentAnchorSchema = z.discriminatedUnion("kind", [
  z.object({ kind: z.literal("whole") }),
  z.object({ kind: z.literal("lines"), from: z.int().min(1), to: z.int().min(1) }),
  z.object({ kind: z.literal("moment"), tick: z.int().min(0) }),
]);
export type CommentAnchor = z.infer<typeof CommentAnchorSchema>;

export const CommentSchema = z.object({
  id: CommentIdSchema,
  authorName: z.string(),
  isMine: z.boolean(),
  isTeacher: z.boolean(),
  versionNumber: z.int(),
  anchor: CommentAnchorSchema,
  body: z.string(),
  createdAt: InstantSchema,
});
export type Comment = z.infer<typeof CommentSchema>;

/** One counted fact beside a criterion; the teacher decides what it is worth. */
export const EvidenceSchema = z.object({
  kind: z.enum(["tick", "triangle", "info"]),
  text: z.string(),
  lines: z.array(z.int()),
  /** Ticks. */
  moments: z.array(z.number()),
});
export type Evidence = z.infer<typeof EvidenceSchema>;

export const MarkSchema = z.object({
  /** Level chosen by criterion id: 1 to 4. */
  levels: z.record(z.string(), z.int().min(1).max(4)),
  note: z.string(),
  got: z.int(),
  of: z.int(),
  isReleased: z.boolean(),
});
export type Mark = z.infer<typeof MarkSchema>;

export const QueueRowSchema = z.object({
  submissionId: SubmissionIdSchema,
  authors: z.array(z.string()),
  showTitle: z.string(),
  state: WorkStateSchema,
  handedInAt: InstantSchema,
  isLate: z.boolean(),
  isOk: z.boolean(),
  stopCount: z.int(),
  points: z.object({ got: z.int(), of: z.int() }).nullable(),
  forwardState: ForwardStateSchema.nullable(),
  ribbon: RibbonSchema.nullable(),
});
export type QueueRow = z.infer<typeof QueueRowSchema>;

export const SubmissionDetailSchema = z.object({
  submission: z.object({
    id: SubmissionIdSchema,
    assignmentId: AssignmentIdSchema,
    assignmentTitle: z.string(),
    classId: ClassIdSchema,
    className: z.string(),
    showId: ShowIdSchema,
    showTitle: z.string(),
    authors: z.array(z.string()),
    state: WorkStateSchema,
    versionId: VersionIdSchema,
    versionNumber: z.int(),
    handedInAt: InstantSchema,
    isLate: z.boolean(),
    /** False: browser and server disagreed and the server's run counts. */
    hashesAgree: z.boolean().nullable(),
  }),
  run: RunSummarySchema,
  rubric: RubricSchema,
  comments: z.array(CommentSchema),
  /** Teachers always; students once released. */
  mark: MarkSchema.nullable(),
  /** By criterion id, and under "" for the whole. Teachers only, else empty. */
  evidence: z.record(z.string(), z.array(EvidenceSchema)),
  forward: z.object({ state: ForwardStateSchema, note: z.string(), answer: z.string().nullable() }).nullable(),
  history: z.array(z.object({ at: InstantSchema, state: WorkStateSchema, by: z.string(), versionNumber: z.int() })),
});
export type SubmissionDetail = z.infer<typeof SubmissionDetailSchema>;

export const markingContract = defineContract({
  inbox: {
    method: "GET",
    path: "/api/marking",
    summary: "Lists the teacher's assignments with what waits for a mark.",
    access: [{ role: "teacher" }],
    response: z.object({
      assignments: z.array(
        z.object({
          id: AssignmentIdSchema,
          title: z.string(),
          className: z.string(),
          dueAt: InstantSchema,
          toMark: z.int(),
          sentBack: z.int(),
          marked: z.int(),
          firstSubmissionId: SubmissionIdSchema.nullable(),
        }),
      ),
    }),
  },
  queue: {
    method: "GET",
    path: "/api/assignments/:assignmentId/submissions",
    summary: "Lists what was handed in, to mark first.",
    access: ofTeacher,
    params: z.object({ assignmentId: AssignmentIdSchema }),
    response: z.object({ title: z.string(), className: z.string(), rows: z.array(QueueRowSchema) }),
    problems: ["not-found"],
  },
  submission: {
    method: "GET",
    path: "/api/submissions/:submissionId",
    summary: "Gives one submission: its run, comments, mark and evidence.",
    access: ofAuthorOrTeacher,
    params,
    response: SubmissionDetailSchema,
    problems: ["not-found"],
  },
  comment: {
    method: "POST",
    path: "/api/submissions/:submissionId/comments",
    summary: "Comments on lines, on a moment or on the whole.",
    access: ofAuthorOrTeacher,
    params,
    body: z.object({
      anchor: CommentAnchorSchema,
      body: paragraphText(2000).pipe(z.string().min(1, "Write the comment first.")),
    }),
    status: 201,
    response: z.object({ comment: CommentSchema }),
    problems: ["invalid-request", "not-found"],
    isIdempotent: true,
  },
  deleteComment: {
    method: "DELETE",
    path: "/api/comments/:commentId",
    summary: "Takes one's own comment back.",
    access: ofAuthorOrTeacher,
    params: z.object({ commentId: CommentIdSchema }),
    status: 204,
    response: z.void(),
    problems: ["not-found", "not-allowed"],
  },
  saveMark: {
    method: "PUT",
    path: "/api/submissions/:submissionId/mark",
    summary: "Keeps the levels and the note; nobody but the teacher sees them before release.",
    access: ofTeacher,
    params,
    body: z.object({ levels: z.record(z.string(), z.int().min(1).max(4)), note: paragraphText(2000) }),
    response: z.object({ mark: MarkSchema }),
    problems: ["invalid-request", "not-found", "wrong-state"],
  },
  sendBack: {
    method: "POST",
    path: "/api/submissions/:submissionId/send-back",
    summary: "Sends the work back for another pass, with a note.",
    access: ofTeacher,
    params,
    body: ofVersion.extend({
      note: paragraphText(2000).pipe(z.string().min(1, "Say what the next pass should change.")),
    }),
    response: z.object({ state: WorkStateSchema }),
    problems: ["invalid-request", "not-found", "wrong-state", "newer-version"],
  },
  release: {
    method: "POST",
    path: "/api/submissions/:submissionId/release",
    summary: "Releases the mark to the authors.",
    access: ofTeacher,
    params,
    body: ofVersion,
    response: z.object({ state: WorkStateSchema, mark: MarkSchema }),
    problems: ["invalid-request", "not-found", "wrong-state", "newer-version"],
  },
  reopen: {
    method: "POST",
    path: "/api/submissions/:submissionId/reopen",
    summary: "Takes a released mark, or work sent back, to submitted again.",
    access: ofTeacher,
    params,
    response: z.object({ state: WorkStateSchema }),
    problems: ["not-found", "wrong-state"],
  },
});
