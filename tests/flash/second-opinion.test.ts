import { beforeAll, describe, expect, it } from "vitest";
import { createCheckContext } from "../../sandbox/checks/context.ts";
import { countPictureFlashes } from "../../sandbox/checks/picture-flash.ts";
import type { WrittenCue } from "../../sandbox/timeline/build.ts";
import { createCursor } from "../../sandbox/timeline/cursor.ts";
import { createTempo } from "../../sandbox/timeline/tempo.ts";
import { buildLayout, buildShow, buildSong, fadeTo, off, on } from "../factories/small-show.ts";
import { ensureFfmpeg, measureBadness } from "../support/ffmpeg.ts";
import { buildReferencePicture, type ReferencePicture } from "../support/reference-picture.ts";

/**
 * An independent filter orders shows as the picture rule does: more flashes a second, more area, more
 * contrast are worse. Only the order is compared: the filter's limit is not that of WCAG.
 *
 * The filter looks at means over a grid of 8 x 8, so a picture an eighth as wide and high says the same.
 */
const FRAMES_PER_SECOND = 30;
const SECONDS = 4;
/** The filter looks back over a second, so the first ones of a show still know the show before. */
const STEADY_FROM = 2 * FRAMES_PER_SECOND;
const SHRINK = 8;
/** A slow start of the encoder on a busy machine is no fault. */
const SLOW_MS = 120_000;

const layout = buildLayout(
  Array.from({ length: 8 }, () => ({
    side: "north" as const,
    outlets: [{ kind: "colour" as const, part: "windows" }],
  })),
);
const ALL = [0, 1, 2, 3, 4, 5, 6, 7];
const song = buildSong();
const BEATS_PER_SECOND = 2;

let ffmpeg: string;
let picture: ReferencePicture;
beforeAll(() => {
  ffmpeg = ensureFfmpeg(console.log);
  picture = buildReferencePicture(layout, "north", SHRINK);
});

/** On for half of each period, off for the other half. */
function blink(flashesPerSecond: number, lights: readonly number[] = ALL, level = 100): WrittenCue[] {
  const period = BEATS_PER_SECOND / flashesPerSecond;
  return Array.from({ length: Math.floor(30 / period) }, (_, turn) => [
    on(turn * period, lights, level),
    off((turn + 0.5) * period, lights),
  ]).flat();
}

/** What the two say of shows: the filter's highest badness, and the most flashes in a second. One video holds all. */
function judge(shows: readonly (readonly WrittenCue[])[]) {
  const { width, height } = picture;
  const frames = shows.flatMap(listFrames);
  const badness = measureBadness(ffmpeg, { width, height, framesPerSecond: FRAMES_PER_SECOND, frames });
  return shows.map((cues, show) => {
    const start = show * SECONDS * FRAMES_PER_SECOND;
    const [general] = countPictureFlashes(createCheckContext({ timeline: buildShow(layout, cues), layout, song }));
    return {
      badness: Math.max(...badness.slice(start + STEADY_FROM, start + SECONDS * FRAMES_PER_SECOND)),
      flashes: general?.worst ?? 0,
    };
  });
}

function listFrames(cues: readonly WrittenCue[]): Uint8Array[] {
  const [cursor, tempo] = [createCursor(buildShow(layout, cues), layout), createTempo(song)];
  return Array.from({ length: SECONDS * FRAMES_PER_SECOND }, (_, frame) =>
    picture.paint(cursor.seek(tempo.toTick(frame / FRAMES_PER_SECOND)).rgb),
  );
}

/** The filter finds each show worse than the one before; the rule never finds it better, and passes the first and stops the last. */
function expectSameOrder(shows: readonly (readonly WrittenCue[])[]): void {
  const judged = judge(shows);
  const rising = (values: readonly number[]) => values.toSorted((a, b) => a - b);
  const badness = judged.map((show) => show.badness);
  const flashes = judged.map((show) => show.flashes);
  expect(badness).toEqual(rising(badness));
  expect(new Set(badness).size).toBe(shows.length);
  expect(flashes).toEqual(rising(flashes));
  expect([(flashes[0] ?? 0) > 3, (flashes.at(-1) ?? 0) > 3]).toEqual([false, true]);
}

describe("ffmpeg's photosensitivity filter as a second opinion", () => {
  it("orders flashes a second as the picture rule does", { timeout: SLOW_MS }, () => {
    expectSameOrder([1, 2, 3, 5].map((rate) => blink(rate)));
  });
  it("orders the area that flashes as the picture rule does", { timeout: SLOW_MS }, () => {
    expectSameOrder([1, 2, 4, 8].map((fronts) => blink(5, ALL.slice(0, fronts))));
  });
  it("orders contrast as the picture rule does", { timeout: SLOW_MS }, () => {
    // Levels 20, 35, 60 and 100 are luminances of 0.03, 0.08, 0.28 and 1.
    expectSameOrder([20, 35, 60, 100].map((level) => blink(5, ALL, level)));
  });
  it("finds slow breathing better than any flashing", { timeout: SLOW_MS }, () => {
    const breathing = [0, 4, 8, 12].flatMap((beat) => [fadeTo(beat, ALL, 100, 2), fadeTo(beat + 2, ALL, 0, 2)]);
    const [slow, quick] = judge([breathing, blink(2)]);
    expect(slow?.flashes).toBeLessThanOrEqual(3);
    expect(slow?.badness).toBeLessThan(quick?.badness ?? 0);
  });
});
