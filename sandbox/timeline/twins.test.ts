import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { buildFront, buildShow, colour, fadeTo, off, on, pulse } from "../../tests/factories/small-show.ts";
import { listLights } from "../square/lights.ts";
import { createCursor } from "./cursor.ts";
import { buildTracks } from "./tracks.ts";
import { listLeaders } from "./twins.ts";

/** 0 relay, 1 to 3 dimmers, 4 and 5 colour. */
const layout = buildFront("relay", "dimmer", "dimmer", "dimmer", { kind: "colour" }, { kind: "colour" });
const lights = listLights(layout);
const leadersOf = (cues: Parameters<typeof buildShow>[1]) => [
  ...listLeaders(lights, buildTracks(buildShow(layout, cues))),
];

const beat = fc.integer({ min: 0, max: 15 }).map((half) => half / 2);
const some = fc.subarray([0, 1, 2, 3, 4, 5], { minLength: 1 });
const length = fc.constantFrom(0, 0.5, 2, 9);
const someCue = fc.oneof(
  fc.tuple(beat, some, fc.integer({ min: 0, max: 100 })).map((a) => on(...a)),
  fc.tuple(beat, some).map((a) => off(...a)),
  fc.tuple(beat, some, fc.integer({ min: 0, max: 100 }), length).map((a) => fadeTo(...a)),
  fc.tuple(beat, some, length, fc.constantFrom(undefined, 0xff_00_00)).map((a) => pulse(...a)),
  fc.tuple(beat, some, fc.constantFrom(0x00_00_ff, 0x00_ff_00), length).map((a) => colour(...a)),
);

describe("listLeaders", () => {
  it("lets every light lead itself that is told something of its own", () => {
    expect(leadersOf([on(0, [1, 2]), on(1, 2), on(2, 4)])).toEqual([0, 1, 2, 3, 4, 5]);
  });
  it("names the first light of the same kind and the same cues", () => {
    expect(leadersOf([on(0, [0, 1, 2, 3, 4, 5]), pulse(1, [2, 3], 1)])).toEqual([0, 1, 2, 2, 4, 4]);
  });
  it("leaves colour cues out for lights without colour", () => {
    expect(leadersOf([colour(0, [1, 4], 0xff_00_00)])).toEqual([0, 1, 1, 1, 4, 5]);
  });
});

describe("a cursor that reads twins once", () => {
  it("shows what reading every light by itself shows, in whatever order it is asked", () => {
    const moment = fc.integer({ min: -50, max: 9 * 960 });
    const step = fc.record({ tick: moment, light: fc.option(fc.integer({ min: 0, max: 5 }), { nil: null }) });
    fc.assert(
      fc.property(fc.array(someCue, { maxLength: 20 }), fc.array(step, { maxLength: 25 }), (cues, steps) => {
        const timeline = buildShow(layout, cues);
        const cursor = createCursor(timeline, layout);
        const single = createCursor(timeline, layout);
        for (const { tick, light } of steps) {
          if (light === null) cursor.seek(tick);
          else cursor.seekLight(light, tick);
          for (const index of light === null ? lights.keys() : [light]) single.seekLight(index, tick);
          expect({ ...cursor.frame, tick: 0 }).toEqual({ ...single.frame, tick: 0 });
        }
      }),
      { numRuns: 200 },
    );
  });
});
