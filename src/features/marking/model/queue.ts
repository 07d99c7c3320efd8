import type { QueueRow } from "../../../../shared/contracts/marking.ts";
import type { WorkState } from "../../../../shared/contracts/shows.ts";

const ORDER: Readonly<Record<WorkState, number>> = { submitted: 0, working: 1, revise: 1, marked: 2 };

/** What waits for a mark first (the longest waiting at the top), then what was sent back, then what is marked. */
export function orderQueue(rows: readonly QueueRow[]): readonly QueueRow[] {
  return [...rows].sort(
    (a, b) =>
      ORDER[a.state] - ORDER[b.state] || a.handedInAt - b.handedInAt || a.submissionId.localeCompare(b.submissionId),
  );
}

/** The row so many steps on in the order shown; null at either end. */
export function findNeighbour(rows: readonly QueueRow[], submissionId: string, step: 1 | -1): QueueRow | null {
  const at = rows.findIndex((row) => row.submissionId === submissionId);
  return at < 0 ? null : (rows[at + step] ?? null);
}

/** What to mark after this one: the next that waits below it, else the first that waits; null when all is done. */
export function findNextToMark(rows: readonly QueueRow[], submissionId: string): QueueRow | null {
  const at = rows.findIndex((row) => row.submissionId === submissionId);
  const waits = (row: QueueRow) => row.state === "submitted" && row.submissionId !== submissionId;
  return rows.slice(at + 1).find(waits) ?? rows.find(waits) ?? null;
}

/** "6 to mark, 2 sent back". */
export function presentQueue(rows: readonly QueueRow[]): string {
  const count = (state: WorkState) => rows.filter((row) => row.state === state).length;
  const parts = [`${count("submitted")} to mark`];
  if (count("revise") > 0) parts.push(`${count("revise")} sent back`);
  return parts.join(", ");
}
