import { mkdtempSync, readFileSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { build } from "vite";
import { beforeAll, describe, expect, it } from "vitest";
import { listLights, type Light } from "../../sandbox/square/lights.ts";
import { createCursor } from "../../sandbox/timeline/cursor.ts";
import { createTempo } from "../../sandbox/timeline/tempo.ts";
import { demoSong } from "../../server/db/seed/world/songs/demo-songs.ts";
import { DEMO_SQUARE } from "../../server/db/seed/world/square.ts";
import { serveFolder } from "../engine-hosts/serve-folder.ts";
import type { Measured } from "../flash/page/main.ts";
import { buildReferencePicture } from "../support/reference-picture.ts";
import { runWell } from "../support/run-script.ts";
import { launchBrowser } from "./support/browser.ts";

/**
 * The stage shows what the flash rule measures: on 30 frames of a show the light that its canvas has in
 * each light's area follows the reference picture. Both are counted from dark (0) to all lights fully on
 * in white (1), in relative luminance; the bloom is off.
 *
 * They can not be equal: the reference picture fills panes and lamps evenly, the stage paints them as
 * paper, glass and halos, and mixes them as screens do. What matters for flashes is that a change that
 * counts there (0.1, WCAG 2.2) is a change the same way here.
 */
const FRAMES = 30;
const SIDE = "north";
/** A string of a house: halos reach past lamps, and half a level is a little more light on a screen. */
const OUTLET_TOLERANCE = 0.18;
/** Pixels of strips, and the tree: their halos lie on top of each other, so a dim one looks brighter. */
const CROWDED_TOLERANCE = 0.4;
/** How much less than the reference picture the stage may show: it errs on the side of more light. */
const DARKER_TOLERANCE = 0.05;
const FLASH_STEP = 0.1;

/** Builds the page, draws the frames in Chromium and gives what was measured. */
async function measure(frames: readonly (readonly number[])[]): Promise<Measured[]> {
  const folder = mkdtempSync(path.join(tmpdir(), "duskbell-stage-"));
  const root = path.resolve(import.meta.dirname, "../flash/page");
  await build({ configFile: false, root, base: "./", logLevel: "error", build: { outDir: folder, emptyOutDir: true } });
  const server = await serveFolder(folder);
  const browser = await launchBrowser();
  try {
    const page = await browser.newPage();
    await page.goto(server.address);
    await page.waitForFunction(() => "measureStage" in window);
    return await page.evaluate(([layout, side, all]) => window.measureStage(layout, side, all), [
      DEMO_SQUARE,
      SIDE,
      frames,
    ] as const);
  } finally {
    await browser.close();
    server.close();
    rmSync(folder, { recursive: true, force: true });
  }
}

/** Light in the area of each light of the side, on the stage and in the reference picture: from dark 0 to full 1. */
interface Shares {
  readonly stage: readonly number[];
  readonly reference: readonly number[];
}

describe("the stage's canvas and the reference picture", () => {
  let frames: readonly Shares[];
  let lights: readonly Light[];

  beforeAll(async () => {
    const song = demoSong("quillhaven-bells").beatMap;
    const source = readFileSync(path.resolve(import.meta.dirname, "../samples/showpiece.ts"), "utf8");
    const { timeline } = await runWell(source, { songId: "quillhaven-bells", song, layout: DEMO_SQUARE });
    const [cursor, tempo] = [createCursor(timeline, DEMO_SQUARE), createTempo(song)];
    const shown = Array.from({ length: FRAMES }, (_, frame) => [
      ...cursor.seek(tempo.toTick(((frame + 0.5) / FRAMES) * tempo.endSeconds)).rgb,
    ]);
    const all = listLights(DEMO_SQUARE);
    const channels = Array.from({ length: all.length * 3 }, () => 0);
    const [dark, full, ...measured] = await measure([channels, channels.map(() => 1), ...shown]);
    if (!dark || !full) throw new Error("The dark and the full frame were not measured.");
    const toShares = (values: readonly number[], from: readonly number[], to: readonly number[]) =>
      values.map((value, at) => (value - (from[at] ?? 0)) / ((to[at] ?? 1) - (from[at] ?? 0)));
    frames = measured.map(({ stage, reference }) => ({
      stage: toShares(stage, dark.stage, full.stage),
      reference: toShares(reference, dark.reference, full.reference),
    }));
    lights = buildReferencePicture(DEMO_SQUARE, SIDE, 8).spreads.flatMap(({ lightIndex }) => all[lightIndex] ?? []);
  });

  it("agree on every light of 30 frames within the tolerance", () => {
    expect(frames).toHaveLength(FRAMES);
    const apart = frames.flatMap(({ stage, reference }, frame) =>
      lights.flatMap(({ id, pixels, side }, at) => {
        const more = (stage[at] ?? 0) - (reference[at] ?? 0);
        const most = pixels !== null || side === null ? CROWDED_TOLERANCE : OUTLET_TOLERANCE;
        return more > most || more < -DARKER_TOLERANCE ? [`frame ${frame}, ${id}: ${more.toFixed(3)}`] : [];
      }),
    );
    expect(apart).toEqual([]);
  });

  it("agree on every change that counts as half a flash: the same lights, the same way", () => {
    const changes = frames.flatMap((later, frame) =>
      frames.slice(0, frame).flatMap((earlier) =>
        lights.flatMap(({ id }, at) => {
          const measured = (later.reference[at] ?? 0) - (earlier.reference[at] ?? 0);
          if (Math.abs(measured) < FLASH_STEP) return [];
          return [{ id, shown: ((later.stage[at] ?? 0) - (earlier.stage[at] ?? 0)) * Math.sign(measured) }];
        }),
      ),
    );
    expect(changes.length).toBeGreaterThan(1000);
    expect(changes.filter(({ shown }) => shown <= 0)).toEqual([]);
    // Nearly all are as large on the stage as they are measured.
    const large = changes.filter(({ shown }) => shown >= 0.8 * FLASH_STEP);
    expect(large.length / changes.length).toBeGreaterThan(0.98);
  });
});
