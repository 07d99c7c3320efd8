import type { Layout } from "../../shared/contracts/square.ts";
import { listLights, type Light } from "../square/lights.ts";
import { channelToLinear, colourToLinear, levelToY, relativeLuminance, WARM_WHITE } from "./colour.ts";
import { NO_COLOUR, type Timeline } from "./model.ts";
import { buildTracks, channelAt, envelopeAt, findEntry, levelAt, type LevelTrack, type Tracks } from "./tracks.ts";
import { listLeaders } from "./twins.ts";

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
const [WARM_RED, WARM_GREEN, WARM_BLUE] = WARM;

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
  /** Where each light was read last, and up to where (outside) it shows the same as there. */
  readonly #tick: Float64Array;
  readonly #until: Float64Array;
  /** For each light the first that is told the same; looked for when all are read at once. */
  #leaders: Uint32Array | null = null;

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
    this.#until = new Float64Array(lights.length).fill(-1);
  }

  seek(tick: number): Frame {
    const { frame } = this;
    const leaders = (this.#leaders ??= listLeaders(this.#lights, this.#tracks));
    frame.tick = tick;
    for (let light = 0; light < leaders.length; light++) {
      const leader = leaders[light] ?? light;
      if (leader === light) this.seekLight(light, tick);
      else this.#copy(leader, light);
    }
    return frame;
  }

  seekLight(light: number, tick: number): Frame {
    if (tick >= (this.#tick[light] ?? 0) && tick < (this.#until[light] ?? 0)) return this.frame;
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
    this.#until[light] = this.#steadyUntil(light, tick, traits?.hasColour ?? false);
    return this.frame;
  }

  #darken(light: number): void {
    const { rgb, level, cue, colourCue } = this.frame;
    rgb[light * 3] = rgb[light * 3 + 1] = rgb[light * 3 + 2] = 0;
    level[light] = 0;
    cue[light] = colourCue[light] = -1;
    this.#until[light] = -1;
  }

  #copy(from: number, to: number): void {
    const { rgb, level, cue, colourCue } = this.frame;
    rgb[to * 3] = rgb[from * 3] ?? 0;
    rgb[to * 3 + 1] = rgb[from * 3 + 1] ?? 0;
    rgb[to * 3 + 2] = rgb[from * 3 + 2] ?? 0;
    level[to] = level[from] ?? 0;
    cue[to] = cue[from] ?? -1;
    colourCue[to] = colourCue[from] ?? -1;
    // Its own entries were not moved on, so what is shown says nothing about them.
    this.#until[to] = -1;
  }

  /** Up to where (outside) a light that was just read at `tick` stays as it is; `tick` itself while it moves. */
  #steadyUntil(light: number, tick: number, hasColour: boolean): number {
    const { level, colour, pulse } = this.#tracks;
    if ((this.#running[light] ?? []).length > 0) return tick;
    let until = Math.min(this.#timeline.endTick, nextTick(pulse, light, this.#pulseEntry[light] ?? 0));
    const levelEntry = this.#levelEntry[light] ?? 0;
    if (isMoving(level, light, levelEntry, tick)) return tick;
    until = Math.min(until, nextTick(level, light, levelEntry));
    if (!hasColour) return until;
    const colourEntry = this.#colourEntry[light] ?? 0;
    if (isMoving(colour, light, colourEntry, tick)) return tick;
    return Math.min(until, nextTick(colour, light, colourEntry));
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
    if (running.length > 0) {
      let kept = 0;
      for (let place = 0; place < running.length; place++) {
        const entry = running[place] ?? 0;
        if ((pulse.end[entry] ?? 0) > tick) running[kept++] = entry;
      }
      running.length = kept;
    }
    const until = pulse.first[light + 1] ?? 0;
    let entry = this.#pulseEntry[light] ?? 0;
    while (entry + 1 < until && (pulse.tick[entry + 1] ?? 0) <= tick) {
      entry++;
      if ((pulse.end[entry] ?? 0) <= tick) continue;
      if (running.length > 0) this.#dropOutshone(running, entry);
      running.push(entry);
    }
    this.#pulseEntry[light] = entry;
  }

  /**
   * Takes out running pulses that a pulse which starts now outshines to their end: of the same colour
   * and no longer. Without it a thousand pulses on top of each other would be read at every moment.
   */
  #dropOutshone(running: number[], newest: number): void {
    const { tick, length, end, cue } = this.#tracks.pulse;
    const { colour } = this.#timeline.cues;
    const newestColour = colour[cue[newest] ?? 0];
    const newestEnd = (tick[newest] ?? 0) + (length[newest] ?? 0);
    let kept = 0;
    for (let place = 0; place < running.length; place++) {
      const entry = running[place] ?? 0;
      const isOutshone =
        (tick[entry] ?? 0) + (length[entry] ?? 0) <= newestEnd &&
        (end[entry] ?? 0) <= (end[newest] ?? 0) &&
        colour[cue[entry] ?? 0] === newestColour;
      if (!isOutshone) running[kept++] = entry;
    }
    running.length = kept;
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
    const running = this.#running[light] ?? [];
    for (let place = 0; place < running.length; place++) {
      const entry = running[place] ?? 0;
      const envelope = envelopeAt(pulse, entry, tick);
      const from = pulse.cue[entry] ?? -1;
      if (envelope > best || (envelope === best && from > cue)) {
        best = envelope;
        cue = from;
      }
    }
    if (isSwitched && cue >= 0) best = 100;
    const y = levelToY(best);
    frame.rgb[light * 3] = WARM_RED * y;
    frame.rgb[light * 3 + 1] = WARM_GREEN * y;
    frame.rgb[light * 3 + 2] = WARM_BLUE * y;
    frame.level[light] = best;
    frame.cue[light] = cue;
    frame.colourCue[light] = -1;
  }

  /** Rule 19: per channel the largest of level x colour and each pulse x its colour. */
  #showColour(light: number, tick: number): void {
    const { level: levels, colour, pulse } = this.#tracks;
    const { frame } = this;
    let red = 1;
    let green = 1;
    let blue = 1;
    let ownCue = -1;
    const colourEntry = this.#colourEntry[light] ?? -1;
    if (colourEntry >= (colour.first[light] ?? 0)) {
      red = channelAt(colour, colourEntry, 0, tick);
      green = channelAt(colour, colourEntry, 1, tick);
      blue = channelAt(colour, colourEntry, 2, tick);
      ownCue = colour.cue[colourEntry] ?? -1;
    }
    const own = relativeLuminance(red, green, blue);
    const shown = this.#shown;
    shown.red = shown.green = shown.blue = shown.level = shown.brightest = 0;
    shown.cue = shown.colourCue = -1;
    const levelEntry = this.#levelEntry[light] ?? -1;
    if (levelEntry >= (levels.first[light] ?? 0))
      addTo(shown, levelAt(levels, levelEntry, tick), red, green, blue, own, levels.cue[levelEntry] ?? -1, ownCue);
    const running = this.#running[light] ?? [];
    for (let place = 0; place < running.length; place++) {
      const entry = running[place] ?? 0;
      const envelope = envelopeAt(pulse, entry, tick);
      const from = pulse.cue[entry] ?? -1;
      const named = this.#timeline.cues.colour[from] ?? NO_COLOUR;
      if (named === NO_COLOUR) {
        addTo(shown, envelope, red, green, blue, own, from, ownCue);
      } else {
        const r = channelToLinear(named >>> 16);
        const g = channelToLinear(named >>> 8);
        const b = channelToLinear(named);
        addTo(shown, envelope, r, g, b, relativeLuminance(r, g, b), from, from);
      }
    }
    const at = light * 3;
    frame.rgb[at] = shown.red;
    frame.rgb[at + 1] = shown.green;
    frame.rgb[at + 2] = shown.blue;
    frame.level[light] = shown.level;
    frame.cue[light] = shown.cue;
    frame.colourCue[light] = shown.colourCue;
  }

  /** What the light being read shows so far; one object for all, since it is filled a million times. */
  readonly #shown: Shown = { red: 0, green: 0, blue: 0, level: 0, brightest: 0, cue: -1, colourCue: -1 };
}

interface Shown {
  red: number;
  green: number;
  blue: number;
  level: number;
  brightest: number;
  cue: number;
  colourCue: number;
}

/** Adds a level in a colour of this luminance to what a light shows. */
function addTo(
  shown: Shown,
  level: number,
  red: number,
  green: number,
  blue: number,
  luminance: number,
  cue: number,
  colourCue: number,
): void {
  const y = levelToY(level);
  if (y * luminance <= 0) return;
  if (y * red > shown.red) shown.red = y * red;
  if (y * green > shown.green) shown.green = y * green;
  if (y * blue > shown.blue) shown.blue = y * blue;
  if (level > shown.level) shown.level = level;
  if (y * luminance > shown.brightest || (y * luminance === shown.brightest && cue > shown.cue)) {
    shown.brightest = y * luminance;
    shown.cue = cue;
    shown.colourCue = colourCue;
  }
}

/** Goes on from `entry` to the last entry at or before `tick`. */
function nextEntry(ticks: Uint32Array, entry: number, until: number, tick: number): number {
  let found = entry;
  while (found + 1 < until && (ticks[found + 1] ?? 0) <= tick) found++;
  return found;
}

/** Tick of the entry after `entry` of a light, infinity after its last. */
function nextTick({ first, tick }: Pick<LevelTrack, "first" | "tick">, light: number, entry: number): number {
  return entry + 1 < (first[light + 1] ?? 0) ? (tick[entry + 1] ?? Infinity) : Infinity;
}

/** Whether the line of an entry in force has not reached its end. */
function isMoving(
  { first, tick, length }: Pick<LevelTrack, "first" | "tick" | "length">,
  light: number,
  entry: number,
  at: number,
): boolean {
  return entry >= (first[light] ?? 0) && at < (tick[entry] ?? 0) + (length[entry] ?? 0);
}
