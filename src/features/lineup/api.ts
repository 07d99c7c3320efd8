import { queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import { lineupContract, type Lineup } from "../../../shared/contracts/lineup.ts";
import type { ForwardId, NightId, SubmissionId } from "../../../shared/ids.ts";
import { callApi } from "../../lib/api-client.ts";
import { applyChange, type Change, findSlotAt } from "./model/change.ts";

/** The season's plan with its findings. */
export const lineupQuery = queryOptions({
  queryKey: ["lineup", "plan"],
  queryFn: ({ signal }) => callApi(lineupContract.lineup, {}, signal),
});

/** Forwarded shows: all of them for the coordinator, a teacher's own. */
export const forwardsQuery = queryOptions({
  queryKey: ["lineup", "forwards"],
  queryFn: async ({ signal }) => (await callApi(lineupContract.forwards, {}, signal)).forwards,
});

export const forwardQuery = (forwardId: ForwardId) =>
  queryOptions({
    queryKey: ["lineup", "forward", forwardId],
    queryFn: ({ signal }) => callApi(lineupContract.forwardDetail, { params: { forwardId } }, signal),
  });

export interface ForwardAnswer {
  forwardId: ForwardId;
  note: string;
}

export function useApprove() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ forwardId, note }: ForwardAnswer) =>
      callApi(lineupContract.approve, { params: { forwardId }, body: { note } }),
    onSuccess: () => client.invalidateQueries({ queryKey: ["lineup"] }),
  });
}

export function useDecline() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ forwardId, note }: ForwardAnswer) =>
      callApi(lineupContract.decline, { params: { forwardId }, body: { note } }),
    onSuccess: () => client.invalidateQueries({ queryKey: ["lineup"] }),
  });
}

/** Forwards a marked show; the submission shows it from then on. */
export function useForwardShow(submissionId: SubmissionId) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (note: string) => callApi(lineupContract.forward, { params: { submissionId }, body: { note } }),
    onSuccess: () =>
      Promise.all([
        client.invalidateQueries({ queryKey: ["lineup"] }),
        client.invalidateQueries({ queryKey: ["marking"] }),
      ]),
  });
}

/** Sends a change of the plan and gives the plan after it. A swap is asked for wherever the time is taken. */
async function sendChange(lineup: Lineup, change: Change): Promise<Lineup> {
  switch (change.kind) {
    case "place": {
      const { forwardId, nightId, startsAt } = change;
      const placed = await callApi(lineupContract.place, { body: { forwardId, nightId, startsAt } });
      const slot = findSlotAt(placed, nightId, startsAt);
      return change.isPinned && slot ? sendChange(placed, { kind: "pin", slotId: slot.id, isPinned: true }) : placed;
    }
    case "move": {
      const { slotId, nightId, startsAt } = change;
      const swap = findSlotAt(lineup, nightId, startsAt) !== null;
      return callApi(lineupContract.move, { params: { slotId }, body: { nightId, startsAt, swap } });
    }
    case "pin":
      return callApi(lineupContract.move, { params: { slotId: change.slotId }, body: { isPinned: change.isPinned } });
    case "remove":
      return callApi(lineupContract.remove, { params: { slotId: change.slotId } });
  }
}

/** Changes the plan: shown at once, put right by the server's answer, taken back when it is refused. */
export function useChangeLineup() {
  const client = useQueryClient();
  return useMutation({
    // One after the other: two quick moves must reach the server in the order they were made.
    scope: { id: "lineup" },
    mutationFn: ({ before, change }: { before: Lineup; change: Change }) => sendChange(before, change),
    onMutate: async ({ change }) => {
      await client.cancelQueries({ queryKey: lineupQuery.queryKey });
      const shown = client.getQueryData(lineupQuery.queryKey);
      if (shown) client.setQueryData(lineupQuery.queryKey, applyChange(shown, change));
    },
    onSuccess: (after) => {
      client.setQueryData(lineupQuery.queryKey, after);
      void client.invalidateQueries({ queryKey: forwardsQuery.queryKey });
    },
    onError: (_error, { before }) => {
      client.setQueryData(lineupQuery.queryKey, before);
      return client.invalidateQueries({ queryKey: lineupQuery.queryKey });
    },
  });
}

export interface NightChange {
  nightId: NightId;
  opensAt?: string;
  closesAt?: string;
  closedReason?: string | null;
}

export function useSetNight() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ nightId, ...body }: NightChange) => callApi(lineupContract.setNight, { params: { nightId }, body }),
    onSuccess: (after) => client.setQueryData(lineupQuery.queryKey, after),
  });
}

export function usePublish() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => callApi(lineupContract.publish, {}),
    onSuccess: () => client.invalidateQueries({ queryKey: ["lineup"] }),
  });
}
