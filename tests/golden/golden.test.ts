import { execFile } from "node:child_process";
import { readFileSync, writeFileSync } from "node:fs";
import path from "node:path";
import { promisify } from "node:util";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { FUEL_LIMIT } from "../../sandbox/engine/limits.ts";
import { ACT_WORDS, CHOOSE_WORDS, GLOBAL_WORDS, SONG_MEMBERS, SQUARE_MEMBERS } from "../../sandbox/language/words.ts";
import { type EnginePage, openChromiumLab, openEnginePage } from "../engine-hosts/chromium-lab.ts";
import { LONG_DEADLINE_MS } from "../engine-hosts/lab.ts";
import { parseLine, toLine } from "./golden-lines.ts";
import { listGoldenScripts } from "./golden-scripts.ts";

const FILE = new URL("./golden.txt", import.meta.url);
const CHILD = path.resolve(import.meta.dirname, "golden-child.ts");
const run = promisify(execFile);
/** A machine that does other work besides is slow; nothing here is timed. */
const SLOW_MS = 240_000;
/** How much of the fuel an honest script may take: new steps of the library have to fit in five times. */
const FUEL_MARGIN = 5;
/** Least number of timelines that are known by heart. */
const LEAST = 200;

/** Time zones east, west and on the meridian; locales with a comma in numbers and with a dotless i. */
const ZONES = [
  { timeZone: "UTC", locale: "en-US", lang: "en_US.UTF-8" },
  { timeZone: "Asia/Tokyo", locale: "de-DE", lang: "de_DE.UTF-8" },
  { timeZone: "America/New_York", locale: "tr-TR", lang: "tr_TR.UTF-8" },
] as const;

const scripts = listGoldenScripts();
const readGolden = (): string[] => readFileSync(FILE, "utf8").trimEnd().split("\n");

/** `npm run golden:update` writes the file anew, from the first zone in Node; everything else is then held to it. */
beforeAll(async () => {
  if (process.env["GOLDEN_UPDATE"] !== "1") return;
  const [, lines] = await runInNode(ZONES[0]);
  writeFileSync(FILE, `${lines.join("\n")}\n`);
}, SLOW_MS);

/** What a process in a zone prints: where it lives, then the lines. */
async function runInNode({ timeZone, lang }: (typeof ZONES)[number]): Promise<[string, string[]]> {
  const env = { PATH: process.env["PATH"], TZ: timeZone, LANG: lang, LC_ALL: lang };
  const { stdout } = await run(process.execPath, ["--import", "tsx", CHILD], { env, maxBuffer: 2 ** 24 });
  const [where = "", ...lines] = stdout.trimEnd().split("\n");
  return [where, lines];
}

describe("golden scripts", () => {
  it("are at least two hundred that run, each with a name of its own", () => {
    const lines = readGolden().map(parseLine);
    expect(lines.filter(({ end }) => end === "ran").length).toBeGreaterThanOrEqual(LEAST);
    expect(new Set(lines.map(({ name }) => name)).size).toBe(lines.length);
    expect(new Set(lines.map(({ timeline }) => timeline)).size).toBeGreaterThanOrEqual(LEAST);
  });

  it("leave the fuel a margin", () => {
    const hungry = readGolden()
      .map(parseLine)
      .filter(({ end, fuel }) => end === "ran" && fuel * FUEL_MARGIN > FUEL_LIMIT);
    expect(hungry).toEqual([]);
  });

  it("use every word of the language", () => {
    const text = scripts.map(({ input }) => input.source).join("\n");
    const words = [...GLOBAL_WORDS, ...ACT_WORDS, ...CHOOSE_WORDS, ...SQUARE_MEMBERS, ...SONG_MEMBERS];
    const members = ["lights", "inTurn", "name", "box", "length", "forEach", "filter", "map", "part", "pitch"];
    const missing = [...words, ...members, "Math.random"].filter((word) => !new RegExp(`\\b${word}\\b`).test(text));
    expect(missing).toEqual([]);
  });

  it.concurrent.each(ZONES)("come out the same in Node in $timeZone, $locale", { timeout: SLOW_MS }, async (zone) => {
    const [where, lines] = await runInNode(zone);
    expect(where).toBe(`${zone.timeZone} ${zone.locale}`);
    expect(lines).toEqual(readGolden());
  });
});

describe("golden scripts in Chromium", () => {
  let page: EnginePage;

  beforeAll(async () => {
    page = await openEnginePage();
  }, SLOW_MS);
  afterAll(() => page.close());

  it.concurrent.each(ZONES)(
    "come out the same in the workers of $timeZone, $locale",
    { timeout: SLOW_MS },
    async (zone) => {
      const lab = await openChromiumLab(page, zone);
      try {
        const { timeZone, locale } = zone;
        expect(await lab.askZone()).toEqual({ timeZone, locale });
        const lines: string[] = [];
        for (const { name, input } of scripts) lines.push(toLine(name, await lab.whole(input, LONG_DEADLINE_MS)));
        expect(lines).toEqual(readGolden());
      } finally {
        await lab.close();
      }
    },
  );
});
