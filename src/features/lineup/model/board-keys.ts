import type { Board, Cell } from "./board.ts";

/** A place on the board by row (start time) and column (night). */
export interface Place {
  readonly row: number;
  readonly column: number;
}

export type Arrow = "ArrowUp" | "ArrowDown" | "ArrowLeft" | "ArrowRight";

const STEPS: Readonly<Record<Arrow, Place>> = {
  ArrowUp: { row: -1, column: 0 },
  ArrowDown: { row: 1, column: 0 },
  ArrowLeft: { row: 0, column: -1 },
  ArrowRight: { row: 0, column: 1 },
};

export function isArrow(key: string): key is Arrow {
  return key in STEPS;
}

/** What is at a place; undefined outside the board. */
export function findCell(board: Board, place: Place): Cell | undefined {
  return board.cells[place.row]?.[place.column];
}

const canStand = (cell: Cell | undefined) => cell !== undefined && cell.kind !== "rest";

/** The next place in that direction where something is or could be; the same place at the edge. */
export function stepFrom(board: Board, from: Place, arrow: Arrow): Place {
  const step = STEPS[arrow];
  let next = from;
  do {
    next = { row: next.row + step.row, column: next.column + step.column };
    if (canStand(findCell(board, next))) return next;
  } while (findCell(board, next) !== undefined);
  return from;
}

/** The first place to stand on, evening by evening; null when the whole week is dark. `prefers` narrows it where it can. */
export function findFirstPlace(board: Board, prefers: (cell: Cell) => boolean = () => true): Place | null {
  let fallback: Place | null = null;
  for (let column = 0; column < board.columns.length; column += 1)
    for (let row = 0; row < board.times.length; row += 1) {
      const cell = findCell(board, { row, column });
      if (!cell || !canStand(cell)) continue;
      if (prefers(cell)) return { row, column };
      fallback ??= { row, column };
    }
  return fallback;
}

/** Where a slot lies this week; null when it is in another week. */
export function findSlotPlace(board: Board, slotId: string): Place | null {
  for (const [row, cells] of board.cells.entries()) {
    const column = cells.findIndex((cell) => cell.kind === "slot" && cell.slot.id === slotId);
    if (column >= 0) return { row, column };
  }
  return null;
}
