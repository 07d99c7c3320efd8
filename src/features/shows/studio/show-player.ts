import type { BeatMap, Score } from "../../../../shared/contracts/songs.ts";
import type { Layout } from "../../../../shared/contracts/square.ts";
import { listLights, type Light } from "../../../../sandbox/square/lights.ts";
import { createFrame, createCursor, type Cursor, type Frame } from "../../../../sandbox/timeline/cursor.ts";
import { createLinesLit } from "../../../../sandbox/timeline/lines.ts";
import type { Timeline } from "../../../../sandbox/timeline/model.ts";
import { createTempo, type Tempo } from "../../../../sandbox/timeline/tempo.ts";
import { GentleFilter } from "../stage/gentle-filter.ts";
import { findLitLight, type LitLight } from "./lit-light.ts";
import { Transport } from "./transport-model.ts";

/** What is drawn or shown anew for every moment: the stage, the playhead, the glow lines. */
export interface MomentView {
  /** `rgb` is what to draw (it may lag behind the frame in a gentle preview). All borrowed. */
  showMoment(moment: ShownMoment): void;
}

export interface ShownMoment {
  readonly tick: number;
  readonly seconds: number;
  readonly frame: Frame;
  readonly rgb: Float32Array;
  /** Strokes of a count-in still to come; 0 when none is under way. */
  readonly countIn: number;
  /** Strength by line number; empty while nothing is on stage. */
  readonly linesLit: ArrayLike<number>;
}

export interface ShowPlayerOptions {
  readonly layout: Layout;
  readonly song: BeatMap;
  /** Null for a song that has no score: the show runs without sound. */
  readonly score: Score | null;
}

/** What is drawn in one animation frame is seen at the next (60 a second; a faster screen only gains). */
export const SCREEN_DELAY_SECONDS = 1 / 60;

const NO_LINES: readonly number[] = [];

/**
 * Runs one show on one song: keeps the place, reads the timeline there and shows the moment to its
 * views, in time with what is heard. Everything that moves lives here; React only hears of starts,
 * stops and jumps (`subscribe`).
 */
export class ShowPlayer {
  readonly tempo: Tempo;
  readonly #layout: Layout;
  readonly #views = new Set<MomentView>();
  readonly #transport: Transport;
  readonly #dark: Frame;
  readonly #gentle: GentleFilter;
  #timeline: Timeline | null = null;
  #cursor: Cursor | null = null;
  #pointer: Cursor | null = null;
  #linesLit: ((frame: Frame) => Float32Array) | null = null;
  #isGentle = true;
  #request = 0;
  #lastDrawn = 0;

  constructor({ layout, song, score }: ShowPlayerOptions) {
    const lights = listLights(layout).length;
    this.#layout = layout;
    this.tempo = createTempo(song);
    this.#dark = createFrame(lights);
    this.#gentle = new GentleFilter(lights);
    this.#transport = new Transport({
      endSeconds: this.tempo.endSeconds,
      toSeconds: (tick) => this.tempo.toSeconds(tick),
      loadPlayer: async () => {
        const { SongPlayer: Player } = await import("../audio/song-player.ts");
        return new Player({ score: score ?? { seconds: 0, tracks: [] }, song });
      },
    });
    this.#transport.subscribe(() => this.redraw());
  }

  get transport(): Transport {
    return this.#transport;
  }

  get timeline(): Timeline | null {
    return this.#timeline;
  }

  get tick(): number {
    return this.#toTick(this.#transport.positionSeconds());
  }

  /** Puts another show on stage; the place in the song stays. */
  setTimeline(timeline: Timeline | null): void {
    if (timeline === this.#timeline) return;
    this.#timeline = timeline;
    this.#cursor = timeline && createCursor(timeline, this.#layout);
    this.#pointer = null;
    this.#linesLit = timeline && createLinesLit(timeline);
    this.redraw();
  }

  /** The same at once, without waiting for an animation frame; gentle until somebody says that it was checked. */
  showUnchecked(timeline: Timeline): void {
    this.#isGentle = true;
    this.setTimeline(timeline);
    cancelAnimationFrame(this.#request);
    this.#draw(performance.now());
  }

  setGentle(isGentle: boolean): void {
    this.#isGentle = isGentle;
    this.redraw();
  }

  seekTick(tick: number): void {
    this.#transport.seek(this.tempo.toSeconds(tick));
  }

  /** The brightest of some lights at any tick; null when they are dark. */
  readLight(lights: readonly Light[], tick: number): LitLight | null {
    if (!this.#timeline) return null;
    // A cursor of its own: the one on stage would lose its place.
    this.#pointer ??= createCursor(this.#timeline, this.#layout);
    for (const { index } of lights) this.#pointer.seekLight(index, tick);
    return findLitLight(this.#timeline, this.#pointer.frame, lights);
  }

  /** The frame at the present moment. Borrowed. */
  readFrame(): Frame {
    return this.#cursor?.seek(this.tick) ?? this.#dark;
  }

  addView(view: MomentView): () => void {
    this.#views.add(view);
    this.redraw();
    return () => this.#views.delete(view);
  }

  /** Shows the present moment at the next animation frame, and goes on while anything moves. */
  redraw(): void {
    if (this.#request === 0) this.#request = requestAnimationFrame((now) => this.#draw(now));
  }

  dispose(): void {
    cancelAnimationFrame(this.#request);
    this.#views.clear();
    this.#transport.dispose();
  }

  #toTick(seconds: number): number {
    return Math.min(this.tempo.endTick, Math.max(0, this.tempo.toTick(seconds)));
  }

  #draw(now: number): void {
    this.#request = 0;
    const seconds = this.#transport.positionSeconds(SCREEN_DELAY_SECONDS);
    const tick = this.#toTick(seconds);
    const frame = this.#cursor?.seek(tick) ?? this.#dark;
    let isSettled = true;
    if (this.#isGentle) {
      const passed = this.#lastDrawn === 0 ? 1 / 60 : (now - this.#lastDrawn) / 1000;
      isSettled = this.#gentle.follow(frame.rgb, passed);
    } else {
      this.#gentle.jumpTo(frame.rgb);
    }
    const linesLit = this.#linesLit?.(frame) ?? NO_LINES;
    const countIn = this.#transport.countInLeft;
    for (const view of this.#views) view.showMoment({ tick, seconds, frame, rgb: this.#gentle.rgb, countIn, linesLit });
    const isMoving = this.#transport.isPlaying || !isSettled;
    this.#lastDrawn = isMoving ? now : 0;
    if (isMoving) this.redraw();
  }
}
