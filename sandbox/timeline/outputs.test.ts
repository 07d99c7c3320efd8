import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { buildFront, buildShow, buildSong, colour, fadeTo, off, on, pulse } from "../../tests/factories/small-show.ts";
import { createCursor } from "./cursor.ts";
import { createOutputSampler, listSwitchings } from "./outputs.ts";
import { listOnSpans } from "./switching.ts";
import { buildTracks } from "./tracks.ts";

const layout = buildFront("relay", "solid-state", "dimmer", { kind: "colour" }, 2);
const song = buildSong();

describe("createOutputSampler", () => {
  const cues = [on(0, [0, 1, 2, 3], 50), colour(0, [3, 4], 0xff_80_00), on(1, 2, 25), on(1, [0, 4], 100)];
  const outputs = createOutputSampler(buildShow(layout, cues), layout, song);

  it("has one channel a plain outlet and three a colour light or pixel", () => {
    expect(outputs.channels.map(({ lightId, use }) => `${lightId} ${use}`)).toEqual([
      "front-a/roof switch",
      "front-a/windows switch",
      "front-a/door level",
      ...["red", "green", "blue"].map((use) => `front-a/sign ${use}`),
      ...["1", "2"].flatMap((pixel) => ["red", "green", "blue"].map((use) => `front-a/awning/${pixel} ${use}`)),
    ]);
  });
  it("sends switches fully, levels as the light that looks so bright (CIE L* 50: Y 0.18419, 25: 0.04415)", () => {
    expect([...outputs.read(0).slice(0, 3)]).toEqual([255, 255, 47]);
    // Beat 1 at 120 a minute is half a second, 20 frames of 40 a second.
    expect(outputs.read(20)[2]).toBe(11);
  });
  it("sends colours as linear light (sRGB 128 is 0.2159, culori 4.0.2)", () => {
    expect([...outputs.read(20).slice(6, 9)]).toEqual([255, 55, 0]);
  });
  it("ends with a dark frame at the song's end", () => {
    expect(outputs.frameCount).toBe(16 * 40 + 1);
    expect([...outputs.read(outputs.frameCount - 2)].some((value) => value > 0)).toBe(true);
    expect([...outputs.read(outputs.frameCount - 1)].every((value) => value === 0)).toBe(true);
  });
  it("follows the song's own beats", () => {
    const late = buildSong({ beats: [1_000_000, 2_000_000, 4_000_000] });
    const sampler = createOutputSampler(buildShow(layout, [on(1, 0)], { endTick: 1920 }), layout, late, 10);
    expect([0, 19, 20, 39, 40].map((frame) => sampler.read(frame)[0])).toEqual([0, 0, 255, 255, 0]);
  });
  it("refuses a rate that is none", () => {
    expect(() => createOutputSampler(buildShow(layout, []), layout, song, 0)).toThrow("0 frames a second");
  });
});

describe("listSwitchings", () => {
  it("gives each time on with how long it is on, and off after it", () => {
    const timeline = buildShow(layout, [on(0, 0), off(2, 0), pulse(3, 0, 1), fadeTo(8, 1, 100, 4), off(16, 1)]);
    expect(
      listSwitchings(timeline, layout, song).map(({ lightId, onAt, onFor, offFor }) => [lightId, onAt, onFor, offFor]),
    ).toEqual([
      ["front-a/roof", 0, 1, 0.5],
      ["front-a/roof", 1.5, 0.5, null],
      ["front-a/windows", 5, 3, null],
    ]);
  });
});

describe("listOnSpans", () => {
  it("is on exactly when sampling says so", () => {
    const beat = fc.integer({ min: 0, max: 255 }).map((eighth) => eighth / 8);
    const length = fc.constantFrom(0, 0.125, 1, 7, 60);
    const level = fc.integer({ min: 0, max: 100 });
    const someCue = fc.oneof(
      fc.tuple(beat, level).map(([at, to]) => on(at, 0, to)),
      beat.map((at) => off(at, 0)),
      fc.tuple(beat, level, length).map(([at, to, beats]) => fadeTo(at, 0, to, beats)),
      fc.tuple(beat, length).map(([at, beats]) => pulse(at, 0, beats)),
    );
    fc.assert(
      fc.property(
        fc.array(someCue, { maxLength: 25 }),
        fc.array(fc.integer({ min: 0, max: 31_000 }), { minLength: 30, maxLength: 30 }),
        (cues, ticks) => {
          const timeline = buildShow(layout, cues);
          const spans = listOnSpans(buildTracks(timeline), 0);
          const cursor = createCursor(timeline, layout);
          for (const tick of ticks) {
            const near = spans.some(({ start, end }) => Math.abs(start - tick) < 1e-6 || Math.abs(end - tick) < 1e-6);
            // At the very crossing of a fade the last digit decides; everywhere else there is one answer.
            if (!near)
              expect(spans.some(({ start, end }) => start <= tick && tick < end)).toBe(
                cursor.seek(tick).level[0] === 100,
              );
          }
          for (let index = 1; index < spans.length; index++)
            expect(spans[index]?.start).toBeGreaterThan(spans[index - 1]?.end ?? 0);
        },
      ),
      { numRuns: 200 },
    );
  });
});
