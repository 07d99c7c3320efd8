import type { BeatMap } from "../../shared/contracts/songs.ts";
import type { BoxKind, Layout, Side } from "../../shared/contracts/square.ts";
import { TICKS_PER_BEAT } from "../../shared/units.ts";
import { listLights } from "../../sandbox/square/lights.ts";
import { buildTimeline, type TimelineHead, type WrittenCue } from "../../sandbox/timeline/build.ts";
import type { Timeline } from "../../sandbox/timeline/model.ts";

/** One outlet of a front: a kind of box, or a colour strip of so many pixels. */
export type OutletSketch =
  | BoxKind
  | number
  | {
      readonly kind: BoxKind;
      readonly part?: string;
      readonly watts?: number;
      readonly circuit?: string;
      readonly pixels?: number;
    };

export interface FrontSketch {
  readonly side: Side | null;
  readonly outlets: readonly OutletSketch[];
}

const PARTS = ["roof", "windows", "door", "sign", "awning", "strip", "steps", "lamps"];

/** A layout of a few fronts: one box an outlet, parts named in order, 120 V, 60 Hz, circuit "a" of 15 A and "b" of 20 A. */
export function buildLayout(fronts: readonly FrontSketch[], overrides: Partial<Layout> = {}): Layout {
  const perSide = new Map<Side | null, number>();
  return {
    version: 1,
    name: "Small square",
    mains: { volts: 120, hertz: 60 },
    circuits: [
      { id: "a", volts: 120, breakerAmps: 15 },
      { id: "b", volts: 120, breakerAmps: 20 },
    ],
    fronts: fronts.map(({ side, outlets }, index) => {
      const order = perSide.get(side) ?? 0;
      perSide.set(side, order + 1);
      return {
        id: `front-${letters(index)}`,
        name: `front ${letters(index)}`,
        side,
        order,
        silhouette: {
          width: 1,
          eave: 0.5,
          top: 0.8,
          roof: "gable",
          floors: 2,
          bays: 3,
          window: "sash",
          ground: "shop",
          awning: 0,
          chimney: 0,
          sign: false,
        },
        boxes: outlets.map((sketch, place) => {
          const outlet =
            typeof sketch === "number"
              ? { kind: "colour" as const, pixels: sketch }
              : typeof sketch === "string"
                ? { kind: sketch }
                : sketch;
          const { kind, part = PARTS[place] ?? `part-${letters(place)}`, watts = 40, circuit = "a", pixels } = outlet;
          return {
            id: `box-${letters(place)}`,
            kind,
            outlets: [{ number: 1, part, watts, circuit, ...(pixels === undefined ? {} : { pixels }) }],
          };
        }),
      };
    }),
    ...overrides,
  };
}

/** One front on the north side with these outlets. */
export function buildFront(...outlets: readonly OutletSketch[]): Layout {
  return buildLayout([{ side: "north", outlets }]);
}

/** Seven fronts on the north side whose windows dim, the first broad: a fifth of the side, yet a quarter of any screen's middle. */
export function buildBroadStreet(): Layout {
  const street = buildLayout(
    Array.from({ length: 7 }, () => ({
      side: "north" as const,
      outlets: [{ kind: "dimmer" as const, part: "windows" }],
    })),
  );
  return {
    ...street,
    fronts: street.fronts.map((front, index) => ({
      ...front,
      silhouette: { ...front.silhouette, floors: 3, bays: index === 0 ? 6 : 4, width: index === 0 ? 1.6 : 1 },
    })),
  };
}

function letters(index: number): string {
  return index < 26 ? String.fromCharCode(97 + index) : letters(Math.floor(index / 26) - 1) + letters(index % 26);
}

/** A song of so many bars of four beats at a steady tempo, silent but for what `overrides` says. */
export function buildSong(
  overrides: Partial<BeatMap> = {},
  { bars = 8, tempo = 120 }: { readonly bars?: number; readonly tempo?: number } = {},
): BeatMap {
  const { beatsPerBar = 4 } = overrides;
  const count = bars * beatsPerBar;
  return {
    version: 1,
    beats: Array.from({ length: count + 1 }, (_, beat) => Math.round((beat * 60_000_000) / tempo)),
    beatsPerBar,
    bars: Array.from({ length: bars }, (_, bar) => ({ number: bar + 1, start: bar * beatsPerBar, beats: beatsPerBar })),
    sections: [],
    instruments: [],
    loudness: Array.from({ length: count * 4 }, () => 50),
    ...overrides,
  };
}

type Lights = number | readonly number[];
const toLights = (lights: Lights): readonly number[] => (typeof lights === "number" ? [lights] : lights);
const toTicks = (beats: number) => Math.round(beats * TICKS_PER_BEAT);

/** Cues in the words of a script: a beat, the lights, the values, the script line. */
export const on = (beat: number, lights: Lights, level = 100, line: number | readonly number[] = 1): WrittenCue => ({
  ...cueHead(beat, lights, line),
  action: "on",
  level: Math.round(level * 100),
});
export const off = (beat: number, lights: Lights, line: number | readonly number[] = 1): WrittenCue => ({
  ...cueHead(beat, lights, line),
  action: "off",
});
export const fadeTo = (
  beat: number,
  lights: Lights,
  level: number,
  beats: number,
  line: number | readonly number[] = 1,
): WrittenCue => ({
  ...cueHead(beat, lights, line),
  action: "fadeTo",
  level: Math.round(level * 100),
  length: toTicks(beats),
});
export const pulse = (
  beat: number,
  lights: Lights,
  beats: number,
  colour?: number,
  line: number | readonly number[] = 1,
): WrittenCue => ({
  ...cueHead(beat, lights, line),
  action: "pulse",
  length: toTicks(beats),
  ...(colour === undefined ? {} : { colour }),
});
export const colour = (
  beat: number,
  lights: Lights,
  value: number,
  beats = 0,
  line: number | readonly number[] = 1,
): WrittenCue => ({
  ...cueHead(beat, lights, line),
  action: "colour",
  colour: value,
  length: toTicks(beats),
});

function cueHead(beat: number, lights: Lights, line: number | readonly number[]) {
  return { tick: toTicks(beat), lights: toLights(lights), chain: typeof line === "number" ? [line] : line };
}

/** A timeline of cues on a layout; 8 bars of 4 beats unless `overrides` says otherwise. */
export function buildShow(
  layout: Layout,
  cues: readonly WrittenCue[],
  overrides: Partial<TimelineHead> = {},
): Timeline {
  return buildTimeline(
    {
      language: 1,
      songId: "song-a",
      layoutHash: "layout-a",
      seed: 7,
      lightCount: listLights(layout).length,
      endTick: 32 * TICKS_PER_BEAT,
      isComplete: true,
      ...overrides,
    },
    cues,
  );
}
