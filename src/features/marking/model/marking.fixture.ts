import type { Rubric } from "../../../../shared/contracts/assignments.ts";
import type { QueueRow, SubmissionDetail } from "../../../../shared/contracts/marking.ts";

/** A row of the queue; `overrides` names what the test is about. */
export function buildQueueRow(id: string, overrides: Partial<QueueRow> = {}): QueueRow {
  return {
    submissionId: id,
    authors: [id],
    showTitle: `Show of ${id}`,
    state: "submitted",
    handedInAt: Date.parse("2026-12-01T14:00:00Z"),
    isLate: false,
    isOk: true,
    stopCount: 0,
    points: null,
    forwardState: null,
    ribbon: null,
    ...overrides,
  };
}

const levels = ["not yet", "nearly", "yes", "and more"].map((name) => ({ name, text: "" }));

/** Three criteria with the usual four levels. */
export function buildRubric(): Rubric {
  return [
    { id: "song", name: "Fits the song", levels },
    { id: "loop", name: "Uses a loop well", levels },
    { id: "square", name: "Uses the square", levels },
  ];
}

/** A submission that waits for a mark, with one piece of evidence; `overrides` names what the test is about. */
export function buildSubmission(id: string, overrides: Partial<SubmissionDetail> = {}): SubmissionDetail {
  return {
    submission: {
      id: id,
      assignmentId: "chorus",
      assignmentTitle: "A show with a chorus",
      classId: "class-7b",
      className: "7B",
      showId: "show-foxes",
      showTitle: "Nine Foxes",
      authors: ["Wren", "Idris"],
      state: "submitted",
      versionId: "version-3",
      versionNumber: 3,
      handedInAt: Date.parse("2026-12-01T19:10:00Z"),
      isLate: false,
      hashesAgree: true,
    },
    run: {
      isOk: true,
      problem: null,
      hash: null,
      cueCount: 120,
      findings: [],
      seconds: 144,
      description: "Starts dark.",
    },
    rubric: buildRubric(),
    comments: [],
    mark: null,
    evidence: { loop: [{ kind: "tick", text: "A loop, run 9 times", lines: [12], moments: [] }] },
    forward: null,
    history: [],
    ...overrides,
  };
}
