import { z } from "zod";
import { defineContract } from "../contract.ts";
import { AssignmentIdSchema, ClassIdSchema, ShowIdSchema, SongIdSchema, SubmissionIdSchema } from "../ids.ts";
import type { Grant } from "../roles.ts";
import { HashSchema, InstantSchema, lineText, paragraphText, RunSummarySchema } from "./common.ts";
import { WorkStateSchema } from "./shows.ts";

const params = z.object({ assignmentId: AssignmentIdSchema });
const ofTeacher: readonly Grant[] = [{ role: "teacher", relation: "class-teacher" }];
const ofStudent: readonly Grant[] = [{ role: "student", relation: "class-member" }];

/** What a script must use; `kind` is a use that `sandbox/checks/use.ts` finds in the syntax tree. */
export const RequirementSchema = z.object({
  kind: z.enum(["loop", "nested-loop", "function", "function-with-parameters", "condition", "list", "song-data"]),
  atLeast: z.int().min(1).max(20).default(1),
});
export type Requirement = z.infer<typeof RequirementSchema>;

export const REQUIREMENT_NAMES: Readonly<Record<Requirement["kind"], string>> = {
  loop: "a loop",
  "nested-loop": "a loop in a loop",
  function: "a function of your own",
  "function-with-parameters": "a function with a parameter",
  condition: "a condition",
  list: "a list",
  "song-data": "something from the song",
};

/** A criterion has four levels, weakest first; points are counted 1 to 4 for the level chosen. */
export const CriterionSchema = z.object({
  id: z.string().regex(/^[a-z][a-z0-9-]{0,30}$/),
  name: lineText(60),
  levels: z.array(z.object({ name: lineText(20), text: paragraphText(200) })).length(4),
});
export type Criterion = z.infer<typeof CriterionSchema>;
export const RubricSchema = z.array(CriterionSchema).min(1, "A rubric needs at least one criterion.").max(8);
export type Rubric = z.infer<typeof RubricSchema>;

/** What happens when the due date is over: take it and say "late", or take nothing more. */
export const LateRuleSchema = z.enum(["accept-late", "closed"]);

export const AssignmentFieldsSchema = z.object({
  title: lineText(80),
  brief: paragraphText(4000),
  songId: SongIdSchema,
  dueAt: InstantSchema,
  lateRule: LateRuleSchema,
  requirements: z.array(RequirementSchema).max(7),
  rubric: RubricSchema,
});
export type AssignmentFields = z.infer<typeof AssignmentFieldsSchema>;

export const AssignmentSummarySchema = z.object({
  id: AssignmentIdSchema,
  classId: ClassIdSchema,
  className: z.string(),
  title: z.string(),
  songId: SongIdSchema,
  songTitle: z.string(),
  dueAt: InstantSchema,
  lateRule: LateRuleSchema,
  /** The caller's own work (students); null for teachers and before anything was begun. */
  mine: z
    .object({
      showId: ShowIdSchema,
      showTitle: z.string(),
      state: WorkStateSchema,
      submissionId: SubmissionIdSchema.nullable(),
      commentCount: z.int(),
      /** Points and total, once released. */
      points: z.object({ got: z.int(), of: z.int() }).nullable(),
    })
    .nullable(),
  /** For the teacher; null for students. */
  counts: z
    .object({ students: z.int(), working: z.int(), submitted: z.int(), revise: z.int(), marked: z.int() })
    .nullable(),
});
export type AssignmentSummary = z.infer<typeof AssignmentSummarySchema>;

export const AssignmentDetailSchema = z.object({
  assignment: AssignmentSummarySchema,
  brief: z.string(),
  requirements: z.array(RequirementSchema),
  rubric: RubricSchema,
  teacherName: z.string(),
});
export type AssignmentDetail = z.infer<typeof AssignmentDetailSchema>;

/** What a hand-in came to: it is never refused for what the script does. */
export const HandInResultSchema = z.object({
  submissionId: SubmissionIdSchema,
  state: WorkStateSchema,
  versionNumber: z.int(),
  isLate: z.boolean(),
  run: RunSummarySchema,
  /** Null when the browser sent no hash (its script did not run). */
  hashesAgree: z.boolean().nullable(),
  unmet: z.array(RequirementSchema),
});
export type HandInResult = z.infer<typeof HandInResultSchema>;

export const assignmentsContract = defineContract({
  list: {
    method: "GET",
    path: "/api/assignments",
    summary: "Lists the assignments of the caller's classes.",
    access: [{ role: "student" }, { role: "teacher" }],
    response: z.object({ assignments: z.array(AssignmentSummarySchema) }),
  },
  get: {
    method: "GET",
    path: "/api/assignments/:assignmentId",
    summary: "Gives an assignment with brief, requirements and rubric.",
    access: [...ofStudent, ...ofTeacher],
    params,
    response: AssignmentDetailSchema,
    problems: ["not-found"],
  },
  create: {
    method: "POST",
    path: "/api/classes/:classId/assignments",
    summary: "Sets an assignment for a class.",
    access: ofTeacher,
    params: z.object({ classId: ClassIdSchema }),
    body: AssignmentFieldsSchema,
    status: 201,
    response: z.object({ assignment: AssignmentSummarySchema }),
    problems: ["invalid-request", "not-found"],
  },
  update: {
    method: "PATCH",
    path: "/api/assignments/:assignmentId",
    summary: "Changes an assignment; the rubric is fixed once something is marked with it.",
    access: ofTeacher,
    params,
    body: AssignmentFieldsSchema.partial(),
    response: z.object({ assignment: AssignmentSummarySchema }),
    problems: ["invalid-request", "not-found", "wrong-state"],
  },
  handIn: {
    method: "POST",
    path: "/api/assignments/:assignmentId/submissions",
    summary: "Hands a saved revision in: makes an immutable version and runs it on the server.",
    access: ofStudent,
    params,
    body: z.object({ showId: ShowIdSchema, revision: z.int().min(0), hash: HashSchema.nullable() }),
    status: 201,
    response: HandInResultSchema,
    // `draft-conflict` when the revision is not the saved one; `past-due` by the assignment's rule.
    problems: ["invalid-request", "not-found", "draft-conflict", "past-due", "wrong-state", "key-reused"],
    isIdempotent: true,
  },
});
