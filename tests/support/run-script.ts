import { createEngine, type Engine } from "../../sandbox/engine/engine.ts";
import type { RunInput, RunOutcome } from "../../sandbox/engine/model.ts";
import { listLights } from "../../sandbox/square/lights.ts";
import { ACTIONS, NO_COLOUR, type Timeline } from "../../sandbox/timeline/model.ts";
import { createNodeHost } from "../../server/runs/node-host.worker.ts";
import { BeatMapSchema, type BeatMap } from "../../shared/contracts/songs.ts";
import { LayoutSchema, type Front, type Layout } from "../../shared/contracts/square.ts";

const SILHOUETTE: Front["silhouette"] = {
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
};

function front(
  name: string,
  side: Front["side"],
  order: number,
  boxes: readonly { kind: Front["boxes"][number]["kind"]; parts: readonly string[]; pixels?: number }[],
): Front {
  const id = name.replaceAll(" ", "-");
  return {
    id,
    name,
    side,
    order,
    silhouette: SILHOUETTE,
    boxes: boxes.map(({ kind, parts, pixels }, b) => ({
      id: `${id}-${b + 1}`,
      kind,
      outlets: parts.map((part, n) => ({
        number: n + 1,
        part,
        watts: 40,
        circuit: "a",
        ...(pixels === undefined ? {} : { pixels }),
      })),
    })),
  };
}

/**
 * A square small enough to count by hand. Lights in walking order: bakery roof 0, windows 1 (relay);
 * library windows 2, door 3 (dimmer); tea room roof 4 (relay), strip 5 to 7 (colour); tree lamps 8.
 */
export const SMALL_LAYOUT: Layout = LayoutSchema.parse({
  version: 1,
  name: "Small square",
  mains: { volts: 120, hertz: 60 },
  circuits: [{ id: "a", volts: 120, breakerAmps: 20 }],
  fronts: [
    front("tree", null, 0, [{ kind: "dimmer", parts: ["lamps"] }]),
    front("tea room", "east", 0, [
      { kind: "relay", parts: ["roof"] },
      { kind: "colour", parts: ["strip"], pixels: 3 },
    ]),
    front("library", "north", 1, [{ kind: "dimmer", parts: ["windows", "door"] }]),
    front("bakery", "north", 0, [{ kind: "relay", parts: ["roof", "windows"] }]),
  ],
});

/** Seventeen beats at 120 a minute: a pick-up of one beat, then four bars of four. */
export const SMALL_SONG: BeatMap = BeatMapSchema.parse({
  version: 1,
  beats: Array.from({ length: 18 }, (_, beat) => beat * 500_000),
  beatsPerBar: 4,
  bars: [
    { number: 0, start: 0, beats: 1 },
    ...[1, 2, 3, 4].map((number) => ({ number, start: number * 4 - 3, beats: 4 })),
  ],
  sections: [
    { name: "verse", start: 1, end: 5 },
    { name: "chorus", start: 5, end: 9 },
    { name: "verse", start: 9, end: 13 },
    { name: "chorus", start: 13, end: 17 },
  ],
  instruments: [
    { name: "drums", hits: [1, 3, 5, 7, 9, 11, 13, 15], notes: [] },
    {
      name: "bells",
      hits: [5, 6],
      notes: [
        { start: 5, beats: 1, pitch: 60 },
        { start: 6, beats: 0.5, pitch: 64 },
      ],
    },
  ],
  loudness: Array.from({ length: 68 }, (_, quarter) => (quarter < 20 ? 20 : 80)),
});

let engine: Promise<Engine> | null = null;

/** Runs a script directly, without a pool: on the small square and song unless told otherwise. */
export async function runScript(source: string, input: Partial<Omit<RunInput, "source">> = {}): Promise<RunOutcome> {
  engine ??= createNodeHost().then(createEngine);
  return (await engine).run({ source, songId: "small", song: SMALL_SONG, layout: SMALL_LAYOUT, seed: 7, ...input });
}

/** Runs a script that has to run; throws its problem otherwise. */
export async function runWell(
  source: string,
  input: Partial<Omit<RunInput, "source">> = {},
): Promise<Extract<RunOutcome, { ok: true }>> {
  const outcome = await runScript(source, input);
  if (!outcome.ok)
    throw new Error(
      `${outcome.problem.code} in line ${outcome.problem.range.line}: ${outcome.problem.sentence} (${outcome.problem.details ?? ""})`,
    );
  return outcome;
}

/** The texts that a script prints. */
export async function printed(source: string, input: Partial<Omit<RunInput, "source">> = {}): Promise<string[]> {
  return (await runWell(source, input)).notes.map((note) => note.text);
}

const LAYOUT_LIGHTS = listLights(SMALL_LAYOUT).length;

/** Every cue on one line: `beat action [level|colour] [+beats] of lights @lines`, lights as ranges or `all`. */
export function listCues(timeline: Timeline): string[] {
  const { cues } = timeline;
  return Array.from({ length: cues.count }, (_, cue) => {
    const action = ACTIONS[cues.action[cue] ?? 0] ?? "";
    const lights = [...(timeline.selections[cues.selection[cue] ?? 0] ?? [])];
    const colour = cues.colour[cue] ?? NO_COLOUR;
    return [
      (cues.tick[cue] ?? 0) / 960,
      action,
      action === "on" || action === "fadeTo" ? (cues.level[cue] ?? 0) / 100 : "",
      colour === NO_COLOUR ? "" : `#${colour.toString(16).padStart(6, "0")}`,
      (cues.length[cue] ?? 0) > 0 ? `+${(cues.length[cue] ?? 0) / 960}` : "",
      lights.length === LAYOUT_LIGHTS && lights.every((light, i) => light === i) ? "all" : `[${lights.join(" ")}]`,
      `@${(timeline.chains[cues.chain[cue] ?? 0] ?? []).join(">")}`,
    ]
      .filter((part) => part !== "")
      .join(" ");
  });
}

/** The cues of a script that has to run. */
export async function cuesOf(source: string, input: Partial<Omit<RunInput, "source">> = {}): Promise<string[]> {
  return listCues((await runWell(source, input)).timeline);
}
