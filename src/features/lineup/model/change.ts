import type { Lineup, Slot } from "../../../../shared/contracts/lineup.ts";
import { presentDate } from "../../../lib/zoned-time.ts";

/** One move of the plan, as the coordinator makes it and as it can be undone. */
export type Change =
  | {
      readonly kind: "place";
      readonly forwardId: Slot["forwardId"];
      readonly nightId: Slot["nightId"];
      readonly startsAt: string;
      readonly isPinned?: boolean;
    }
  | { readonly kind: "move"; readonly slotId: Slot["id"]; readonly nightId: Slot["nightId"]; readonly startsAt: string }
  | { readonly kind: "pin"; readonly slotId: Slot["id"]; readonly isPinned: boolean }
  | { readonly kind: "remove"; readonly slotId: Slot["id"] };

export function findSlot(lineup: Lineup, slotId: string): Slot | null {
  return lineup.slots.find((slot) => slot.id === slotId) ?? null;
}

/** The slot at a night's start time, or null when it is free. */
export function findSlotAt(lineup: Lineup, nightId: string, startsAt: string): Slot | null {
  return lineup.slots.find((slot) => slot.nightId === nightId && slot.startsAt === startsAt) ?? null;
}

/** "Wednesday 9 December, 18:20". */
export function presentPlace(lineup: Lineup, nightId: string, startsAt: string): string {
  const night = lineup.nights.find((candidate) => candidate.id === nightId);
  return night ? `${presentDate(night.date, "full")}, ${startsAt}` : startsAt;
}

/** The title of a show on the plan. */
export function presentTitle(lineup: Lineup, forwardId: string): string {
  return lineup.shows.find((show) => show.id === forwardId)?.title ?? "This show";
}

function isOver(lineup: Lineup, nightId: string): boolean {
  const night = lineup.nights.find((candidate) => candidate.id === nightId);
  return night !== undefined && night.date < lineup.tonight;
}

/** What stands in the way of a change, as a sentence; null when nothing does. */
export function findObstacle(lineup: Lineup, change: Change): string | null {
  const slotNight = change.kind === "place" ? null : findSlot(lineup, change.slotId)?.nightId;
  if (slotNight && change.kind !== "pin" && isOver(lineup, slotNight)) return "That night is over: it stays as it was.";
  if ((change.kind === "place" || change.kind === "move") && isOver(lineup, change.nightId))
    return "That night is over.";
  if (change.kind === "place") {
    const there = findSlotAt(lineup, change.nightId, change.startsAt);
    return there ? `${presentTitle(lineup, there.forwardId)} is there. Move it first, or choose a free time.` : null;
  }
  if (change.kind === "move" || change.kind === "remove") {
    const slot = findSlot(lineup, change.slotId);
    if (slot?.isPinned) return `${presentTitle(lineup, slot.forwardId)} is pinned. Take the pin out first.`;
  }
  if (change.kind === "move") {
    const there = findSlotAt(lineup, change.nightId, change.startsAt);
    if (there && there.id !== change.slotId && there.isPinned)
      return `${presentTitle(lineup, there.forwardId)} is pinned there. Take its pin out first.`;
  }
  return null;
}

/** The plan as it will be: shown at once, until the server's answer replaces it. Findings stay as they were. */
export function applyChange(lineup: Lineup, change: Change): Lineup {
  switch (change.kind) {
    case "place": {
      const slot: Slot = {
        id: "placing",
        nightId: change.nightId,
        startsAt: change.startsAt,
        forwardId: change.forwardId,
        isPinned: change.isPinned ?? false,
      };
      return { ...lineup, slots: [...lineup.slots, slot] };
    }
    case "move": {
      const slot = findSlot(lineup, change.slotId);
      const there = findSlotAt(lineup, change.nightId, change.startsAt);
      return {
        ...lineup,
        slots: lineup.slots.map((candidate) => {
          if (candidate.id === change.slotId)
            return { ...candidate, nightId: change.nightId, startsAt: change.startsAt };
          if (slot && candidate.id === there?.id)
            return { ...candidate, nightId: slot.nightId, startsAt: slot.startsAt };
          return candidate;
        }),
      };
    }
    case "pin":
      return {
        ...lineup,
        slots: lineup.slots.map((slot) => (slot.id === change.slotId ? { ...slot, isPinned: change.isPinned } : slot)),
      };
    case "remove":
      return { ...lineup, slots: lineup.slots.filter((slot) => slot.id !== change.slotId) };
  }
}

/** The change that takes `change` back, from the plans before and after it; null when its slot is gone. */
export function invertChange(before: Lineup, after: Lineup, change: Change): Change | null {
  switch (change.kind) {
    case "place": {
      const placed = findSlotAt(after, change.nightId, change.startsAt);
      return placed ? { kind: "remove", slotId: placed.id } : null;
    }
    case "move": {
      const slot = findSlot(before, change.slotId);
      return slot && findSlot(after, change.slotId)
        ? { kind: "move", slotId: slot.id, nightId: slot.nightId, startsAt: slot.startsAt }
        : null;
    }
    case "pin":
      return { ...change, isPinned: !change.isPinned };
    case "remove": {
      const slot = findSlot(before, change.slotId);
      return slot
        ? {
            kind: "place",
            forwardId: slot.forwardId,
            nightId: slot.nightId,
            startsAt: slot.startsAt,
            isPinned: slot.isPinned,
          }
        : null;
    }
  }
}

/** What a change did, for the live region and the undo message. */
export function presentChange(before: Lineup, change: Change): string {
  if (change.kind === "place")
    return `${presentTitle(before, change.forwardId)} is placed on ${presentPlace(before, change.nightId, change.startsAt)}.`;
  const slot = findSlot(before, change.slotId);
  const title = slot ? presentTitle(before, slot.forwardId) : "The show";
  if (change.kind === "pin")
    return change.isPinned ? `${title} is pinned: it keeps its place.` : `${title} has no pin any more.`;
  if (change.kind === "remove") return `${title} is back in the tray.`;
  const there = findSlotAt(before, change.nightId, change.startsAt);
  const swapped =
    there && there.id !== change.slotId ? ` ${presentTitle(before, there.forwardId)} took its place.` : "";
  return `${title} moved to ${presentPlace(before, change.nightId, change.startsAt)}.${swapped}`;
}
