import { useState } from "react";
import { Button } from "../../../components/button.tsx";
import { Dialog } from "../../../components/dialog.tsx";
import { Notice } from "../../../components/notice.tsx";
import { listFindings, type RunState } from "./run-model.ts";

export interface HandInDialogProps {
  title: string;
  run: RunState;
  /** Whether the newest run is of the text that would be handed in. */
  isRunCurrent: boolean;
  onHandIn: () => Promise<void>;
  onClose: () => void;
}

/** Says what would be handed in, and how it stands. Handing in is never blocked. */
export function HandInDialog({ title, run, isRunCurrent, onHandIn, onClose }: HandInDialogProps) {
  const [isPending, setIsPending] = useState(false);
  const [isFailed, setIsFailed] = useState(false);
  const handIn = () => {
    setIsPending(true);
    setIsFailed(false);
    onHandIn().then(onClose, () => {
      setIsPending(false);
      setIsFailed(true);
    });
  };
  const warning = isRunCurrent ? findWarning(run) : null;
  return (
    <Dialog
      isOpen
      onClose={onClose}
      isBusy={isPending}
      size="small"
      title={`Hand in ${title}?`}
      actions={
        <>
          <Button onPress={onClose} disabledReason={isPending ? "Wait until it is handed in." : null}>
            Keep working
          </Button>
          <Button look="main" icon="sent" isPending={isPending} onPress={handIn}>
            Hand in
          </Button>
        </>
      }
    >
      {warning && (
        <Notice tone="warn" title={warning.title}>
          <p>{warning.meaning}</p>
        </Notice>
      )}
      <p>Your teacher gets the script as it is now. You can go on working, and hand in again until the due date.</p>
      {isFailed && <Notice tone="stop" role="alert" title="It was not handed in. Your script is safe. Try again." />}
    </Dialog>
  );
}

function findWarning(run: RunState): { title: string; meaning: string } | null {
  const { outcome } = run;
  if (outcome?.ok === false)
    return {
      title: "This script does not run.",
      meaning: `Line ${outcome.problem.range.line} has a problem. You can hand it in all the same: it is marked "does not run".`,
    };
  const stops = listFindings(run).filter((finding) => finding.severity === "stop").length;
  if (stops === 0) return null;
  return {
    title: stops === 1 ? "The check found 1 stop." : `The check found ${stops} stops.`,
    meaning: "You can hand it in all the same. It can not go to the square until that is mended.",
  };
}
