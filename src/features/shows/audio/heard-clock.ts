/** The parts of an audio context that tell time. */
export interface AudioTime {
  readonly currentTime: number;
  readonly outputLatency?: number;
  readonly baseLatency?: number;
}

/** Steps of the audio clock up to this size are evened out; larger ones are followed at once. */
const LARGEST_SLIP_SECONDS = 0.05;
/** How fast the audio clock may fall behind the page's: ten times what poor clocks do. */
const LARGEST_DRIFT = 0.001;
/** Some Bluetooth speakers report nothing or nonsense; nobody would sit through more than this. */
const LARGEST_LATENCY_SECONDS = 0.5;

/**
 * Which moment of an audio context is being heard now. The context's own time moves in steps of a
 * buffer (up to 20 ms), which would show as a trembling picture; the page's clock moves evenly but
 * runs apart from it. This follows the first with the evenness of the second. A step is never early:
 * right after one the audio clock is exact, before the next it lags. So the furthest it was ahead is
 * the truth, not the mean, which would be half a buffer late.
 */
export class HeardClock {
  readonly #audio: AudioTime;
  readonly #pageSeconds: () => number;
  #offset: number | null = null;
  #readAt = 0;

  constructor(audio: AudioTime, pageSeconds: () => number = () => performance.now() / 1000) {
    this.#audio = audio;
    this.#pageSeconds = pageSeconds;
  }

  /** The time of the context that leaves the loudspeaker at this moment, in seconds. */
  now(): number {
    const page = this.#pageSeconds();
    const offset = this.#audio.currentTime - page;
    if (this.#offset === null || Math.abs(offset - this.#offset) > LARGEST_SLIP_SECONDS) this.#offset = offset;
    else this.#offset = Math.max(offset, this.#offset - (page - this.#readAt) * LARGEST_DRIFT);
    this.#readAt = page;
    return page + this.#offset - this.latency;
  }

  /** Seconds between the context's time and the ear, as far as the browser tells. */
  get latency(): number {
    const told = this.#audio.outputLatency || this.#audio.baseLatency || 0;
    return Math.min(LARGEST_LATENCY_SECONDS, Math.max(0, told));
  }
}
