import { Temporal } from "temporal-polyfill";

/** A night belongs to the date on which it began: it rolls over at 04:00, when every crew is home. */
const NIGHT_ROLLS_OVER_AT_HOUR = 4;

/** The date of the night that is on, or comes next, in a time zone: "2026-12-04". */
export function tonightIn(timeZone: string, now: number): string {
  const local = Temporal.Instant.fromEpochMilliseconds(now).toZonedDateTimeISO(timeZone);
  const date = local.toPlainDate();
  return (local.hour < NIGHT_ROLLS_OVER_AT_HOUR ? date.subtract({ days: 1 }) : date).toString();
}

/** Seconds from the midnight before a night: "18:20" is 66 000; hours before 04:00 are of the next day. */
export function secondsOfNight(time: string): number {
  const [hours = 0, minutes = 0] = time.split(":").map(Number);
  return ((hours < NIGHT_ROLLS_OVER_AT_HOUR ? hours + 24 : hours) * 60 + minutes) * 60;
}

/** A second of a night as a clock shows it, rounded up to the minute: "18:23". */
export function clockOfNight(seconds: number): string {
  const minutes = Math.ceil(seconds / 60) % (24 * 60);
  return `${String(Math.floor(minutes / 60)).padStart(2, "0")}:${String(minutes % 60).padStart(2, "0")}`;
}

const WEEKDAYS = ["Mon", "Tue", "Wed", "Thu", "Fri", "Sat", "Sun"] as const;
const MONTHS = ["Jan", "Feb", "Mar", "Apr", "May", "Jun", "Jul", "Aug", "Sep", "Oct", "Nov", "Dec"] as const;

/** A date in words: "Fri 4 Dec". */
export function sayDate(date: string): string {
  const plain = Temporal.PlainDate.from(date);
  return `${WEEKDAYS[plain.dayOfWeek - 1]} ${plain.day} ${MONTHS[plain.month - 1]}`;
}

/** Whole days from one date to another; negative when the other comes before. */
export function daysBetween(from: string, to: string): number {
  return Temporal.PlainDate.from(from).until(Temporal.PlainDate.from(to)).days;
}
