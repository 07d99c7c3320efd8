/**
 * A Standard MIDI File (RP-001) as far as a song needs it: notes, tempo, meter, names and markers.
 * Times are in MIDI ticks from the start of the file; `ticksPerQuarter` of them make a quarter note.
 */

/** A note with its end already found. Channels count from 0; channel 9 is the drums. */
export interface MidiNote {
  readonly tick: number;
  readonly ticks: number;
  readonly channel: number;
  /** MIDI key number: 60 is middle C. */
  readonly pitch: number;
  /** 1 to 127. */
  readonly velocity: number;
}

export interface MidiTrack {
  /** The track's name, trimmed; "" when it has none. */
  readonly name: string;
  /** General MIDI program (0 to 127) of its first program change; null when it has none. */
  readonly program: number | null;
  /** Sorted by tick, then pitch. */
  readonly notes: readonly MidiNote[];
}

export interface TempoChange {
  readonly tick: number;
  /** Microseconds of a quarter note: 500 000 is 120 a minute. */
  readonly microsPerQuarter: number;
}

export interface MeterChange {
  readonly tick: number;
  readonly beats: number;
  /** 4 is a quarter note, 8 an eighth. */
  readonly unit: number;
}

export interface Marker {
  readonly tick: number;
  readonly name: string;
}

export interface MidiFile {
  readonly format: 0 | 1;
  readonly ticksPerQuarter: number;
  /** Of all tracks, sorted by tick; at most one a tick. */
  readonly tempos: readonly TempoChange[];
  readonly meters: readonly MeterChange[];
  readonly markers: readonly Marker[];
  readonly tracks: readonly MidiTrack[];
}

/** Tempo until the first tempo event (RP-001): 120 quarter notes a minute. */
export const DEFAULT_MICROS_PER_QUARTER = 500_000;
/** The channel of drums in General MIDI, counted from 0. */
export const DRUM_CHANNEL = 9;

/** Why a file is no song that can be used: one plain sentence, and the byte at which reading stopped. */
export class MidiFileError extends Error {
  override readonly name = "MidiFileError";
  readonly offset: number;

  constructor(message: string, offset: number) {
    super(message);
    this.offset = offset;
  }
}
