import { listParts } from "./instruments.ts";
import type { MidiFile } from "./midi-file.ts";
import { tempoMap } from "./tempo-map.ts";

/** A note as it is played: times in seconds from the start of the audio. */
export interface ScoreNote {
  readonly start: number;
  readonly lasts: number;
  /** MIDI key number: 60 is middle C, 69 is A at 440 Hz. */
  readonly pitch: number;
  /** Above 0, at most 1. */
  readonly velocity: number;
}

export interface ScoreTrack {
  /** The instrument's name, as scripts know it. */
  readonly name: string;
  /** General MIDI program (0 to 127), when the file names one. */
  readonly program: number | null;
  /** Drum notes name a drum by their pitch, not a tone. */
  readonly isDrums: boolean;
  /** Sorted by start, then pitch. */
  readonly notes: readonly ScoreNote[];
}

/** What playback needs from a song's file. */
export interface Score {
  /** When the last note ends. */
  readonly seconds: number;
  readonly tracks: readonly ScoreTrack[];
}

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
      return { start, lasts: seconds(note.tick + note.ticks) - start, pitch: note.pitch, velocity: note.velocity / 127 };
    }),
  }));
  const end = tracks.reduce((latest, track) => track.notes.reduce((late, note) => Math.max(late, note.start + note.lasts), latest), 0);
  return { seconds: end, tracks };
}

/** The frequency in hertz of a MIDI key: 440 x 2^((key - 69) / 12), A at 440 Hz (ISO 16). */
export function pitchFrequency(pitch: number): number {
  return 440 * 2 ** ((pitch - 69) / 12);
}
