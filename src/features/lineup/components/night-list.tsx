import { joinClasses } from "../../../components/class-names.ts";
import { Icon } from "../../../components/icon.tsx";
import { presentDate } from "../../../lib/zoned-time.ts";
import type { Board, Cell, Column } from "../model/board.ts";
import { BoardCell } from "./board-cell.tsx";

export interface NightListProps {
  board: Board;
  /** The night on screen, by date. */
  date: string;
  onDate: (date: string) => void;
  onOpen: (cell: Exclude<Cell, { kind: "rest" }>) => void;
  onNight: (column: Column) => void;
}

/** The week on a narrow screen: one night at a time, its times under each other. */
export function NightList({ board, date, onDate, onOpen, onNight }: NightListProps) {
  const index = Math.max(
    0,
    board.columns.findIndex((column) => column.date === date),
  );
  const column = board.columns[index];
  return (
    <div>
      <div role="group" aria-label="Night" className="-mx-4 mb-2 flex gap-1.5 overflow-x-auto px-4 py-1">
        {board.columns.map((one) => {
          const [weekday, day] = presentDate(one.date, "column").split(" ");
          return (
            <button
              key={one.date}
              type="button"
              aria-pressed={one.date === column?.date}
              onClick={() => onDate(one.date)}
              className="min-w-[46px] flex-1 rounded-[2px] border border-line bg-card pt-1.5 pb-1 text-center leading-tight aria-pressed:bg-main aria-pressed:text-on-main"
            >
              {weekday} <b className="block font-head text-4 font-[650]">{day}</b>
              <span className="flex h-4 justify-center">
                {one.stopCount > 0 ? (
                  <Icon name="stop" label="with stops" className="size-3.5" />
                ) : one.lookCount > 0 ? (
                  <Icon name="warn" label="with something to look at" className="size-3.5" />
                ) : null}
              </span>
            </button>
          );
        })}
      </div>
      {column?.night && (
        <button
          type="button"
          onClick={() => onNight(column)}
          className="mb-2 flex min-h-9 items-center gap-2 text-plum underline underline-offset-2"
        >
          <Icon name="clock" />
          {column.night.closedReason
            ? `Closed: ${column.night.closedReason}`
            : `First show from ${column.night.opensAt}, quiet from ${column.night.closesAt}`}
        </button>
      )}
      <ul className="space-y-1.5">
        {board.times.map((time, row) => {
          const cell = board.cells[row]?.[index];
          if (!cell) return null;
          return (
            <li key={time} className="grid grid-cols-[54px_minmax(0,1fr)] items-start">
              <span className={joinClasses("pt-1.5 font-mono text-2 text-slate")}>{time}</span>
              <BoardCell cell={cell} label={time} isInTabOrder onPress={() => cell.kind !== "rest" && onOpen(cell)} />
            </li>
          );
        })}
      </ul>
    </div>
  );
}
