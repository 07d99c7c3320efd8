import { useId, useRef, useState } from "react";
import type { Lineup, LineupFinding } from "../../../../shared/contracts/lineup.ts";
import type { SlotId } from "../../../../shared/ids.ts";
import { Button } from "../../../components/button.tsx";
import { EmptyState } from "../../../components/empty-state.tsx";
import { IconButton } from "../../../components/icon-button.tsx";
import { KeyHints } from "../../../components/kbd.tsx";
import { SubBand } from "../../../components/sub-band.tsx";
import { Tag } from "../../../components/tag.tsx";
import { useMediaQuery } from "../../../hooks/use-media-query.ts";
import { addDays, presentDate, presentWhen, toLocalDate } from "../../../lib/zoned-time.ts";
import { buildBoard, type Cell, listWeeks, toMonday } from "../model/board.ts";
import { type Change, findSlot } from "../model/change.ts";
import { findPublishObstacle } from "../model/publication.ts";
import { useBoard } from "../use-board.ts";
import { useLineupActs } from "../use-lineup-acts.ts";
import { BoardTable } from "./board.tsx";
import { FindingsColumn } from "./findings-column.tsx";
import { LineupDialogs, type LineupTask } from "./lineup-dialogs.tsx";
import { NightList } from "./night-list.tsx";
import { Tray } from "./tray.tsx";

export interface LineupBoardProps {
  lineup: Lineup;
  /** The Monday of the week on screen; it lives in the address. */
  monday: string;
  onMonday: (monday: string) => void;
  now: number;
}

const HINTS = [
  { keys: ["Space"], does: "pick up, put down" },
  { keys: ["arrows"], does: "move" },
  { keys: ["P"], does: "pin" },
  { keys: ["Del"], does: "back to the tray" },
  { keys: ["Esc"], does: "cancel" },
];

/** The season's plan: approved shows in the tray, a week on the board, what stands in the way beside it. */
export function LineupBoard({ lineup, monday, onMonday, now }: LineupBoardProps) {
  const hintsId = useId();
  const statusId = useId();
  const isNarrow = useMediaQuery("(max-width: 56.25rem)");
  const [task, setTask] = useState<LineupTask | null>(null);
  const [date, setDate] = useState(lineup.tonight);
  const acts = useLineupActs(lineup);
  const weeks = listWeeks(lineup.season);
  const board = buildBoard(lineup, monday);
  const week = (step: 1 | -1) => {
    const to = addDays(monday, step * 7);
    if (!weeks.includes(to)) {
      acts.announce(step === 1 ? "This is the season’s last week." : "This is the season’s first week.");
      return false;
    }
    onMonday(to);
    setDate(to);
    acts.announce(`Week of ${presentDate(to, "full")}.`);
    return true;
  };
  const open = (cell: Exclude<Cell, { kind: "rest" }>) =>
    setTask(
      cell.kind === "slot"
        ? { kind: "slot", slotId: cell.slot.id }
        : { kind: "free", nightId: cell.nightId, startsAt: cell.startsAt },
    );
  const boardRef = useRef<HTMLTableElement>(null);
  const control = useBoard({ lineup, board, boardRef, acts, onOpen: open, onWeek: week });
  const obstacle = findPublishObstacle(lineup);
  const close = () => setTask(null);
  const apply = (change: Change) => {
    if (acts.apply(change)) close();
  };
  const fix = (found: NonNullable<LineupFinding["fix"]>) =>
    apply(
      found.kind === "remove"
        ? { kind: "remove", slotId: found.slotId }
        : { kind: "move", slotId: found.slotId, nightId: found.nightId, startsAt: found.startsAt },
    );
  const showSlot = (slotId: SlotId) => {
    const night = lineup.nights.find((candidate) => candidate.id === findSlot(lineup, slotId)?.nightId);
    if (!night) return;
    setDate(night.date);
    if (!control.showSlot(slotId)) onMonday(toMonday(night.date));
    if (isNarrow) setTask({ kind: "slot", slotId });
  };
  const last = addDays(monday, 6);
  return (
    <>
      <SubBand
        title="Lineup"
        detail={lineup.season.name}
        actions={
          <>
            <Button
              icon="undo"
              onPress={() => acts.undo?.()}
              disabledReason={acts.undo ? null : "There is no move to undo."}
            >
              Undo
            </Button>
            <Button
              icon="send"
              look={obstacle ? "plain" : "main"}
              disabledReason={obstacle}
              reasonId={obstacle ? statusId : undefined}
              onPress={() => setTask({ kind: "publish" })}
            >
              Publish
            </Button>
          </>
        }
      >
        <div className="flex items-center gap-0.5">
          <IconButton
            icon="chevron-left"
            label="Week before"
            disabledReason={weeks.includes(addDays(monday, -7)) ? null : "The season begins this week."}
            onPress={() => void week(-1)}
          />
          <strong className="min-w-40 text-center tabular-nums max-wide:min-w-0">{presentWeek(monday, last)}</strong>
          <IconButton
            icon="chevron-right"
            label="Week after"
            disabledReason={weeks.includes(addDays(monday, 7)) ? null : "The season ends this week."}
            onPress={() => void week(1)}
          />
        </div>
        <DraftTag lineup={lineup} now={now} />
      </SubBand>
      <div className="grid flex-1 grid-cols-[214px_minmax(0,1fr)_248px] wide:h-[calc(100dvh-var(--band)-52px)] wide:flex-none max-wide:grid-cols-1">
        {!isNarrow && (
          <Tray
            lineup={lineup}
            carried={control.carried}
            hintsId={hintsId}
            onPickUp={control.pickUpShow}
            onDragStart={control.drag}
            onDragEnd={() => control.drag(null)}
            onDropSlot={({ slotId }) => {
              control.drag(null);
              control.removeSlot(slotId);
            }}
            onPlace={(forwardId) => setTask({ kind: "place", forwardId })}
          />
        )}
        <section
          aria-label="Week"
          className="min-h-0 min-w-0 overflow-auto px-3 py-2 [scrollbar-width:thin] max-wide:px-4 max-wide:pb-4"
        >
          {lineup.nights.length === 0 ? (
            <EmptyState icon="calendar" title="The season has no night yet" headingLevel={2}>
              Nights are set up with the season. Ask the admin.
            </EmptyState>
          ) : isNarrow ? (
            <NightList
              board={board}
              date={date}
              onDate={setDate}
              onOpen={open}
              onNight={(column) => setTask({ kind: "night", column })}
            />
          ) : (
            <BoardTable
              board={board}
              boardRef={boardRef}
              control={control}
              hintsId={hintsId}
              onNight={(column) => setTask({ kind: "night", column })}
            />
          )}
          <div id={hintsId} className="px-0.5 pt-2 wide:pl-12">
            {control.carriedTitle && !control.isDragging ? (
              <p className="flex flex-wrap items-center gap-2">
                <strong>{control.carriedTitle}</strong> is picked up. Press a time, or move with the arrows and put it
                down with Space.
                <Button size="small" onPress={control.cancel}>
                  Cancel
                </Button>
              </p>
            ) : (
              <KeyHints hints={HINTS} />
            )}
          </div>
          <p role="status" aria-live="assertive" className="sr-only">
            {acts.news}
          </p>
        </section>
        <FindingsColumn
          lineup={lineup}
          status={obstacle ?? "Everything is clear. It can go out."}
          statusId={statusId}
          onFix={fix}
          onShowSlot={showSlot}
          onPlace={(forwardId) => setTask({ kind: "place", forwardId })}
        />
        {isNarrow && (
          <Tray
            lineup={lineup}
            carried={null}
            hintsId={hintsId}
            onPickUp={null}
            onDragStart={control.drag}
            onDragEnd={() => control.drag(null)}
            onDropSlot={() => undefined}
            onPlace={(forwardId) => setTask({ kind: "place", forwardId })}
          />
        )}
      </div>
      <LineupDialogs task={task} setTask={setTask} lineup={lineup} monday={monday} onApply={apply} onFix={fix} />
    </>
  );
}

function presentWeek(from: string, to: string): string {
  const [day, month] = presentDate(from, "day").split(" ");
  const end = presentDate(to, "day");
  return end.endsWith(` ${month}`) ? `${day} – ${end}` : `${day} ${month} – ${end}`;
}

function DraftTag({ lineup, now }: { lineup: Lineup; now: number }) {
  const { publication, changeCount, season } = lineup;
  if (!publication) return <Tag state="working">Draft, never published</Tag>;
  const today = toLocalDate(now, season.timeZone) === toLocalDate(publication.publishedAt, season.timeZone);
  const when = today ? "today" : (presentWhen(publication.publishedAt, now, season.timeZone).split(/ \d\d:/)[0] ?? "");
  if (changeCount === 0) return <Tag state="scheduled">Published {when}, nothing changed since</Tag>;
  return (
    <Tag state="working">
      Draft, {changeCount === 1 ? "1 change" : `${changeCount} changes`} since {when}
    </Tag>
  );
}
