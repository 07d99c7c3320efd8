import type { songsContract } from "../../../shared/contracts/songs.ts";
import type { FeatureDeps } from "../../deps.ts";
import type { Handlers } from "../../http/mount.ts";
import { getSongToPlay, listSongSummaries } from "./songs.service.ts";

/** The handlers of the songs contract. */
export function createSongsHandlers(deps: FeatureDeps): Handlers<typeof songsContract> {
  return {
    list: () => ({ songs: listSongSummaries(deps.db) }),
    get: ({ params }) => getSongToPlay(deps.db, params.songId),
  };
}
