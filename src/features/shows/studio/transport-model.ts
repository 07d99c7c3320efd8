import type { LoopRange } from "../audio/playhead.ts";
import type { TickLoop } from "../ribbon/song-place.ts";

/** The part of a song player that the transport works with; `SongPlayer` is one. */
export interface PlaybackEngine {
  readonly isPlaying: boolean;
  readonly hasSound: boolean;
  /** Strokes of a count-in still to come. */
  readonly countInLeft: number;
  positionSeconds(ahead?: number): number;
  play(): Promise<void>;
  pause(): void;
  seek(seconds: number): void;
  setLoop(loop: LoopRange | null): void;
  setRate(rate: number): void;
  setVolume(volume: number): void;
  setMetronome(hasMetronome: boolean): void;
  setCountIn(hasCountIn: boolean): void;
  stream(): MediaStream | null;
  subscribe(listener: () => void): () => void;
  dispose(): void;
}

export interface TransportOptions {
  readonly endSeconds: number;
  readonly toSeconds: (tick: number) => number;
  /** Called at the first press of play: the sound library is a chunk of its own. */
  readonly loadPlayer: () => Promise<PlaybackEngine>;
}

/** What React shows of the transport; a new object at every change. */
export interface TransportState {
  readonly isPlaying: boolean;
  /** Play was pressed and the instruments are being made ready. */
  readonly isStarting: boolean;
  readonly hasSound: boolean;
  /** The sound did not load at the last press of play (no network). */
  readonly hasFailed: boolean;
  readonly isLooping: boolean;
  readonly loop: TickLoop | null;
  readonly rate: number;
  readonly volume: number;
  /** A stroke on every beat. */
  readonly hasMetronome: boolean;
  /** A bar of strokes before the song starts. */
  readonly hasCountIn: boolean;
}

/** Play, pause, jump, loop, speed and volume; before the sound is loaded it keeps the place itself. */
export class Transport {
  readonly #options: TransportOptions;
  readonly #listeners = new Set<() => void>();
  #state: TransportState = {
    isPlaying: false,
    isStarting: false,
    hasSound: true,
    hasFailed: false,
    isLooping: false,
    loop: null,
    rate: 1,
    volume: 0.7,
    hasMetronome: false,
    hasCountIn: false,
  };
  #engine: PlaybackEngine | null = null;
  #loading: Promise<PlaybackEngine> | null = null;
  #rest = 0;
  #isDisposed = false;

  constructor(options: TransportOptions) {
    this.#options = options;
  }

  get state(): TransportState {
    return this.#state;
  }

  get isPlaying(): boolean {
    return this.#state.isPlaying;
  }

  /** The moment of the song that is heard now, or `ahead` seconds later. */
  positionSeconds(ahead = 0): number {
    return this.#engine?.positionSeconds(ahead) ?? this.#rest;
  }

  get countInLeft(): number {
    return this.#engine?.countInLeft ?? 0;
  }

  /** What is heard, as a stream to record; null before the sound is loaded, and where there is none. */
  stream(): MediaStream | null {
    return this.#engine?.stream() ?? null;
  }

  /** Call from the person's own act, else the browser stays silent. */
  async play(): Promise<void> {
    if (this.#state.isPlaying || this.#state.isStarting) return;
    this.#set({ isStarting: true, hasFailed: false });
    try {
      const engine = await this.#load();
      // Pause may have been pressed while the sound was loading.
      if (this.#state.isStarting) await engine.play();
    } finally {
      this.#set({
        isStarting: false,
        isPlaying: this.#engine?.isPlaying ?? false,
        hasSound: this.#engine?.hasSound ?? true,
      });
    }
  }

  pause(): void {
    this.#engine?.pause();
    this.#set({ isStarting: false, isPlaying: false });
  }

  toggle(): void {
    if (this.#state.isPlaying || this.#state.isStarting) this.pause();
    else this.play().catch(() => this.#set({ hasFailed: true }));
  }

  seek(seconds: number): void {
    this.#rest = Math.min(Math.max(0, seconds), this.#options.endSeconds);
    this.#engine?.seek(this.#rest);
    this.#notify();
  }

  /** The stretch that a loop repeats, whether it is on or not. */
  setLoop(loop: TickLoop | null, isLooping = this.#state.isLooping): void {
    this.#set({ loop, isLooping: isLooping && loop !== null });
    this.#engine?.setLoop(this.#readLoop());
  }

  setRate(rate: number): void {
    this.#set({ rate });
    this.#engine?.setRate(rate);
  }

  setVolume(volume: number): void {
    this.#set({ volume });
    this.#engine?.setVolume(volume);
  }

  setMetronome(hasMetronome: boolean): void {
    this.#set({ hasMetronome });
    this.#engine?.setMetronome(hasMetronome);
  }

  setCountIn(hasCountIn: boolean): void {
    this.#set({ hasCountIn });
    this.#engine?.setCountIn(hasCountIn);
  }

  subscribe(listener: () => void): () => void {
    this.#listeners.add(listener);
    return () => this.#listeners.delete(listener);
  }

  dispose(): void {
    this.#isDisposed = true;
    this.#listeners.clear();
    this.#engine?.dispose();
  }

  #load(): Promise<PlaybackEngine> {
    this.#loading ??= this.#options.loadPlayer().then(
      (engine) => {
        if (this.#isDisposed) engine.dispose();
        else this.#adopt(engine);
        return engine;
      },
      (error: unknown) => {
        // The chunk did not come (no network): the next press tries again.
        this.#loading = null;
        throw error;
      },
    );
    return this.#loading;
  }

  #adopt(engine: PlaybackEngine): void {
    engine.seek(this.#rest);
    engine.setRate(this.#state.rate);
    engine.setVolume(this.#state.volume);
    engine.setLoop(this.#readLoop());
    engine.setMetronome(this.#state.hasMetronome);
    engine.setCountIn(this.#state.hasCountIn);
    engine.subscribe(() => this.#set({ isPlaying: engine.isPlaying, hasSound: engine.hasSound }));
    this.#engine = engine;
  }

  #readLoop(): LoopRange | null {
    const { isLooping, loop } = this.#state;
    return isLooping && loop
      ? { start: this.#options.toSeconds(loop.start), end: this.#options.toSeconds(loop.end) }
      : null;
  }

  #set(change: Partial<TransportState>): void {
    this.#state = { ...this.#state, ...change };
    this.#notify();
  }

  #notify(): void {
    for (const listener of this.#listeners) listener();
  }
}
