import type { BeatMap } from "../../shared/contracts/songs.ts";
import type { Layout } from "../../shared/contracts/square.ts";
import { listLights, type Light } from "../square/lights.ts";
import { traceLights, type LightCurve } from "../timeline/curves.ts";
import type { Timeline } from "../timeline/model.ts";
import { createTempo, type Tempo } from "../timeline/tempo.ts";
import { buildTracks, type Tracks } from "../timeline/tracks.ts";
import { DEFAULT_RULES, type EventRules } from "./rules.ts";

/** What a show is checked on. */
export interface CheckInput {
  readonly timeline: Timeline;
  readonly layout: Layout;
  readonly song: BeatMap;
  readonly rules?: Partial<EventRules>;
}

/** The input and what every rule reads of it, worked out once. */
export interface CheckContext {
  readonly timeline: Timeline;
  readonly layout: Layout;
  readonly song: BeatMap;
  readonly rules: EventRules;
  /** Walking order. */
  readonly lights: readonly Light[];
  readonly tracks: Tracks;
  readonly tempo: Tempo;
  /** The curve of each light, by index; worked out at the first call. */
  curves(): readonly LightCurve[];
}

/** Gives the context of a check. Throws `RangeError` when the timeline is for another number of lights. */
export function createCheckContext({ timeline, layout, song, rules }: CheckInput): CheckContext {
  const lights = listLights(layout);
  if (lights.length !== timeline.lightCount)
    throw new RangeError(`The timeline is for ${timeline.lightCount} lights, the layout has ${lights.length}.`);
  const tracks = buildTracks(timeline);
  let curves: readonly LightCurve[] | undefined;
  return {
    timeline,
    layout,
    song,
    rules: { ...DEFAULT_RULES, ...rules },
    lights,
    tracks,
    tempo: createTempo(song),
    curves: () => (curves ??= traceLights(timeline, lights, tracks)),
  };
}
