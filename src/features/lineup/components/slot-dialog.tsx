import type { ForwardSummary, Lineup, LineupFinding, Slot } from "../../../../shared/contracts/lineup.ts";
import { Button } from "../../../components/button.tsx";
import { Dialog } from "../../../components/dialog.tsx";
import { LinkButton } from "../../../components/link-button.tsx";
import { Notice } from "../../../components/notice.tsx";
import { PictureRibbon } from "../../../components/picture-ribbon.tsx";
import { presentLength } from "../../../lib/zoned-time.ts";
import { presentPlace } from "../model/change.ts";

export interface SlotDialogProps {
  lineup: Lineup;
  slot: Slot;
  show: ForwardSummary;
  finding: LineupFinding | null;
  onPin: () => void;
  onMove: () => void;
  onRemove: () => void;
  onFix: (fix: NonNullable<LineupFinding["fix"]>) => void;
  onClose: () => void;
}

/** One slot: what it is, what is wrong with it, and everything that can be done with it without dragging. */
export function SlotDialog({ lineup, slot, show, finding, onPin, onMove, onRemove, onFix, onClose }: SlotDialogProps) {
  const pinned = slot.isPinned ? "It is pinned. Take the pin out first." : null;
  return (
    <Dialog isOpen onClose={onClose} title={show.title} size="small">
      <PictureRibbon picture={show.ribbon} label="" />
      <p>
        {presentPlace(lineup, slot.nightId, slot.startsAt)} · {presentLength(show.seconds)}
        <span className="block text-slate">
          {show.publicName} · forwarded by {show.teacherName}
        </span>
      </p>
      {finding && (
        <Notice
          tone={finding.severity === "stop" ? "stop" : finding.severity === "warn" ? "warn" : "info"}
          title={finding.cause}
          actions={
            finding.fix && (
              <Button size="small" onPress={() => finding.fix && onFix(finding.fix)}>
                {finding.fix.label}
              </Button>
            )
          }
        >
          {finding.sentence}
        </Notice>
      )}
      <div className="flex flex-wrap gap-2">
        <Button icon="swap" onPress={onMove} disabledReason={pinned}>
          Move…
        </Button>
        <Button icon="pin" onPress={onPin}>
          {slot.isPinned ? "Take the pin out" : "Pin it here"}
        </Button>
        <Button icon="undo" onPress={onRemove} disabledReason={pinned}>
          Back to the tray
        </Button>
        <LinkButton icon="eye" to={`/event/shows/${show.id}`}>
          Watch the show
        </LinkButton>
      </div>
    </Dialog>
  );
}
