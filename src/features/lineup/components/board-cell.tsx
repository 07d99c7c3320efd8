import type { HTMLAttributes, KeyboardEvent } from "react";
import { joinClasses } from "../../../components/class-names.ts";
import { Icon } from "../../../components/icon.tsx";
import { PictureRibbon } from "../../../components/picture-ribbon.tsx";
import { presentLength } from "../../../lib/zoned-time.ts";
import type { Cell } from "../model/board.ts";
import type { Carried } from "../use-board.ts";

export interface BoardCellProps {
  cell: Cell;
  /** "Wednesday 9 December, 18:20". */
  label: string;
  isInTabOrder: boolean;
  onPress: () => void;
  /** Left out on a narrow screen, where nothing is carried over the board. */
  carrying?: CellCarrying;
}

export interface CellCarrying {
  /** "row-column", by which the focus finds it. */
  placeKey: string;
  isTonight: boolean;
  carried: Carried | null;
  /** What is carried would be put down here. */
  isTarget: boolean;
  onKeyDown: (event: KeyboardEvent) => void;
  onFocus: () => void;
  onDragStart: (what: Carried) => void;
  onDragOver: () => void;
  onDragLeave: () => void;
  onDragEnd: () => void;
  onDrop: (what: Carried) => void;
}

/** One place of the board: a show, a free time, or time in which nothing runs. */
export function BoardCell({ cell, label, isInTabOrder, onPress, carrying }: BoardCellProps) {
  if (cell.kind === "rest")
    return (
      <div className="grid h-[59px] place-items-center rounded-cut text-meta text-slate hatched">{cell.reason}</div>
    );
  const carried = carrying?.carried ?? null;
  const isLifted = cell.kind === "slot" && carried?.kind === "slot" && carried.slotId === cell.slot.id;
  return (
    // A button element cannot be dragged in every browser: this one has its role and its keys.
    <div
      role="button"
      data-place={carrying?.placeKey}
      tabIndex={isInTabOrder ? 0 : -1}
      onClick={onPress}
      onKeyDown={(event) => {
        if (carrying) carrying.onKeyDown(event);
        else if (event.key === "Enter" || event.key === " ") {
          event.preventDefault();
          onPress();
        }
      }}
      {...(carrying && listenToMouse(cell, carrying))}
      className={joinClasses(
        "relative block h-[59px] min-w-0 cursor-pointer rounded-cut focus-visible:z-10",
        cell.kind === "free"
          ? "grid place-items-center border-[1.5px] border-dashed border-rim/60 text-slate hover:bg-card hover:text-ink"
          : slotClass(cell),
        cell.kind === "slot" && carrying?.isTonight && "bg-glow/25",
        isLifted && "opacity-55 outline-2 outline-dashed outline-rim",
        carried !== null && carrying?.isTarget && !isLifted && "bg-spruce-tint! outline-2 outline-spruce",
      )}
    >
      <span className="sr-only">{label}: </span>
      {cell.kind === "free" ? (
        <>
          <span className="sr-only">free, place a show</span>
          <Icon name="plus" className="size-4" />
        </>
      ) : (
        <SlotFace cell={cell} />
      )}
      {isLifted && <span className="sr-only">, picked up</span>}
    </div>
  );
}

function listenToMouse(
  cell: Exclude<Cell, { kind: "rest" }>,
  { carried, onFocus, onDragStart, onDragOver, onDragLeave, onDragEnd, onDrop }: CellCarrying,
): HTMLAttributes<HTMLDivElement> {
  return {
    draggable: cell.kind === "slot" && !cell.slot.isPinned,
    onFocus,
    onDragLeave,
    onDragEnd,
    onDragStart: (event) => {
      if (cell.kind !== "slot") return;
      event.dataTransfer.effectAllowed = "move";
      event.dataTransfer.setData("text/plain", cell.show.title);
      onDragStart({ kind: "slot", slotId: cell.slot.id });
    },
    onDragOver: (event) => {
      if (!carried) return;
      event.preventDefault();
      onDragOver();
    },
    onDrop: (event) => {
      event.preventDefault();
      if (carried) onDrop(carried);
    },
  };
}

function slotClass({ finding }: Extract<Cell, { kind: "slot" }>): string {
  const base = "bg-card shadow-sheet-1 hover:shadow-sheet-2";
  if (finding?.severity === "stop") return `${base} border-2 border-rowan px-[5px] pt-[3px]`;
  if (finding?.severity === "warn") return `${base} border-2 border-dashed border-lamp-ink px-[5px] pt-[3px]`;
  return `${base} border border-line px-1.5 pt-1`;
}

function SlotFace({ cell }: { cell: Extract<Cell, { kind: "slot" }> }) {
  const { show, slot, finding } = cell;
  const hasMark = slot.isPinned || finding !== null;
  return (
    <>
      <span
        className={joinClasses("block truncate text-1 leading-[1.25] font-[650] tracking-[-0.01em]", hasMark && "pr-4")}
      >
        {show.title}
      </span>
      <span className="sr-only">, </span>
      <PictureRibbon picture={show.ribbon} size="row" label="" className="mt-[3px] mb-0.5" />
      <span className="flex justify-between gap-1 text-floor leading-[1.2] whitespace-nowrap text-slate">
        <span className="tabular-nums">{presentLength(show.seconds)}</span>
        <span className="truncate">{toShortSchool(show.schoolName)}</span>
      </span>
      <span className="absolute top-1 right-1 flex">
        {finding?.severity === "stop" && (
          <>
            <Icon name="stop" className="size-3.5 text-rowan" />
            <span className="sr-only">, stop: {finding.cause}</span>
          </>
        )}
        {finding?.severity === "warn" && (
          <>
            <Icon name="warn" className="size-3.5 text-lamp-ink" />
            <span className="sr-only">, look here: {finding.cause}</span>
          </>
        )}
        {slot.isPinned && (
          <>
            <Icon name="pin" className="size-3.5 text-slate" />
            <span className="sr-only">, pinned</span>
          </>
        )}
      </span>
    </>
  );
}

/** "Tarn Road Middle School" is "Tarn Road" where there is little room. */
export function toShortSchool(name: string): string {
  return name.replace(/ (Middle School|School|Academy)$/, "").replace(/^Quillhaven /, "");
}
