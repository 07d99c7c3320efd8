/** A stretch of the song that repeats, in seconds: from `start` up to `end`. */
export interface LoopRange {
  readonly start: number;
  readonly end: number;
}

/** A stretch of the song with the clock's time at which it begins. */
export interface PlayedSpan {
  readonly from: number;
  readonly to: number;
  readonly clock: number;
}

export interface PlayheadOptions {
  /** The clock's time and the song's second at one and the same moment. */
  readonly clock: number;
  readonly song: number;
  /** Seconds of the song in one second of the clock. */
  readonly rate: number;
  readonly end: number;
  readonly loop: LoopRange | null;
}

/** Which second of the song belongs to which time of a clock, from one moment on. Immutable. */
export class Playhead {
  readonly #options: PlayheadOptions;

  constructor(options: PlayheadOptions) {
    this.#options = options;
  }

  /** The song's second at a time of the clock: before the start it stands, at the end it stays. */
  songAt(clock: number): number {
    const { song, end } = this.#options;
    const passed = this.#passed(clock);
    const loop = this.#loop;
    if (!loop || song + passed < loop.end) return Math.min(end, song + passed);
    return loop.start + ((song + passed - loop.end) % (loop.end - loop.start));
  }

  /** Whether the song is over at a time of the clock; never in a loop. */
  isOverAt(clock: number): boolean {
    return !this.#loop && this.#options.song + this.#passed(clock) >= this.#options.end;
  }

  /** The stretches of the song that belong to a stretch of the clock, in order. */
  listSpans(fromClock: number, toClock: number): PlayedSpan[] {
    const { rate, end } = this.#options;
    const loop = this.#loop;
    const spans: PlayedSpan[] = [];
    let clock = Math.max(fromClock, this.#options.clock);
    while (clock < toClock) {
      const from = this.songAt(clock);
      const last = loop && from < loop.end ? loop.end : end;
      const to = Math.min(last, from + (toClock - clock) * rate);
      // Rounding may leave less than a sample; going on would never end.
      if (to - from < 1e-6) {
        if (!loop) break;
        clock += 1e-6;
        continue;
      }
      spans.push({ from, to, clock });
      clock += (to - from) / rate;
    }
    return spans;
  }

  /** The loop, unless the song is already past it: then it plays on to the end. */
  get #loop(): LoopRange | null {
    const { loop, song } = this.#options;
    return loop && loop.end - loop.start > 0.05 && song < loop.end ? loop : null;
  }

  #passed(clock: number): number {
    return Math.max(0, clock - this.#options.clock) * this.#options.rate;
  }
}
