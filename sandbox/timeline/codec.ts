import { ByteReader, ByteWriter, TimelineFormatError } from "./bytes.ts";
import { crc32 } from "./crc32.ts";
import { NO_COLOUR, type CueTable, type Timeline } from "./model.ts";
import { assertTimeline } from "./validate.ts";

/**
 * The stored form of a timeline, number 1.
 *
 * `D B T L`, format number, flags (bit 0: complete); language, seed, lights, end tick; ids of song
 * and layout; the selections and the chains, each a length and its numbers; the cues column by
 * column, ticks as steps from the cue before and a colour as 0 for none, else its value plus 1; a
 * CRC-32 of all that. Numbers are whole numbers of variable length (see `bytes.ts`).
 */
const MARK = [0x44, 0x42, 0x54, 0x4c] as const;
const FORMAT = 1;
const CRC_BYTES = 4;

/** Gives the stored form of a timeline, chains and completeness included. Throws `TimelineFormatError` for a timeline that breaks its model. */
export function encodeTimeline(timeline: Timeline): Uint8Array {
  assertTimeline(timeline);
  const out = new ByteWriter();
  for (const byte of MARK) out.byte(byte);
  out.byte(FORMAT);
  out.byte(timeline.isComplete ? 1 : 0);
  out.whole(timeline.language);
  out.fixed32(timeline.seed);
  out.whole(timeline.lightCount);
  out.whole(timeline.endTick);
  out.id(timeline.songId);
  out.id(timeline.layoutHash);
  writeLists(out, timeline.selections);
  writeLists(out, timeline.chains);
  writeCues(out, timeline.cues);
  out.fixed32(crc32(out.written()));
  return out.finish();
}

/**
 * Gives the timeline of stored bytes; everything in it is fresh and was checked. Throws
 * `TimelineFormatError` on bytes that are cut short, changed, of a newer format or not a timeline.
 */
export function decodeTimeline(bytes: Uint8Array): Timeline {
  MARK.forEach((byte, index) => {
    if (bytes[index] !== byte) throw new TimelineFormatError("These bytes are not a timeline.");
  });
  const format = bytes[MARK.length];
  if (format !== FORMAT)
    throw new TimelineFormatError(`This timeline has the format ${format}; this build reads format ${FORMAT}.`);
  if (bytes.length < MARK.length + 2 + CRC_BYTES) throw new TimelineFormatError("The timeline is cut short.");
  const body = bytes.subarray(0, bytes.length - CRC_BYTES);
  const stored = new ByteReader(bytes.subarray(bytes.length - CRC_BYTES)).fixed32("the check sum");
  if (stored !== crc32(body)) throw new TimelineFormatError("The timeline is damaged: its check sum does not fit.");
  const timeline = readTimeline(new ByteReader(body.subarray(MARK.length + 1)));
  assertTimeline(timeline);
  return timeline;
}

function readTimeline(input: ByteReader): Timeline {
  const flags = input.byte("the flags");
  if (flags > 1) throw new TimelineFormatError(`The flags are ${flags}; only 0 and 1 are known.`);
  const head = {
    version: 1 as const,
    isComplete: flags === 1,
    language: input.whole("the language number"),
    seed: input.fixed32("the seed"),
    lightCount: input.whole("the number of lights"),
    endTick: input.whole("the end"),
    songId: input.id("the song id"),
    layoutHash: input.id("the layout hash"),
  };
  const selections = readLists(input, "a selection").map((lights) => {
    for (const light of lights)
      if (light > 0xff_ff)
        throw new TimelineFormatError(`A selection names light ${light}; light indexes have 16 bits.`);
    return Uint16Array.from(lights);
  });
  const chains = readLists(input, "a chain");
  const cues = readCues(input);
  if (input.remaining > 0) throw new TimelineFormatError(`${input.remaining} bytes are left over after the timeline.`);
  return { ...head, selections, chains, cues };
}

function writeLists(out: ByteWriter, lists: readonly ArrayLike<number>[]): void {
  out.whole(lists.length);
  for (const list of lists) {
    out.whole(list.length);
    for (let i = 0; i < list.length; i++) out.whole(list[i] ?? 0);
  }
}

function readLists(input: ByteReader, what: string): number[][] {
  const lists: number[][] = [];
  for (let left = input.count(`the number of lists (${what})`); left > 0; left--) {
    const list: number[] = [];
    for (let rest = input.count(`the length of ${what}`); rest > 0; rest--) list.push(input.whole(what));
    lists.push(list);
  }
  return lists;
}

function writeCues(out: ByteWriter, cues: CueTable): void {
  out.whole(cues.count);
  const column = (value: (cue: number) => number) => {
    for (let cue = 0; cue < cues.count; cue++) out.whole(value(cue));
  };
  column((cue) => (cues.tick[cue] ?? 0) - (cues.tick[cue - 1] ?? 0));
  column((cue) => cues.action[cue] ?? 0);
  column((cue) => cues.selection[cue] ?? 0);
  column((cue) => cues.level[cue] ?? 0);
  column((cue) => cues.length[cue] ?? 0);
  column((cue) => (cues.colour[cue] === NO_COLOUR ? 0 : (cues.colour[cue] ?? 0) + 1));
  column((cue) => cues.chain[cue] ?? 0);
}

function readCues(input: ByteReader): CueTable {
  const count = input.count("the number of cues");
  const read = (what: string, most: number) => {
    const values = new Array<number>(count);
    for (let cue = 0; cue < count; cue++) {
      const value = input.whole(`the ${what} of cue ${cue}`);
      if (value > most) throw new TimelineFormatError(`The ${what} of cue ${cue} is ${value}, above ${most}.`);
      values[cue] = value;
    }
    return values;
  };
  const steps = read("time step", 0xff_ff_ff_ff);
  let tick = 0;
  const ticks = Uint32Array.from(steps, (step) => {
    tick += step;
    if (tick > 0xff_ff_ff_ff) throw new TimelineFormatError("The times of the cues add up to more than 32 bits.");
    return tick;
  });
  return {
    count,
    tick: ticks,
    action: Uint8Array.from(read("action", 0xff)),
    selection: Uint32Array.from(read("selection", 0xff_ff_ff_ff)),
    level: Uint16Array.from(read("level", 0xff_ff)),
    length: Uint32Array.from(read("length", 0xff_ff_ff_ff)),
    colour: Uint32Array.from(read("colour", 0x1_00_00_00), (value) => (value === 0 ? NO_COLOUR : value - 1)),
    chain: Uint32Array.from(read("chain", 0xff_ff_ff_ff)),
  };
}
