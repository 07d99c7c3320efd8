import { listLights, type Light } from "../../sandbox/square/lights.ts";
import { ACTIONS, NO_COLOUR, type Timeline } from "../../sandbox/timeline/model.ts";
import type { Layout } from "../../shared/contracts/square.ts";

/**
 * Which cue lights a light at a moment, found by reading every cue from the first: rules 13 to 20 as
 * they are written, without tracks, cursors or anything kept between two questions.
 */

/** One cue as a light meets it. */
interface Met {
  readonly cue: number;
  readonly tick: number;
  readonly action: string;
  /** 0 to 100. */
  readonly level: number;
  readonly length: number;
  readonly colour: number;
}

/** A value on its way from one to another. */
interface Ramp<T> {
  readonly from: T;
  readonly to: T;
  readonly start: number;
  readonly length: number;
}

type Rgb = readonly [number, number, number];

const shareOf = ({ start, length }: Ramp<unknown>, tick: number): number =>
  length === 0 ? 1 : Math.min(1, (tick - start) / length);
const between = (from: number, to: number, share: number): number => from + (to - from) * share;
const levelAt = (ramp: Ramp<number>, tick: number): number => between(ramp.from, ramp.to, shareOf(ramp, tick));
const colourAt = ({ from, to, ...ramp }: Ramp<Rgb>, tick: number): Rgb => {
  const share = shareOf({ from, to, ...ramp }, tick);
  return [between(from[0], to[0], share), between(from[1], to[1], share), between(from[2], to[2], share)];
};

/** sRGB to linear light (IEC 61966-2-1). */
function toLinear(hex: number): Rgb {
  const channel = (byte: number): number =>
    byte <= 10.31475 ? byte / 255 / 12.92 : ((byte / 255 + 0.055) / 1.055) ** 2.4;
  return [channel(hex >>> 16), channel((hex >>> 8) & 255), channel(hex & 255)];
}

/** Luminance of linear light (IEC 61966-2-1), and Y of L* (CIE 15). */
const luminance = ([r, g, b]: Rgb): number => 0.2126 * r + 0.7152 * g + 0.0722 * b;
const toY = (level: number): number => (level > 8 ? ((level + 16) / 116) ** 3 : (level * 27) / 24_389);

/** Every cue that some light meets, in order: all those whose selection holds it. */
function listMet({ cues }: Timeline, hasLight: readonly boolean[]): Met[] {
  const met: Met[] = [];
  for (let cue = 0; cue < cues.count; cue++) {
    if (!hasLight[cues.selection[cue] ?? 0]) continue;
    met.push({
      cue,
      tick: cues.tick[cue] ?? 0,
      action: ACTIONS[cues.action[cue] ?? 0] ?? "",
      level: (cues.level[cue] ?? 0) / 100,
      length: cues.length[cue] ?? 0,
      colour: cues.colour[cue] ?? NO_COLOUR,
    });
  }
  return met;
}

/** A cue that could light the light, and how strongly: luminance of what it gives. */
export interface Candidate {
  readonly cue: number;
  readonly strength: number;
}

/** Every cue that lights a light at a tick by itself, the strongest first, of equals the latest. */
function listCandidates(all: readonly Met[], light: Light, tick: number): Candidate[] {
  let level: Ramp<number> = { from: 0, to: 0, start: 0, length: 0 };
  let levelCue = -1;
  let colour: Ramp<Rgb> = { from: [1, 1, 1], to: [1, 1, 1], start: 0, length: 0 };
  let pulses: Met[] = [];
  for (const met of all) {
    if (met.tick > tick) break;
    if (met.action === "pulse") pulses.push(met);
    else if (met.action === "colour")
      colour = { from: colourAt(colour, met.tick), to: toLinear(met.colour), start: met.tick, length: met.length };
    else {
      const from = levelAt(level, met.tick);
      level = {
        from,
        to: met.action === "off" ? 0 : met.level,
        start: met.tick,
        length: met.action === "fadeTo" ? met.length : 0,
      };
      levelCue = met.cue;
      if (met.action === "off") pulses = [];
    }
  }
  const own = colourAt(colour, tick);
  const shine = (lightness: number, rgb: Rgb): number =>
    light.hasColour ? luminance(rgb) * toY(lightness) : lightness;
  const base = levelAt(level, tick);
  const candidates: Candidate[] = [];
  if (base > 0 && (!light.isSwitched || base >= 50)) candidates.push({ cue: levelCue, strength: shine(base, own) });
  for (const pulse of pulses) {
    const gone = (tick - pulse.tick) / pulse.length;
    if (gone >= 1) continue;
    const rgb = pulse.colour === NO_COLOUR ? own : toLinear(pulse.colour);
    candidates.push({ cue: pulse.cue, strength: shine(100 * (1 - gone), rgb) });
  }
  return candidates.filter(({ strength }) => strength > 0).sort((a, b) => b.strength - a.strength || b.cue - a.cue);
}

/** Asks for any light at any moment. Lights of one kind in the same selections are worked out once a moment. */
export function createWitness(
  timeline: Timeline,
  layout: Layout,
): (light: number, tick: number) => readonly Candidate[] {
  const kinds = new Map<string, { readonly light: Light; readonly met: readonly Met[] }>();
  const keys = listLights(layout).map((light) => {
    const hasLight = timeline.selections.map((lights) => lights.includes(light.index));
    const key = `${light.hasColour} ${light.isSwitched} ${hasLight.map(Number).join("")}`;
    if (!kinds.has(key)) kinds.set(key, { light, met: listMet(timeline, hasLight) });
    return key;
  });
  let lastTick = -1;
  const answers = new Map<string, readonly Candidate[]>();
  return (light, tick) => {
    if (tick !== lastTick) answers.clear();
    lastTick = tick;
    const key = keys[light] ?? "";
    const kind = kinds.get(key);
    if (kind === undefined) throw new RangeError(`There is no light ${light}.`);
    const known = answers.get(key) ?? listCandidates(kind.met, kind.light, tick);
    answers.set(key, known);
    return known;
  };
}
