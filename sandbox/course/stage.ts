import type { BeatMap } from "../../shared/contracts/songs.ts";
import type { Layout } from "../../shared/contracts/square.ts";
import { TICKS_PER_BEAT } from "../../shared/units.ts";
import { listFronts, listLights } from "../square/lights.ts";
import type { Light, WalkedFront } from "../square/lights.ts";
import { createCursor } from "../timeline/cursor.ts";
import type { Cursor, Frame } from "../timeline/cursor.ts";
import { linesOfCue } from "../timeline/lines.ts";
import type { Timeline } from "../timeline/model.ts";
import type { LightChoice } from "./exercise.ts";

/** A level below this can not be told from dark. */
export const SEEN = 3;
/** How often the whole show is looked at: four times a beat. */
const STEP = TICKS_PER_BEAT / 4;

/** When a front was first seen lit. */
export interface FirstLight {
  readonly front: WalkedFront;
  /** null: never. */
  readonly tick: number | null;
}

/** A run as the checks look at it. */
export class CheckedRun {
  readonly timeline: Timeline;
  readonly song: BeatMap;
  readonly lights: readonly Light[];
  readonly fronts: readonly WalkedFront[];
  readonly #cursor: Cursor;

  constructor(timeline: Timeline, layout: Layout, song: BeatMap) {
    this.timeline = timeline;
    this.song = song;
    this.lights = listLights(layout);
    this.fronts = listFronts(layout);
    this.#cursor = createCursor(timeline, layout);
  }

  /** The lights that a check looks at, in walking order. */
  choose(choice: LightChoice): readonly Light[] {
    return this.lights.filter(
      (light) =>
        (choice.front === undefined || light.frontName === choice.front) &&
        (choice.side === undefined || light.side === choice.side) &&
        (choice.part === undefined || light.part === choice.part),
    );
  }

  /** What is shown at a beat. Borrowed until the next call. */
  frameAt(beat: number): Frame {
    return this.frameAtTick(Math.round(beat * TICKS_PER_BEAT));
  }

  /** As `frameAt`, for a tick. */
  frameAtTick(tick: number): Frame {
    return this.#cursor.seek(tick);
  }

  /** The last script line that wrote this cue, where the learner's own text is; null for a dark light. */
  lineOf(cue: number): number | null {
    return linesOfCue(this.timeline, cue).at(-1) ?? null;
  }

  /** Ticks at which the whole show is looked at: every quarter beat and just after every cue. */
  momentsSeen(): readonly number[] {
    const ticks = new Set<number>();
    for (let tick = 0; tick < this.timeline.endTick; tick += STEP) ticks.add(tick);
    const { cues } = this.timeline;
    for (let cue = 0; cue < cues.count; cue += 1) {
      const tick = cues.tick[cue] ?? 0;
      if (tick < this.timeline.endTick) ticks.add(tick);
    }
    return [...ticks].sort((a, b) => a - b);
  }

  /** Calls back for every moment looked at; stops when `look` gives false. */
  watch(look: (frame: Frame) => boolean | void): void {
    for (const tick of this.momentsSeen()) if (look(this.#cursor.seek(tick)) === false) return;
  }

  /** When each front was first lit, in walking order. */
  firstLights(): readonly FirstLight[] {
    const first = new Map<number, number>();
    this.watch((frame) => {
      for (const front of this.fronts)
        if (!first.has(front.index) && front.lights.some((light) => (frame.level[light] ?? 0) >= SEEN))
          first.set(front.index, frame.tick);
      return first.size < this.fronts.length;
    });
    return this.fronts.map((front) => ({ front, tick: first.get(front.index) ?? null }));
  }
}
