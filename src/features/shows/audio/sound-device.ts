import type { Score } from "../../../../shared/contracts/songs.ts";
import { Clicker } from "./clicker.ts";
import { Ensemble } from "./ensemble.ts";
import type { AudioTime } from "./heard-clock.ts";
import type { QueuedNote } from "./note-queue.ts";
import { createLiveContext, type Context } from "./tone.ts";

/** What makes a song's sounds and tells time; tests pass one of their own. Times are those of `time`. */
export interface SoundDevice {
  readonly time: AudioTime;
  /** Call from the person's own act. False: the device does not answer. */
  resume(): Promise<boolean>;
  /** Makes the instruments of the score ready; at once when they are. */
  prepare(): Promise<void>;
  playNote(note: QueuedNote, at: number, lasts: number): void;
  playClick(at: number, isFirst: boolean): void;
  /** Silences all that sounds, and what was laid up to `laidUntil`. */
  hush(laidUntil: number): void;
  /** Lets all be heard again from then on. */
  open(at: number): void;
  /** 0 to 1, as a factor of the samples. */
  setGain(gain: number): void;
  /** What is heard, as a stream to record; the same one each time. */
  stream(): MediaStream;
  dispose(): void;
}

/** The loudspeaker of this computer. Silent until `resume`. */
export class LiveDevice implements SoundDevice {
  readonly #score: Score;
  readonly #context: Context;
  readonly #master: GainNode;
  readonly #clicker: Clicker;
  #building: Promise<Ensemble> | null = null;
  #ensemble: Ensemble | null = null;
  #recorded: MediaStreamAudioDestinationNode | null = null;
  #isDisposed = false;

  constructor(score: Score) {
    this.#score = score;
    this.#context = createLiveContext();
    const raw = this.#context.rawContext;
    this.#master = raw.createGain();
    this.#master.connect(raw.destination);
    this.#clicker = new Clicker(raw, this.#master);
  }

  get time(): AudioTime {
    return this.#context.rawContext;
  }

  async resume(): Promise<boolean> {
    await this.#context.resume();
    return this.#context.state === "running";
  }

  async prepare(): Promise<void> {
    this.#building ??= Ensemble.create(this.#score, this.#context, this.#master);
    const ensemble = await this.#building;
    if (this.#isDisposed) ensemble.dispose();
    else this.#ensemble = ensemble;
  }

  playNote(note: QueuedNote, at: number, lasts: number): void {
    this.#ensemble?.play(note, at, lasts);
  }

  playClick(at: number, isFirst: boolean): void {
    this.#clicker.play(at, isFirst);
  }

  hush(laidUntil: number): void {
    this.#ensemble?.hush(laidUntil);
    this.#clicker.hush();
  }

  open(at: number): void {
    this.#ensemble?.open(at);
    this.#clicker.open(at);
  }

  setGain(gain: number): void {
    this.#master.gain.value = gain;
  }

  stream(): MediaStream {
    if (!this.#recorded) {
      // Tone wraps the browser's context in a class of its own, so `instanceof` says nothing here.
      const raw = this.#context.rawContext;
      if (!("createMediaStreamDestination" in raw)) throw new Error("Only a live context can be recorded.");
      this.#recorded = raw.createMediaStreamDestination();
      this.#master.connect(this.#recorded);
    }
    return this.#recorded.stream;
  }

  dispose(): void {
    this.#isDisposed = true;
    this.#ensemble?.dispose();
    this.#clicker.dispose();
    void this.#context.close().then(() => this.#context.dispose());
  }
}
