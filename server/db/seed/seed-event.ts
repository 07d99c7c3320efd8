import { createHash } from "node:crypto";
import { layoutHash } from "../../../sandbox/square/layout-hash.ts";
import type { FeatureDeps } from "../../deps.ts";
import { inTransaction } from "../connection.ts";
import { newId } from "../schema/columns.ts";
import { beatMaps, nights, seasons, songFiles, songs, squareLayouts, squares } from "../schema/index.ts";
import type { SeedDay } from "./seed-day.ts";
import { EVENT_NAME, SQUARE_NAME, TIME_ZONE, TOWN } from "./world/figures.ts";
import { CLOSES_AT, listNights, OPENS_AT, SEASON_NAME, START_TIMES } from "./world/season.ts";
import { DEMO_SONGS } from "./world/songs/demo-songs.ts";
import { DEMO_SQUARE } from "./world/square.ts";

/** Ids of what belongs to the event. */
export interface SeededEvent {
  readonly layoutId: string;
  readonly seasonId: string;
  /** Id of the beat map by song id. */
  readonly beatMapIds: ReadonlyMap<string, string>;
  /** Id of the night by date. */
  readonly nightIds: ReadonlyMap<string, string>;
}

const SET_UP_DAY = -60;

/** Adds the square with its first layout, the songs with their files and beat maps, the season with its nights. */
export function seedEvent({ db }: FeatureDeps, day: SeedDay): SeededEvent {
  const squareId = newId();
  const layoutId = newId();
  const seasonId = newId();
  const beatMapIds = new Map(DEMO_SONGS.map((song) => [song.id, newId()]));
  const season = listNights(day.today);
  const nightIds = new Map(season.map((night) => [night.date, newId()]));
  const createdAt = day.at(SET_UP_DAY, "20:00");
  const hash = layoutHash(DEMO_SQUARE, (text) => createHash("sha256").update(text).digest("hex"));

  inTransaction(db, (tx) => {
    tx.insert(squares)
      .values({
        id: squareId,
        name: SQUARE_NAME,
        townName: TOWN,
        eventName: EVENT_NAME,
        timeZone: TIME_ZONE,
        currentLayoutId: layoutId,
      })
      .run();
    tx.insert(squareLayouts).values({ id: layoutId, squareId, number: 1, hash, layout: DEMO_SQUARE, createdAt }).run();
    for (const song of DEMO_SONGS) {
      const beatMapId = beatMapIds.get(song.id) ?? null;
      tx.insert(songs)
        .values({ id: song.id, title: song.title, credit: song.credit, currentBeatMapId: beatMapId })
        .run();
      tx.insert(songFiles)
        .values({ songId: song.id, mediaType: "audio/midi", bytes: Buffer.from(song.file) })
        .run();
      tx.insert(beatMaps)
        .values({ id: beatMapId ?? newId(), songId: song.id, number: 1, beatMap: song.beatMap, createdAt })
        .run();
    }
    const [firstDate = day.today] = season.map((night) => night.date);
    const lastDate = season.at(-1)?.date ?? day.today;
    tx.insert(seasons)
      .values({ id: seasonId, squareId, name: SEASON_NAME, firstDate, lastDate, times: [...START_TIMES] })
      .run();
    for (const { date, closedReason } of season) {
      tx.insert(nights)
        .values({
          id: nightIds.get(date) ?? newId(),
          seasonId,
          date,
          opensAt: OPENS_AT,
          closesAt: CLOSES_AT,
          closedReason,
        })
        .run();
    }
  });
  return { layoutId, seasonId, beatMapIds, nightIds };
}
