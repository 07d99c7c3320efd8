import { ByteReader } from "./byte-reader.ts";
import { MidiFileError } from "./midi-file.ts";
import type { Marker, MeterChange, MidiFile, MidiNote, MidiTrack, TempoChange } from "./midi-file.ts";
import { readText } from "./midi-text.ts";

const META = { trackName: 0x03, marker: 0x06, endOfTrack: 0x2f, tempo: 0x51, meter: 0x58 } as const;
const KIND = {
  noteOff: 0x8,
  noteOn: 0x9,
  keyPressure: 0xa,
  control: 0xb,
  program: 0xc,
  pressure: 0xd,
  bend: 0xe,
} as const;

/** More events than any song has: a guard against files made to fill memory. */
const MOST_EVENTS = 200_000;
const MOST_TRACKS = 64;

/** What is collected over all tracks. */
interface Collected {
  readonly tempos: TempoChange[];
  readonly meters: MeterChange[];
  readonly markers: Marker[];
  events: number;
}

interface OpenNote {
  readonly tick: number;
  readonly velocity: number;
}

/** One track while it is read: the notes that still sound wait for their end. */
class TrackReader {
  readonly #reader: ByteReader;
  readonly #all: Collected;
  readonly #notes: MidiNote[] = [];
  readonly #open = new Map<number, OpenNote[]>();
  #tick = 0;
  #status = 0;
  #name = "";
  #program: number | null = null;
  #isOver = false;

  constructor(reader: ByteReader, all: Collected) {
    this.#reader = reader;
    this.#all = all;
  }

  read(): MidiTrack {
    while (!this.#isOver && !this.#reader.isAtEnd) {
      this.#tick += this.#reader.variableLength();
      this.#event();
      this.#all.events += 1;
      if (this.#all.events > MOST_EVENTS)
        throw new MidiFileError("The file has more events than a song can have.", this.#reader.offset);
    }
    for (const key of this.#open.keys()) while (this.#close(key));
    this.#notes.sort((a, b) => a.tick - b.tick || a.pitch - b.pitch);
    return { name: this.#name, program: this.#program, notes: this.#notes };
  }

  #event(): void {
    const first = this.#reader.peek();
    if (first === 0xff) return this.#meta();
    if (first === 0xf0 || first === 0xf7) {
      this.#reader.byte();
      this.#reader.bytes(this.#reader.variableLength());
      this.#status = 0;
      return;
    }
    if (first >= 0xf0)
      throw new MidiFileError(
        "The file holds an event that belongs to a live cable, not to a file.",
        this.#reader.offset,
      );
    // A byte below 0x80 means: the same kind of event as before (running status).
    if (first >= 0x80) this.#status = this.#reader.byte();
    else if (this.#status === 0)
      throw new MidiFileError("The file has an event of no kind. Export it again.", this.#reader.offset);
    this.#channelEvent(this.#status >> 4, this.#status & 0x0f);
  }

  #channelEvent(kind: number, channel: number): void {
    const first = this.#reader.byte() & 0x7f;
    if (kind === KIND.program) {
      this.#program ??= first;
      return;
    }
    if (kind === KIND.pressure) return;
    const second = this.#reader.byte() & 0x7f;
    const key = channel * 128 + first;
    // A note-on of velocity 0 is a note-off (RP-001).
    if (kind === KIND.noteOn && second > 0) {
      const waiting = this.#open.get(key);
      const note = { tick: this.#tick, velocity: second };
      if (waiting) waiting.push(note);
      else this.#open.set(key, [note]);
    } else if (kind === KIND.noteOff || kind === KIND.noteOn) {
      this.#close(key);
    }
  }

  /** Ends the oldest note that still sounds on this key; says whether there was one. */
  #close(key: number): boolean {
    const note = this.#open.get(key)?.shift();
    if (!note) return false;
    this.#notes.push({
      tick: note.tick,
      ticks: Math.max(1, this.#tick - note.tick),
      channel: Math.floor(key / 128),
      pitch: key % 128,
      velocity: note.velocity,
    });
    return true;
  }

  #meta(): void {
    this.#reader.byte();
    this.#status = 0;
    const type = this.#reader.byte();
    const at = this.#reader.offset;
    const data = this.#reader.part(this.#reader.variableLength());
    if (type === META.endOfTrack) this.#isOver = true;
    else if (type === META.trackName && this.#name === "") this.#name = readText(rest(data));
    else if (type === META.marker) this.#all.markers.push({ tick: this.#tick, name: readText(rest(data)) });
    else if (type === META.tempo) this.#tempo(data.number(3), at);
    else if (type === META.meter) this.#meter(data.byte(), data.byte(), at);
  }

  #tempo(microsPerQuarter: number, at: number): void {
    if (microsPerQuarter === 0) throw new MidiFileError("The file has a tempo of 0. Export it again.", at);
    this.#all.tempos.push({ tick: this.#tick, microsPerQuarter });
  }

  #meter(beats: number, power: number, at: number): void {
    if (beats === 0 || beats > 32 || power > 5)
      throw new MidiFileError("The file has a meter that cannot be counted. Use 1 to 32 beats.", at);
    this.#all.meters.push({ tick: this.#tick, beats, unit: 2 ** power });
  }
}

function rest(reader: ByteReader): Uint8Array {
  const bytes: number[] = [];
  while (!reader.isAtEnd) bytes.push(reader.byte());
  return Uint8Array.from(bytes);
}

/** Sorted by tick; of several at one tick the last one counts. */
function lastAtEachTick<Event extends { readonly tick: number }>(events: readonly Event[]): Event[] {
  const byTick = new Map<number, Event>();
  for (const event of events) byTick.set(event.tick, event);
  return [...byTick.values()].sort((a, b) => a.tick - b.tick);
}

function readHeader(reader: ByteReader): { format: 0 | 1; tracks: number; ticksPerQuarter: number } {
  if (reader.letters() !== "MThd")
    throw new MidiFileError("This is not a MIDI file. Choose a file that ends in .mid.", 0);
  const header = reader.part(reader.number(4));
  const format = header.number(2);
  const tracks = header.number(2);
  const division = header.number(2);
  if (format !== 0 && format !== 1)
    throw new MidiFileError("This MIDI file holds several songs (format 2). Export one song as format 1.", 8);
  if (division >= 0x8000)
    throw new MidiFileError("This MIDI file counts film frames, not beats. Export it with ticks per quarter note.", 12);
  if (division === 0) throw new MidiFileError("This MIDI file has no ticks in a quarter note. Export it again.", 12);
  return { format, tracks, ticksPerQuarter: division };
}

/**
 * Reads a Standard MIDI File of format 0 or 1. Throws a `MidiFileError` with a sentence for people
 * when the bytes are no such file. Checked against RP-001 examples and a reference library in tests.
 */
export function readMidi(bytes: Uint8Array): MidiFile {
  if (bytes.length < 14) throw new MidiFileError("This is not a MIDI file. Choose a file that ends in .mid.", 0);
  const reader = new ByteReader(bytes);
  const header = readHeader(reader);
  const all: Collected = { tempos: [], meters: [], markers: [], events: 0 };
  const tracks: MidiTrack[] = [];
  while (tracks.length < header.tracks && !reader.isAtEnd) {
    // Chunks of other kinds are to be passed over (RP-001).
    const kind = reader.letters();
    const chunk = reader.part(reader.number(4));
    if (kind === "MTrk") tracks.push(new TrackReader(chunk, all).read());
    if (tracks.length > MOST_TRACKS)
      throw new MidiFileError(`The file has more than ${MOST_TRACKS} tracks.`, reader.offset);
  }
  return {
    format: header.format,
    ticksPerQuarter: header.ticksPerQuarter,
    tempos: lastAtEachTick(all.tempos),
    meters: lastAtEachTick(all.meters),
    markers: lastAtEachTick(all.markers),
    tracks,
  };
}
