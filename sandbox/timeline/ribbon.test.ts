import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { buildFront, buildLayout, buildShow, colour, on, pulse } from "../../tests/factories/small-show.ts";
import { fromBase64, toBase64 } from "./base64.ts";
import { ribbonSvg, ribbonGrid } from "./ribbon-svg.ts";
import { decodeRibbon, ribbonCells, shrinkRibbon, toRibbonPicture, type RibbonCells } from "./ribbon.ts";

/** Three fronts with one colour light each; the tree, on no side, is walked last. */
const layout = buildLayout([
  { side: null, outlets: [{ kind: "colour" }] },
  { side: "south", outlets: [{ kind: "colour" }] },
  { side: "north", outlets: [{ kind: "colour" }] },
]);
const cell = ({ columns, cells }: RibbonCells, row: number, column: number) => [
  ...cells.slice((row * columns + column) * 4, (row * columns + column + 1) * 4),
];
const strength = (level: number) => Math.round(255 * level ** 0.56);

describe("ribbonCells", () => {
  const size = { rows: 40, columns: 8 };
  it("has a row a front in walking order and time from left to right", () => {
    // Light 0 is the north front, 1 the south, 2 the tree. A column is 4 beats.
    const ribbon = ribbonCells(buildShow(layout, [on(0, 0), on(16, 1), on(4, 2), on(8, 2, 0)]), layout, size);
    const lit = [0, 1, 2].map((row) =>
      Array.from({ length: 8 }, (_, column) => ((cell(ribbon, row, column)[3] ?? 0) > 0 ? "#" : ".")).join(""),
    );
    expect(ribbon.rows).toBe(3);
    expect(lit).toEqual(["########", "....####", ".#......"]);
  });
  it("shows the mean level to the power 0.56 in the colour of the light", () => {
    const ribbon = ribbonCells(buildShow(layout, [colour(0, 0, 0xff_80_00), on(0, 0, 25), on(2, 0, 75)]), layout, size);
    expect(cell(ribbon, 0, 0)).toEqual([255, 128, 0, strength(0.5)]);
    expect(cell(ribbon, 0, 1)).toEqual([255, 128, 0, strength(0.75)]);
    expect(cell(ribbon, 1, 0)).toEqual([0, 0, 0, 0]);
  });
  it("weighs colours by level", () => {
    const one = buildLayout([{ side: "north", outlets: [{ kind: "colour" }, { kind: "colour" }] }]);
    const ribbon = ribbonCells(
      buildShow(one, [colour(0, 0, 0xff_00_00), colour(0, 1, 0x00_00_ff), on(0, 0, 75), on(0, 1, 25)]),
      one,
      size,
    );
    expect(cell(ribbon, 0, 0)).toEqual([191, 0, 64, strength(0.5)]);
  });
  it("counts a strip's pixels as one outlet together", () => {
    const strip = buildFront("dimmer", 4);
    const ribbon = ribbonCells(buildShow(strip, [on(0, [1, 2, 3, 4])]), strip, size);
    expect(cell(ribbon, 0, 0)).toEqual([255, 255, 255, strength(0.5)]);
  });
  it("is bare weave after the last cue of an incomplete timeline", () => {
    const cues = [on(0, 0), on(8, 1)];
    const whole = ribbonCells(buildShow(layout, cues), layout, size);
    const cut = ribbonCells(buildShow(layout, cues, { isComplete: false }), layout, size);
    expect(cell(whole, 0, 5)[3]).toBe(255);
    expect(cell(cut, 0, 5)[3]).toBe(0);
    expect(cell(cut, 0, 1)[3]).toBe(255);
    expect(
      [...ribbonCells(buildShow(layout, [], { isComplete: false }), layout, size).cells].some((byte) => byte > 0),
    ).toBe(false);
  });
  it("puts neighbouring fronts into one row when there are more fronts than rows", () => {
    const street = buildLayout(
      Array.from({ length: 5 }, () => ({ side: "north" as const, outlets: ["relay" as const] })),
    );
    const ribbon = ribbonCells(buildShow(street, [on(0, 4)]), street, { rows: 2, columns: 4 });
    expect([cell(ribbon, 0, 0)[3], cell(ribbon, 1, 0)[3]]).toEqual([0, strength(1 / 2)]);
  });
});

describe("shrinkRibbon", () => {
  const ribbon = ribbonCells(
    buildShow(layout, [colour(0, 0, 0xff_00_00), on(0, 0), on(16, 0, 0), pulse(20, [1, 2], 4, 0x00_ff_00)]),
    layout,
    { rows: 3, columns: 32 },
  );
  it("takes the mean of levels, not of strengths", () => {
    const small = shrinkRibbon(ribbon, { rows: 1, columns: 1 });
    expect(cell(small, 0, 0)[3]).toBeCloseTo(strength((16 + 2 * 2) / (3 * 32)), -1);
  });
  it("is the same as drawing small from the start, but for rounding", () => {
    const straight = ribbonCells(buildShow(layout, [on(0, 0, 40), on(8, 1, 90)]), layout, { rows: 3, columns: 8 });
    const shrunk = shrinkRibbon(
      ribbonCells(buildShow(layout, [on(0, 0, 40), on(8, 1, 90)]), layout, { rows: 3, columns: 32 }),
      { rows: 3, columns: 8 },
    );
    straight.cells.forEach((byte, at) => expect(Math.abs(byte - (shrunk.cells[at] ?? 0))).toBeLessThanOrEqual(2));
  });
  it("leaves a ribbon that is small enough as it is", () => {
    expect(shrinkRibbon(ribbon, { rows: 40, columns: 320 }).rows).toBe(3);
  });
});

describe("stored ribbons", () => {
  it("come back as they were", () => {
    const ribbon = ribbonCells(buildShow(layout, [on(0, 0, 40), pulse(8, 1, 3, 0xff_d7_00)]), layout, {
      rows: 3,
      columns: 16,
    });
    expect(decodeRibbon(toRibbonPicture(ribbon))).toEqual(ribbon);
  });
  it("are refused when the bytes do not fit the size", () => {
    expect(() => decodeRibbon({ rows: 2, columns: 2, cells: "AAAA" })).toThrow(
      "The ribbon has 3 bytes; 2 rows of 2 cells have 16.",
    );
  });
  it("use base64 as Node does (RFC 4648)", () => {
    fc.assert(
      fc.property(fc.uint8Array({ maxLength: 100 }), (bytes) => {
        expect(toBase64(bytes)).toBe(Buffer.from(bytes).toString("base64"));
        expect(fromBase64(toBase64(bytes))).toEqual(bytes);
      }),
    );
    for (const text of ["A", "AA=A", "AA*=", "===="]) expect(() => fromBase64(text)).toThrow(RangeError);
  });
});

describe("ribbonSvg", () => {
  const ribbon = ribbonCells(buildShow(layout, [colour(0, 0, 0xff_d7_00), on(0, 0), on(16, 0, 0)]), layout);
  it("has no style, script, class or foreign reference, so a strict policy lets it stand", () => {
    const svg = ribbonSvg(ribbon, { width: 320, height: 44, id: "show-1", title: 'Foxes & "bells" <3' });
    expect(svg).not.toMatch(/style|class=|<script|href|on\w+=/i);
    expect(svg).toContain('aria-label="Foxes &amp; &quot;bells&quot; &lt;3"');
    expect([...svg.matchAll(/url\((.*?)\)/g)].map((match) => match[1])).toEqual([
      "#show-1-cut",
      "#show-1-bare",
      "#show-1-over",
    ]);
  });
  it("draws all cells of one colour as one path", () => {
    const svg = ribbonSvg(ribbon, { width: 320, height: 44, id: "a" });
    expect(svg.match(/fill="#ffd800"/g)).toHaveLength(1);
    expect(svg).toContain('aria-hidden="true"');
  });
  it("takes fewer rows for smaller sizes", () => {
    expect([16, 20, 44, 62, 120].map((height) => ribbonGrid(320, height).rows)).toEqual([4, 6, 10, 20, 40]);
    expect(ribbonGrid(320, 16).columns).toBe(128);
    expect(ribbonGrid(320, 62).columns).toBe(80);
  });
});
