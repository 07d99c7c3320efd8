import {
  type AssignmentDetail,
  type AssignmentFields,
  AssignmentFieldsSchema,
  type Criterion,
  type Requirement,
  REQUIREMENT_NAMES,
} from "../../../../shared/contracts/assignments.ts";
import { parseDueText, toDueText, toFirstDue } from "./due-date.ts";
import { STARTING_RUBRIC } from "./starting-rubric.ts";

export const REQUIREMENT_KINDS = Object.keys(REQUIREMENT_NAMES) as Requirement["kind"][];

/** The form as it stands on the page: what is not yet right included. */
export interface AssignmentDraft {
  readonly title: string;
  readonly brief: string;
  readonly songId: string;
  /** As the date-and-time field holds it, in the school's zone. */
  readonly due: string;
  readonly lateRule: AssignmentFields["lateRule"];
  /** How often each is asked for; 0 is not at all. */
  readonly uses: Readonly<Record<Requirement["kind"], number>>;
  readonly rubric: readonly Criterion[];
}

/** What is wrong with one field; `fieldId` is the id of its box on the page. */
export interface DraftError {
  readonly fieldId: string;
  readonly message: string;
}

const NO_USES = Object.fromEntries(REQUIREMENT_KINDS.map((kind) => [kind, 0])) as AssignmentDraft["uses"];

/** An empty form with a due date in a week and a rubric to begin with. */
export function toNewDraft(now: number, zone: string): AssignmentDraft {
  return {
    title: "",
    brief: "",
    songId: "",
    due: toFirstDue(now, zone),
    lateRule: "accept-late",
    uses: NO_USES,
    rubric: STARTING_RUBRIC,
  };
}

export function toDraft(detail: AssignmentDetail, zone: string): AssignmentDraft {
  const { assignment, brief, requirements, rubric } = detail;
  return {
    title: assignment.title,
    brief,
    songId: assignment.songId,
    due: toDueText(assignment.dueAt, zone),
    lateRule: assignment.lateRule,
    uses: {
      ...NO_USES,
      ...Object.fromEntries(requirements.map((requirement) => [requirement.kind, requirement.atLeast])),
    },
    rubric,
  };
}

export interface CheckOptions {
  readonly zone: string;
  readonly now: number;
  /** The due date that the assignment has already: it may lie in the past. */
  readonly keptDue?: number;
}

/** The fields to send, or every bad field with what to do about it. */
export function checkDraft(
  draft: AssignmentDraft,
  { zone, now, keptDue }: CheckOptions,
): { fields: AssignmentFields; errors: null } | { fields: null; errors: readonly DraftError[] } {
  const dueAt = parseDueText(draft.due, zone);
  const errors: DraftError[] = [];
  if (draft.songId === "") errors.push({ fieldId: "songId", message: "Choose a song." });
  if (dueAt === null)
    errors.push({
      fieldId: "due",
      message:
        draft.due === ""
          ? "Choose a date and a time."
          : "This time does not exist: the clocks change that night. Choose another.",
    });
  else if (dueAt <= now && dueAt !== keptDue)
    errors.push({ fieldId: "due", message: "Choose a time that is still to come." });
  const parsed = AssignmentFieldsSchema.safeParse({
    title: draft.title,
    brief: draft.brief,
    songId: draft.songId,
    dueAt: dueAt ?? 0,
    lateRule: draft.lateRule,
    requirements: REQUIREMENT_KINDS.filter((kind) => draft.uses[kind] > 0).map((kind) => ({
      kind,
      atLeast: draft.uses[kind],
    })),
    rubric: draft.rubric,
  });
  for (const issue of parsed.error?.issues ?? []) {
    const fieldId = toFieldId(issue.path);
    if (!errors.some((error) => error.fieldId === fieldId)) errors.push({ fieldId, message: issue.message });
  }
  if (parsed.success && errors.length === 0) return { fields: parsed.data, errors: null };
  const order = (error: DraftError) => FIELD_ORDER.indexOf(error.fieldId.split("-")[0] ?? "");
  return { fields: null, errors: errors.sort((a, b) => order(a) - order(b)) };
}

const FIELD_ORDER = ["title", "songId", "brief", "due", "lateRule", "requirements", "rubric"];

/** The id of the box that a path of the request belongs to: "rubric-0-name". */
export function toFieldId(path: readonly PropertyKey[]): string {
  return path[0] === "dueAt" ? "due" : path.map(String).join("-");
}

const LABELS: Readonly<Record<string, string>> = {
  title: "Title",
  songId: "Song",
  brief: "Brief",
  due: "Due",
  requirements: "What the script must use",
  rubric: "Rubric",
};

/** The name of a field for the list of what is to mend: "Criterion 2, level 3". */
export function presentField(fieldId: string): string {
  const [, criterion, part, level] = /^rubric-(\d+)-(name|levels)(?:-(\d+))?/.exec(fieldId) ?? [];
  if (criterion === undefined) return LABELS[fieldId] ?? LABELS[fieldId.split("-")[0] ?? ""] ?? "Form";
  const place = `Criterion ${Number(criterion) + 1}`;
  return part === "name" ? `${place}, name` : `${place}, level ${Number(level ?? 0) + 1}`;
}
