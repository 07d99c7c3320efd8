import { CLASSES } from "./people.ts";
import { demoScript } from "./scripts/index.ts";
import { WORK } from "./work.ts";

/** The demo world's season: five weeks round the day of seeding, and which show is planned when. */

export const SEASON_NAME = "Five weeks of lights";
/** The start times that the board offers. */
export const START_TIMES = ["17:00", "17:20", "17:40", "18:00", "18:20", "18:40", "19:00", "19:20", "19:40"] as const;
export const OPENS_AT = "17:00";
/** Quiet hour: every show must be over. */
export const CLOSES_AT = "20:00";
/** First and last night, and the last that is planned, in days from today: the season is half filled. */
const FIRST_DAY = -10;
const LAST_DAY = 24;
const LAST_PLANNED_DAY = 9;
/** Market day comes every week, three days after today: tonight is never dark. */
const MARKET_DAY = 3;
const DAYS_IN_WEEK = 7;
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

function addDays(date: string, days: number): string {
  const at = new Date(`${date}T12:00:00Z`);
  at.setUTCDate(at.getUTCDate() + days);
  return at.toISOString().slice(0, 10);
}

function closedReason(date: string, day: number): string | null {
  if (/-12-2[45]$/.test(date) && day !== 0) return "Holiday";
  return (((day - MARKET_DAY) % DAYS_IN_WEEK) + DAYS_IN_WEEK) % DAYS_IN_WEEK === 0 ? "Market day" : null;
}

/** Every night of the season that lies round this date. */
export function listNights(today: string): readonly DemoNight[] {
  return Array.from({ length: LAST_DAY - FIRST_DAY + 1 }, (_, n) => {
    const date = addDays(today, FIRST_DAY + n);
    return { date, closedReason: closedReason(date, FIRST_DAY + n) };
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
 * The planned slots of that season: the schools take turns within a night, no show comes twice in one,
 * and every show moves on by one place from night to night.
 */
export function listSlots(today: string): readonly DemoSlot[] {
  const schools = scheduledBySchool();
  const lastDate = addDays(today, LAST_PLANNED_DAY);
  const open = listNights(today).filter((night) => night.closedReason === null && night.date <= lastDate);
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
