const DAY_MS = 86_400_000;

const parts = (zone: string, options: Intl.DateTimeFormatOptions) =>
  new Intl.DateTimeFormat("en-GB", { timeZone: zone, ...options });

/** The calendar date of an instant (UTC milliseconds) in a zone, as 2026-12-04. */
export function toLocalDate(instant: number, zone: string): string {
  const found = new Map(
    parts(zone, { year: "numeric", month: "2-digit", day: "2-digit" })
      .formatToParts(instant)
      .map((part) => [part.type, part.value]),
  );
  return `${found.get("year")}-${found.get("month")}-${found.get("day")}`;
}

/** The time of day of an instant in a zone, as 18:20. */
export function presentTime(instant: number, zone: string): string {
  return parts(zone, { hour: "2-digit", minute: "2-digit", hourCycle: "h23" }).format(instant);
}

/** When something was, seen from `now`: "today 08:55", "yesterday 14:10", "Mon 14:10", "12 Nov 14:10". */
export function presentWhen(instant: number, now: number, zone: string): string {
  const time = presentTime(instant, zone);
  const days = countDays(toLocalDate(instant, zone), toLocalDate(now, zone));
  if (days === 0) return `today ${time}`;
  if (days === 1) return `yesterday ${time}`;
  if (days === -1) return `tomorrow ${time}`;
  if (days > 1 && days < 7) return `${parts(zone, { weekday: "short" }).format(instant)} ${time}`;
  return `${parts(zone, { day: "numeric", month: "short" }).format(instant)} ${time}`;
}

/** A due date in full: "Fri 4 December, 15:30". */
export function presentDue(instant: number, zone: string): string {
  return `${parts(zone, { weekday: "short", day: "numeric", month: "long" }).format(instant).replace(",", "")}, ${presentTime(instant, zone)}`;
}

/** Whole days from the local date `from` to the local date `to`; negative when `to` is earlier. */
export function countDays(from: string, to: string): number {
  return Math.round((Date.parse(to) - Date.parse(from)) / DAY_MS);
}

/** The local date so many days later (or earlier). */
export function addDays(date: string, days: number): string {
  return new Date(Date.parse(date) + days * DAY_MS).toISOString().slice(0, 10);
}

/** A local date in words: "Wed 9", "Wednesday 9 December", "9 December". */
export function presentDate(date: string, style: "column" | "full" | "day"): string {
  const options: Record<typeof style, Intl.DateTimeFormatOptions> = {
    column: { weekday: "short", day: "numeric" },
    full: { weekday: "long", day: "numeric", month: "long" },
    day: { day: "numeric", month: "long" },
  };
  return parts("UTC", options[style]).format(Date.parse(date)).replace(",", "");
}

/** A length in minutes and seconds: "2:24". */
export function presentLength(seconds: number): string {
  const whole = Math.round(seconds);
  return `${Math.floor(whole / 60)}:${String(whole % 60).padStart(2, "0")}`;
}
