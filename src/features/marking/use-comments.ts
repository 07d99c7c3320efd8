import { useState } from "react";
import type { CommentAnchor, Comment } from "../../../shared/contracts/marking.ts";
import type { SubmissionId } from "../../../shared/ids.ts";
import { showToast } from "../../components/toast-queue.ts";
import { useComment, useDeleteComment } from "./api.ts";
import { dropUnsentComment } from "./components/comment-composer.tsx";

export interface OpenComposer {
  readonly anchor: CommentAnchor;
  /** One for each opening: a comment that is sent again over a bad line is written once. */
  readonly idempotencyKey: string;
}

/** Names the unsent text of a place. */
export const toDraftKey = (submissionId: string, anchor: CommentAnchor) => `${submissionId} ${JSON.stringify(anchor)}`;

/** Writing and taking back comments on one submission. */
export function useComments(submissionId: SubmissionId) {
  const [open, setOpen] = useState<OpenComposer | null>(null);
  const comment = useComment(submissionId);
  const remove = useDeleteComment(submissionId);

  const save = (body: string) => {
    if (!open) return;
    comment.mutate(
      { anchor: open.anchor, body, idempotencyKey: open.idempotencyKey },
      {
        onSuccess: () => {
          dropUnsentComment(toDraftKey(submissionId, open.anchor));
          setOpen(null);
        },
      },
    );
  };
  const takeBack = ({ id, anchor, body }: Comment) =>
    remove.mutate(id, {
      onSuccess: () =>
        showToast({
          title: "The comment is taken back.",
          action: {
            label: "Undo",
            onPress: () => comment.mutate({ anchor, body, idempotencyKey: crypto.randomUUID() }),
          },
        }),
      onError: (error) => showToast({ tone: "stop", title: "The comment was not taken back.", detail: error.message }),
    });

  return {
    open,
    isPending: comment.isPending,
    error: open && comment.error ? `Not saved: ${comment.error.message}` : null,
    write: (anchor: CommentAnchor) => {
      comment.reset();
      setOpen({ anchor, idempotencyKey: crypto.randomUUID() });
    },
    close: () => setOpen(null),
    save,
    takeBack,
  };
}
