import { useState, type RefObject } from "react";
import { Icon } from "../../../components/icon.tsx";
import { joinClasses } from "../../../components/class-names.ts";
import { presentDate } from "../../../lib/zoned-time.ts";
import type { Board, Column } from "../model/board.ts";
import type { BoardControl } from "../use-board.ts";
import { BoardCell } from "./board-cell.tsx";

export interface BoardTableProps {
  board: Board;
  boardRef: RefObject<HTMLTableElement | null>;
  control: BoardControl;
  /** Id of the line that explains the keys. */
  hintsId: string;
  onNight: (column: Column) => void;
}

/** A week of the plan as a table: nights by start times. One place at a time is in the tab order; arrows go on from there. */
export function BoardTable({ board, boardRef, control, hintsId, onNight }: BoardTableProps) {
  const [over, setOver] = useState<string | null>(null);
  const closed = (column: number) => board.cells.every((row) => row[column]?.kind === "rest");
  const first = board.columns[0];
  const last = board.columns.at(-1);
  return (
    <table
      ref={boardRef}
      role="grid"
      aria-describedby={hintsId}
      className="-mx-[5px] w-full table-fixed border-separate border-spacing-x-[5px] border-spacing-y-[3px]"
    >
      <caption className="sr-only">
        Lineup, {first && presentDate(first.date, "full")} to {last && presentDate(last.date, "full")}
      </caption>
      <colgroup>
        <col className="w-12" />
        {board.columns.map((column, index) => (
          <col key={column.date} className={closed(index) ? "w-20" : undefined} />
        ))}
      </colgroup>
      <thead>
        <tr>
          <td />
          {board.columns.map((column, index) => (
            <th
              key={column.date}
              scope="col"
              className={joinClasses(
                "border-b-2 px-1.5 pt-0.5 pb-1 text-left align-bottom font-head leading-tight font-[650]",
                closed(index) ? "border-line text-slate" : "border-ink",
              )}
            >
              <ColumnHead column={column} isClosed={closed(index)} onNight={onNight} />
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {board.times.map((time, row) => (
          <tr key={time}>
            <th scope="row" className="pt-1.5 pr-1 text-right align-top font-mono text-2 font-normal text-slate">
              {time}
            </th>
            {board.cells[row]?.map((cell, column) => {
              if (closed(column)) {
                return row === 0 ? (
                  <td
                    key={column}
                    rowSpan={board.times.length}
                    className="rounded-cut px-1 text-center align-middle text-meta text-slate hatched"
                  >
                    {cell.kind === "rest" ? cell.reason : ""}
                  </td>
                ) : null;
              }
              const key = `${row}-${column}`;
              const place = { row, column };
              const isHere = control.place?.row === row && control.place.column === column;
              return (
                <td key={column} className="p-0">
                  <BoardCell
                    cell={cell}
                    label={`${presentDate(board.columns[column]?.date ?? "", "full")}, ${time}`}
                    isInTabOrder={isHere}
                    onPress={() => control.press(place)}
                    carrying={{
                      placeKey: key,
                      isTonight: board.columns[column]?.isTonight ?? false,
                      carried: control.carried,
                      isTarget: over === key || (!control.isDragging && isHere),
                      onKeyDown: (event) => control.handleKey(event, place),
                      onFocus: () => control.setPlace(place),
                      onDragStart: control.drag,
                      onDragOver: () => setOver(key),
                      onDragLeave: () => setOver((before) => (before === key ? null : before)),
                      onDragEnd: () => {
                        setOver(null);
                        control.drag(null);
                      },
                      onDrop: (what) => {
                        setOver(null);
                        control.drag(null);
                        control.putDown(what, place);
                      },
                    }}
                  />
                </td>
              );
            })}
          </tr>
        ))}
      </tbody>
    </table>
  );
}

function ColumnHead({
  column,
  isClosed,
  onNight,
}: {
  column: Column;
  isClosed: boolean;
  onNight: (column: Column) => void;
}) {
  const count = column.showCount === 1 ? "1 show" : `${column.showCount} shows`;
  const open = column.freeCount > 0 ? `${count}, ${column.freeCount} free` : count;
  const line = isClosed ? (column.night?.closedReason ? "closed" : column.night ? "over" : "no night") : open;
  return (
    <>
      <span className="flex items-center gap-1 whitespace-nowrap">
        {presentDate(column.date, "column")}
        {column.isTonight && <Icon name="moon" label="tonight" className="size-3.5" />}
        {column.night && (
          <button
            type="button"
            onClick={() => onNight(column)}
            aria-label={`Hours of ${presentDate(column.date, "full")}`}
            className="-my-1 ml-auto grid size-6 place-items-center rounded-cut text-slate hover:bg-well hover:text-ink"
          >
            <Icon name="clock" className="size-4" />
          </button>
        )}
      </span>
      <span className="block font-text text-1 font-normal text-slate">{line}</span>
    </>
  );
}
