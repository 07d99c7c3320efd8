import { presentDate, toLocalDate } from "./zoned-time.ts";

/** The zone of this computer: pupils read due dates where they sit. */
export const HERE = Intl.DateTimeFormat().resolvedOptions().timeZone;

const MINUTE = 60_000;
const HOUR = 60 * MINUTE;

/** How long ago, in words a pupil uses; beyond a day it is the date. */
export function formatAgo(at: number, now: number): string {
  const ago = now - at;
  if (ago < MINUTE) return "just now";
  if (ago < HOUR) return `${Math.floor(ago / MINUTE)} min ago`;
  if (ago < 24 * HOUR) return `${Math.floor(ago / HOUR)} h ago`;
  return presentDate(toLocalDate(at, HERE), "full");
}

/** "Wren", "Wren and Idris", "Wren, Idris and June". */
export function formatNames(names: readonly string[]): string {
  if (names.length < 2) return names[0] ?? "nobody";
  return `${names.slice(0, -1).join(", ")} and ${names.at(-1)}`;
}

/** A local calendar date ("2026-12-11") in parts for a leaf and in full. No zone moves it. */
export function formatLocalDate(date: string): { weekday: string; day: string; month: string; full: string } {
  const at = Date.parse(`${date}T12:00:00Z`);
  const part = (options: Intl.DateTimeFormatOptions) =>
    new Intl.DateTimeFormat("en-GB", { ...options, timeZone: "UTC" }).format(at);
  return {
    weekday: part({ weekday: "short" }),
    day: part({ day: "numeric" }),
    month: part({ month: "short" }),
    full: part({ weekday: "long", day: "numeric", month: "long" }),
  };
}
