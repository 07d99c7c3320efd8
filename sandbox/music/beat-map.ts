import { BeatMapSchema } from "../../shared/contracts/songs.ts";
import type { BeatMap, Instrument, Note, Section } from "../../shared/contracts/songs.ts";
import { TICKS_PER_BEAT } from "../../shared/units.ts";
import { beatGrid, momentAt } from "./beat-grid.ts";
import type { BeatGrid } from "./beat-grid.ts";
import { listParts } from "./instruments.ts";
import type { Part } from "./instruments.ts";
import { loudnessAt } from "./loudness.ts";
import { countedBeats, firstMeter } from "./meter-grid.ts";
import { MidiFileError } from "./midi-file.ts";
import type { MidiFile } from "./midi-file.ts";
import { buildScore } from "./score.ts";
import { tempoMap } from "./tempo-map.ts";

const LONGEST_NAME = 40;
/** Longer than any show: a guard against files made to fill memory. */
const MOST_BEATS = 19_999;
const QUARTERS_PER_BEAT = 4;

/** One instrument as scripts see it (LANGUAGE rule 23): of notes at one start and pitch the longest stays. */
function instrument(part: Part, grid: BeatGrid): Instrument {
  const notes = new Map<string, Note>();
  for (const { tick, ticks, pitch } of part.notes) {
    const start = momentAt(grid, tick);
    const beats = Math.max(1, Math.round((momentAt(grid, tick + ticks) - start) * TICKS_PER_BEAT)) / TICKS_PER_BEAT;
    const key = `${start} ${pitch}`;
    if ((notes.get(key)?.beats ?? 0) < beats) notes.set(key, { start, beats, pitch });
  }
  const sorted = [...notes.values()].sort((a, b) => a.start - b.start || a.pitch - b.pitch);
  return { name: part.name, hits: [...new Set(sorted.map((note) => note.start))], notes: sorted };
}

/** Every marker opens a section, which lasts until the next one; a marker without a name only closes. */
function sections(file: MidiFile, grid: BeatGrid): Section[] {
  const end = grid.ticks.length - 1;
  return file.markers
    .map((marker, n): Section => {
      const next = file.markers[n + 1];
      return {
        name: marker.name.slice(0, LONGEST_NAME).trim(),
        start: momentAt(grid, marker.tick),
        end: next ? momentAt(grid, next.tick) : end,
      };
    })
    .filter((section) => section.name !== "" && section.start < section.end);
}

/** The time of every beat in whole microseconds from the start of the audio, rising by at least one. */
function beatTimes(file: MidiFile, grid: BeatGrid): number[] {
  const micros = tempoMap(file);
  let before = -1;
  return grid.ticks.map((tick) => {
    before = Math.max(before + 1, Math.round(micros(tick)));
    return before;
  });
}

function loudness(file: MidiFile, beats: readonly number[]): number[] {
  const times: number[] = [];
  for (let beat = 0; beat + 1 < beats.length; beat += 1) {
    const from = (beats[beat] ?? 0) / 1_000_000;
    const to = (beats[beat + 1] ?? 0) / 1_000_000;
    for (let q = 0; q < QUARTERS_PER_BEAT; q += 1) times.push(from + ((to - from) * q) / QUARTERS_PER_BEAT);
  }
  const end = (beats.at(-1) ?? 0) / 1_000_000;
  return loudnessAt(buildScore(file), times, (i) => (times[i + 1] ?? end) - (times[i] ?? 0));
}

/**
 * The beat map of a song from its file: everything that a script can ask about it. Throws a
 * `MidiFileError` with a sentence for people when the file holds no song.
 */
export function buildBeatMap(file: MidiFile): BeatMap {
  const parts = listParts(file);
  const notes = parts.flatMap((part) => part.notes);
  if (notes.length === 0) throw new MidiFileError("This MIDI file has no notes. Choose another one.", 0);
  const first = notes.reduce((earliest, note) => Math.min(earliest, note.tick), Number.POSITIVE_INFINITY);
  const last = notes.reduce((latest, note) => Math.max(latest, note.tick + note.ticks), 0);
  if (last / file.ticksPerQuarter > MOST_BEATS)
    throw new MidiFileError("This song is too long for a show. Cut it to a few minutes.", 0);
  const grid = beatGrid(file, first, last);
  const beats = beatTimes(file, grid);
  return BeatMapSchema.parse({
    version: 1,
    beats,
    beatsPerBar: countedBeats(firstMeter(file)),
    bars: [...grid.bars],
    sections: sections(file, grid),
    instruments: parts.map((part) => instrument(part, grid)),
    loudness: loudness(file, beats),
  } satisfies BeatMap);
}
