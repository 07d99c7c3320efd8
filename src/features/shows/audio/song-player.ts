import type { BeatMap, Score } from "../../../../shared/contracts/songs.ts";
import { findCountIn, listBeatClicks, type BeatClick } from "./beat-clicks.ts";
import { HeardClock } from "./heard-clock.ts";
import { NoteQueue } from "./note-queue.ts";
import { Playhead, type LoopRange, type PlayedSpan } from "./playhead.ts";
import { LiveDevice, type SoundDevice } from "./sound-device.ts";

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
  /** For the metronome, and the song's end. */
  readonly song: Pick<BeatMap, "beats" | "bars">;
  /** The loudspeaker of this computer when left out. */
  readonly openDevice?: () => SoundDevice;
}

/**
 * Plays a song's score. The audio context's time is the clock of the show: `positionSeconds` tells
 * the moment of the song that is being heard. Nothing sounds before `play`, which must come from an
 * act of the person (browsers insist). Listeners hear when it starts, stops or jumps.
 */
export class SongPlayer {
  readonly #queue: NoteQueue;
  readonly #options: SongPlayerOptions;
  readonly #clicks: readonly BeatClick[];
  readonly #end: number;
  readonly #listeners = new Set<() => void>();
  #device: SoundDevice | null = null;
  #clock: HeardClock | null = null;
  #playhead: Playhead | null = null;
  #laidUntil = 0;
  #turn: ReturnType<typeof setInterval> | undefined;
  #rest = 0;
  #rate = 1;
  #loop: LoopRange | null = null;
  #volume = 0.8;
  #hasSound = true;
  #hasMetronome = false;
  #hasCountIn = false;
  /** Seconds of the clock between two strokes of the count-in under way. */
  #countSeconds = 0;
  /** Counts starts and stops, so that a start that waited for the device knows it was overtaken. */
  #order = 0;

  constructor(options: SongPlayerOptions) {
    this.#options = options;
    this.#queue = new NoteQueue(options.score);
    this.#clicks = listBeatClicks(options.song);
    this.#end = (options.song.beats.at(-1) ?? 0) / 1_000_000;
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

  /** The moment of the song that is heard now, or `ahead` seconds later; in seconds from the start of the audio. */
  positionSeconds(ahead = 0): number {
    if (!this.#playhead || !this.#clock) return this.#rest;
    return this.#playhead.songAt(this.#clock.now() + ahead);
  }

  /** Strokes of the count-in that are still to come; 0 once the song sounds. */
  get countInLeft(): number {
    if (!this.#playhead || !this.#clock || this.#countSeconds === 0) return 0;
    return Math.ceil(this.#playhead.secondsUntilStart(this.#clock.now()) / this.#countSeconds);
  }

  /** What is heard, as a stream to record; null where there is no sound. */
  stream(): MediaStream | null {
    return this.#hasSound ? (this.#device?.stream() ?? null) : null;
  }

  /** Plays on from where it stands; from the loop's start, or the song's, when it stands at the end. */
  async play(): Promise<void> {
    if (this.isPlaying) return;
    const order = (this.#order += 1);
    await this.#openDevice();
    if (order !== this.#order || this.isPlaying) return;
    const isAtEnd = this.#rest >= this.#end - 0.01;
    this.#startAt(isAtEnd ? (this.#loop?.start ?? 0) : this.#rest, this.#hasCountIn);
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
    this.#device?.setGain(this.#volume ** 2);
  }

  /** A stroke on each beat, high on the first of a bar. Strokes that were laid already are heard. */
  setMetronome(hasMetronome: boolean): void {
    this.#hasMetronome = hasMetronome;
  }

  /** One bar of strokes before the song, at each `play`. */
  setCountIn(hasCountIn: boolean): void {
    this.#hasCountIn = hasCountIn;
  }

  subscribe(listener: () => void): () => void {
    this.#listeners.add(listener);
    return () => this.#listeners.delete(listener);
  }

  dispose(): void {
    this.#order += 1;
    this.#listeners.clear();
    this.#stop();
    this.#device?.dispose();
    this.#device = null;
  }

  async #openDevice(): Promise<void> {
    if (this.#clock && !this.#device) return;
    if (!this.#device) {
      this.#device = this.#options.openDevice?.() ?? new LiveDevice(this.#options.score);
      this.#device.setGain(this.#volume ** 2);
      this.#clock = new HeardClock(this.#device.time);
    }
    const device = this.#device;
    const isOpen = await Promise.race([
      device.resume(),
      new Promise<boolean>((resolve) => setTimeout(() => resolve(false), DEVICE_PATIENCE_MS)),
    ]).catch(() => false);
    if (device !== this.#device) return;
    if (isOpen) return device.prepare();
    this.#hasSound = false;
    this.#device = null;
    device.dispose();
    this.#clock = new HeardClock({
      get currentTime() {
        return performance.now() / 1000;
      },
    });
  }

  #startAt(song: number, isCountedIn = false): void {
    if (!this.#clock) return;
    const now = this.#now();
    // Notes that were laid before a jump are hushed, not taken back: start behind the last of them.
    const first = this.#device ? Math.max(now + LEAD_SECONDS, this.#laidUntil + 0.01) : now;
    this.#device?.open(first);
    const clock = first + (isCountedIn ? this.#countIn(song, first) : 0);
    this.#playhead = new Playhead({ clock, song, rate: this.#rate, end: this.#end, loop: this.#loop });
    this.#laidUntil = clock;
    this.#takeUpHeld(song, clock);
    this.#layAhead();
    this.#turn = setInterval(() => this.#layAhead(), TURN_MS);
  }

  /** Lays the strokes of a count-in from a time of the clock on; gives how long they take. */
  #countIn(song: number, from: number): number {
    const { beats, beatSeconds } = findCountIn(this.#options.song, song);
    this.#countSeconds = beatSeconds / this.#rate;
    for (let beat = 0; beat < beats; beat += 1) this.#device?.playClick(from + beat * this.#countSeconds, beat === 0);
    return beats * this.#countSeconds;
  }

  #startAgain(): void {
    if (!this.isPlaying) return this.#notify();
    this.seek(this.positionSeconds());
  }

  #stop(): void {
    clearInterval(this.#turn);
    if (this.#playhead) this.#device?.hush(this.#laidUntil);
    this.#playhead = null;
    this.#countSeconds = 0;
  }

  /** The time of the clock that notes are laid by. */
  #now(): number {
    return this.#device?.time.currentTime ?? this.#clock?.now() ?? 0;
  }

  #takeUpHeld(song: number, clock: number): void {
    for (const note of this.#queue.listSounding(song)) {
      const left = (note.start + note.lasts - song) / this.#rate;
      if (left > WORTH_HOLDING_SECONDS) this.#device?.playNote(note, clock, left);
    }
  }

  #layAhead(): void {
    const playhead = this.#playhead;
    if (!playhead || !this.#clock) return;
    const ahead = document.hidden ? AHEAD_HIDDEN_SECONDS : AHEAD_SECONDS;
    const until = Math.max(this.#laidUntil, this.#now() + ahead);
    if (this.#device) for (const span of playhead.listSpans(this.#laidUntil, until)) this.#laySpan(this.#device, span);
    this.#laidUntil = until;
    if (playhead.isOverAt(this.#clock.now())) {
      this.#rest = this.#end;
      this.#stop();
      this.#notify();
    }
  }

  #laySpan(device: SoundDevice, { from, to, clock }: PlayedSpan): void {
    const timeOf = (start: number) => clock + (start - from) / this.#rate;
    for (const note of this.#queue.listStarting(from, to))
      device.playNote(note, timeOf(note.start), note.lasts / this.#rate);
    if (!this.#hasMetronome) return;
    for (const click of this.#clicks)
      if (click.start >= from && click.start < to) device.playClick(timeOf(click.start), click.isFirst);
  }

  #notify(): void {
    for (const listener of this.#listeners) listener();
  }
}
