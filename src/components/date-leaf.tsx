export interface DateLeafProps {
  /** ISO date, "2026-12-11". */
  dateTime: string;
  /** Three letters: "Fri". */
  weekday: string;
  /** "11". */
  day: string;
  /** Three letters, where the month is not plain from the place: "Dec". */
  month?: string;
  /** The date in full for assistive technology: "Friday 11 December". */
  label: string;
}

/** One leaf of a tear-off calendar: weekday on dusk, day below. */
export function DateLeaf({ dateTime, weekday, day, month, label }: DateLeafProps) {
  return (
    <time
      dateTime={dateTime}
      className="block w-14 rounded-[2px] border border-line bg-card pb-1.5 text-center leading-none shadow-sheet-1"
    >
      <span aria-hidden="true" className="block bg-leaf pt-1 pb-[5px] text-meta leading-none text-on-dusk">
        {weekday}
      </span>
      <span aria-hidden="true" className="mt-1.5 block font-head text-[1.375rem]/none font-bold tabular-nums">
        {day}
      </span>
      {month && (
        <span aria-hidden="true" className="mt-1 block text-floor leading-none text-slate">
          {month}
        </span>
      )}
      <span className="sr-only">{label}</span>
    </time>
  );
}
