import { fileURLToPath } from "node:url";
import type { Browser, Page } from "playwright-core";
import { rolldown } from "rolldown";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { readMidi } from "../../sandbox/music/read-midi.ts";
import { buildBeatMap } from "../../sandbox/music/beat-map.ts";
import { buildScore } from "../../sandbox/music/score.ts";
import { createTempo } from "../../sandbox/timeline/tempo.ts";
import { DEMO_SONGS } from "../../server/db/seed/world/songs/demo-songs.ts";
import type { Score } from "../../shared/contracts/songs.ts";
import { TICKS_PER_BEAT } from "../../shared/units.ts";
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

/** Seconds from each moment to where the sound rises near it; a moment at which nothing rises counts as half a second off. */
function findOnsetErrors(score: Score, moments: readonly number[]): Promise<number[]> {
  return page.evaluate(
    async ({ score: wanted, moments: at, seconds, sampleRate }) => {
      const { songSound } = window as unknown as { songSound: { renderSong: typeof renderSong } };
      const samples = await songSound.renderSong(wanted, { from: 0, to: seconds }, sampleRate);
      const loudest = (from: number, to: number) => {
        let peak = 0;
        for (let i = Math.max(0, Math.round(from * sampleRate)); i < to * sampleRate; i += 1)
          peak = Math.max(peak, Math.abs(samples[i] ?? 0));
        return peak;
      };
      return at.map((moment) => {
        const before = loudest(moment - 0.08, moment - 0.04);
        const after = loudest(moment, moment + 0.1);
        for (let time = moment - 0.04; time < moment + 0.1; time += 0.001)
          if (loudest(time, time + 0.001) > before + (after - before) * 0.2) return time - moment;
        return 0.5;
      });
    },
    { score, moments, seconds: SECONDS, sampleRate: SAMPLE_RATE },
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

  it("sounds each drum within 20 ms of the moment that scripts and lights have for it", async () => {
    const errors: number[] = [];
    for (const { file } of DEMO_SONGS) {
      const midi = readMidi(file);
      const score = buildScore(midi);
      const drums = score.tracks.filter((track) => track.isDrums);
      const map = buildBeatMap(midi);
      const tempo = createTempo(map);
      const moments = drums
        .flatMap(({ name }) => map.instruments.find((instrument) => instrument.name === name)?.hits ?? [])
        .map((beat) => tempo.toSeconds(beat * TICKS_PER_BEAT))
        .sort((a, b) => a - b);
      // A drum that rings hides where the next begins.
      const alone = moments.filter((at, i) => at > 0.3 && at < SECONDS - 0.2 && at - (moments[i - 1] ?? 0) > 0.3);
      if (alone.length > 0) errors.push(...(await findOnsetErrors({ ...score, tracks: drums }, alone)));
    }
    expect(errors.length).toBeGreaterThan(10);
    expect(Math.max(...errors.map(Math.abs))).toBeLessThan(0.02);
  });

  it("is silent where a score has no notes", async () => {
    expect((await measure({ seconds: 4, tracks: [] })).peak).toBe(0);
  });
});
