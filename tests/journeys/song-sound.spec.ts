import { fileURLToPath } from "node:url";
import type { Browser, Page } from "playwright-core";
import { rolldown } from "rolldown";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { readMidi } from "../../sandbox/music/read-midi.ts";
import { buildScore } from "../../sandbox/music/score.ts";
import { DEMO_SONGS } from "../../server/db/seed/world/songs/demo-songs.ts";
import type { Score } from "../../shared/contracts/songs.ts";
import type { renderSong } from "../../src/features/shows/audio/render-song.ts";
import { launchBrowser } from "./support/browser.ts";

const ENTRANCE = fileURLToPath(new URL("../../src/features/shows/audio/render-song.ts", import.meta.url));
const SECONDS = 6;
const SAMPLE_RATE = 22_050;

/** Loud enough for a laptop in a classroom, and never clipped (levels in decibels of full scale, chosen by measuring). */
const LEAST_SONG_DB = -30;
const LEAST_TRACK_DB = -55;
const LARGEST_SAMPLE = 1;

interface Level {
  /** Root mean square in decibels of full scale. */
  readonly db: number;
  readonly peak: number;
}

let browser: Browser;
let page: Page;

beforeAll(async () => {
  const build = await rolldown({ input: ENTRANCE, logLevel: "silent", platform: "browser" });
  const { output } = await build.generate({ format: "iife", name: "songSound" });
  await build.close();
  browser = await launchBrowser();
  page = await browser.newPage();
  await page.goto("about:blank");
  await page.addScriptTag({ content: output[0].code });
});
afterAll(() => browser.close());

/** Renders the first seconds of a score in the browser, as the player would sound them. */
function measure(score: Score): Promise<Level> {
  return page.evaluate(
    async ({ score: wanted, seconds, sampleRate }) => {
      const { songSound } = window as unknown as { songSound: { renderSong: typeof renderSong } };
      const samples = await songSound.renderSong(wanted, { from: 0, to: seconds }, sampleRate);
      let squares = 0;
      let peak = 0;
      for (const sample of samples) {
        squares += sample * sample;
        peak = Math.max(peak, Math.abs(sample));
      }
      return { db: 10 * Math.log10(squares / samples.length + 1e-12), peak };
    },
    { score, seconds: SECONDS, sampleRate: SAMPLE_RATE },
  );
}

describe("the sound of the demo songs", () => {
  it.each(DEMO_SONGS.map((song) => [song.title, song.file] as const))(
    "%s is heard, every instrument of it, and clips nowhere",
    async (_title, file) => {
      const score = buildScore(readMidi(file));
      const whole = await measure(score);
      expect(whole.db).toBeGreaterThan(LEAST_SONG_DB);
      expect(whole.peak).toBeLessThanOrEqual(LARGEST_SAMPLE);
      for (const track of score.tracks.filter(({ notes }) => notes.some((note) => note.start < SECONDS - 1))) {
        const alone = await measure({ ...score, tracks: [track] });
        expect(alone.db, track.name).toBeGreaterThan(LEAST_TRACK_DB);
      }
    },
  );

  it("is silent where a score has no notes", async () => {
    expect((await measure({ seconds: 4, tracks: [] })).peak).toBe(0);
  });
});
