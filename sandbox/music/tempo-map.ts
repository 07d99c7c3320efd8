import { DEFAULT_MICROS_PER_QUARTER } from "./midi-file.ts";
import type { MidiFile } from "./midi-file.ts";

/** Gives the time of a MIDI tick in microseconds from the start of the file (not rounded). */
export type TempoMap = (tick: number) => number;

interface Stretch {
  readonly tick: number;
  readonly micros: number;
  readonly microsPerTick: number;
}

/**
 * The tempo map of a file. Seconds = ticks x microseconds a quarter / (ticks a quarter x 1 000 000),
 * added up over the stretches between tempo events; 120 a minute before the first one (RP-001).
 */
export function tempoMap(file: Pick<MidiFile, "tempos" | "ticksPerQuarter">): TempoMap {
  const stretches: Stretch[] = [
    { tick: 0, micros: 0, microsPerTick: DEFAULT_MICROS_PER_QUARTER / file.ticksPerQuarter },
  ];
  for (const { tick, microsPerQuarter } of file.tempos) {
    const last = stretches.at(-1);
    if (!last) continue;
    stretches.push({
      tick,
      micros: last.micros + (tick - last.tick) * last.microsPerTick,
      microsPerTick: microsPerQuarter / file.ticksPerQuarter,
    });
  }
  return (tick) => {
    const stretch = stretches.findLast((one) => one.tick <= tick) ?? stretches[0];
    return stretch ? stretch.micros + (tick - stretch.tick) * stretch.microsPerTick : 0;
  };
}
