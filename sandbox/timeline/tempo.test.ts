import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { createTempo } from "./tempo.ts";

describe("createTempo", () => {
  it("lays 120 beats a minute half a second apart (500 000 us a quarter, SMF RP-001)", () => {
    const tempo = createTempo({ beats: [0, 500_000, 1_000_000] });
    expect(tempo.toSeconds(960)).toBe(0.5);
    expect(tempo.toSeconds(480)).toBe(0.25);
    expect(tempo.toTick(0.75)).toBe(1440);
    expect(tempo.endTick).toBe(1920);
    expect(tempo.endSeconds).toBe(1);
  });
  it("follows a change of tempo beat by beat", () => {
    const tempo = createTempo({ beats: [100_000, 600_000, 1_200_000] });
    expect(tempo.toSeconds(0)).toBe(0.1);
    expect(tempo.toSeconds(960 + 480)).toBeCloseTo(0.9, 12);
    expect(tempo.toTick(0.9)).toBeCloseTo(1440, 9);
  });
  it("goes on at the nearest tempo before the first beat and after the last", () => {
    const tempo = createTempo({ beats: [100_000, 600_000, 1_200_000] });
    expect(tempo.toTick(0)).toBeCloseTo(-192, 9);
    expect(tempo.toSeconds(-192)).toBeCloseTo(0, 12);
    expect(tempo.toSeconds(2 * 960 + 960)).toBeCloseTo(1.8, 12);
  });
  it("gives back the tick it was given, for any beat map", () => {
    const beats = fc.array(fc.integer({ min: 1, max: 2_000_000 }), { minLength: 2, maxLength: 40 }).map((steps) => {
      let time = 0;
      return steps.map((step) => (time += step));
    });
    fc.assert(
      fc.property(beats, fc.double({ min: -2, max: 42, noNaN: true }), (times, place) => {
        const tempo = createTempo({ beats: times });
        expect(tempo.toTick(tempo.toSeconds(place * 960))).toBeCloseTo(place * 960, 3);
      }),
    );
  });
});
