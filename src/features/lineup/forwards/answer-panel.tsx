import { useState } from "react";
import type { ForwardSummary } from "../../../../shared/contracts/lineup.ts";
import { Button } from "../../../components/button.tsx";
import { Dialog } from "../../../components/dialog.tsx";
import { LinkButton } from "../../../components/link-button.tsx";
import { Notice } from "../../../components/notice.tsx";
import { TextArea } from "../../../components/text-area.tsx";
import { showToast } from "../../../components/toast-queue.ts";
import { useApprove, useDecline } from "../api.ts";

export interface AnswerPanelProps {
  forward: ForwardSummary;
  /** Stops of the check on the square as it is now. */
  stopCount: number;
  runs: boolean;
}

/** The coordinator's answer: approve, or send back with a note that says why. */
export function AnswerPanel({ forward, stopCount, runs }: AnswerPanelProps) {
  const [note, setNote] = useState("");
  const [isDeclining, setIsDeclining] = useState(false);
  const approve = useApprove();
  const obstacle = !runs
    ? "It does not run."
    : stopCount > 0
      ? stopCount === 1
        ? "1 stop is open."
        : `${stopCount} stops are open.`
      : null;

  if (forward.state === "declined") {
    return (
      <Notice tone="warn" icon="turn" title="You sent it back.">
        {forward.answer}
      </Notice>
    );
  }
  const isWaiting = forward.state === "waiting";
  return (
    <div className="space-y-3">
      {isWaiting ? (
        <TextArea
          label="Note to the teacher"
          isOptional
          rows={2}
          maxLength={1000}
          value={note}
          onChange={(event) => setNote(event.target.value)}
        />
      ) : (
        <Notice
          tone="ok"
          title={
            forward.state === "scheduled"
              ? `Approved, and on ${forward.slotCount === 1 ? "1 slot" : `${forward.slotCount} slots`} of the lineup.`
              : "Approved. It waits in the tray of the lineup."
          }
          actions={
            <LinkButton to="/lineup" icon="calendar">
              Open the lineup
            </LinkButton>
          }
        >
          {forward.answer}
        </Notice>
      )}
      {approve.error && (
        <Notice tone="stop" role="alert" title="The show was not approved.">
          {approve.error.message}
        </Notice>
      )}
      <div className="flex flex-wrap gap-2">
        {isWaiting && (
          <Button
            look="main"
            icon="tick"
            isPending={approve.isPending}
            disabledReason={obstacle}
            onPress={() =>
              approve.mutate(
                { forwardId: forward.id, note: note.trim() },
                {
                  onSuccess: () =>
                    showToast({
                      title: `${forward.title} is approved.`,
                      detail: "It waits in the tray of the lineup.",
                    }),
                },
              )
            }
          >
            Approve
          </Button>
        )}
        <Button icon="turn" onPress={() => setIsDeclining(true)}>
          Send back
        </Button>
      </div>
      {isDeclining && <DeclineDialog forward={forward} note={note} onClose={() => setIsDeclining(false)} />}
    </div>
  );
}

function DeclineDialog({ forward, note, onClose }: { forward: ForwardSummary; note: string; onClose: () => void }) {
  const [text, setText] = useState(note);
  const [isTried, setIsTried] = useState(false);
  const decline = useDecline();
  const send = () => {
    setIsTried(true);
    if (text.trim() === "") return;
    decline.mutate(
      { forwardId: forward.id, note: text.trim() },
      {
        onSuccess: () => {
          showToast({ title: `${forward.title} is sent back to ${forward.teacherName}.` });
          onClose();
        },
      },
    );
  };
  return (
    <Dialog
      isOpen
      onClose={onClose}
      title={`Send ${forward.title} back?`}
      isBusy={decline.isPending}
      actions={
        <>
          <Button onPress={onClose}>Keep it</Button>
          <Button
            look={forward.slotCount > 0 ? "stop" : "main"}
            icon="turn"
            isPending={decline.isPending}
            onPress={send}
          >
            Send back
          </Button>
        </>
      }
    >
      {forward.slotCount > 0 && (
        <Notice
          tone="warn"
          title={
            forward.slotCount === 1
              ? "It loses its slot on the lineup."
              : `It loses its ${forward.slotCount} slots on the lineup.`
          }
        >
          The times become free. This can not be undone; the teacher has to forward the show again.
        </Notice>
      )}
      <TextArea
        label={`Why, for ${forward.teacherName}`}
        hint="Say what has to change, so that they can mend it."
        rows={4}
        maxLength={1000}
        autoFocus
        value={text}
        onChange={(event) => setText(event.target.value)}
        error={isTried && text.trim() === "" ? "Say why, so that they can mend it." : null}
      />
      {decline.error && (
        <Notice tone="stop" role="alert" title="The show was not sent back.">
          {decline.error.message}
        </Notice>
      )}
    </Dialog>
  );
}
