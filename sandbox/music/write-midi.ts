import type { MidiFile, MidiTrack } from "./midi-file.ts";
import { writeText } from "./midi-text.ts";

/** Bytes of an event that stands at a tick. `order` settles ties: names, then ends of notes, then starts. */
interface TimedBytes {
  readonly tick: number;
  readonly order: number;
  readonly bytes: readonly number[];
}

const bigEndian = (value: number, width: number): number[] =>
  Array.from({ length: width }, (_, i) => Math.floor(value / 256 ** (width - 1 - i)) % 256);

/** A number of variable length (RP-001): 720 is 85 50. Whole, 0 to 0x0FFFFFFF. */
export function variableLength(value: number): number[] {
  if (!Number.isInteger(value) || value < 0 || value > 0x0f_ff_ff_ff)
    throw new RangeError(`${value} does not fit a variable length.`);
  const bytes = [value & 0x7f];
  for (let rest = value >>> 7; rest > 0; rest >>>= 7) bytes.unshift((rest & 0x7f) | 0x80);
  return bytes;
}

const meta = (type: number, data: readonly number[]): number[] => [0xff, type, ...variableLength(data.length), ...data];

function chunk(kind: string, data: readonly number[]): number[] {
  return [...writeText(kind), ...bigEndian(data.length, 4), ...data];
}

function trackChunk(events: readonly TimedBytes[]): number[] {
  let at = 0;
  const bytes = events
    .toSorted((a, b) => a.tick - b.tick || a.order - b.order)
    .flatMap((event) => {
      const step = event.tick - at;
      at = event.tick;
      return [...variableLength(step), ...event.bytes];
    });
  return chunk("MTrk", [...bytes, 0, ...meta(0x2f, [])]);
}

function conductorEvents(file: MidiFile): TimedBytes[] {
  return [
    ...file.tempos.map(({ tick, microsPerQuarter }) => ({
      tick,
      order: 1,
      bytes: meta(0x51, bigEndian(microsPerQuarter, 3)),
    })),
    ...file.meters.map(({ tick, beats, unit }) => {
      const isCompound = unit >= 8 && beats > 3 && beats % 3 === 0;
      const clocksPerClick = (96 / unit) * (isCompound ? 3 : 1);
      return { tick, order: 0, bytes: meta(0x58, [beats, Math.log2(unit), clocksPerClick, 8]) };
    }),
    ...file.markers.map(({ tick, name }) => ({ tick, order: 2, bytes: meta(0x06, writeText(name)) })),
  ];
}

function trackEvents(track: MidiTrack): TimedBytes[] {
  const channel = track.notes[0]?.channel ?? 0;
  const events: TimedBytes[] = [{ tick: 0, order: 0, bytes: meta(0x03, writeText(track.name)) }];
  if (track.program !== null) events.push({ tick: 0, order: 0, bytes: [0xc0 | channel, track.program] });
  for (const note of track.notes) {
    events.push({ tick: note.tick, order: 2, bytes: [0x90 | note.channel, note.pitch, note.velocity] });
    events.push({ tick: note.tick + note.ticks, order: 1, bytes: [0x80 | note.channel, note.pitch, 64] });
  }
  return events;
}

/**
 * The bytes of a Standard MIDI File of format 1: a first track with tempo, meter and markers, then
 * one track for each of the file's. Reading them back gives the same notes.
 */
export function writeMidi(file: MidiFile): Uint8Array {
  const header = chunk("MThd", [
    ...bigEndian(1, 2),
    ...bigEndian(file.tracks.length + 1, 2),
    ...bigEndian(file.ticksPerQuarter, 2),
  ]);
  const tracks = [conductorEvents(file), ...file.tracks.map(trackEvents)].flatMap(trackChunk);
  return Uint8Array.from([...header, ...tracks]);
}
