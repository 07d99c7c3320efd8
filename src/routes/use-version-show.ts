import { useQuery, type UseQueryResult } from "@tanstack/react-query";
import type { VersionId } from "../../shared/ids.ts";
import { versionQuery } from "../features/shows/api.ts";
import { songQuery } from "../features/songs/api.ts";
import { layoutQuery } from "../features/square/api.ts";

/** A version with the song and the layout it was made for: all that it takes to show it. */
export function useVersionShow(versionId: VersionId) {
  const version = useQuery(versionQuery(versionId));
  const song = useQuery({ ...songQuery(version.data?.songId ?? ""), enabled: version.data !== undefined });
  const layout = useQuery({ ...layoutQuery(version.data?.layoutId ?? ""), enabled: version.data !== undefined });
  const failed: UseQueryResult | undefined = [version, song, layout].find((query) => query.isError);
  const data =
    version.data && song.data && layout.data
      ? { version: version.data, song: song.data, layout: layout.data.layout }
      : null;
  return { data, error: failed?.error ?? null, retry: () => void failed?.refetch() };
}

export type VersionShow = NonNullable<ReturnType<typeof useVersionShow>["data"]>;
