import { useState } from "react";
import { Button } from "../../../components/button.tsx";
import { Dialog } from "../../../components/dialog.tsx";
import { ScriptView } from "../editor/script-view.tsx";
import { joinTexts, listOwnLines } from "./join-texts.ts";

export interface TwoVersionsDialogProps {
  mine: string;
  theirs: string;
  onChoose: (source: string) => void;
  onClose: () => void;
}

/** Both texts of a draft that was changed in two places, side by side. The one not chosen is kept. */
export function TwoVersionsDialog({ mine, theirs, onChoose, onClose }: TwoVersionsDialogProps) {
  const [joined] = useState(() => joinTexts(mine, theirs));
  return (
    <Dialog
      isOpen
      onClose={onClose}
      title="Two versions of this script"
      size="wide"
      actions={
        <>
          <Button onPress={onClose}>Decide later</Button>
          <Button onPress={() => onChoose(joined)}>Keep both in one script</Button>
          <Button onPress={() => onChoose(theirs)}>Take the other</Button>
          <Button look="main" onPress={() => onChoose(mine)}>
            Keep mine
          </Button>
        </>
      }
    >
      <p>
        It was changed here and somewhere else: in another tab, on another computer, or by your partner. Nothing is
        lost: the text you do not choose is put aside.
      </p>
      <div className="grid gap-4 wide:grid-cols-2">
        <section>
          <h3>Mine, on this computer</h3>
          <ScriptView
            source={mine}
            label="My script"
            markedLines={listOwnLines(mine, theirs)}
            className="max-h-80 overflow-auto rounded-cut border border-line"
          />
        </section>
        <section>
          <h3>The other, on the server</h3>
          <ScriptView
            source={theirs}
            label="The other script"
            markedLines={listOwnLines(theirs, mine)}
            className="max-h-80 overflow-auto rounded-cut border border-line"
          />
        </section>
      </div>
    </Dialog>
  );
}
