import { asc, eq, sql } from "drizzle-orm";
import type { BeatMap } from "../../shared/contracts/songs.ts";
import { ProblemError } from "../../shared/problem.ts";
import type { Db } from "../db/connection.ts";
import { beatMaps, songFiles, songs } from "../db/schema/index.ts";

/** A song with the beat map that drafts follow now. */
export interface SongRow {
  readonly id: string;
  readonly title: string;
  readonly credit: string;
  readonly beatMapId: string;
  readonly beatMap: BeatMap;
}

const songColumns = {
  id: songs.id,
  title: songs.title,
  credit: songs.credit,
  beatMapId: beatMaps.id,
  beatMap: beatMaps.beatMap,
};

/** The songs that can be used, by title. */
export function listSongs(db: Db): SongRow[] {
  return db
    .select(songColumns)
    .from(songs)
    .innerJoin(beatMaps, eq(beatMaps.id, songs.currentBeatMapId))
    .orderBy(asc(songs.title))
    .all();
}

/** One song, or null when there is none with a beat map. */
export function findSong(db: Db, songId: string): SongRow | null {
  return (
    db
      .select(songColumns)
      .from(songs)
      .innerJoin(beatMaps, eq(beatMaps.id, songs.currentBeatMapId))
      .where(eq(songs.id, songId))
      .get() ?? null
  );
}

/** One song. Throws `not-found`. */
export function getSong(db: Db, songId: string): SongRow {
  const song = findSong(db, songId);
  if (!song) throw new ProblemError("not-found");
  return song;
}

/** One beat map by its id. Throws `not-found`. */
export function getBeatMap(db: Db, beatMapId: string): BeatMap {
  const row = db.select({ beatMap: beatMaps.beatMap }).from(beatMaps).where(eq(beatMaps.id, beatMapId)).get();
  if (!row) throw new ProblemError("not-found");
  return row.beatMap;
}

/** The score file of a song. Throws `not-found`. */
export function getSongFile(db: Db, songId: string): { mediaType: string; bytes: Buffer } {
  const row = db
    .select({ mediaType: songFiles.mediaType, bytes: songFiles.bytes })
    .from(songFiles)
    .where(eq(songFiles.songId, songId))
    .get();
  if (!row) throw new ProblemError("not-found");
  return row;
}

/** Title and length in seconds of every song by id; the database reads the length, so that no beat map is parsed. */
export function listSongFacts(db: Db): Map<string, { title: string; seconds: number }> {
  const rows = db
    .select({
      id: songs.id,
      title: songs.title,
      micros: sql<number>`json_extract(${beatMaps.beatMap}, '$.beats[#-1]')`,
    })
    .from(songs)
    .innerJoin(beatMaps, eq(beatMaps.id, songs.currentBeatMapId))
    .all();
  return new Map(rows.map((row) => [row.id, { title: row.title, seconds: row.micros / 1_000_000 }]));
}

/** Length of a song in seconds: its beat map's last entry is the song's end. */
export function songSeconds(beatMap: BeatMap): number {
  return (beatMap.beats.at(-1) ?? 0) / 1_000_000;
}
