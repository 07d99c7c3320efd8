import { useMemo, useState } from "react";
import { Button } from "../../../components/button.tsx";
import { Dialog } from "../../../components/dialog.tsx";
import { ScriptCompareView } from "./script-compare-view.tsx";

export interface TwoVersionsDialogProps {
  mine: string;
  theirs: string;
  onChoose: (source: string) => void;
  onClose: () => void;
}

/** Both texts of a draft that was changed in two places, to be compared and made one. What is not chosen is put aside. */
export function TwoVersionsDialog({ mine, theirs, onChoose, onClose }: TwoVersionsDialogProps) {
  // What each was when the dialog opened: the editor behind it cannot be reached meanwhile.
  const [opened] = useState({ mine, theirs });
  const [merged, setMerged] = useState(mine);
  const earlier = useMemo(() => ({ name: "The other, on the server", source: opened.theirs }), [opened]);
  const later = useMemo(() => ({ name: "Mine: change it here", source: opened.mine }), [opened]);
  return (
    <Dialog
      isOpen
      onClose={onClose}
      title="Two versions of this script"
      size="full"
      actions={
        <>
          <Button onPress={onClose}>Decide later</Button>
          <Button onPress={() => onChoose(opened.theirs)}>Take the other as it is</Button>
          <Button look="main" onPress={() => onChoose(merged)}>
            {merged === opened.mine ? "Keep mine" : "Keep what I made of both"}
          </Button>
        </>
      }
    >
      <p>
        It was changed here and somewhere else: in another tab, on another computer, or by your partner. Take over what
        you want from the other. Nothing is lost: both texts stay in the history.
      </p>
      <div className="grid h-[min(32rem,calc(100dvh-18rem))] min-h-60">
        <ScriptCompareView earlier={earlier} later={later} onMerge={setMerged} />
      </div>
    </Dialog>
  );
}
