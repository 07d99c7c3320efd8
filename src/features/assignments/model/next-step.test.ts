import { describe, expect, it } from "vitest";
import type { AssignmentSummary } from "../../../../shared/contracts/assignments.ts";
import { nextStepOf, sortByNextStep, studioActionOf } from "./next-step.ts";

const NOW = Date.UTC(2026, 11, 1, 16);
const DAY = 86_400_000;

const assignment = (fields: Partial<AssignmentSummary>): AssignmentSummary => ({
  id: "assignment-1",
  classId: "class-1",
  className: "7B",
  title: "Twelve bars of calm",
  songId: "frost-fair",
  songTitle: "Frost Fair",
  dueAt: NOW + DAY,
  lateRule: "accept-late",
  mine: null,
  counts: null,
  ...fields,
});
const mine = (state: NonNullable<AssignmentSummary["mine"]>["state"]): AssignmentSummary["mine"] => ({
  showId: "show-1",
  showTitle: "Calm",
  state,
  submissionId: null,
  commentCount: 2,
  points: null,
});

describe("nextStepOf", () => {
  it("asks to begin until the due date, and only to look once hand-in is closed", () => {
    expect(nextStepOf(assignment({}), NOW)).toMatchObject({ label: "Begin", isUrgent: true });
    expect(nextStepOf(assignment({ dueAt: NOW - 1, lateRule: "closed" }), NOW)).toMatchObject({
      label: "Look",
      line: "hand-in is closed",
    });
  });

  it("leads work under way straight to the studio", () => {
    expect(nextStepOf(assignment({ mine: mine("working") }), NOW).to).toBe("/shows/show-1");
  });

  it("counts the comments of work that was sent back", () => {
    expect(nextStepOf(assignment({ mine: mine("revise") }), NOW).line).toContain("2 comments");
  });
});

describe("sortByNextStep", () => {
  it("puts work to mend first, then what is under way, not begun, handed in, over, marked", () => {
    const titled = (title: string, fields: Partial<AssignmentSummary>) => assignment({ title, ...fields });
    const sorted = sortByNextStep(
      [
        titled("marked", { mine: mine("marked") }),
        titled("over", { dueAt: NOW - 1 }),
        titled("submitted", { mine: mine("submitted") }),
        titled("new", {}),
        titled("working", { mine: mine("working") }),
        titled("revise", { mine: mine("revise") }),
      ],
      NOW,
    );
    expect(sorted.map((one) => one.title)).toEqual(["revise", "working", "new", "submitted", "over", "marked"]);
  });
});

describe("studioActionOf", () => {
  it("gives no way in, but a reason, when hand-in is closed and nothing was begun", () => {
    const action = studioActionOf(assignment({ dueAt: NOW - 1, lateRule: "closed" }), NOW);
    expect(action.to).toBeNull();
    expect(action.reason).toContain("closed");
  });
});
