import { readdirSync, readFileSync } from "node:fs";
import { LESSONS } from "../../lessons/index.ts";
import type { RunInput } from "../../sandbox/engine/model.ts";
import { listNames } from "../../sandbox/engine/tables.ts";
import { DEMO_SCRIPTS } from "../../server/db/seed/world/scripts/index.ts";
import { DEMO_SONGS, demoSong } from "../../server/db/seed/world/songs/demo-songs.ts";
import { DEMO_SQUARE } from "../../server/db/seed/world/square.ts";
import { SMALL_LAYOUT, SMALL_SONG } from "../support/run-script.ts";
import { seededDraw } from "./draw.ts";
import { drawProgram } from "./grammar.ts";
import { RULE_SCRIPTS } from "./rule-scripts.ts";

/** A script whose timeline is known by heart. */
export interface GoldenScript {
  readonly name: string;
  readonly input: RunInput;
}

const SAMPLES = new URL("../samples/", import.meta.url);
const SEED = 20_261_201;
/** Drawn programs, in turn on each demo song; on the small square every third. */
const DRAWN = 30;

function onDemoSquare(name: string, source: string, songId: string, seed: number): GoldenScript {
  return { name, input: { source, songId, song: demoSong(songId).beatMap, layout: DEMO_SQUARE, seed } };
}

function listSamples(): GoldenScript[] {
  return readdirSync(SAMPLES)
    .filter((file) => file.endsWith(".ts") && !file.endsWith(".test.ts"))
    .map((file) => {
      const songId = file === "waltz.ts" ? "lantern-waltz" : "quillhaven-bells";
      return onDemoSquare(`sample ${file}`, readFileSync(new URL(file, SAMPLES), "utf8"), songId, SEED);
    });
}

function listLessonScripts(): GoldenScript[] {
  return LESSONS.flatMap(({ id, songId, seed, steps }) =>
    steps.flatMap((step) =>
      (["starter", "aim", "solution"] as const).flatMap((kind) => {
        const source = step[kind];
        return source === null ? [] : [onDemoSquare(`lesson ${id}/${step.id} ${kind}`, source, songId, seed)];
      }),
    ),
  );
}

function listDrawn(): GoldenScript[] {
  return Array.from({ length: DRAWN }, (_, seed) => {
    const isSmall = seed % 3 === 0;
    const demo = DEMO_SONGS[seed % DEMO_SONGS.length];
    const song = isSmall || demo === undefined ? SMALL_SONG : demo.beatMap;
    const layout = isSmall ? SMALL_LAYOUT : DEMO_SQUARE;
    const source = drawProgram(seededDraw(seed), listNames(layout, song));
    return { name: `drawn ${seed}`, input: { source, songId: "drawn", song, layout, seed } };
  });
}

/** Every golden script, each text once; those that stop with a problem too. */
export function listGoldenScripts(): GoldenScript[] {
  const all = [
    ...listSamples(),
    ...DEMO_SCRIPTS.map(({ id, source, songId, seed }) => onDemoSquare(`demo ${id}`, source, songId, seed)),
    ...listLessonScripts(),
    ...Object.entries(RULE_SCRIPTS).map(([rule, source]) =>
      onDemoSquare(`rule ${rule}`, source, "quillhaven-bells", SEED),
    ),
    ...listDrawn(),
  ];
  const seen = new Set<string>();
  return all.filter(({ input: { source, songId, seed } }) => {
    const key = `${songId} ${seed} ${source}`;
    return seen.has(key) ? false : seen.add(key) !== undefined;
  });
}
