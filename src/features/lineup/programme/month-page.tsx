import { Link } from "react-router";
import { presentDate } from "../../../lib/zoned-time.ts";
import type { Month, MonthDay } from "./month.ts";

const WEEKDAYS = ["Monday", "Tuesday", "Wednesday", "Thursday", "Friday", "Saturday", "Sunday"];
const WINDOWS_A_ROW = 5;

export interface MonthPageProps {
  month: Month;
  /** The night on the page. */
  chosen: string;
  hrefOf: (date: string) => string;
}

/** A month of nights; each lit window is one show, dark nights say so. */
export function MonthPage({ month, chosen, hrefOf }: MonthPageProps) {
  return (
    <table className="w-full table-fixed border-separate border-spacing-1">
      <caption className="pb-1 text-left font-head text-5 font-semibold">{month.name}</caption>
      <thead>
        <tr>
          {WEEKDAYS.map((day) => (
            <th key={day} scope="col" className="py-1 text-meta font-semibold text-soft">
              <abbr title={day} className="no-underline">
                {day.slice(0, 3)}
              </abbr>
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {month.weeks.map((week, w) => (
          <tr key={w}>
            {week.map((day, d) => (
              <td key={d} className="h-14 p-0 align-top">
                {day && <Night day={day} isChosen={day.date === chosen} href={hrefOf(day.date)} />}
              </td>
            ))}
          </tr>
        ))}
      </tbody>
    </table>
  );
}

function Night({ day, isChosen, href }: { day: MonthDay; isChosen: boolean; href: string }) {
  const box = "flex h-full flex-col rounded-cut px-1.5 py-1 text-meta tabular-nums";
  if (day.closedReason === undefined) return <span className={`${box} text-slate`}>{day.day}</span>;
  if (day.closedReason !== null || day.shows === 0) {
    return (
      <span className={`${box} border border-dashed border-rim text-soft`} title={day.closedReason ?? undefined}>
        {day.day}
        <span className="leading-none">dark</span>
      </span>
    );
  }
  return (
    <Link
      to={href}
      aria-current={isChosen ? "date" : undefined}
      aria-label={`${presentDate(day.date, "full")}: ${day.shows} ${day.shows === 1 ? "show" : "shows"}`}
      className={`${box} border no-underline ${isChosen ? "border-main bg-main text-on-main" : "border-line bg-card text-ink hover:bg-well"}`}
    >
      <span className="font-semibold">{day.day}</span>
      <span className="mt-auto grid grid-cols-5 gap-[2px]" aria-hidden="true">
        {Array.from({ length: Math.min(day.shows, WINDOWS_A_ROW * 2) }, (_, i) => (
          <span key={i} className={`h-1.5 ${isChosen ? "bg-lamp" : "bg-lamp-ink"}`} />
        ))}
      </span>
    </Link>
  );
}
