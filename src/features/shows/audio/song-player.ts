import type { Score } from "../../../../shared/contracts/songs.ts";
import { Ensemble } from "./ensemble.ts";
import { HeardClock } from "./heard-clock.ts";
import { NoteQueue } from "./note-queue.ts";
import { Playhead, type LoopRange } from "./playhead.ts";
import { createLiveContext, type Context } from "./tone.ts";

/** Notes are laid this far ahead; a hidden page's timers run once a second, so further there. */
const AHEAD_SECONDS = 0.2;
const AHEAD_HIDDEN_SECONDS = 2.5;
const TURN_MS = 50;
/** Between a start and its first note, so that the note is laid before its time. */
const LEAD_SECONDS = 0.05;
/** When no sound device answers in this time, the show runs by the page's clock, without sound. */
const DEVICE_PATIENCE_MS = 1500;
/** A held note is taken up again after a jump when this much of it is left. */
const WORTH_HOLDING_SECONDS = 0.2;

export interface SongPlayerOptions {
  readonly score: Score;
  /** The song's end in seconds, by its beat map. */
  readonly endSeconds: number;
}

/**
 * Plays a song's score. The audio context's time is the clock of the show: `positionSeconds` tells
 * the moment of the song that is being heard. Nothing sounds before `play`, which must come from an
 * act of the person (browsers insist). Listeners hear when it starts, stops or jumps.
 */
export class SongPlayer {
  readonly #queue: NoteQueue;
  readonly #score: Score;
  readonly #end: number;
  readonly #listeners = new Set<() => void>();
  #context: Context | null = null;
  #master: GainNode | null = null;
  #clock: HeardClock | null = null;
  #ensemble: Ensemble | null = null;
  #building: Promise<Ensemble> | null = null;
  #playhead: Playhead | null = null;
  #laidUntil = 0;
  #turn: ReturnType<typeof setInterval> | undefined;
  #rest = 0;
  #rate = 1;
  #loop: LoopRange | null = null;
  #volume = 0.8;
  #hasSound = true;
  /** Counts starts and stops, so that a start that waited for the device knows it was overtaken. */
  #order = 0;

  constructor({ score, endSeconds }: SongPlayerOptions) {
    this.#score = score;
    this.#end = endSeconds;
    this.#queue = new NoteQueue(score);
  }

  get isPlaying(): boolean {
    return this.#playhead !== null;
  }

  /** False when no sound device answered: the show runs silently. */
  get hasSound(): boolean {
    return this.#hasSound;
  }

  get rate(): number {
    return this.#rate;
  }

  get loop(): LoopRange | null {
    return this.#loop;
  }

  get endSeconds(): number {
    return this.#end;
  }

  /** The moment of the song being heard, in seconds from the start of the audio. */
  positionSeconds(): number {
    if (!this.#playhead || !this.#clock) return this.#rest;
    return this.#playhead.songAt(this.#clock.now());
  }

  /** Plays on from where it stands; from the loop's start, or the song's, when it stands at the end. */
  async play(): Promise<void> {
    if (this.isPlaying) return;
    const order = (this.#order += 1);
    await this.#openDevice();
    if (order !== this.#order || this.isPlaying) return;
    const isAtEnd = this.#rest >= this.#end - 0.01;
    this.#startAt(isAtEnd ? (this.#loop?.start ?? 0) : this.#rest);
    this.#notify();
  }

  pause(): void {
    this.#order += 1;
    if (!this.isPlaying) return;
    this.#rest = this.positionSeconds();
    this.#stop();
    this.#notify();
  }

  seek(seconds: number): void {
    const to = Math.min(Math.max(seconds, 0), this.#end);
    const wasPlaying = this.isPlaying;
    this.#stop();
    this.#rest = to;
    if (wasPlaying) this.#startAt(to);
    this.#notify();
  }

  setLoop(loop: LoopRange | null): void {
    this.#loop = loop;
    this.#startAgain();
  }

  /** Seconds of the song in a second: 0.5 is half as fast, at the same pitch. */
  setRate(rate: number): void {
    this.#rate = Math.min(2, Math.max(0.25, rate));
    this.#startAgain();
  }

  /** 0 to 1. */
  setVolume(volume: number): void {
    this.#volume = Math.min(1, Math.max(0, volume));
    // The ear hears the square of the slider as even steps.
    if (this.#master) this.#master.gain.value = this.#volume ** 2;
  }

  subscribe(listener: () => void): () => void {
    this.#listeners.add(listener);
    return () => this.#listeners.delete(listener);
  }

  dispose(): void {
    this.#order += 1;
    this.#listeners.clear();
    this.#stop();
    this.#ensemble?.dispose();
    this.#ensemble = null;
    const context = this.#context;
    this.#context = null;
    if (context) void context.close().then(() => context.dispose());
  }

  async #openDevice(): Promise<void> {
    if (this.#clock && !this.#context) return;
    if (!this.#context) {
      this.#context = createLiveContext();
      const raw = this.#context.rawContext;
      this.#master = raw.createGain();
      this.#master.gain.value = this.#volume ** 2;
      this.#master.connect(raw.destination);
      this.#clock = new HeardClock(raw);
    }
    const context = this.#context;
    const isOpen = await Promise.race([
      context.resume().then(() => context.state === "running"),
      new Promise<boolean>((resolve) => setTimeout(() => resolve(false), DEVICE_PATIENCE_MS)),
    ]).catch(() => false);
    if (context !== this.#context) return;
    if (isOpen && this.#master) {
      this.#building ??= Ensemble.create(this.#score, context, this.#master);
      const ensemble = await this.#building;
      if (context === this.#context) this.#ensemble = ensemble;
      else ensemble.dispose();
      return;
    }
    this.#hasSound = false;
    this.#context = null;
    this.#clock = new HeardClock({
      get currentTime() {
        return performance.now() / 1000;
      },
    });
  }

  #startAt(song: number): void {
    if (!this.#clock) return;
    const now = this.#now();
    // Notes that were laid before a jump are hushed, not taken back: start behind the last of them.
    const clock = this.#context ? Math.max(now + LEAD_SECONDS, this.#laidUntil + 0.01) : now;
    this.#playhead = new Playhead({ clock, song, rate: this.#rate, end: this.#end, loop: this.#loop });
    this.#laidUntil = clock;
    this.#ensemble?.open(clock);
    this.#takeUpHeld(song, clock);
    this.#layAhead();
    this.#turn = setInterval(() => this.#layAhead(), TURN_MS);
  }

  #startAgain(): void {
    if (!this.isPlaying) return this.#notify();
    this.seek(this.positionSeconds());
  }

  #stop(): void {
    clearInterval(this.#turn);
    if (this.#playhead) this.#ensemble?.hush(this.#laidUntil);
    this.#playhead = null;
  }

  /** The time of the clock that notes are laid by. */
  #now(): number {
    return this.#context ? this.#context.rawContext.currentTime : (this.#clock?.now() ?? 0);
  }

  #takeUpHeld(song: number, clock: number): void {
    for (const note of this.#queue.listSounding(song)) {
      const left = (note.start + note.lasts - song) / this.#rate;
      if (left > WORTH_HOLDING_SECONDS) this.#ensemble?.play(note, clock, left);
    }
  }

  #layAhead(): void {
    const playhead = this.#playhead;
    if (!playhead || !this.#clock) return;
    const ahead = document.hidden ? AHEAD_HIDDEN_SECONDS : AHEAD_SECONDS;
    const until = Math.max(this.#laidUntil, this.#now() + ahead);
    if (this.#ensemble)
      for (const span of playhead.listSpans(this.#laidUntil, until))
        for (const note of this.#queue.listStarting(span.from, span.to))
          this.#ensemble.play(note, span.clock + (note.start - span.from) / this.#rate, note.lasts / this.#rate);
    this.#laidUntil = until;
    if (playhead.isOverAt(this.#clock.now())) {
      this.#rest = this.#end;
      this.#stop();
      this.#notify();
    }
  }

  #notify(): void {
    for (const listener of this.#listeners) listener();
  }
}
