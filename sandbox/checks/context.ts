import type { BeatMap } from "../../shared/contracts/songs.ts";
import type { Layout } from "../../shared/contracts/square.ts";
import { listLights, type Light } from "../square/lights.ts";
import type { Timeline } from "../timeline/model.ts";
import { listOnSpans, type OnSpan } from "../timeline/switching.ts";
import { createTempo, type Tempo } from "../timeline/tempo.ts";
import { buildTracks, type Tracks } from "../timeline/tracks.ts";
import { CheckMemory } from "./check-memory.ts";
import { listFacts, type LightFacts } from "./light-facts.ts";
import { tightenRules, type EventRules } from "./rules.ts";

/** Where shows are checked: what stays the same from one check to the next. */
export interface CheckSetting {
  readonly layout: Layout;
  readonly song: BeatMap;
  readonly rules?: Partial<EventRules>;
}

/** What a show is checked on. */
export interface CheckInput extends CheckSetting {
  readonly timeline: Timeline;
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
  /** What earlier checks of the same setting left. */
  readonly memory: CheckMemory;
  /** The facts of each light, by index; worked out at the first call. */
  facts(): readonly LightFacts[];
  /** When each switched light is on, by index; empty for others. Worked out at the first call. */
  onSpans(): readonly (readonly OnSpan[])[];
}

/** Gives the context of a check. Throws `RangeError` when the timeline is for another number of lights. */
export function createCheckContext({ timeline, ...setting }: CheckInput): CheckContext {
  return openSetting(setting)(timeline);
}

/** Gives what makes contexts of one setting after another, with one memory. */
export function openSetting({ layout, song, rules: own }: CheckSetting): (timeline: Timeline) => CheckContext {
  const memory = new CheckMemory();
  const lights = listLights(layout);
  const tempo = createTempo(song);
  const rules = tightenRules(own);
  return (timeline) => {
    if (lights.length !== timeline.lightCount)
      throw new RangeError(`The timeline is for ${timeline.lightCount} lights, the layout has ${lights.length}.`);
    memory.turnPage();
    const tracks = buildTracks(timeline);
    let facts: readonly LightFacts[] | undefined;
    let onSpans: readonly (readonly OnSpan[])[] | undefined;
    return {
      timeline,
      layout,
      song,
      rules,
      lights,
      tracks,
      tempo,
      memory,
      facts: () => (facts ??= listFacts(timeline, lights, tracks, rules, memory)),
      onSpans: () =>
        (onSpans ??= lights.map(({ index, isSwitched }) => (isSwitched ? listOnSpans(tracks, index) : []))),
    };
  };
}
