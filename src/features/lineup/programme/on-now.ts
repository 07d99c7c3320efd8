import type { ProgrammeShow } from "../../../../shared/contracts/lineup.ts";
import { presentTime, toLocalDate } from "../../../lib/zoned-time.ts";

const MINUTE = 60;

function minutesOf(time: string): number {
  const [hours = "0", minutes = "0"] = time.split(":");
  return Number(hours) * MINUTE + Number(minutes);
}

/** The slot that plays at this instant, by the event's clock; null between shows. */
export function findOnNow(shows: readonly ProgrammeShow[], now: number, zone: string): string | null {
  const date = toLocalDate(now, zone);
  const minutes = minutesOf(presentTime(now, zone));
  const on = shows.find(
    (show) =>
      show.date === date &&
      minutes >= minutesOf(show.startsAt) &&
      minutes < minutesOf(show.startsAt) + Math.ceil(show.seconds / MINUTE),
  );
  return on?.slotId ?? null;
}

/** Shows whose title, maker, school or song contains every word of the search; big and small letters are alike. */
export function searchShows(shows: readonly ProgrammeShow[], text: string): ProgrammeShow[] {
  const words = text.toLowerCase().split(/\s+/).filter(Boolean);
  if (words.length === 0) return [];
  return shows.filter((show) => {
    const hay = `${show.title} ${show.publicName} ${show.schoolName} ${show.songTitle}`.toLowerCase();
    return words.every((word) => hay.includes(word));
  });
}
