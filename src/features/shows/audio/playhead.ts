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

/** A shorter loop would only buzz. */
const SHORTEST_LOOP_SECONDS = 0.05;

/**
 * Which second of the song belongs to which time of a clock, from one moment on. Immutable.
 *
 * Everything is worked out from the way: the seconds played since the start, loops unrolled. A way is
 * cut into turns at `#wayOfTurn`, which is a product and not a sum, so that the ten-thousandth turn
 * begins as exactly as the first; both `songAt` and `listSpans` go through it, so that what is laid and
 * what is shown cannot part, and no note at the very start of a loop falls between two spans.
 */
export class Playhead {
  readonly #options: PlayheadOptions;
  readonly #loop: LoopRange | null;

  constructor(options: PlayheadOptions) {
    this.#options = options;
    const { loop, song } = options;
    // A loop that lies behind is not gone back to: the song plays on to its end.
    this.#loop = loop && loop.end - loop.start > SHORTEST_LOOP_SECONDS && song < loop.end ? loop : null;
  }

  /** The song's second at a time of the clock: before the start it stands, at the end it stays. */
  songAt(clock: number): number {
    return this.#place(this.#wayAt(clock)).song;
  }

  /** Whether the song is over at a time of the clock; never in a loop. */
  isOverAt(clock: number): boolean {
    return !this.#loop && this.#wayAt(clock) >= this.#wayOfTurn(0);
  }

  /** Seconds of the clock until the song starts; 0 once it has. */
  secondsUntilStart(clock: number): number {
    return Math.max(0, this.#options.clock - clock);
  }

  /** The stretches of the song that belong to a stretch of the clock, in order. Spans that meet share their edge. */
  listSpans(fromClock: number, toClock: number): PlayedSpan[] {
    const spans: PlayedSpan[] = [];
    const end = this.#wayAt(toClock);
    let way = this.#wayAt(fromClock);
    let { turn, song } = this.#place(way);
    while (way < end && (this.#loop !== null || way < this.#wayOfTurn(0))) {
      const turnEnd = this.#wayOfTurn(turn);
      const isWhole = turnEnd <= end;
      const to = isWhole ? this.#lastSecond() : this.#place(end).song;
      if (to > song) spans.push({ from: song, to, clock: this.#options.clock + way / this.#options.rate });
      way = Math.min(turnEnd, end);
      turn += 1;
      song = this.#loop?.start ?? this.#options.end;
    }
    return spans;
  }

  /** Seconds of the song played at a time of the clock, as if no loop went back. */
  #wayAt(clock: number): number {
    return Math.max(0, clock - this.#options.clock) * this.#options.rate;
  }

  /** The way at which a turn ends: turn 0 leads from the start to the loop's end (or the song's). */
  #wayOfTurn(turn: number): number {
    const { song, end } = this.#options;
    if (!this.#loop) return end - song;
    return this.#loop.end - song + turn * (this.#loop.end - this.#loop.start);
  }

  #lastSecond(): number {
    return this.#loop?.end ?? this.#options.end;
  }

  #place(way: number): { readonly turn: number; readonly song: number } {
    const { song, end } = this.#options;
    if (way < this.#wayOfTurn(0)) return { turn: 0, song: song + way };
    if (!this.#loop) return { turn: 0, song: end };
    const length = this.#loop.end - this.#loop.start;
    let turn = 1 + Math.floor((way - this.#wayOfTurn(0)) / length);
    // A division may land a hair beside the edge of a turn; the edges themselves decide.
    if (way < this.#wayOfTurn(turn - 1)) turn -= 1;
    else if (way >= this.#wayOfTurn(turn)) turn += 1;
    if (turn === 0) return { turn, song: song + way };
    return { turn, song: Math.min(this.#loop.end, this.#loop.start + (way - this.#wayOfTurn(turn - 1))) };
  }
}
