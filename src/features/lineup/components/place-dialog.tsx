import { useState } from "react";
import type { Lineup, Slot } from "../../../../shared/contracts/lineup.ts";
import { Button } from "../../../components/button.tsx";
import { Dialog } from "../../../components/dialog.tsx";
import { Select } from "../../../components/select.tsx";
import { presentDate } from "../../../lib/zoned-time.ts";
import { type Change, findObstacle, findSlotAt, presentTitle } from "../model/change.ts";

export interface PlaceDialogProps {
  lineup: Lineup;
  /** What is placed: a show of the tray, or a slot that goes elsewhere. */
  what: { kind: "show"; forwardId: Slot["forwardId"] } | { kind: "slot"; slot: Slot };
  /** The week on the board: its nights come first. */
  monday: string;
  onPlace: (change: Change) => void;
  onClose: () => void;
}

/** Places or moves a show by choosing night and time from lists: the way without dragging. */
export function PlaceDialog({ lineup, what, monday, onPlace, onClose }: PlaceDialogProps) {
  const forwardId = what.kind === "show" ? what.forwardId : what.slot.forwardId;
  const nights = lineup.nights.filter((night) => night.closedReason === null && night.date >= lineup.tonight);
  const [nightId, setNightId] = useState<string>((nights.find((night) => night.date >= monday) ?? nights[0])?.id ?? "");
  const [startsAt, setStartsAt] = useState("");
  const night = nights.find((candidate) => candidate.id === nightId);
  const times = night ? lineup.times.filter((time) => time >= night.opensAt && time < night.closesAt) : [];
  const change: Change | null =
    night && startsAt !== ""
      ? what.kind === "show"
        ? { kind: "place", forwardId, nightId: night.id, startsAt }
        : { kind: "move", slotId: what.slot.id, nightId: night.id, startsAt }
      : null;
  const obstacle = change && findObstacle(lineup, change);
  const taken = night && startsAt !== "" ? findSlotAt(lineup, night.id, startsAt) : null;
  const isSwap = what.kind === "slot" && taken !== null && taken.id !== what.slot.id;
  const title = presentTitle(lineup, forwardId);

  return (
    <Dialog
      isOpen
      onClose={onClose}
      size="small"
      title={what.kind === "show" ? `Place ${title}` : `Move ${title}`}
      actions={
        <>
          <Button onPress={onClose}>Cancel</Button>
          <Button
            look="main"
            disabledReason={nights.length === 0 ? "No night is open." : change === null ? "Choose a time." : obstacle}
            onPress={() => change && onPlace(change)}
          >
            {isSwap ? "Change places" : what.kind === "show" ? "Place it" : "Move it"}
          </Button>
        </>
      }
    >
      <Select
        label="Night"
        value={nightId}
        autoFocus
        onChange={(event) => {
          setNightId(event.target.value);
          setStartsAt("");
        }}
        options={nights.map((one) => ({ value: one.id, label: presentDate(one.date, "full") }))}
      />
      <Select
        label="Start time"
        placeholder="Choose a time"
        value={startsAt}
        onChange={(event) => setStartsAt(event.target.value)}
        options={times.map((time) => {
          const there = night && findSlotAt(lineup, night.id, time);
          return {
            value: time,
            label: there
              ? `${time}, ${presentTitle(lineup, there.forwardId)}${there.isPinned ? " (pinned)" : ""}`
              : `${time}, free`,
          };
        })}
        error={obstacle}
      />
      {isSwap && taken && !obstacle && (
        <p className="text-soft">
          {presentTitle(lineup, taken.forwardId)} takes the place that {title} has now.
        </p>
      )}
    </Dialog>
  );
}
