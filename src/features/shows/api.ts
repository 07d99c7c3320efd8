import { queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import type { EndpointCall } from "../../../shared/contract.ts";
import { showsContract } from "../../../shared/contracts/shows.ts";
import type { ShowId, VersionId } from "../../../shared/ids.ts";
import { callApi } from "../../lib/api-client.ts";
import { askOrRecall } from "../../lib/offline-shelf.ts";

export const showsQuery = (archived: "yes" | "no" = "no") =>
  queryOptions({
    queryKey: ["shows", "list", archived],
    queryFn: async ({ signal }) =>
      (await askOrRecall(`shows/${archived}`, () => callApi(showsContract.list, { query: { archived } }, signal)))
        .shows,
  });

export const showQuery = (showId: ShowId) =>
  queryOptions({
    queryKey: ["shows", "one", showId],
    queryFn: ({ signal }) =>
      askOrRecall(`show/${showId}`, () => callApi(showsContract.get, { params: { showId } }, signal)),
  });

/** A version never changes, so it is read once. */
export const versionQuery = (versionId: VersionId) =>
  queryOptions({
    queryKey: ["shows", "version", versionId],
    queryFn: ({ signal }) => callApi(showsContract.version, { params: { versionId } }, signal),
    staleTime: Infinity,
  });

export const historyQuery = (showId: ShowId) =>
  queryOptions({
    queryKey: ["shows", "history", showId],
    queryFn: async ({ signal }) => (await callApi(showsContract.history, { params: { showId } }, signal)).drafts,
    staleTime: 0,
  });

export const earlierDraftQuery = (showId: ShowId, revision: number) =>
  queryOptions({
    queryKey: ["shows", "history", showId, revision],
    queryFn: ({ signal }) => callApi(showsContract.earlierDraft, { params: { showId, revision } }, signal),
    staleTime: Infinity,
  });

export function useCreateShow() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: EndpointCall<typeof showsContract.create>["body"]) => callApi(showsContract.create, { body }),
    onSuccess: () => client.invalidateQueries({ queryKey: ["shows"] }),
  });
}

export function useUpdateShow() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ showId, ...body }: EndpointCall<typeof showsContract.update>["body"] & { showId: ShowId }) =>
      callApi(showsContract.update, { params: { showId }, body }),
    onSuccess: () => client.invalidateQueries({ queryKey: ["shows"] }),
  });
}

export function useDuplicateShow() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (showId: ShowId) => callApi(showsContract.duplicate, { params: { showId } }),
    onSuccess: () => client.invalidateQueries({ queryKey: ["shows"] }),
  });
}
