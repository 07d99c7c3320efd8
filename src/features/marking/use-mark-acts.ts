import { useEffect, useRef, useState } from "react";
import type { SubmissionDetail } from "../../../shared/contracts/marking.ts";
import type { SubmissionId } from "../../../shared/ids.ts";
import { dismissToast, showToast } from "../../components/toast-queue.ts";
import { formatNames } from "../../lib/format.ts";
import { useRelease, useReopen, useSendBack } from "./api.ts";
import type { MarkDraftView } from "./use-mark-draft.ts";

/** The undo of the mark before: with a hundred marks an evening only the last one is offered. */
let lastToast: number | null = null;

export interface MarkActsOptions {
  readonly submission: SubmissionDetail["submission"];
  readonly draft: MarkDraftView;
  /** The submission was sent back: on to the next. */
  readonly onDone: () => void;
  /** Opens a submission again after an undo. */
  readonly onOpen: (submissionId: SubmissionId) => void;
}

/** Release, send back, take back: each can be undone from its message. */
export function useMarkActs({ submission, draft, onDone, onOpen }: MarkActsOptions) {
  const release = useRelease(submission.id);
  const sendBack = useSendBack(submission.id);
  const reopen = useReopen();
  const [isFlushing, setIsFlushing] = useState(false);
  const isReleasing = useRef(false);
  useEffect(() => {
    if (submission.state !== "submitted") isReleasing.current = false;
  }, [submission.state]);
  const authors = formatNames(submission.authors);

  const takeBack = (after?: () => void) =>
    reopen.mutate(submission.id, {
      onSuccess: after,
      onError: (error) => showToast({ tone: "stop", title: "It could not be taken back.", detail: error.message }),
    });
  const tell = (title: string, detail: string) => {
    if (lastToast !== null) dismissToast(lastToast);
    lastToast = showToast({
      title,
      detail,
      action: { label: "Undo", onPress: () => takeBack(() => onOpen(submission.id)) },
    });
  };

  return {
    /** The mark was released on this visit: next is what waits, not the neighbour among the marked. */
    hasReleased: release.isSuccess,
    isReleasing: isFlushing || release.isPending,
    isSendingBack: sendBack.isPending,
    isReopening: reopen.isPending,
    sendBackError: sendBack.error?.message ?? null,
    release: async () => {
      // A key that is held or pressed twice must not release twice.
      if (isReleasing.current) return;
      isReleasing.current = true;
      setIsFlushing(true);
      const isSaved = await draft.flush();
      setIsFlushing(false);
      if (!isSaved) {
        isReleasing.current = false;
        showToast({
          tone: "warn",
          title: "The mark is not released.",
          detail: "Its last change is not saved yet. Try again when it is.",
        });
        return;
      }
      release.mutate(submission.versionId, {
        // The desk stays: what is marked is often forwarded next. J goes on.
        onSuccess: ({ mark }) => tell(`The mark of ${authors} is released.`, `${mark.got} of ${mark.of}.`),
        onError: (error) => {
          isReleasing.current = false;
          showToast({ tone: "stop", title: "The mark is not released.", detail: error.message });
        },
      });
    },
    sendBack: (note: string, onSent: () => void) =>
      sendBack.mutate(
        { versionId: submission.versionId, note },
        {
          onSuccess: () => {
            tell(`The work of ${authors} is sent back.`, "They can hand it in again.");
            onSent();
            onDone();
          },
        },
      ),
    takeBack: () => takeBack(),
  };
}
