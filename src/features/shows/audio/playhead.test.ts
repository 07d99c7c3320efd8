import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { Playhead } from "./playhead.ts";

const base = { clock: 10, song: 4, rate: 1, end: 60, loop: null };

describe("Playhead", () => {
  it("stands before its start and at the song's end", () => {
    const playhead = new Playhead(base);
    expect(playhead.songAt(9)).toBe(4);
    expect(playhead.songAt(12.5)).toBe(6.5);
    expect(playhead.songAt(500)).toBe(60);
    expect([playhead.isOverAt(65.9), playhead.isOverAt(66)]).toEqual([false, true]);
  });

  it("runs at its rate", () => {
    expect(new Playhead({ ...base, rate: 0.5 }).songAt(20)).toBe(9);
  });

  it("goes round its loop without end", () => {
    const playhead = new Playhead({ ...base, loop: { start: 2, end: 6 } });
    expect([11.9, 12, 13, 16, 17].map((clock) => playhead.songAt(clock))).toEqual([expect.closeTo(5.9), 2, 3, 2, 3]);
    expect(playhead.isOverAt(10_000)).toBe(false);
  });

  it("plays on to the end when it starts behind the loop", () => {
    const playhead = new Playhead({ ...base, song: 7, loop: { start: 2, end: 6 } });
    expect(playhead.songAt(15)).toBe(12);
    expect(playhead.isOverAt(63)).toBe(true);
  });

  it("lays every second of a stretch once, in order, whatever the loop and the rate", () => {
    const seconds = fc.double({ min: 0, max: 40, noNaN: true });
    fc.assert(
      fc.property(
        seconds,
        fc.double({ min: 0.1, max: 8, noNaN: true }),
        fc.constantFrom(0.5, 0.75, 1),
        seconds,
        (start, length, rate, song) => {
          const playhead = new Playhead({ ...base, song, rate, loop: { start, end: start + length } });
          const spans = playhead.listSpans(10, 40);
          let clock = 10;
          for (const span of spans) {
            expect(span.clock).toBeCloseTo(clock, 3);
            expect(span.from).toBeCloseTo(playhead.songAt(span.clock + 1e-7), 3);
            clock = span.clock + (span.to - span.from) / rate;
          }
          if (!playhead.isOverAt(40)) expect(clock).toBeCloseTo(40, 3);
        },
      ),
    );
  });
});
