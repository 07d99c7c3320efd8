import { readFileSync } from "node:fs";
import { hashText } from "../../sandbox/square/stable-chance.ts";
import { buildBeatMap } from "../../sandbox/music/beat-map.ts";
import { readMidi } from "../../sandbox/music/read-midi.ts";
import type { RunInput } from "../../sandbox/engine/model.ts";
import type { BeatMap } from "../../shared/contracts/songs.ts";
import { type Layout, LayoutSchema } from "../../shared/contracts/square.ts";
import { DEMO_SONGS } from "../db/seed/world/songs/demo-songs.ts";
import { DEMO_SQUARE, LARGE_SQUARE, SQUARE_230 } from "../db/seed/world/square.ts";
import { UsageError } from "./command.ts";

/** Layouts of the demo world by the name that `--layout` takes. */
const LAYOUTS: ReadonlyMap<string, Layout> = new Map([
  ["demo", DEMO_SQUARE],
  ["large", LARGE_SQUARE],
  ["230v", SQUARE_230],
]);

/** What `run` and `check` take beside the script: names of options for `parseOptions`. */
export const RUN_OPTIONS = ["song", "layout", "seed"] as const;

/** Wall time of a run that no page waits for: a busy machine is no reason to give a script up. */
export const COMMAND_DEADLINE_MS = 60_000;

/** The run that the options ask for. Throws `UsageError` naming the option and the fix. */
export function buildRunInput(file: string, values: ReadonlyMap<string, string>): RunInput {
  const songName = values.get("song") ?? "frost-fair";
  const seed = values.get("seed");
  if (seed !== undefined && !/^\d{1,10}$/.test(seed))
    throw new UsageError("--seed takes a whole number from 0 to 4294967295.");
  return {
    source: readText(file),
    songId: songName,
    song: findSong(songName),
    layout: findLayout(values.get("layout") ?? "demo"),
    seed: seed === undefined ? hashText(file) : Number(seed) >>> 0,
  };
}

function readText(file: string): string {
  try {
    return readFileSync(file, "utf8");
  } catch {
    throw new UsageError(`${file} can not be read. Name a script, for example my-show.ts.`);
  }
}

function findSong(name: string): BeatMap {
  const known = DEMO_SONGS.find((song) => song.id === name);
  if (known) return known.beatMap;
  if (!name.endsWith(".mid")) {
    throw new UsageError(`--song takes ${DEMO_SONGS.map((song) => song.id).join(", ")}, or a file that ends in .mid.`);
  }
  try {
    return buildBeatMap(readMidi(readFileSync(name)));
  } catch (error) {
    throw new UsageError(`--song ${name}: ${error instanceof Error ? error.message : "it can not be read"}`);
  }
}

function findLayout(name: string): Layout {
  const known = LAYOUTS.get(name);
  if (known) return known;
  if (!name.endsWith(".json")) {
    throw new UsageError(`--layout takes ${[...LAYOUTS.keys()].join(", ")}, or a file that ends in .json.`);
  }
  const parsed = LayoutSchema.safeParse(readJson(name));
  if (parsed.success) return parsed.data;
  const lines = parsed.error.issues.map((issue) => `  ${issue.path.map(String).join(".")}: ${issue.message}`);
  throw new UsageError(`--layout ${name} is no layout:\n${lines.join("\n")}`);
}

function readJson(file: string): unknown {
  try {
    return JSON.parse(readFileSync(file, "utf8"));
  } catch (error) {
    throw new UsageError(`--layout ${file}: ${error instanceof Error ? error.message : "it can not be read"}`);
  }
}

/** The one script that a command was given. Throws `UsageError`. */
export function getFile(rest: readonly string[], command: string): string {
  const [file, ...more] = rest;
  if (file === undefined || more.length > 0)
    throw new UsageError(`${command} takes one script: ${command} my-show.ts --song frost-fair`);
  return file;
}
