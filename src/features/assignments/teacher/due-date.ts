import { Temporal } from "temporal-polyfill";

/** An instant (UTC milliseconds) as the value of a date-and-time field in a zone: "2026-12-04T15:30". */
export function toDueText(instant: number, zone: string): string {
  return Temporal.Instant.fromEpochMilliseconds(instant)
    .toZonedDateTimeISO(zone)
    .toPlainDateTime()
    .toString({ smallestUnit: "minute" });
}

/**
 * The instant of a date-and-time field in a zone. A time that the clocks leap over does not exist and
 * gives null, as does anything that is no date; of a time that comes twice the first is taken.
 */
export function parseDueText(text: string, zone: string): number | null {
  try {
    const local = Temporal.PlainDateTime.from(text);
    const zoned = local.toZonedDateTime(zone, { disambiguation: "earlier" });
    return zoned.toPlainDateTime().equals(local) ? zoned.epochMilliseconds : null;
  } catch {
    return null;
  }
}

/** A due date to begin with: a week from now at the end of the school's afternoon. */
export function toFirstDue(now: number, zone: string): string {
  return Temporal.Instant.fromEpochMilliseconds(now)
    .toZonedDateTimeISO(zone)
    .add({ days: 7 })
    .withPlainTime("15:30")
    .toPlainDateTime()
    .toString({ smallestUnit: "minute" });
}
