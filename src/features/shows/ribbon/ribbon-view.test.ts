import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { followTickInView, keepInside, wholeSong, zoomView } from "./ribbon-view.ts";

/** 40 bars of four. */
const song = { beats: Array.from({ length: 161 }, (_, beat) => beat * 500_000), beatsPerBar: 4 };
const whole = wholeSong(song);
const beat = (count: number) => count * 960;

describe("zoomView", () => {
  it("halves around the moment, which keeps its place", () => {
    expect(zoomView(whole, song, { way: "in", around: beat(40) })).toEqual({ start: beat(20), end: beat(100) });
    expect(zoomView(whole, song, { way: "in", around: 0 })).toEqual({ start: 0, end: beat(80) });
  });

  it("never shows less than two bars or more than the song, whatever is asked in turn", () => {
    const ways = fc.array(
      fc.record({ way: fc.constantFrom<"in" | "out">("in", "out"), around: fc.integer({ min: -5000, max: 200_000 }) }),
    );
    fc.assert(
      fc.property(ways, (steps) => {
        let view = whole;
        for (const step of steps) {
          view = zoomView(view, song, step);
          expect(view.start).toBeGreaterThanOrEqual(0);
          expect(view.end).toBeLessThanOrEqual(whole.end);
          expect(view.end - view.start).toBeGreaterThanOrEqual(beat(8) - 1);
        }
      }),
    );
  });
});

describe("followTickInView", () => {
  it("stays while the moment is in sight, turns the page when it is not, and stops at the end", () => {
    const view = { start: beat(20), end: beat(40) };
    expect(followTickInView(view, song, beat(39))).toBe(view);
    expect(followTickInView(view, song, beat(40))).toEqual({ start: beat(39), end: beat(59) });
    expect(followTickInView(view, song, beat(5))).toEqual({ start: beat(4), end: beat(24) });
    const last = keepInside({ start: beat(150), end: beat(170) }, song);
    expect(last).toEqual({ start: beat(140), end: whole.end });
    expect(followTickInView(last, song, whole.end)).toBe(last);
  });
});
