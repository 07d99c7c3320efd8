import type { PublishedSlot } from "../../db/schema/index.ts";
import type { ForwardFacts } from "./forward.presenter.ts";
import type { NightRow, SlotRow } from "./lineup.queries.ts";

export interface PublishedNight {
  readonly date: string;
  readonly closedReason: string | null;
}

export interface PublishedPlan {
  readonly nights: readonly PublishedNight[];
  readonly slots: readonly PublishedSlot[];
}

export function toPublishedNights(nights: readonly NightRow[]): PublishedNight[] {
  return nights.map(({ date, closedReason }) => ({ date, closedReason }));
}

/** The slots as families will see them, by date and time; a slot whose show never ran has nothing to show and is left out. */
export function toPublishedSlots(
  nights: readonly NightRow[],
  slots: readonly SlotRow[],
  shows: readonly ForwardFacts[],
): PublishedSlot[] {
  const dates = new Map(nights.map((night) => [night.id, night.date]));
  const facts = new Map(shows.map((show) => [show.forward.id, show]));
  return slots.flatMap((slot) => {
    const show = facts.get(slot.forwardId);
    const date = dates.get(slot.nightId);
    if (!show?.run || date === undefined) return [];
    return [
      {
        slotId: slot.id,
        forwardId: slot.forwardId,
        versionId: show.forward.versionId,
        runId: show.run.id,
        nightId: slot.nightId,
        date,
        startsAt: slot.startsAt,
        title: show.show.title,
        publicName: show.publicName,
        schoolName: show.schoolName,
        songTitle: show.songTitle,
        seconds: show.seconds,
        description: show.run.summary.description,
      },
    ];
  });
}

/** Slots that came, went or differ, and nights that were closed, opened or closed for another reason. */
export function countChanges(before: PublishedPlan | null, now: PublishedPlan): number {
  // Before the first publication an open night is nothing to tell.
  const nightsBefore = before?.nights ?? now.nights.map(({ date }) => ({ date, closedReason: null }));
  return (
    countDifferent(before?.slots ?? [], now.slots, (slot) => slot.slotId) +
    countDifferent(nightsBefore, now.nights, (night) => night.date)
  );
}

function countDifferent<Row extends object>(
  before: readonly Row[],
  now: readonly Row[],
  key: (row: Row) => string,
): number {
  const old = new Map(before.map((row) => [key(row), JSON.stringify(row)]));
  const changedOrNew = now.filter((row) => old.get(key(row)) !== JSON.stringify(row)).length;
  const kept = new Set(now.map(key));
  return changedOrNew + [...old.keys()].filter((id) => !kept.has(id)).length;
}
