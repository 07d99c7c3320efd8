import { describe, expect, it } from "vitest";
import { createCursor } from "../../sandbox/timeline/cursor.ts";
import { linesOfCue } from "../../sandbox/timeline/lines.ts";
import type { Timeline } from "../../sandbox/timeline/model.ts";
import { DEMO_SCRIPTS } from "../../server/db/seed/world/scripts/index.ts";
import { demoSong } from "../../server/db/seed/world/songs/demo-songs.ts";
import { DEMO_SQUARE } from "../../server/db/seed/world/square.ts";
import { seededDraw } from "../golden/draw.ts";
import { SMALL_LAYOUT, SMALL_SONG, runWell } from "../support/run-script.ts";
import { createWitness, type Candidate } from "./naive-light.ts";
import { runByStack } from "./run-by-stack.ts";

const SLOW_MS = 240_000;
/** Moments of each show. */
const MOMENTS = 200;
/** Two ways to work out the same light differ by less; a show on equal terms differs by nothing. */
const TOLERANCE = 1e-9;

/** The chain of lines of every cue, as text. */
const listChains = (timeline: Timeline): string[] =>
  Array.from(timeline.cues.chain, (chain) => (timeline.chains[chain] ?? []).join(">"));

async function chainsOf(source: string): Promise<string[]> {
  const input = { source, songId: "small", song: SMALL_SONG, layout: SMALL_LAYOUT, seed: 7 };
  const { timeline } = await runWell(source, input);
  expect(listChains(timeline)).toEqual(listChains(runByStack(input)));
  return listChains(timeline);
}

describe("the lines of a cue", () => {
  it("go through functions, and back to the caller's own line", async () => {
    const source =
      "function glow() {\n  square.all.on();\n}\nfunction both() {\n  glow();\n  square.all.off();\n}\nboth();\nglow();";
    expect(await chainsOf(source)).toEqual(["8>5>2", "8>6", "9>2"]);
  });

  it("go through loops of every kind", async () => {
    const source =
      "for (const front of square.fronts.first(1))\n  front.on();\nfor (let i = 0; i < 1; i++) {\n  square.all.on(i);\n}\nlet left = 1;\nwhile (left > 0) {\n  left = left - 1;\n  square.all.off();\n}";
    expect(await chainsOf(source)).toEqual(["2", "4", "9"]);
  });

  it("go through the callbacks of every word that takes one", async () => {
    const source =
      "at(1, () => {\n  square.all.on();\n});\nrepeat(1, () => {\n  square.all.on();\n});\ntogether(() => {\n  square.all.on();\n});\nsquare.all.first(1).inTurn(1, (light) => {\n  light.on();\n});\nsquare.all.first(1).forEach((light) => {\n  light.on();\n});\n[1].map(() =>\n  square.all.on());\nconst none = square.all.filter((light) => {\n  light.off();\n  return false;\n});\nnone.on();";
    expect([...new Set(await chainsOf(source))].sort()).toEqual(
      ["1>2", "4>5", "7>8", "10>11", "13>14", "16>17", "18>19"].sort(),
    );
  });

  it("go down and up a function that calls itself, each line of a run once", async () => {
    const source =
      "function fall(n: number) {\n  if (n > 0) {\n    fall(n - 1);\n  }\n  square.all.on(n);\n}\nfall(3);";
    expect(await chainsOf(source)).toEqual(["7>3>5", "7>3>5", "7>3>5", "7>5"]);
  });

  it("name arguments, methods and chains of calls by the line they are on", async () => {
    const source =
      "function lit() {\n  return square.all.on();\n}\nlit()\n  .off()\n  .pulse(1);\nsquare.all.on(\n  lit().length,\n);\nclass Show {\n  constructor() {\n    this.start();\n  }\n  start() {\n    square.all.on(5);\n  }\n}\nconst show = new Show();\nshow.start();";
    expect(await chainsOf(source)).toEqual(["4>2", "5", "6", "8>2", "7", "18>12>15", "19>15"]);
  });
});

/** Whether a cue names the lines of the one that lights the light, or of another just as bright. */
function isNamed(lines: string, witness: Timeline, [best, ...others]: readonly Candidate[]): boolean {
  if (best === undefined) return lines === "";
  const equals = others.filter(({ strength }) => strength >= best.strength - TOLERANCE);
  return [best, ...equals].some(({ cue }) => linesOfCue(witness, cue).join(">") === lines);
}

const SHOWS = DEMO_SCRIPTS.filter(({ expected }) => expected.runs);

describe("every demo show", () => {
  it.each(SHOWS)(
    "$id names the right lines for what is lit",
    { timeout: SLOW_MS },
    async ({ source, songId, seed }) => {
      const input = { source, songId, song: demoSong(songId).beatMap, layout: DEMO_SQUARE, seed };
      const { timeline } = await runWell(source, input);
      const witness = runByStack(input);
      expect(listChains(timeline)).toEqual(listChains(witness));

      const draw = seededDraw(seed);
      const cursor = createCursor(timeline, DEMO_SQUARE);
      const ask = createWitness(witness, DEMO_SQUARE);
      const wrong: string[] = [];
      for (let moment = 0; moment < MOMENTS; moment++) {
        const tick = draw(timeline.endTick);
        cursor.seek(tick).cue.forEach((cue, light) => {
          const lines = linesOfCue(timeline, cue).join(">");
          if (!isNamed(lines, witness, ask(light, tick))) wrong.push(`light ${light} at ${tick}: ${lines}`);
        });
      }
      expect(wrong.slice(0, 5)).toEqual([]);
    },
  );
});
