import { Temporal } from "temporal-polyfill";

/** The day of seeding, from which all days of the demo world count. */
export interface SeedDay {
  /** "2026-12-04", in the event's zone; the evening goes on until 04:00. */
  readonly today: string;
  /** The local date so many days away. */
  dateOf(day: number): string;
  /** UTC milliseconds of a local time ("15:30") so many days away, never later than now. */
  before(day: number, time: string): number;
  /** UTC milliseconds of a local time so many days away. */
  at(day: number, time: string): number;
}

/** Counts days from a local date in a zone; daylight saving is the zone's. */
export function createSeedDay(today: string, timeZone: string, now: number): SeedDay {
  const date = Temporal.PlainDate.from(today);
  const at = (day: number, time: string) =>
    date.add({ days: day }).toZonedDateTime({ timeZone, plainTime: time }).epochMilliseconds;
  return {
    today,
    dateOf: (day) => date.add({ days: day }).toString(),
    at,
    before: (day, time) => Math.min(now, at(day, time)),
  };
}
