import type { Rubric } from "../../../../shared/contracts/assignments.ts";
import type { QueueRow } from "../../../../shared/contracts/marking.ts";

/** A row of the queue; `overrides` names what the test is about. */
export function buildQueueRow(id: string, overrides: Partial<QueueRow> = {}): QueueRow {
  return {
    submissionId: id as QueueRow["submissionId"],
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
