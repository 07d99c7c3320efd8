import { queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import type { EndpointCall } from "../../../shared/contract.ts";
import { assignmentsContract } from "../../../shared/contracts/assignments.ts";
import type { AssignmentId, ClassId } from "../../../shared/ids.ts";
import { callApi } from "../../lib/api-client.ts";
import { askOrRecall } from "../../lib/offline-shelf.ts";

export const assignmentsQuery = queryOptions({
  queryKey: ["assignments", "list"],
  queryFn: async ({ signal }) =>
    (await askOrRecall("assignments", () => callApi(assignmentsContract.list, {}, signal))).assignments,
});

export const assignmentQuery = (assignmentId: AssignmentId) =>
  queryOptions({
    queryKey: ["assignments", "one", assignmentId],
    queryFn: ({ signal }) =>
      askOrRecall(`assignment/${assignmentId}`, () =>
        callApi(assignmentsContract.get, { params: { assignmentId } }, signal),
      ),
  });

/** What a change to an assignment or a hand-in makes old: lists, shows and the marking queue. */
function useForget() {
  const client = useQueryClient();
  return () =>
    Promise.all([
      client.invalidateQueries({ queryKey: ["assignments"] }),
      client.invalidateQueries({ queryKey: ["shows"] }),
      client.invalidateQueries({ queryKey: ["marking"] }),
    ]);
}

export function useHandIn(assignmentId: AssignmentId) {
  const forget = useForget();
  return useMutation({
    mutationFn: ({
      idempotencyKey,
      ...body
    }: EndpointCall<typeof assignmentsContract.handIn>["body"] & { idempotencyKey: string }) =>
      callApi(assignmentsContract.handIn, { params: { assignmentId }, body, idempotencyKey }),
    onSuccess: forget,
  });
}

export function useCreateAssignment(classId: ClassId) {
  const forget = useForget();
  return useMutation({
    mutationFn: (body: EndpointCall<typeof assignmentsContract.create>["body"]) =>
      callApi(assignmentsContract.create, { params: { classId }, body }),
    onSuccess: forget,
  });
}

export function useUpdateAssignment(assignmentId: AssignmentId) {
  const forget = useForget();
  return useMutation({
    mutationFn: (body: EndpointCall<typeof assignmentsContract.update>["body"]) =>
      callApi(assignmentsContract.update, { params: { assignmentId }, body }),
    onSuccess: forget,
  });
}
