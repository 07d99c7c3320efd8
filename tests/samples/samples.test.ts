import { readFileSync, readdirSync, writeFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { checkShow } from "../../sandbox/checks/index.ts";
import { FUEL_LIMIT } from "../../sandbox/engine/limits.ts";
import { demoSong } from "../../server/db/seed/world/songs/demo-songs.ts";
import { DEMO_SQUARE } from "../../server/db/seed/world/square.ts";
import { runWell } from "../support/run-script.ts";

/** What stands beside a sample. */
interface Sidecar {
  readonly song: string;
  readonly seed: number;
  readonly cues: number;
  readonly hash: string;
  /** Interpreter polls. */
  readonly fuel: number;
  /** Rules, sorted, each once. */
  readonly findings: readonly string[];
  readonly notes: readonly string[];
}

const FOLDER = new URL("./", import.meta.url);
const DEFAULT_SONG = "quillhaven-bells";
const DEFAULT_SEED = 20_261_201;
const SONGS: { readonly [sample: string]: string } = { waltz: "lantern-waltz" };
/** How much of the fuel any sample may take: new steps of the library have to fit in five times. */
const FUEL_MARGIN = 5;

const SAMPLES = readdirSync(FOLDER).filter((file) => file.endsWith(".ts") && !file.endsWith(".test.ts")).map((file) => file.slice(0, -".ts".length));

function readSidecar(sample: string): Sidecar {
  return JSON.parse(readFileSync(new URL(`${sample}.json`, FOLDER), "utf8")) as Sidecar;
}

async function runSample(sample: string): Promise<Sidecar> {
  const song = SONGS[sample] ?? DEFAULT_SONG;
  const { beatMap } = demoSong(song);
  const source = readFileSync(new URL(`${sample}.ts`, FOLDER), "utf8");
  const outcome = await runWell(source, { songId: song, song: beatMap, layout: DEMO_SQUARE, seed: DEFAULT_SEED });
  const checked = checkShow({ timeline: outcome.timeline, layout: DEMO_SQUARE, song: beatMap });
  return {
    song,
    seed: DEFAULT_SEED,
    cues: outcome.cueCount,
    hash: outcome.hash,
    fuel: outcome.fuel,
    findings: [...new Set([...outcome.findings, ...checked].map((finding) => finding.rule))].sort(),
    notes: outcome.notes.map((note) => note.text),
  };
}

describe("samples", () => {
  it.each(SAMPLES)("%s comes to what stands beside it", { timeout: 60_000 }, async (sample) => {
    const result = await runSample(sample);
    if (process.env["GOLDEN_UPDATE"] === "1") writeFileSync(new URL(`${sample}.json`, FOLDER), `${JSON.stringify(result, null, 2)}\n`);
    expect(result).toEqual(readSidecar(sample));
  });

  it.each(SAMPLES)("%s leaves the fuel a margin", (sample) => {
    expect(readSidecar(sample).fuel * FUEL_MARGIN).toBeLessThanOrEqual(FUEL_LIMIT);
  });

  it("has the findings that the samples were written for", () => {
    expect(readSidecar("clamps-and-counts").findings).toEqual(expect.arrayContaining(["count-rounded", "level-clamped"]));
    expect(readSidecar("conditions-on-song").findings).toContain("never-switches");
    expect(readSidecar("blackout").findings).toContain("never-switches");
  });
});
