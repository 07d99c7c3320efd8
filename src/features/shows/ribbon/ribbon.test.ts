import { describe, expect, it } from "vitest";
import type { BeatMap } from "../../../../shared/contracts/songs.ts";
import { findBarStep, fitFlag, toTick, toX } from "./ribbon-scale.ts";
import { findSongPlace, nearestBarLine, presentClock } from "./song-place.ts";
import { listRowSpans, weaveCloth, type ClothLook } from "./weave-cloth.ts";

/** A pick-up of one beat, three bars of three, half a second a beat. */
const song: BeatMap = {
  version: 1,
  beats: Array.from({ length: 11 }, (_, beat) => beat * 500_000),
  beatsPerBar: 3,
  bars: [
    { number: 0, start: 0, beats: 1 },
    { number: 1, start: 1, beats: 3 },
    { number: 2, start: 4, beats: 3 },
    { number: 3, start: 7, beats: 3 },
  ],
  sections: [
    { name: "verse", start: 1, end: 4 },
    { name: "chorus", start: 7, end: 10 },
  ],
  instruments: [],
  loudness: [],
};

describe("findSongPlace", () => {
  it("counts the pick-up as bar 0 and beats from 1", () => {
    expect(findSongPlace(song, 0)).toEqual({ bar: 0, beat: 1, beats: 1, section: -1 });
    expect(findSongPlace(song, 960)).toEqual({ bar: 1, beat: 1, beats: 3, section: 0 });
    expect(findSongPlace(song, 5.5 * 960)).toEqual({ bar: 2, beat: 2, beats: 3, section: -1 });
  });

  it("stays on the last beat at the song's end", () => {
    expect(findSongPlace(song, 10 * 960)).toEqual({ bar: 3, beat: 3, beats: 3, section: 1 });
    expect(findSongPlace(song, 1e9)).toMatchObject({ bar: 3, beat: 3 });
  });
});

describe("nearestBarLine", () => {
  it("takes bar starts and the song's end", () => {
    expect(nearestBarLine(song, 4.4 * 960)).toBe(4 * 960);
    expect(nearestBarLine(song, 9.9 * 960)).toBe(10 * 960);
  });
});

describe("presentClock", () => {
  it("pads seconds", () => {
    expect([presentClock(0), presentClock(65.9), presentClock(600)]).toEqual(["0:00", "1:05", "10:00"]);
  });
});

describe("ribbon scale", () => {
  const scale = { width: 728, tail: 14, startTick: 0, endTick: 7000 };

  it("leads from ticks to pixels and back, ends inside the cut", () => {
    expect([toX(scale, 0), toX(scale, 7000), toX(scale, 9000)]).toEqual([14, 714, 714]);
    for (const tick of [0, 1234, 7000]) expect(toTick(scale, toX(scale, tick))).toBe(tick);
    expect([toTick(scale, -50), toTick(scale, 2000)]).toEqual([0, 7000]);
  });

  it("shows a stretch from end to end, what lies outside at its ends", () => {
    const part = { ...scale, startTick: 3500 };
    expect([toX(part, 3500), toX(part, 5250), toX(part, 0)]).toEqual([14, 364, 14]);
    expect([toTick(part, 14), toTick(part, 364), toTick(part, -9)]).toEqual([3500, 5250, 3500]);
  });

  it("numbers bars further apart where there is no room, and ends before there is any width", () => {
    expect(findBarStep(scale, 36, 46)).toBe(4);
    expect(findBarStep({ ...scale, width: 0 }, 36, 46)).toBeGreaterThanOrEqual(36);
  });

  it("drops a name that does not fit its flag", () => {
    expect([fitFlag("chorus", 120), fitFlag("chorus", 60), fitFlag("chorus", 30)]).toEqual(["full", "tight", "none"]);
  });
});

describe("weaveCloth", () => {
  const look: ClothLook = { width: 40, height: 17, tail: 4, gap: 1, bands: [3, 1], ratio: 1, theme: "light" };
  const cells = { rows: 4, columns: 2, cells: new Uint8Array(4 * 2 * 4) };
  cells.cells.set([255, 160, 40, 255], (1 * 2 + 1) * 4);
  const pixelAt = (pixels: Uint8ClampedArray, x: number, y: number) => [
    ...pixels.subarray((y * look.width + x) * 4, (y * look.width + x) * 4 + 4),
  ];

  it("gives every row a span, a gap between bands", () => {
    expect(listRowSpans(look)).toEqual([
      { top: 0, bottom: 4 },
      { top: 4, bottom: 8 },
      { top: 8, bottom: 12 },
      { top: 13, bottom: 17 },
    ]);
    expect(pixelAt(weaveCloth(cells, look), 20, 12)[3]).toBe(0);
  });

  it("lights the cell's own row and time only", () => {
    const woven = weaveCloth(cells, look);
    const bare = weaveCloth(null, look);
    expect(pixelAt(woven, 30, 5)).not.toEqual(pixelAt(bare, 30, 5));
    expect(pixelAt(woven, 30, 5)[0]).toBeGreaterThan(200);
    for (const [x, y] of [
      [10, 5],
      [30, 1],
      [30, 9],
      [38, 5],
    ] as const)
      expect(pixelAt(woven, x, y)).toEqual(pixelAt(bare, x, y));
  });
});
