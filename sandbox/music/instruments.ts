import { DRUM_CHANNEL } from "./midi-file.ts";
import type { MidiFile, MidiNote } from "./midi-file.ts";

/** The notes of one instrument: of all tracks that have its name. */
export interface Part {
  readonly name: string;
  /** General MIDI program, when the file names one. */
  readonly program: number | null;
  readonly isDrums: boolean;
  /** Sorted by tick, then pitch. */
  readonly notes: readonly MidiNote[];
}

const LONGEST_NAME = 40;

/** A track without a name takes its channel's: channel 10 is the drums in General MIDI. */
function nameOf(track: { readonly name: string }, channel: number): string {
  if (track.name !== "") return track.name.slice(0, LONGEST_NAME).trim();
  return channel === DRUM_CHANNEL ? "drums" : `channel ${channel + 1}`;
}

/** The instruments of a file in the order of its tracks; tracks without notes are none. */
export function listParts(file: MidiFile): Part[] {
  const parts = new Map<string, { program: number | null; notes: MidiNote[] }>();
  for (const track of file.tracks) {
    for (const note of track.notes) {
      const name = nameOf(track, note.channel);
      const part = parts.get(name) ?? { program: track.program, notes: [] };
      part.notes.push(note);
      parts.set(name, part);
    }
  }
  return [...parts].map(([name, { program, notes }]) => ({
    name,
    program,
    isDrums: notes.every((note) => note.channel === DRUM_CHANNEL),
    notes: notes.sort((a, b) => a.tick - b.tick || a.pitch - b.pitch),
  }));
}
