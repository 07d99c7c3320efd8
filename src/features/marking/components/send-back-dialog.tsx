import { useState } from "react";
import { Button } from "../../../components/button.tsx";
import { Dialog } from "../../../components/dialog.tsx";
import { Notice } from "../../../components/notice.tsx";
import { TextArea } from "../../../components/text-area.tsx";

export interface SendBackDialogProps {
  isOpen: boolean;
  authors: string;
  /** The note of the mark so far: it usually says it already. */
  note: string;
  isPending: boolean;
  error: string | null;
  onSend: (note: string) => void;
  onClose: () => void;
}

/** Asks for the note that goes with the work when it is sent back for another pass. */
export function SendBackDialog(props: SendBackDialogProps) {
  return props.isOpen ? <SendBackForm {...props} /> : null;
}

function SendBackForm({ isOpen, authors, note, isPending, error, onSend, onClose }: SendBackDialogProps) {
  const [text, setText] = useState(note);
  const [isMissed, setIsMissed] = useState(false);
  const send = () => {
    setIsMissed(text.trim() === "");
    if (text.trim() !== "") onSend(text.trim());
  };
  return (
    <Dialog
      isOpen={isOpen}
      onClose={onClose}
      title={`Send it back to ${authors}?`}
      isBusy={isPending}
      actions={
        <>
          <Button onPress={onClose}>Keep it here</Button>
          <Button look="main" icon="turn" onPress={send} isPending={isPending}>
            Send back
          </Button>
        </>
      }
    >
      <p>
        They see your note and your comments, and can work on the show and hand it in again. Your levels stay with you.
      </p>
      <TextArea
        label="What should the next pass change?"
        autoFocus
        rows={4}
        maxLength={2000}
        value={text}
        onChange={(event) => setText(event.target.value)}
        error={isMissed && text.trim() === "" ? "Say what the next pass should change." : null}
      />
      {error && <Notice tone="stop" role="alert" title={error} />}
    </Dialog>
  );
}
