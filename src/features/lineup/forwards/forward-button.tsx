import { useState } from "react";
import type { ForwardState } from "../../../../shared/contracts/shows.ts";
import type { SubmissionId } from "../../../../shared/ids.ts";
import { Button } from "../../../components/button.tsx";
import { Dialog } from "../../../components/dialog.tsx";
import { Notice } from "../../../components/notice.tsx";
import { Tag } from "../../../components/tag.tsx";
import { TextArea } from "../../../components/text-area.tsx";
import { showToast } from "../../../components/toast-queue.ts";
import { useForwardShow } from "../api.ts";

export interface ForwardButtonProps {
  submissionId: SubmissionId;
  title: string;
  /** What became of an earlier forwarding; a declined show may be forwarded again. */
  forwardState: ForwardState | null;
  /** Why it cannot be forwarded now, as a sentence. */
  obstacle: string | null;
}

/** Forward to the event with a note, or the state of the show there. */
export function ForwardButton({ submissionId, title, forwardState, obstacle }: ForwardButtonProps) {
  const [isOpen, setIsOpen] = useState(false);
  const [note, setNote] = useState("");
  const forward = useForwardShow(submissionId);
  if (forwardState !== null && forwardState !== "declined")
    return (
      <Tag state={forwardState}>
        {{ waiting: "Forwarded, waiting", approved: "Approved by the event", scheduled: "On the lineup" }[forwardState]}
      </Tag>
    );

  return (
    <>
      <Button size="small" look="quiet" icon="send" disabledReason={obstacle} onPress={() => setIsOpen(true)}>
        {forwardState === "declined" ? "Forward again" : "Forward to the event"}
      </Button>
      <Dialog
        isOpen={isOpen}
        onClose={() => setIsOpen(false)}
        title={`Forward ${title} to the event?`}
        isBusy={forward.isPending}
        actions={
          <>
            <Button onPress={() => setIsOpen(false)}>Cancel</Button>
            <Button
              look="main"
              icon="send"
              isPending={forward.isPending}
              onPress={() =>
                forward.mutate(note.trim(), {
                  onSuccess: () => {
                    setIsOpen(false);
                    showToast({
                      title: `${title} is forwarded.`,
                      detail: "The coordinator watches it; you read the answer under Forwarded.",
                    });
                  },
                })
              }
            >
              Forward
            </Button>
          </>
        }
      >
        <p>
          The coordinator sees this version, its show check and your note. In the public programme the authors are named
          only as far as their families allowed.
        </p>
        <TextArea
          label="Note to the coordinator"
          isOptional
          rows={3}
          maxLength={1000}
          autoFocus
          value={note}
          onChange={(event) => setNote(event.target.value)}
        />
        {forward.error && (
          <Notice tone="stop" role="alert" title="The show was not forwarded.">
            {forward.error.message}
          </Notice>
        )}
      </Dialog>
    </>
  );
}
