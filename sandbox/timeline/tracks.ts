import { colourToLinear, WHITE } from "./colour.ts";
import { ACTION_CODE, type Timeline } from "./model.ts";

/**
 * The cues of a timeline sorted out by light: what each light is told, in order.
 *
 * Three tracks a light (level, colour, pulses), each a run of entries in one flat table: light `i`
 * owns the entries `first[i]` up to, not including, `first[i + 1]`. An entry of the level or colour
 * track holds what its light had reached when the entry took over, so that a light can be read at
 * any moment from one entry alone. Built once for a timeline, shared by every cursor and check.
 */
export interface Tracks {
  readonly lightCount: number;
  readonly endTick: number;
  readonly level: LevelTrack;
  readonly colour: ColourTrack;
  readonly pulse: PulseTrack;
}

interface Track {
  readonly first: Uint32Array;
  readonly tick: Uint32Array;
  /** Index of the cue. */
  readonly cue: Uint32Array;
}

export interface LevelTrack extends Track {
  /** Level 0 to 100 when the entry takes over, and at the end of its line. */
  readonly from: Float64Array;
  readonly to: Float64Array;
  /** Ticks of the straight line; 0 is at once. */
  readonly length: Uint32Array;
}

export interface ColourTrack extends Track {
  /** Linear red, green and blue, three numbers an entry. */
  readonly from: Float64Array;
  readonly to: Float64Array;
  readonly length: Uint32Array;
}

export interface PulseTrack extends Track {
  readonly length: Uint32Array;
  /** Tick at which the pulse is over, or was ended by `off()`. */
  readonly end: Float64Array;
  /** The latest `end` of this entry and those of its light before it: how far back to look. */
  readonly latestEnd: Float64Array;
}

/** Gives the tracks of every light. Linear in the single-light changes; rules 13 to 18 of the language. */
export function buildTracks(timeline: Timeline): Tracks {
  const { lightCount, endTick } = timeline;
  const { levels, colours, pulses } = countEntries(timeline);
  const level: LevelTrack = {
    ...newTrack(levels),
    from: newFloats(levels),
    to: newFloats(levels),
    length: newWholes(levels),
  };
  const colour: ColourTrack = {
    ...newTrack(colours),
    from: newFloats(colours, 3),
    to: newFloats(colours, 3),
    length: newWholes(colours),
  };
  const pulse: PulseTrack = {
    ...newTrack(pulses),
    length: newWholes(pulses),
    end: newFloats(pulses),
    latestEnd: newFloats(pulses),
  };
  fillTracks(timeline, level, colour, pulse);
  return { lightCount, endTick, level, colour, pulse };
}

/** Gives the level (0 to 100) of a level entry at `tick`, which is at or after the entry. */
export function levelAt(track: LevelTrack, entry: number, tick: number): number {
  const to = track.to[entry] ?? 0;
  const passed = tick - (track.tick[entry] ?? 0);
  const length = track.length[entry] ?? 0;
  if (passed >= length) return to;
  const from = track.from[entry] ?? 0;
  return from + ((to - from) * passed) / length;
}

/** Gives one linear channel (0 red, 1 green, 2 blue) of a colour entry at `tick`, which is at or after the entry. */
export function channelAt(track: ColourTrack, entry: number, channel: number, tick: number): number {
  const to = track.to[entry * 3 + channel] ?? 0;
  const passed = tick - (track.tick[entry] ?? 0);
  const length = track.length[entry] ?? 0;
  if (passed >= length) return to;
  const from = track.from[entry * 3 + channel] ?? 0;
  return from + ((to - from) * passed) / length;
}

/** Gives the envelope (100 falling to 0, rule 18) of a pulse entry at `tick`, which is inside the pulse. */
export function envelopeAt(track: PulseTrack, entry: number, tick: number): number {
  return 100 * (1 - (tick - (track.tick[entry] ?? 0)) / (track.length[entry] ?? 1));
}

/** Gives the last entry of `light` at or before `tick`, or `first - 1` when there is none. */
export function findEntry(track: Pick<Track, "first" | "tick">, light: number, tick: number): number {
  let low = track.first[light] ?? 0;
  let high = track.first[light + 1] ?? 0;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((track.tick[middle] ?? 0) <= tick) low = middle + 1;
    else high = middle;
  }
  return low - 1;
}

/** Number of entries of each light, summed up: the shape of `first`. */
function countEntries({ cues, selections, lightCount }: Timeline) {
  const levels = new Uint32Array(lightCount + 1);
  const colours = new Uint32Array(lightCount + 1);
  const pulses = new Uint32Array(lightCount + 1);
  for (let cue = 0; cue < cues.count; cue++) {
    const action = cues.action[cue];
    const counts = action === ACTION_CODE.colour ? colours : action === ACTION_CODE.pulse ? pulses : levels;
    for (const light of selections[cues.selection[cue] ?? 0] ?? []) counts[light + 1] = (counts[light + 1] ?? 0) + 1;
  }
  for (const counts of [levels, colours, pulses])
    for (let light = 0; light < lightCount; light++)
      counts[light + 1] = (counts[light + 1] ?? 0) + (counts[light] ?? 0);
  return { levels, colours, pulses };
}

const entriesIn = (first: Uint32Array) => first[first.length - 1] ?? 0;
const newWholes = (first: Uint32Array) => new Uint32Array(entriesIn(first));
const newFloats = (first: Uint32Array, each = 1) => new Float64Array(entriesIn(first) * each);
const newTrack = (first: Uint32Array): Track => ({ first, tick: newWholes(first), cue: newWholes(first) });

function fillTracks(
  { cues, selections, lightCount }: Timeline,
  level: LevelTrack,
  colour: ColourTrack,
  pulse: PulseTrack,
): void {
  const nextLevel = level.first.slice();
  const nextColour = colour.first.slice();
  const nextPulse = pulse.first.slice();
  // Pulses before this entry were ended by an `off()` already, so each is looked at once.
  const runningFrom = pulse.first.slice();
  const white = colourToLinear(WHITE);
  for (let cue = 0; cue < cues.count; cue++) {
    const action = cues.action[cue];
    const lights = selections[cues.selection[cue] ?? 0] ?? [];
    const tick = cues.tick[cue] ?? 0;
    const length = cues.length[cue] ?? 0;
    if (action === ACTION_CODE.pulse) {
      for (const light of lights) {
        const entry = addEntry(pulse, nextPulse, light, tick, cue);
        pulse.length[entry] = length;
        pulse.end[entry] = tick + length;
      }
    } else if (action === ACTION_CODE.colour) {
      const target = colourToLinear(cues.colour[cue] ?? WHITE);
      for (const light of lights) {
        const entry = addEntry(colour, nextColour, light, tick, cue);
        const hasBefore = entry > (colour.first[light] ?? 0);
        colour.length[entry] = length;
        for (let channel = 0; channel < 3; channel++) {
          colour.from[entry * 3 + channel] = hasBefore
            ? channelAt(colour, entry - 1, channel, tick)
            : (white[channel] ?? 1);
          colour.to[entry * 3 + channel] = target[channel] ?? 0;
        }
      }
    } else {
      const isOff = action === ACTION_CODE.off;
      for (const light of lights) {
        const entry = addEntry(level, nextLevel, light, tick, cue);
        level.from[entry] = entry > (level.first[light] ?? 0) ? levelAt(level, entry - 1, tick) : 0;
        level.to[entry] = isOff ? 0 : (cues.level[cue] ?? 0) / 100;
        level.length[entry] = action === ACTION_CODE.fadeTo ? length : 0;
        if (isOff) endPulses(pulse, runningFrom, nextPulse, light, tick);
      }
    }
  }
  for (let light = 0; light < lightCount; light++) {
    let latest = 0;
    for (let entry = pulse.first[light] ?? 0; entry < (pulse.first[light + 1] ?? 0); entry++) {
      latest = Math.max(latest, pulse.end[entry] ?? 0);
      pulse.latestEnd[entry] = latest;
    }
  }
}

function addEntry(track: Track, next: Uint32Array, light: number, tick: number, cue: number): number {
  const entry = next[light] ?? 0;
  next[light] = entry + 1;
  track.tick[entry] = tick;
  track.cue[entry] = cue;
  return entry;
}

function endPulses(
  pulse: PulseTrack,
  runningFrom: Uint32Array,
  nextPulse: Uint32Array,
  light: number,
  tick: number,
): void {
  const until = nextPulse[light] ?? 0;
  for (let entry = runningFrom[light] ?? 0; entry < until; entry++)
    pulse.end[entry] = Math.min(pulse.end[entry] ?? 0, tick);
  runningFrom[light] = until;
}
