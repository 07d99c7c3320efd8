import { queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import { contracts } from "../../../shared/contracts/index.ts";
import type { ForwardSummary, Lineup } from "../../../shared/contracts/lineup.ts";
import { callApi } from "../../lib/api-client.ts";
import { applyChange, type Change, findSlotAt } from "./model/change.ts";

const keys = {
  lineup: ["lineup"] as const,
  forwards: ["forwards"] as const,
  forward: (forwardId: string) => ["forwards", forwardId] as const,
};

export function lineupQuery() {
  return queryOptions({ queryKey: keys.lineup, queryFn: ({ signal }) => callApi(contracts.lineup.lineup, {}, signal) });
}

export function forwardsQuery() {
  return queryOptions({
    queryKey: keys.forwards,
    queryFn: async ({ signal }) => (await callApi(contracts.lineup.forwards, {}, signal)).forwards,
  });
}

export function forwardDetailQuery(forwardId: ForwardSummary["id"]) {
  return queryOptions({
    queryKey: keys.forward(forwardId),
    queryFn: ({ signal }) => callApi(contracts.lineup.forwardDetail, { params: { forwardId } }, signal),
  });
}

/** Answers to a forwarded show change it, the list it is in, and the plan. */
function useForwardAnswer(answer: (forwardId: ForwardSummary["id"], note: string) => Promise<unknown>) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ forwardId, note }: { forwardId: ForwardSummary["id"]; note: string }) => answer(forwardId, note),
    onSuccess: () =>
      Promise.all([client.invalidateQueries({ queryKey: keys.forwards }), client.invalidateQueries({ queryKey: keys.lineup })]),
  });
}

export function useApprove() {
  return useForwardAnswer((forwardId, note) => callApi(contracts.lineup.approve, { params: { forwardId }, body: { note } }));
}

export function useDecline() {
  return useForwardAnswer((forwardId, note) => callApi(contracts.lineup.decline, { params: { forwardId }, body: { note } }));
}

export function useForwardShow(onForwarded: () => Promise<unknown>) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (input: { submissionId: ForwardSummary["submissionId"]; note: string }) =>
      callApi(contracts.lineup.forward, { params: { submissionId: input.submissionId }, body: { note: input.note } }),
    onSuccess: () => Promise.all([client.invalidateQueries({ queryKey: keys.forwards }), onForwarded()]),
  });
}

/** Sends a change of the plan and gives the plan after it. A swap is asked for wherever the time is taken. */
async function sendChange(lineup: Lineup, change: Change): Promise<Lineup> {
  switch (change.kind) {
    case "place": {
      const { forwardId, nightId, startsAt } = change;
      const placed = await callApi(contracts.lineup.place, { body: { forwardId, nightId, startsAt } });
      const slot = findSlotAt(placed, nightId, startsAt);
      return change.isPinned && slot ? sendChange(placed, { kind: "pin", slotId: slot.id, isPinned: true }) : placed;
    }
    case "move": {
      const { slotId, nightId, startsAt } = change;
      const swap = findSlotAt(lineup, nightId, startsAt) !== null;
      return callApi(contracts.lineup.move, { params: { slotId }, body: { nightId, startsAt, swap } });
    }
    case "pin":
      return callApi(contracts.lineup.move, { params: { slotId: change.slotId }, body: { isPinned: change.isPinned } });
    case "remove":
      return callApi(contracts.lineup.remove, { params: { slotId: change.slotId } });
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
      await client.cancelQueries({ queryKey: keys.lineup });
      const shown = client.getQueryData<Lineup>(keys.lineup);
      if (shown) client.setQueryData(keys.lineup, applyChange(shown, change));
    },
    onSuccess: (after) => {
      client.setQueryData(keys.lineup, after);
      void client.invalidateQueries({ queryKey: keys.forwards });
    },
    onError: (_error, { before }) => {
      client.setQueryData(keys.lineup, before);
      return client.invalidateQueries({ queryKey: keys.lineup });
    },
  });
}

export interface NightChange {
  nightId: Lineup["nights"][number]["id"];
  opensAt?: string;
  closesAt?: string;
  closedReason?: string | null;
}

export function useSetNight() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ nightId, ...body }: NightChange) => callApi(contracts.lineup.setNight, { params: { nightId }, body }),
    onSuccess: (after) => client.setQueryData(keys.lineup, after),
  });
}

export function usePublish() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => callApi(contracts.lineup.publish, {}),
    onSuccess: () => Promise.all([client.invalidateQueries({ queryKey: keys.lineup }), client.invalidateQueries({ queryKey: ["programme"] }), client.invalidateQueries({ queryKey: keys.forwards })]),
  });
}
