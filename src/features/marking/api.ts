import { queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import type { EndpointCall, EndpointResponse } from "../../../shared/contract.ts";
import { markingContract } from "../../../shared/contracts/marking.ts";
import type { AssignmentId, CommentId, SubmissionId, VersionId } from "../../../shared/ids.ts";
import { callApi } from "../../lib/api-client.ts";

export type MarkingInbox = EndpointResponse<typeof markingContract.inbox>["assignments"];

/** The teacher's assignments with what waits for a mark. */
export const inboxQuery = queryOptions({
  queryKey: ["marking", "inbox"],
  queryFn: async ({ signal }) => (await callApi(markingContract.inbox, {}, signal)).assignments,
});

export const queueQuery = (assignmentId: AssignmentId) =>
  queryOptions({
    queryKey: ["marking", "queue", assignmentId],
    queryFn: ({ signal }) => callApi(markingContract.queue, { params: { assignmentId } }, signal),
  });

export const submissionQuery = (submissionId: SubmissionId) =>
  queryOptions({
    queryKey: ["marking", "submission", submissionId],
    queryFn: ({ signal }) => callApi(markingContract.submission, { params: { submissionId } }, signal),
  });

/** Every answer to a submission changes it, its queue, the inbox, and what the authors see. */
function useForget() {
  const client = useQueryClient();
  return () =>
    Promise.all([
      client.invalidateQueries({ queryKey: ["marking"] }),
      client.invalidateQueries({ queryKey: ["assignments"] }),
    ]);
}

/** The key is the caller's, so that a comment sent twice over a bad line is written once. */
export function useComment(submissionId: SubmissionId) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({
      idempotencyKey,
      ...body
    }: EndpointCall<typeof markingContract.comment>["body"] & { idempotencyKey: string }) =>
      callApi(markingContract.comment, { params: { submissionId }, body, idempotencyKey }),
    onSuccess: ({ comment }) => {
      client.setQueryData(
        submissionQuery(submissionId).queryKey,
        (detail) => detail && { ...detail, comments: [...detail.comments, comment] },
      );
    },
  });
}

export function useDeleteComment(submissionId: SubmissionId) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (commentId: CommentId) => callApi(markingContract.deleteComment, { params: { commentId } }),
    onSuccess: (_, commentId) => {
      client.setQueryData(
        submissionQuery(submissionId).queryKey,
        (detail) => detail && { ...detail, comments: detail.comments.filter((comment) => comment.id !== commentId) },
      );
    },
  });
}

export function useSendBack(submissionId: SubmissionId) {
  const forget = useForget();
  return useMutation({
    mutationFn: (body: { versionId: VersionId; note: string }) =>
      callApi(markingContract.sendBack, { params: { submissionId }, body }),
    // A refusal may mean that a newer version is there to be looked at.
    onSettled: forget,
  });
}

export function useRelease(submissionId: SubmissionId) {
  const client = useQueryClient();
  const forget = useForget();
  return useMutation({
    mutationFn: (versionId: VersionId) =>
      callApi(markingContract.release, { params: { submissionId }, body: { versionId } }),
    // A refusal may mean that a newer version is there to be looked at.
    onError: forget,
    onSuccess: ({ state, mark }) => {
      client.setQueryData(
        submissionQuery(submissionId).queryKey,
        (detail) => detail && { ...detail, mark, submission: { ...detail.submission, state } },
      );
      return forget();
    },
  });
}

/** Back to submitted: undoes a release or a sending back. The id comes with the call, for an undo after the desk moved on. */
export function useReopen() {
  const forget = useForget();
  return useMutation({
    mutationFn: (submissionId: SubmissionId) => callApi(markingContract.reopen, { params: { submissionId } }),
    onSuccess: forget,
  });
}

/** Opens released work again, or leaves it open when it is already; gives the assignment whose desk it lies on. */
export function useReopenForDesk() {
  const client = useQueryClient();
  const forget = useForget();
  return useMutation({
    mutationFn: async (submissionId: SubmissionId) => {
      const { submission } = await client.fetchQuery({ ...submissionQuery(submissionId), staleTime: 0 });
      if (submission.state === "marked") await callApi(markingContract.reopen, { params: { submissionId } });
      return submission.assignmentId;
    },
    onSuccess: forget,
  });
}
