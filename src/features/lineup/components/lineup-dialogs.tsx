import type { Lineup, LineupFinding, Slot } from "../../../../shared/contracts/lineup.ts";
import type { ForwardId, SlotId } from "../../../../shared/ids.ts";
import type { Column } from "../model/board.ts";
import { type Change, findSlot } from "../model/change.ts";
import { ChooseShowDialog } from "./choose-show-dialog.tsx";
import { NightDialog } from "./night-dialog.tsx";
import { PlaceDialog } from "./place-dialog.tsx";
import { PublishDialog } from "./publish-dialog.tsx";
import { SlotDialog } from "./slot-dialog.tsx";

/** What the coordinator is asked about over the board. */
export type LineupTask =
  | { kind: "slot"; slotId: SlotId }
  | { kind: "free"; nightId: Slot["nightId"]; startsAt: string }
  | { kind: "place"; forwardId: ForwardId }
  | { kind: "move"; slotId: SlotId }
  | { kind: "night"; column: Column }
  | { kind: "publish" };

export interface LineupDialogsProps {
  task: LineupTask | null;
  setTask: (task: LineupTask | null) => void;
  lineup: Lineup;
  monday: string;
  onApply: (change: Change) => void;
  onFix: (fix: NonNullable<LineupFinding["fix"]>) => void;
}

/** The dialog of the task at hand, if any. */
export function LineupDialogs({ task, setTask, lineup, monday, onApply, onFix }: LineupDialogsProps) {
  const close = () => setTask(null);
  if (task?.kind === "publish") return <PublishDialog lineup={lineup} onClose={close} />;
  if (task?.kind === "night" && task.column.night)
    return <NightDialog night={task.column.night} showCount={task.column.showCount} onClose={close} />;
  if (task?.kind === "place")
    return (
      <PlaceDialog
        lineup={lineup}
        what={{ kind: "show", forwardId: task.forwardId }}
        monday={monday}
        onPlace={onApply}
        onClose={close}
      />
    );
  if (task?.kind === "free")
    return (
      <ChooseShowDialog
        lineup={lineup}
        nightId={task.nightId}
        startsAt={task.startsAt}
        onClose={close}
        onChoose={(forwardId) => onApply({ kind: "place", forwardId, nightId: task.nightId, startsAt: task.startsAt })}
      />
    );
  if (task?.kind !== "slot" && task?.kind !== "move") return null;
  const slot = findSlot(lineup, task.slotId);
  const show = lineup.shows.find((candidate) => candidate.id === slot?.forwardId);
  if (!slot || !show) return null;
  if (task.kind === "move")
    return (
      <PlaceDialog lineup={lineup} what={{ kind: "slot", slot }} monday={monday} onPlace={onApply} onClose={close} />
    );
  return (
    <SlotDialog
      lineup={lineup}
      slot={slot}
      show={show}
      finding={lineup.findings.find((finding) => finding.slotId === slot.id) ?? null}
      onPin={() => onApply({ kind: "pin", slotId: slot.id, isPinned: !slot.isPinned })}
      onMove={() => setTask({ kind: "move", slotId: slot.id })}
      onRemove={() => onApply({ kind: "remove", slotId: slot.id })}
      onFix={onFix}
      onClose={close}
    />
  );
}
