import type { Lineup, ProgrammeShow } from "../../../../shared/contracts/lineup.ts";
import { presentDate } from "../../../lib/zoned-time.ts";

/** One line of what publishing will change for families and crew. */
export interface PublicationChange {
  readonly slotId: string;
  readonly kind: "new" | "moved" | "gone";
  readonly title: string;
  /** "Wednesday 9 December, 18:20", or "from ... to ...". */
  readonly place: string;
}

const toPlace = (date: string, startsAt: string) => `${presentDate(date, "full")}, ${startsAt}`;

/** How the plan differs from the published programme, in the order of the nights. */
export function listPublicationChanges(
  lineup: Lineup,
  published: readonly ProgrammeShow[],
): readonly PublicationChange[] {
  const before = new Map<string, ProgrammeShow>(published.map((show) => [show.slotId, show]));
  const changes: (PublicationChange & { at: string })[] = [];
  for (const slot of lineup.slots) {
    const date = lineup.nights.find((night) => night.id === slot.nightId)?.date ?? "";
    const title = lineup.shows.find((show) => show.id === slot.forwardId)?.title ?? "";
    const was = before.get(slot.id);
    before.delete(slot.id);
    const place = toPlace(date, slot.startsAt);
    const at = `${date} ${slot.startsAt}`;
    if (!was) changes.push({ slotId: slot.id, kind: "new", title, place, at });
    else if (was.date !== date || was.startsAt !== slot.startsAt)
      changes.push({
        slotId: slot.id,
        kind: "moved",
        title,
        place: `from ${toPlace(was.date, was.startsAt)} to ${place}`,
        at,
      });
  }
  for (const show of before.values())
    changes.push({
      slotId: show.slotId,
      kind: "gone",
      title: show.title,
      place: toPlace(show.date, show.startsAt),
      at: `${show.date} ${show.startsAt}`,
    });
  return changes.sort((a, b) => a.at.localeCompare(b.at)).map(({ at: _, ...change }) => change);
}

/** Why the plan cannot be published now, as a sentence; null when it can. */
export function findPublishObstacle(lineup: Lineup): string | null {
  const stops = lineup.findings.filter((finding) => finding.severity === "stop").length;
  if (stops > 0)
    return stops === 1 ? "1 stop to clear, then it can go out." : `${stops} stops to clear, then it can go out.`;
  if (lineup.changeCount === 0 && lineup.publication) return "Nothing changed since the last publication.";
  if (lineup.slots.length === 0) return "No show is placed yet.";
  return null;
}
