import { readFileSync } from "node:fs";
import path from "node:path";
import tsBlankSpace from "ts-blank-space";
import type { Layout } from "../../shared/contracts/square.ts";
import { createEngine, type EngineHost } from "../../sandbox/engine/engine.ts";
import type { GuestLuck } from "../../sandbox/engine/guest.ts";
import { GuestRuntime } from "../../sandbox/engine/runtime.ts";
import { buildTables, listNames } from "../../sandbox/engine/tables.ts";
import { compileScript } from "../../sandbox/language/compile.ts";
import { GLOBAL_WORDS, MARK_PREFIX } from "../../sandbox/language/words.ts";
import { createNodeHost } from "../../server/runs/node-host.worker.ts";
import { demoSong } from "../../server/db/seed/world/songs/demo-songs.ts";
import { DEMO_SQUARE } from "../../server/db/seed/world/square.ts";
import { buildSquareOf } from "./checks.ts";
import { type Figure, timeInTurns } from "./measure.ts";
import { HEAVY } from "./runs.ts";

const ROUNDS = 9;
const SHOWPIECE = readFileSync(path.resolve(import.meta.dirname, "../samples/showpiece.ts"), "utf8");
/** Every light for itself, once. */
const WAVE = "square.all.inTurn(0.01, (light) => light.pulse(2));\nsquare.all.fadeTo(20, 4);\n";
const SIZES = [50, 500, 5000] as const;
const song = demoSong("quillhaven-bells").beatMap;

/**
 * What knowing the line of every cue costs: the marked script against the same script, engine and library
 * without marks, so that nothing is noted at a call and every cue has the same empty chain. And how a
 * whole run grows with the square.
 */
export async function benchMarks(): Promise<Figure[]> {
  const host = await createNodeHost();
  const figures = [
    await measureMarks(host, "a three-minute show", SHOWPIECE),
    await measureMarks(host, "a heavy show", HEAVY),
  ];
  const engine = createEngine(host);
  const runs = SIZES.map((size) => {
    const layout = buildSquareOf(size);
    return { source: WAVE, songId: "bench", song, layout, seed: 1 };
  });
  const [small, middle, large] = runs;
  if (small === undefined || middle === undefined || large === undefined) throw new Error("Three squares are needed.");
  const times = await timeInTurns(ROUNDS, {
    small: () => engine.run(small),
    middle: () => engine.run(middle),
    large: () => engine.run(large),
  });
  const perLight = times.small / SIZES[0];
  return [...figures, growth(SIZES[1], times.middle, perLight), growth(SIZES[2], times.large, perLight)];
}

/** A run on so many lights; the ratio is the time for one light against one light of the smallest square. */
function growth(size: number, value: number, perLight: number): Figure {
  return {
    name: `run of a wave over ${size} lights`,
    value,
    unit: "ms",
    against: `one light of ${SIZES[0]}, for each light`,
    ratio: value / size / perLight,
  };
}

async function measureMarks(
  host: EngineHost,
  name: string,
  source: string,
  layout: Layout = DEMO_SQUARE,
): Promise<Figure> {
  const compiled = compileScript(source, listNames(layout, song));
  if (!compiled.ok) throw new Error(`The bench script does not compile: ${compiled.problem.sentence}`);
  const { marked, text } = compiled;
  const luck: GuestLuck = { seed: 1, streamOf: marked.streamOf, streams: marked.streams };
  const words = GLOBAL_WORDS.join(",");
  const bare = `(function(${MARK_PREFIX}w,${MARK_PREFIX}){"use strict";const {${words}}=${MARK_PREFIX}w;(()=>{\n${tsBlankSpace(text)}\n})()})`;
  const tables = buildTables(layout, song);
  // Opened before the clock starts: opening takes longer than most scripts and would hide what marks cost.
  const opened: GuestRuntime[] = [];
  while (opened.length < 2 * (ROUNDS + 1)) opened.push(new GuestRuntime(await host.newModule(), tables));
  const run = (code: string): void => {
    const result = opened.pop()?.run({ code, luck });
    if (result?.end !== "ended" || result.report?.failure !== null)
      throw new Error(`The bench script stopped: ${result?.details}`);
  };
  const times = await timeInTurns(ROUNDS, { marked: () => run(marked.code), bare: () => run(bare) });
  return {
    name: `run of ${name}, lines noted`,
    value: times.marked,
    unit: "ms",
    against: "the same without marks",
    ratio: times.marked / times.bare,
  };
}
