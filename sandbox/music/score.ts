import type { Score } from "../../shared/contracts/songs.ts";
import { listParts } from "./instruments.ts";
import type { MidiFile } from "./midi-file.ts";
import { tempoMap } from "./tempo-map.ts";

/** The notes of a file in seconds, one track for each instrument. */
export function buildScore(file: MidiFile): Score {
  const micros = tempoMap(file);
  const seconds = (tick: number): number => micros(tick) / 1_000_000;
  const tracks = listParts(file).map((part) => ({
    name: part.name,
    program: part.program,
    isDrums: part.isDrums,
    notes: part.notes.map((note) => {
      const start = seconds(note.tick);
      return {
        start,
        lasts: seconds(note.tick + note.ticks) - start,
        pitch: note.pitch,
        velocity: note.velocity / 127,
      };
    }),
  }));
  const end = tracks.reduce(
    (latest, track) => track.notes.reduce((late, note) => Math.max(late, note.start + note.lasts), latest),
    0,
  );
  return { seconds: end, tracks };
}

/** The frequency in hertz of a MIDI key: 440 x 2^((key - 69) / 12), A at 440 Hz (ISO 16). */
export function pitchFrequency(pitch: number): number {
  return 440 * 2 ** ((pitch - 69) / 12);
}
