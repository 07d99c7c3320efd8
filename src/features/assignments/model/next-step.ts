import type { AssignmentSummary } from "../../../../shared/contracts/assignments.ts";
import { HERE } from "../../../lib/format.ts";
import { presentDue } from "../../../lib/zoned-time.ts";

/** What an assignment asks of a pupil now. */
export interface NextStep {
  readonly label: string;
  readonly to: string;
  readonly isUrgent: boolean;
  /** Instead of the due date, where something else matters more. */
  readonly line: string | null;
}

/** The next step by the state of the work: begin, go on, mend, or read the mark. Work sent back comes first. */
export function nextStepOf(assignment: AssignmentSummary, now: number): NextStep {
  const page = `/assignments/${assignment.id}`;
  const { mine } = assignment;
  const isOver = assignment.dueAt < now;
  const late = isOver ? (assignment.lateRule === "closed" ? "hand-in is closed" : "late work is still taken") : null;
  if (mine === null) {
    return {
      label: isOver && assignment.lateRule === "closed" ? "Look" : "Begin",
      to: page,
      isUrgent: !isOver,
      line: late,
    };
  }
  switch (mine.state) {
    case "working":
      return { label: "Carry on", to: `/shows/${mine.showId}`, isUrgent: !isOver, line: late };
    case "submitted":
      return { label: "Look", to: page, isUrgent: false, line: "handed in, your teacher has it" };
    case "revise":
      return { label: "Read and fix", to: page, isUrgent: true, line: comments(mine.commentCount, assignment.dueAt) };
    case "marked":
      return {
        label: "Read the mark",
        to: page,
        isUrgent: false,
        line: mine.points ? `${mine.points.got} of ${mine.points.of} points` : null,
      };
  }
}

function comments(count: number, dueAt: number): string {
  const words = count === 0 ? "back from your teacher" : `back with ${count} ${count === 1 ? "comment" : "comments"}`;
  return `${words} · again by ${presentDue(dueAt, HERE)}`;
}

/** The way into the studio from an assignment's page, or why there is none. */
export interface StudioAction {
  readonly label: string;
  readonly to: string | null;
  readonly reason: string | null;
}

export function studioActionOf(assignment: AssignmentSummary, now: number): StudioAction {
  const { mine } = assignment;
  if (mine !== null) {
    const words = {
      working: "Carry on",
      submitted: "Change and hand in again",
      revise: "Fix it in the studio",
      marked: "Open the studio",
    } as const;
    return { label: words[mine.state], to: `/shows/${mine.showId}`, reason: null };
  }
  if (assignment.dueAt < now && assignment.lateRule === "closed") {
    return {
      label: "Begin",
      to: null,
      reason: "The due date is over and hand-in is closed. Ask your teacher if you want to begin now.",
    };
  }
  return { label: "Begin", to: `/shows/new?assignment=${assignment.id}`, reason: null };
}

const RANK = { revise: 0, working: 1, none: 2, submitted: 3, marked: 4 } as const;

/** Assignments by what they ask: to mend, under way, not begun (closed ones last), handed in, marked; each by due date. */
export function sortByNextStep(assignments: readonly AssignmentSummary[], now: number): AssignmentSummary[] {
  const rank = (one: AssignmentSummary) => {
    if (one.mine !== null) return RANK[one.mine.state];
    return one.dueAt < now ? RANK.submitted + 0.5 : RANK.none;
  };
  return [...assignments].sort((a, b) => rank(a) - rank(b) || a.dueAt - b.dueAt);
}
