import type { MeterChange, MidiFile } from "./midi-file.ts";

/** A bar of the file as its meter counts it. Ticks are MIDI ticks. */
export interface GridBar {
  readonly tick: number;
  readonly ticks: number;
  /** Beats as counted: 6/8 counts two. */
  readonly beats: number;
  readonly isPickUp: boolean;
}

/** Meter until the first meter event (RP-001). */
const COMMON: MeterChange = { tick: 0, beats: 4, unit: 4 };

/** Whether a meter counts in threes of its unit: 6/8, 9/8, 12/8 (common practice, no source). */
const isCompound = ({ beats, unit }: MeterChange): boolean => unit >= 8 && beats > 3 && beats % 3 === 0;

/** Beats a bar as counted: 4/4 four, 3/4 three, 6/8 two, 2/2 two, 7/8 seven. */
export function countedBeats(meter: MeterChange): number {
  return isCompound(meter) ? meter.beats / 3 : meter.beats;
}

const barTicks = (meter: MeterChange, ticksPerQuarter: number): number =>
  (meter.beats * 4 * ticksPerQuarter) / meter.unit;

function metersFrom(file: Pick<MidiFile, "meters">): MeterChange[] {
  return file.meters[0]?.tick === 0 ? [...file.meters] : [COMMON, ...file.meters];
}

/** A first meter of one short bar before the real one: how notation programs write a pick-up. */
function isPickUpMeter(first: MeterChange, second: MeterChange | undefined, ticksPerQuarter: number): boolean {
  if (!second) return false;
  const ticks = barTicks(first, ticksPerQuarter);
  return second.tick === first.tick + ticks && ticks < barTicks(second, ticksPerQuarter);
}

/** The song's meter: the first one, or the second when the first is only a pick-up bar. */
export function firstMeter(file: Pick<MidiFile, "meters" | "ticksPerQuarter">): MeterChange {
  const [first = COMMON, second] = metersFrom(file);
  return second && isPickUpMeter(first, second, file.ticksPerQuarter) ? second : first;
}

/**
 * The bars of a file from tick 0 until one ends at or after `until`. A meter change inside a bar
 * cuts that bar short, as a new bar begins with every meter.
 */
export function meterGrid(file: Pick<MidiFile, "meters" | "ticksPerQuarter">, until: number): GridBar[] {
  const meters = metersFrom(file);
  const bars: GridBar[] = [];
  meters.forEach((meter, m) => {
    const next = meters[m + 1];
    const ticks = barTicks(meter, file.ticksPerQuarter);
    const beatTicks = ticks / countedBeats(meter);
    const isPickUp = m === 0 && isPickUpMeter(meter, next, file.ticksPerQuarter);
    const end = next?.tick ?? Number.POSITIVE_INFINITY;
    for (let tick = meter.tick; tick < end && (tick < until || bars.length === 0); tick += ticks) {
      const length = Math.min(ticks, end - tick);
      bars.push({ tick, ticks: length, beats: Math.max(1, Math.round(length / beatTicks)), isPickUp });
    }
  });
  return bars;
}
