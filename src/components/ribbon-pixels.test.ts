// @vitest-environment node
import { describe, expect, it } from "vitest";
import { meanCell, threadsFor, weaveRibbon } from "./ribbon-pixels.ts";

/** A ribbon from text: one letter a cell, `.` dark, `r` red, `b` blue at full strength. */
function buildRibbon(...rows: string[]) {
  const columns = rows[0]?.length ?? 0;
  const cells = new Uint8Array(rows.length * columns * 4);
  rows.forEach((letters, row) =>
    [...letters].forEach((letter, column) => {
      if (letter !== ".") cells.set(letter === "r" ? [255, 0, 0, 255] : [0, 0, 255, 255], (row * columns + column) * 4);
    }),
  );
  return { rows: rows.length, columns, cells };
}

const countRed = (pixels: Uint8ClampedArray) => {
  let count = 0;
  for (let at = 0; at < pixels.length; at += 4) if ((pixels[at] ?? 0) > 200) count += 1;
  return count;
};

describe("threadsFor", () => {
  // The sizes of the design: queue and row 4, card 10, marking 20, reading 40.
  it.each([
    [14, 4],
    [16, 4],
    [20, 4],
    [44, 10],
    [58, 10],
    [62, 20],
    [120, 40],
  ])("gives %i px %i threads", (height, threads) => {
    expect(threadsFor(height)).toBe(threads);
  });
});

describe("meanCell", () => {
  it("weighs colours by their strength: a dark cell thins the light and does not tint it", () => {
    expect(meanCell(buildRibbon("r."), { row: 0, column: 0 }, { row: 1, column: 2 })).toEqual([255, 0, 0, 0.5]);
  });

  it("mixes lit cells", () => {
    expect(meanCell(buildRibbon("r", "b"), { row: 0, column: 0 }, { row: 2, column: 1 })).toEqual([127.5, 0, 127.5, 1]);
  });

  it("gives nothing where all is dark", () => {
    expect(meanCell(buildRibbon("..", ".."), { row: 0, column: 0 }, { row: 2, column: 2 })).toEqual([0, 0, 0, 0]);
  });

  it("takes one cell where a stitch is smaller than a cell", () => {
    expect(meanCell(buildRibbon("rb"), { row: 0, column: 0.75 }, { row: 0.5, column: 0.9 })).toEqual([255, 0, 0, 1]);
  });
});

describe("weaveRibbon", () => {
  const look = { width: 200, height: 58, ratio: 1, theme: "light" } as const;

  it("fills every pixel, at any size and ratio", () => {
    for (const [width, height, ratio] of [
      [200, 58, 1],
      [333, 29, 2],
      [7, 3, 1],
      [412, 174, 3],
    ] as const) {
      const pixels = weaveRibbon(null, { width, height, ratio, theme: "dark" });
      expect(pixels).toHaveLength(width * height * 4);
      for (let at = 3; at < pixels.length; at += 4) expect(pixels[at]).toBe(255);
    }
  });

  it("is bare weave for no ribbon and for a dark one alike", () => {
    expect(weaveRibbon(buildRibbon("....", "...."), look)).toEqual(weaveRibbon(null, look));
  });

  it("keeps light where it is: the lit half of the song is the lit half of the cloth", () => {
    const pixels = weaveRibbon(buildRibbon("rr..", "rr.."), look);
    const half = (from: number) => {
      const side = new Uint8ClampedArray(100 * 58 * 4);
      for (let y = 0; y < 58; y++)
        side.set(pixels.subarray((y * 200 + from) * 4, (y * 200 + from + 100) * 4), y * 100 * 4);
      return countRed(side);
    };
    expect(half(0)).toBeGreaterThan(3000);
    expect(half(100)).toBe(0);
  });

  it("lays the dark theme's bare threads one step lighter", () => {
    const [light] = weaveRibbon(null, look);
    const [dark] = weaveRibbon(null, { ...look, theme: "dark" });
    expect(dark).toBeGreaterThan(light ?? 255);
  });
});
