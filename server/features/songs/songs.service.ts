import type { BeatMap, Score, SongSummary } from "../../../shared/contracts/songs.ts";
import { SongIdSchema } from "../../../shared/ids.ts";
import { readMidi } from "../../../sandbox/music/read-midi.ts";
import { buildScore } from "../../../sandbox/music/score.ts";
import type { Db } from "../../db/connection.ts";
import { getSong, getSongFile, listSongs, type SongRow, songSeconds } from "../../event/song.queries.ts";

/** Every song of the event, by title. */
export function listSongSummaries(db: Db): SongSummary[] {
  return listSongs(db).map(presentSong);
}

/** A song with what scripts read of it and what playback needs. Throws `not-found`. */
export function getSongToPlay(db: Db, songId: string): { song: SongSummary; beatMap: BeatMap; score: Score } {
  const song = getSong(db, songId);
  return { song: presentSong(song), beatMap: song.beatMap, score: buildScore(readMidi(getSongFile(db, songId).bytes)) };
}

function presentSong(song: SongRow): SongSummary {
  const { beatMap } = song;
  const seconds = songSeconds(beatMap);
  const played = seconds - (beatMap.beats[0] ?? 0) / 1_000_000;
  return {
    id: SongIdSchema.parse(song.id),
    title: song.title,
    credit: song.credit,
    seconds,
    // The mean: a song that slows down at its end has no one tempo.
    beatsPerMinute: Math.round((600 * (beatMap.beats.length - 1)) / played) / 10,
    beatsPerBar: beatMap.beatsPerBar,
    sections: beatMap.sections.map((section) => section.name),
    instruments: beatMap.instruments.map((instrument) => instrument.name),
  };
}
