import type { BeatMap } from "../../../shared/contracts/songs.ts";

/** The first bars of a song as a song of its own, so that an example of a few beats fills its ribbon. */
export function takeFirstBars(song: BeatMap, count: number): BeatMap {
  const end = song.bars.find((bar) => bar.number === count + 1)?.start ?? song.beats.length - 1;
  return {
    ...song,
    beats: song.beats.slice(0, end + 1),
    bars: song.bars.filter((bar) => bar.start < end),
    sections: song.sections
      .filter((section) => section.start < end)
      .map((section) => ({ ...section, end: Math.min(section.end, end) })),
    instruments: song.instruments
      .map((instrument) => ({
        ...instrument,
        hits: instrument.hits.filter((hit) => hit < end),
        notes: instrument.notes.filter((note) => note.start < end),
      }))
      .filter((instrument) => instrument.hits.length > 0),
    loudness: song.loudness.slice(0, end * 4),
  };
}
