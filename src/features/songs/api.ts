import { queryOptions } from "@tanstack/react-query";
import { songsContract } from "../../../shared/contracts/songs.ts";
import type { SongId } from "../../../shared/ids.ts";
import { callApi } from "../../lib/api-client.ts";
import { askOrRecall } from "../../lib/offline-shelf.ts";

export const songsQuery = queryOptions({
  queryKey: ["songs", "list"],
  queryFn: async ({ signal }) => (await callApi(songsContract.list, {}, signal)).songs,
});

export const songQuery = (songId: SongId) =>
  queryOptions({
    queryKey: ["songs", "one", songId],
    queryFn: ({ signal }) =>
      askOrRecall(`song/${songId}`, () => callApi(songsContract.get, { params: { songId } }, signal)),
    staleTime: 10 * 60_000,
  });
