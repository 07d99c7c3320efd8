import { useEffect, useRef, useState, type KeyboardEvent, type RefObject } from "react";
import type { Lineup } from "../../../shared/contracts/lineup.ts";
import type { ForwardId, SlotId } from "../../../shared/ids.ts";
import { presentDate } from "../../lib/zoned-time.ts";
import type { Board, Cell } from "./model/board.ts";
import { findCell, findFirstPlace, findSlotPlace, isArrow, type Place, stepFrom } from "./model/board-keys.ts";
import { findSlot, presentTitle } from "./model/change.ts";
import type { LineupActs } from "./use-lineup-acts.ts";

/** What is picked up, by keyboard or by mouse: a show of the tray, or a slot of the board. */
export type Carried =
  { readonly kind: "show"; readonly forwardId: ForwardId } | { readonly kind: "slot"; readonly slotId: SlotId };

export interface BoardOptions {
  readonly lineup: Lineup;
  readonly board: Board;
  readonly boardRef: RefObject<HTMLTableElement | null>;
  readonly acts: LineupActs;
  /** Opens what a slot or a free time offers besides being moved. */
  readonly onOpen: (cell: Exclude<Cell, { kind: "rest" }>) => void;
  /** One week on or back; null at the season's ends. */
  readonly onWeek: (step: 1 | -1) => boolean;
}

export type BoardControl = ReturnType<typeof useBoard>;

/** The board under the hands: which place has the focus, what is carried, and what each key does. */
export function useBoard({ lineup, board, boardRef, acts, onOpen, onWeek }: BoardOptions) {
  const [chosen, setChosen] = useState<Place | null>(null);
  const [carried, setCarried] = useState<Carried | null>(null);
  const [origin, setOrigin] = useState<Place | null>(null);
  const [isDragging, setIsDragging] = useState(false);
  const wantsFocus = useRef(false);

  const isStanding = (place: Place | null) => place !== null && (findCell(board, place)?.kind ?? "rest") !== "rest";
  const place = isStanding(chosen) ? chosen : findFirstPlace(board);

  useEffect(() => {
    if (!wantsFocus.current || !place) return;
    const element = boardRef.current?.querySelector<HTMLElement>(`[data-place="${place.row}-${place.column}"]`);
    if (!element) return;
    wantsFocus.current = false;
    element.focus();
  });

  const go = (to: Place) => {
    wantsFocus.current = true;
    setChosen(to);
  };
  const titleOf = (what: Carried) =>
    presentTitle(lineup, what.kind === "show" ? what.forwardId : (findSlot(lineup, what.slotId)?.forwardId ?? ""));

  const presentTarget = (at: Place) => {
    const cell = findCell(board, at);
    const column = board.columns[at.column];
    const where = `${column ? presentDate(column.date, "full") : ""}, ${board.times[at.row] ?? ""}`;
    if (cell?.kind !== "slot") return `${where}, free.`;
    return carried?.kind === "slot" && cell.slot.id === carried.slotId
      ? `${where}, where it was.`
      : `${where}, ${cell.show.title} is there.`;
  };

  const pickUpShow = (forwardId: ForwardId) => {
    const what: Carried = { kind: "show", forwardId };
    const first = findFirstPlace(board, (cell) => cell.kind === "free");
    if (!first) {
      acts.announce("No time is free this week. Choose another week first.");
      return;
    }
    setCarried(what);
    setOrigin(null);
    go(first);
    acts.announce(
      `${titleOf(what)} is picked up. Arrows choose a time, Space puts it down, Escape cancels. ${presentTarget(first)}`,
    );
  };
  const pickUpSlot = (at: Place, slotId: SlotId) => {
    const slot = findSlot(lineup, slotId);
    if (slot?.isPinned) {
      acts.announce(`${presentTitle(lineup, slot.forwardId)} is pinned. Press P to take the pin out first.`);
      return;
    }
    setCarried({ kind: "slot", slotId });
    setOrigin(at);
    acts.announce(
      `${titleOf({ kind: "slot", slotId })} is picked up. Arrows move it, Space puts it down, Delete sends it back to the tray, Escape cancels.`,
    );
  };
  const cancel = () => {
    if (!carried) return;
    acts.announce(`${titleOf(carried)} stays where it was.`);
    setCarried(null);
    if (origin) go(origin);
    else if (carried.kind === "show")
      document.querySelector<HTMLElement>(`[data-tray="${carried.forwardId}"]`)?.focus();
  };
  /** Puts something down at a place, carried by keyboard or dropped by mouse. */
  const putDown = (what: Carried, at: Place) => {
    const cell = findCell(board, at);
    if (!cell || cell.kind === "rest") return;
    const { nightId, startsAt } = cell.kind === "slot" ? cell.slot : cell;
    if (what.kind === "slot" && cell.kind === "slot" && cell.slot.id === what.slotId) return cancel();
    if (
      acts.apply(
        what.kind === "show"
          ? { kind: "place", forwardId: what.forwardId, nightId, startsAt }
          : { kind: "move", slotId: what.slotId, nightId, startsAt },
      )
    ) {
      setCarried(null);
      go(at);
    }
  };
  const removeSlot = (slotId: SlotId) => {
    if (acts.apply({ kind: "remove", slotId })) setCarried(null);
    wantsFocus.current = true;
  };

  const handleKey = (event: KeyboardEvent, at: Place) => {
    const cell = findCell(board, at);
    if (!cell || cell.kind === "rest" || event.ctrlKey || event.metaKey || event.altKey) return;
    const slot = cell.kind === "slot" ? cell.slot : null;
    const key = event.key;
    if (isArrow(key)) {
      const to = stepFrom(board, at, key);
      go(to);
      if (carried) acts.announce(presentTarget(to));
    } else if (key === " ") {
      if (carried) putDown(carried, at);
      else if (slot) pickUpSlot(at, slot.id);
      else onOpen(cell);
    } else if (key === "Enter") {
      if (carried) putDown(carried, at);
      else onOpen(cell);
    } else if (key === "Escape" && carried) cancel();
    else if (key.toLowerCase() === "p" && slot && !carried)
      acts.apply({ kind: "pin", slotId: slot.id, isPinned: !slot.isPinned });
    else if ((key === "Delete" || key === "Backspace") && carried?.kind === "slot") removeSlot(carried.slotId);
    else if ((key === "Delete" || key === "Backspace") && carried) cancel();
    else if ((key === "Delete" || key === "Backspace") && slot) removeSlot(slot.id);
    else if (key === "PageDown" || key === "PageUp") {
      if (onWeek(key === "PageDown" ? 1 : -1)) wantsFocus.current = true;
    } else return;
    event.preventDefault();
  };

  return {
    place,
    carried,
    carriedTitle: carried && titleOf(carried),
    isDragging,
    /** The mouse holds something (or, with null, let it go). */
    drag: (what: Carried | null) => {
      setCarried(what);
      setIsDragging(what !== null);
    },
    pickUpShow,
    putDown,
    cancel,
    removeSlot,
    handleKey,
    setPlace: setChosen,
    press: (at: Place) => {
      const cell = findCell(board, at);
      if (!cell || cell.kind === "rest") return;
      if (carried) putDown(carried, at);
      else onOpen(cell);
    },
    /** Gives the focus to a slot of this week: from a finding, for example. */
    showSlot: (slotId: SlotId) => {
      const found = findSlotPlace(board, slotId);
      if (found) go(found);
      return found !== null;
    },
  };
}
