import { fileURLToPath } from "node:url";
import path from "node:path";
import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import type { Page } from "playwright-core";
import { build } from "vite";
import { listNames } from "../../sandbox/engine/tables.ts";
import type { NameTable } from "../../sandbox/language/names.ts";
import { demoSong } from "../../server/db/seed/world/songs/demo-songs.ts";
import { DEMO_SQUARE } from "../../server/db/seed/world/square.ts";
import { serveFolder } from "../engine-hosts/serve-folder.ts";
import { launchBrowser } from "../journeys/support/browser.ts";
import type { LanguagePage } from "./language-page/main.ts";
import { type Figure, median, percentile } from "./measure.ts";

/** A school laptop is about four times as slow as this machine (common practice, no source). Throttling does not reach workers: their time is multiplied. */
const SLOWNESS = 4;
const EDITS = 140;
/** Edits until the worker's code runs at its full speed: the first seconds of typing. Told apart. */
const WARM_UP = 20;
const BLOCKS = 20;

/** Two hundred lines as pupils write them: helpers, loops, song data, colours. */
function longScript(): string {
  const block = (n: number) => `// part ${n}
function wave${n}(lights: Lights, level: number) {
  for (const front of lights) {
    front.fadeTo(level, 2);
    wait(0.5);
  }
}
const side${n} = square.side("${["north", "east", "south", "west"][n % 4]}");
at(song.bar(${n + 1}), () => {
  wave${n}(side${n}, ${40 + n});
});`;
  return Array.from({ length: BLOCKS }, (_, n) => block(n)).join("\n");
}

/** An edit as it is typed: a level, somewhere in the script, becomes another number. */
function edit(text: string, turn: number): string {
  let count = -1;
  return text.replaceAll(/fadeTo\(level, \d+\)/g, (call) => {
    count += 1;
    return count === turn % BLOCKS ? `fadeTo(level, ${2 + (turn % 7)})` : call;
  });
}

/** How long the type checker takes in a worker of Chromium: for its first notes, and after each edit. */
export async function benchLanguage(): Promise<Figure[]> {
  const folder = mkdtempSync(path.join(tmpdir(), "duskbell-language-"));
  const root = fileURLToPath(new URL("./language-page/", import.meta.url));
  await build({
    configFile: false,
    root,
    base: "./",
    logLevel: "error",
    worker: { format: "es" },
    build: { outDir: folder, emptyOutDir: true, assetsInlineLimit: 0, chunkSizeWarningLimit: 20_000 },
  });
  const server = await serveFolder(folder);
  const browser = await launchBrowser();
  try {
    const page = await browser.newPage();
    const names = listNames(DEMO_SQUARE, demoSong("quillhaven-bells").beatMap);
    await page.goto(server.address);
    // Once to fill the browser's cache, once from it.
    await timeNotes(page, names, [longScript()]);
    await page.goto("about:blank");
    await page.goto(server.address);
    const text = longScript();
    const texts = Array.from({ length: EDITS }, (_, turn) => edit(text, turn + 1));
    const [first = 0, ...edits] = await timeNotes(page, names, [text, ...texts]);
    const [early, warm] = [edits.slice(0, WARM_UP), edits.slice(WARM_UP)];
    const slow = percentile(warm, 0.95) * SLOWNESS;
    return [
      figure("first type notes of 200 lines, from a warm cache", first, 1500, "the aim of 1500 ms"),
      figure(`type notes after an edit, in the worker, median of the first ${WARM_UP}`, median(early), null, null),
      figure("type notes after an edit, in the worker, median", median(warm), null, null),
      figure("type notes after an edit, in the worker, p95", percentile(warm, 0.95), null, null),
      figure("type notes after an edit, p95, four times as slow", slow, 150, "the aim of 150 ms"),
    ];
  } finally {
    await browser.close();
    server.close();
    rmSync(folder, { recursive: true, force: true });
  }
}

function timeNotes(page: Page, names: NameTable, texts: readonly string[]): Promise<number[]> {
  return page.evaluate(
    ([given, all]) => (window as unknown as { languagePage: LanguagePage }).languagePage.timeNotes(given, all),
    [names, texts] as const,
  );
}

function figure(name: string, value: number, limit: number | null, against: string | null): Figure {
  return { name, value, unit: "ms", against, ratio: limit === null ? null : value / limit };
}
