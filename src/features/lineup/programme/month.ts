/** One cell of a month: a night, or null before the 1st. */
export interface MonthDay {
  readonly date: string;
  readonly day: number;
  readonly shows: number;
  /** null: runs; a text: why it is dark; undefined: outside the season. */
  readonly closedReason: string | null | undefined;
}

export interface Month {
  readonly name: string;
  /** Weeks from Monday; null where the week begins or ends in another month. */
  readonly weeks: readonly (readonly (MonthDay | null)[])[];
}

const NAME = new Intl.DateTimeFormat("en-GB", { month: "long", year: "numeric", timeZone: "UTC" });
const DAYS_IN_WEEK = 7;

/** The months of a season as calendar pages. Dates are local calendar dates; no zone moves them. */
export function buildMonths(
  nights: readonly { readonly date: string; readonly closedReason: string | null }[],
  shows: readonly { readonly date: string }[],
): Month[] {
  const closed = new Map(nights.map((night) => [night.date, night.closedReason]));
  const counts = new Map<string, number>();
  for (const show of shows) counts.set(show.date, (counts.get(show.date) ?? 0) + 1);
  const months = [...new Set(nights.map((night) => night.date.slice(0, 7)))].sort();
  return months.map((month) => {
    const first = new Date(`${month}-01T00:00:00Z`);
    const days = new Date(Date.UTC(first.getUTCFullYear(), first.getUTCMonth() + 1, 0)).getUTCDate();
    const lead = (first.getUTCDay() + DAYS_IN_WEEK - 1) % DAYS_IN_WEEK;
    const cells: (MonthDay | null)[] = Array.from({ length: lead }, () => null);
    for (let day = 1; day <= days; day += 1) {
      const date = `${month}-${String(day).padStart(2, "0")}`;
      cells.push({ date, day, shows: counts.get(date) ?? 0, closedReason: closed.get(date) });
    }
    while (cells.length % DAYS_IN_WEEK !== 0) cells.push(null);
    const weeks = Array.from({ length: cells.length / DAYS_IN_WEEK }, (_, w) =>
      cells.slice(w * DAYS_IN_WEEK, (w + 1) * DAYS_IN_WEEK),
    );
    return { name: NAME.format(first), weeks };
  });
}
