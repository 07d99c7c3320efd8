import { TimelineFormatError } from "./bytes.ts";
import { buildTimeline, type WrittenCue } from "./build.ts";
import { colourToHex } from "./colour.ts";
import { ACTIONS, NO_COLOUR, type Action, type Timeline } from "./model.ts";

/** The JSON twin of the stored form: the same content, to be read by people and other programs. */
export interface TimelineJson {
  readonly format: "duskbell-timeline";
  readonly version: 1;
  readonly language: number;
  readonly songId: string;
  readonly layoutHash: string;
  readonly seed: number;
  readonly lightCount: number;
  readonly endTick: number;
  readonly isComplete: boolean;
  /** Light indexes in walking order of the selection. */
  readonly selections: readonly (readonly number[])[];
  readonly chains: readonly (readonly number[])[];
  readonly cues: readonly CueJson[];
}

/** One cue; only the fields that its action has. */
export interface CueJson {
  /** 1/960 beat. */
  readonly tick: number;
  readonly action: Action;
  readonly selection: number;
  readonly chain: number;
  /** 0 to 100. */
  readonly level?: number;
  /** Ticks. */
  readonly length?: number;
  /** `#rrggbb`. */
  readonly colour?: string;
}

/** Gives the JSON twin of a timeline, ready for `JSON.stringify`. */
export function timelineToJson(timeline: Timeline): TimelineJson {
  const { cues, selections, chains, ...head } = timeline;
  return {
    format: "duskbell-timeline",
    ...head,
    selections: selections.map((lights) => [...lights]),
    chains: chains.map((lines) => [...lines]),
    cues: Array.from({ length: cues.count }, (_, cue) => {
      const action = ACTIONS[cues.action[cue] ?? 0] ?? "on";
      const colour = cues.colour[cue] ?? NO_COLOUR;
      return {
        tick: cues.tick[cue] ?? 0,
        action,
        selection: cues.selection[cue] ?? 0,
        chain: cues.chain[cue] ?? 0,
        ...(action === "on" || action === "fadeTo" ? { level: (cues.level[cue] ?? 0) / 100 } : {}),
        ...(action === "on" || action === "off" ? {} : { length: cues.length[cue] ?? 0 }),
        ...((action === "pulse" || action === "colour") && colour !== NO_COLOUR ? { colour: colourToHex(colour) } : {}),
      };
    }),
  };
}

/** Gives the timeline of a JSON twin. Throws `TimelineFormatError` that names the field when it is not one. */
export function parseTimelineJson(json: unknown): Timeline {
  const root = toRecord(json, "The timeline");
  if (root.format !== "duskbell-timeline") throw new TimelineFormatError('"format" has to be "duskbell-timeline".');
  if (root.version !== 1) throw new TimelineFormatError('"version" has to be 1.');
  const selections = toLists(root.selections, "selections");
  const chains = toLists(root.chains, "chains");
  if (typeof root.isComplete !== "boolean") throw new TimelineFormatError('"isComplete" has to be true or false.');
  const written = toList(root.cues, "cues").map((cue, index): WrittenCue =>
    parseCue(cue, `cues[${index}]`, selections, chains),
  );
  let previous = 0;
  written.forEach(({ tick }, index) => {
    if (tick < previous) throw new TimelineFormatError(`"cues[${index}].tick" is before the cue in front of it.`);
    previous = tick;
  });
  return buildTimeline(
    {
      language: toWhole(root.language, "language"),
      songId: toText(root.songId, "songId"),
      layoutHash: toText(root.layoutHash, "layoutHash"),
      seed: toWhole(root.seed, "seed"),
      lightCount: toWhole(root.lightCount, "lightCount"),
      endTick: toWhole(root.endTick, "endTick"),
      isComplete: root.isComplete,
    },
    written,
  );
}

function parseCue(
  json: unknown,
  path: string,
  selections: readonly number[][],
  chains: readonly number[][],
): WrittenCue {
  const cue = toRecord(json, `"${path}"`);
  const action = ACTIONS.find((name) => name === cue.action);
  if (action === undefined) throw new TimelineFormatError(`"${path}.action" has to be one of ${ACTIONS.join(", ")}.`);
  const lights = selections[toWhole(cue.selection, `${path}.selection`)];
  const chain = chains[toWhole(cue.chain, `${path}.chain`)];
  if (lights === undefined) throw new TimelineFormatError(`"${path}.selection" is not in "selections".`);
  if (chain === undefined) throw new TimelineFormatError(`"${path}.chain" is not in "chains".`);
  return {
    tick: toWhole(cue.tick, `${path}.tick`),
    action,
    lights,
    chain,
    ...(action === "on" || action === "fadeTo" ? { level: toLevel(cue.level, `${path}.level`) } : {}),
    ...(action === "on" || action === "off" ? {} : { length: toWhole(cue.length, `${path}.length`) }),
    ...(cue.colour === undefined ? {} : { colour: toColour(cue.colour, `${path}.colour`) }),
  };
}

function toRecord(value: unknown, what: string): Readonly<Record<string, unknown>> {
  if (typeof value !== "object" || value === null || Array.isArray(value))
    throw new TimelineFormatError(`${what} has to be an object.`);
  return value as Readonly<Record<string, unknown>>;
}

function toList(value: unknown, path: string): readonly unknown[] {
  if (!Array.isArray(value)) throw new TimelineFormatError(`"${path}" has to be a list.`);
  return value as readonly unknown[];
}

function toLists(value: unknown, path: string): number[][] {
  return toList(value, path).map((list, index) =>
    toList(list, `${path}[${index}]`).map((number, place) => toWhole(number, `${path}[${index}][${place}]`)),
  );
}

function toWhole(value: unknown, path: string): number {
  if (typeof value !== "number" || !Number.isInteger(value) || value < 0 || value > 0xff_ff_ff_ff)
    throw new TimelineFormatError(`"${path}" has to be a whole number of at most 32 bits.`);
  return value;
}

function toLevel(value: unknown, path: string): number {
  if (typeof value !== "number" || !(value >= 0 && value <= 100))
    throw new TimelineFormatError(`"${path}" has to be a number from 0 to 100.`);
  return Math.round(value * 100);
}

function toText(value: unknown, path: string): string {
  if (typeof value !== "string") throw new TimelineFormatError(`"${path}" has to be a text.`);
  return value;
}

function toColour(value: unknown, path: string): number {
  if (typeof value !== "string" || !/^#[0-9a-f]{6}$/.test(value))
    throw new TimelineFormatError(`"${path}" has to be a colour like "#ffd700".`);
  return Number.parseInt(value.slice(1), 16);
}
