import { queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import { partnersContract } from "../../../shared/contracts/partners.ts";
import type { ShowId, UserId } from "../../../shared/ids.ts";
import { callApi } from "../../lib/api-client.ts";

export const partnersQuery = (showId: ShowId) =>
  queryOptions({
    queryKey: ["shows", "partners", showId],
    queryFn: ({ signal }) => callApi(partnersContract.partners, { params: { showId } }, signal),
    staleTime: 0,
  });

export const invitationsQuery = queryOptions({
  queryKey: ["shows", "invitations"],
  queryFn: async ({ signal }) => (await callApi(partnersContract.invitations, {}, signal)).invitations,
});

export function useAskPartner(showId: ShowId) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (userId: UserId) => callApi(partnersContract.askPartner, { params: { showId }, body: { userId } }),
    onSuccess: (partners) => client.setQueryData(partnersQuery(showId).queryKey, partners),
  });
}

export function useWithdrawPartner(showId: ShowId) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (userId: UserId) => callApi(partnersContract.withdrawPartner, { params: { showId, userId } }),
    onSuccess: (partners) => client.setQueryData(partnersQuery(showId).queryKey, partners),
  });
}

/** Joining and leaving change who sees which show and which work: all of it is read again. */
function useForgetShows() {
  const client = useQueryClient();
  return () =>
    Promise.all([
      client.invalidateQueries({ queryKey: ["shows"] }),
      client.invalidateQueries({ queryKey: ["assignments"] }),
    ]);
}

export function useLeaveShow(showId: ShowId) {
  const forget = useForgetShows();
  return useMutation({
    mutationFn: () => callApi(partnersContract.leave, { params: { showId } }),
    onSuccess: forget,
  });
}

export function useAnswerInvitation() {
  const forget = useForgetShows();
  return useMutation({
    mutationFn: ({ showId, answer }: { showId: ShowId; answer: "join" | "decline" }) =>
      callApi(partnersContract.answerInvitation, { params: { showId }, body: { answer } }),
    onSettled: forget,
  });
}
