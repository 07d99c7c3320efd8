import type { Layout } from "../../shared/contracts/square.ts";
import { listLights, type Light } from "../square/lights.ts";
import { colourToLinear, levelToY, relativeLuminance, WARM_WHITE } from "./colour.ts";
import { NO_COLOUR, type Timeline } from "./model.ts";
import { buildTracks, channelAt, envelopeAt, findEntry, levelAt, type Tracks } from "./tracks.ts";

/** The level at which a switched light comes on (rule 20). */
export const SWITCH_LEVEL = 50;

/**
 * What every light shows at one moment; arrays are indexed by light in walking order. Borrowed: the
 * cursor writes the same arrays again at its next `seek`.
 */
export interface Frame {
  tick: number;
  /** Linear red, green and blue, 0 to 1, three numbers a light. */
  readonly rgb: Float32Array;
  /** Lightness as seen, 0 to 100; 0 when nothing is to be seen. A switched light has 0 or 100. */
  readonly level: Float32Array;
  /** Index of the cue that lights it, -1 when dark. Of several the brightest, then the latest. */
  readonly cue: Int32Array;
  /** Index of the cue that gave the colour shown, -1 for the colour a light starts with. */
  readonly colourCue: Int32Array;
}

/** Reads a timeline moment by moment. */
export interface Cursor {
  readonly frame: Frame;
  /**
   * Gives the frame at `tick` (may be fractional). Dark before 0 and from the end on. Going forward
   * costs what changed since the last frame; going back costs a search a light. The result does not
   * depend on where the cursor was before.
   */
  seek(tick: number): Frame;
  /** As `seek` for one light: writes only that light's places in the frame, whose `tick` stays as it was. */
  seekLight(light: number, tick: number): Frame;
}

/** What sampling needs to know of a light. */
export type SampledLight = Pick<Light, "hasColour" | "isSwitched">;

/** Gives a fresh frame in which every light is dark. */
export function createFrame(lightCount: number): Frame {
  return {
    tick: 0,
    rgb: new Float32Array(lightCount * 3),
    level: new Float32Array(lightCount),
    cue: new Int32Array(lightCount).fill(-1),
    colourCue: new Int32Array(lightCount).fill(-1),
  };
}

/** Gives a cursor of a timeline on its layout (rules 13 to 21). Throws `RangeError` when the layout has another number of lights. */
export function createCursor(timeline: Timeline, layout: Layout): Cursor {
  return createLightsCursor(timeline, listLights(layout), buildTracks(timeline));
}

/** As `createCursor`, from lights in walking order and tracks that were built before. */
export function createLightsCursor(timeline: Timeline, lights: readonly SampledLight[], tracks: Tracks): Cursor {
  if (lights.length !== timeline.lightCount)
    throw new RangeError(`The timeline is for ${timeline.lightCount} lights, the layout has ${lights.length}.`);
  return new TrackCursor(timeline, lights, tracks);
}

const WARM = colourToLinear(WARM_WHITE);

class TrackCursor implements Cursor {
  readonly frame: Frame;
  readonly #timeline: Timeline;
  readonly #lights: readonly SampledLight[];
  readonly #tracks: Tracks;
  /** The entry of each track that is in force, `first - 1` before the first. */
  readonly #levelEntry: Int32Array;
  readonly #colourEntry: Int32Array;
  readonly #pulseEntry: Int32Array;
  /** Entries of the pulses that run, in order. */
  readonly #running: number[][];
  /** Where each light was read last. */
  readonly #tick: Float64Array;

  constructor(timeline: Timeline, lights: readonly SampledLight[], tracks: Tracks) {
    this.#timeline = timeline;
    this.#lights = lights;
    this.#tracks = tracks;
    this.frame = createFrame(lights.length);
    const before = (first: Uint32Array) => Int32Array.from(first.subarray(0, lights.length), (entry) => entry - 1);
    this.#levelEntry = before(tracks.level.first);
    this.#colourEntry = before(tracks.colour.first);
    this.#pulseEntry = before(tracks.pulse.first);
    this.#running = lights.map(() => []);
    this.#tick = new Float64Array(lights.length).fill(-1);
  }

  seek(tick: number): Frame {
    this.frame.tick = tick;
    for (let light = 0; light < this.#lights.length; light++) this.seekLight(light, tick);
    return this.frame;
  }

  seekLight(light: number, tick: number): Frame {
    // Not a number fails both comparisons: such a moment is dark, too.
    if (!(tick >= 0 && tick < this.#timeline.endTick)) {
      this.#darken(light);
      return this.frame;
    }
    if (tick >= (this.#tick[light] ?? 0)) this.#advance(light, tick);
    else this.#goBack(light, tick);
    this.#tick[light] = tick;
    const traits = this.#lights[light];
    if (traits?.hasColour) this.#showColour(light, tick);
    else this.#showPlain(light, tick, traits?.isSwitched ?? false);
    return this.frame;
  }

  #darken(light: number): void {
    const { rgb, level, cue, colourCue } = this.frame;
    rgb[light * 3] = rgb[light * 3 + 1] = rgb[light * 3 + 2] = 0;
    level[light] = 0;
    cue[light] = colourCue[light] = -1;
  }

  #advance(light: number, tick: number): void {
    const { level, colour, pulse } = this.#tracks;
    this.#levelEntry[light] = nextEntry(level.tick, this.#levelEntry[light] ?? 0, level.first[light + 1] ?? 0, tick);
    this.#colourEntry[light] = nextEntry(
      colour.tick,
      this.#colourEntry[light] ?? 0,
      colour.first[light + 1] ?? 0,
      tick,
    );
    const running = this.#running[light] ?? [];
    let kept = 0;
    for (const entry of running) if ((pulse.end[entry] ?? 0) > tick) running[kept++] = entry;
    running.length = kept;
    const until = pulse.first[light + 1] ?? 0;
    let entry = this.#pulseEntry[light] ?? 0;
    while (entry + 1 < until && (pulse.tick[entry + 1] ?? 0) <= tick) {
      entry++;
      if ((pulse.end[entry] ?? 0) > tick) running.push(entry);
    }
    this.#pulseEntry[light] = entry;
  }

  #goBack(light: number, tick: number): void {
    const { level, colour, pulse } = this.#tracks;
    this.#levelEntry[light] = findEntry(level, light, tick);
    this.#colourEntry[light] = findEntry(colour, light, tick);
    const last = findEntry(pulse, light, tick);
    this.#pulseEntry[light] = last;
    const running = this.#running[light] ?? [];
    running.length = 0;
    for (let entry = last; entry >= (pulse.first[light] ?? 0) && (pulse.latestEnd[entry] ?? 0) > tick; entry--)
      if ((pulse.end[entry] ?? 0) > tick) running.push(entry);
    running.reverse();
  }

  /** Rule 20: the largest of level and pulses; a switched light is on or off. */
  #showPlain(light: number, tick: number, isSwitched: boolean): void {
    const { level: levels, pulse } = this.#tracks;
    const { frame } = this;
    let best = 0;
    let cue = -1;
    const levelEntry = this.#levelEntry[light] ?? -1;
    if (levelEntry >= (levels.first[light] ?? 0)) {
      const level = levelAt(levels, levelEntry, tick);
      if (level > 0 && (!isSwitched || level >= SWITCH_LEVEL)) {
        best = level;
        cue = levels.cue[levelEntry] ?? -1;
      }
    }
    for (const entry of this.#running[light] ?? []) {
      const envelope = envelopeAt(pulse, entry, tick);
      const from = pulse.cue[entry] ?? -1;
      if (envelope > best || (envelope === best && from > cue)) {
        best = envelope;
        cue = from;
      }
    }
    if (isSwitched && cue >= 0) best = 100;
    const y = levelToY(best);
    for (let channel = 0; channel < 3; channel++) frame.rgb[light * 3 + channel] = (WARM[channel] ?? 0) * y;
    frame.level[light] = best;
    frame.cue[light] = cue;
    frame.colourCue[light] = -1;
  }

  /** Rule 19: per channel the largest of level x colour and each pulse x its colour. */
  #showColour(light: number, tick: number): void {
    const { level: levels, colour, pulse } = this.#tracks;
    const { frame } = this;
    let [red, green, blue] = [1, 1, 1];
    let ownCue = -1;
    const colourEntry = this.#colourEntry[light] ?? -1;
    if (colourEntry >= (colour.first[light] ?? 0)) {
      red = channelAt(colour, colourEntry, 0, tick);
      green = channelAt(colour, colourEntry, 1, tick);
      blue = channelAt(colour, colourEntry, 2, tick);
      ownCue = colour.cue[colourEntry] ?? -1;
    }
    const own = relativeLuminance(red, green, blue);
    const at = light * 3;
    frame.rgb[at] = frame.rgb[at + 1] = frame.rgb[at + 2] = 0;
    frame.level[light] = 0;
    let brightest = 0;
    let cue = -1;
    let colourCue = -1;
    const add = (
      level: number,
      r: number,
      g: number,
      b: number,
      luminance: number,
      from: number,
      colourFrom: number,
    ) => {
      const y = levelToY(level);
      if (y * luminance <= 0) return;
      frame.rgb[at] = Math.max(frame.rgb[at] ?? 0, y * r);
      frame.rgb[at + 1] = Math.max(frame.rgb[at + 1] ?? 0, y * g);
      frame.rgb[at + 2] = Math.max(frame.rgb[at + 2] ?? 0, y * b);
      frame.level[light] = Math.max(frame.level[light] ?? 0, level);
      if (y * luminance > brightest || (y * luminance === brightest && from > cue)) {
        brightest = y * luminance;
        cue = from;
        colourCue = colourFrom;
      }
    };
    const levelEntry = this.#levelEntry[light] ?? -1;
    if (levelEntry >= (levels.first[light] ?? 0))
      add(levelAt(levels, levelEntry, tick), red, green, blue, own, levels.cue[levelEntry] ?? -1, ownCue);
    for (const entry of this.#running[light] ?? []) {
      const envelope = envelopeAt(pulse, entry, tick);
      const from = pulse.cue[entry] ?? -1;
      const named = this.#timeline.cues.colour[from] ?? NO_COLOUR;
      if (named === NO_COLOUR) {
        add(envelope, red, green, blue, own, from, ownCue);
      } else {
        const [r, g, b] = colourToLinear(named);
        add(envelope, r, g, b, relativeLuminance(r, g, b), from, from);
      }
    }
    frame.cue[light] = cue;
    frame.colourCue[light] = colourCue;
  }
}

/** Goes on from `entry` to the last entry at or before `tick`. */
function nextEntry(ticks: Uint32Array, entry: number, until: number, tick: number): number {
  let found = entry;
  while (found + 1 < until && (ticks[found + 1] ?? 0) <= tick) found++;
  return found;
}
