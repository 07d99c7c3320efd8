import { CLASSES } from "./people.ts";
import { demoScript } from "./scripts/index.ts";
import { WORK } from "./work.ts";

/** The demo world's season: every night of December, and which show is planned when. */

export const SEASON_NAME = "December on the square";
/** The start times that the board offers. */
export const START_TIMES = ["17:00", "17:20", "17:40", "18:00", "18:20", "18:40", "19:00", "19:20", "19:40"] as const;
export const OPENS_AT = "17:00";
/** Quiet hour: every show must be over. */
export const CLOSES_AT = "20:00";
const NIGHTS_IN_DECEMBER = 31;
/** Most and fewest shows of a night: Fridays and Saturdays are full. */
const FULL_NIGHT = START_TIMES.length;
const USUAL_NIGHT = 6;

export interface DemoNight {
  /** Calendar date: "2026-12-04". */
  readonly date: string;
  /** Set when nothing runs. */
  readonly closedReason: string | null;
}

export interface DemoSlot {
  readonly date: string;
  readonly startsAt: string;
  readonly scriptId: string;
  readonly isPinned: boolean;
}

/** 0 is Sunday. */
const weekday = (date: string): number => new Date(`${date}T12:00:00Z`).getUTCDay();

function closedReason(date: string): string | null {
  const day = date.slice(-2);
  if (day === "24" || day === "25" || day === "31") return "Holiday";
  return weekday(date) === 0 ? "Market day" : null;
}

/** Every night of December of a year. */
export function listNights(year: number): readonly DemoNight[] {
  return Array.from({ length: NIGHTS_IN_DECEMBER }, (_, n) => {
    const date = `${year}-12-${String(n + 1).padStart(2, "0")}`;
    return { date, closedReason: closedReason(date) };
  });
}

/** Scheduled shows of each school, so that a night can go to and fro between them. */
function scheduledBySchool(): readonly (readonly string[])[] {
  const ids = WORK.filter((one) => one.forward?.state === "scheduled").map((one) => one.scriptId);
  const schoolOf = (id: string): string => {
    const [author = ""] = demoScript(id).authors;
    return CLASSES.find((one) => author.startsWith(`${one.code}/`))?.school ?? "";
  };
  return [ids.filter((id) => schoolOf(id) === "tarn"), ids.filter((id) => schoolOf(id) === "quill")];
}

/**
 * The planned slots of a December: the schools take turns within a night, no show comes twice in one,
 * and every show moves on by one place from night to night.
 */
export function listSlots(year: number): readonly DemoSlot[] {
  const schools = scheduledBySchool();
  const open = listNights(year).filter((night) => night.closedReason === null);
  return open.flatMap(({ date }, n) => {
    const isFull = [5, 6].includes(weekday(date));
    const slots: DemoSlot[] = [];
    for (const [place, startsAt] of START_TIMES.slice(0, isFull ? FULL_NIGHT : USUAL_NIGHT).entries()) {
      const shows = schools[place % schools.length] ?? [];
      const scriptId = shows[(n + Math.floor(place / schools.length)) % Math.max(1, shows.length)];
      if (scriptId !== undefined && !slots.some((slot) => slot.scriptId === scriptId))
        slots.push({ date, startsAt, scriptId, isPinned: false });
    }
    return slots;
  });
}
