import type { BeatMap } from "../../shared/contracts/songs.ts";
import { TICKS_PER_BEAT, type Seconds, type Ticks } from "../../shared/units.ts";

/**
 * Where ticks lie in the audio of one song. Linear inside a beat; before the first beat and after
 * the last the nearest beat's tempo goes on, so that a clock may start early or run over.
 */
export interface Tempo {
  /** The song's end; the last beat of the beat map. */
  readonly endTick: Ticks;
  readonly endSeconds: Seconds;
  /** Seconds from the start of the audio; `tick` may be fractional. */
  toSeconds(tick: number): Seconds;
  /** Fractional ticks from beat 0; the inverse of `toSeconds`. */
  toTick(seconds: number): Ticks;
}

const MICROSECONDS = 1_000_000;

/** Gives the tempo of a beat map (whole microseconds, strictly rising, two beats or more). Each call of its methods is a binary search at most. */
export function createTempo(song: Pick<BeatMap, "beats">): Tempo {
  const { beats } = song;
  const last = beats.length - 1;
  const at = (beat: number) => beats[beat] ?? 0;
  return {
    endTick: (last * TICKS_PER_BEAT) as Ticks,
    endSeconds: (at(last) / MICROSECONDS) as Seconds,
    toSeconds(tick) {
      const place = tick / TICKS_PER_BEAT;
      const beat = Math.min(Math.max(Math.floor(place), 0), last - 1);
      return ((at(beat) + (place - beat) * (at(beat + 1) - at(beat))) / MICROSECONDS) as Seconds;
    },
    toTick(seconds) {
      const time = seconds * MICROSECONDS;
      let low = 0;
      let high = last - 1;
      while (low < high) {
        const middle = (low + high + 1) >> 1;
        if (at(middle) <= time) low = middle;
        else high = middle - 1;
      }
      return ((low + (time - at(low)) / (at(low + 1) - at(low))) * TICKS_PER_BEAT) as Ticks;
    },
  };
}
