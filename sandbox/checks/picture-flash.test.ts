import { describe, expect, it } from "vitest";
import {
  buildBroadStreet,
  buildLayout,
  buildShow,
  buildSong,
  colour,
  off,
  on,
  pulse,
} from "../../tests/factories/small-show.ts";
import { sideGeometry } from "../square/geometry.ts";
import type { WrittenCue } from "../timeline/build.ts";
import { createCheckContext } from "./context.ts";
import { BLOCK_COUNT, FLASH_AREA_PIXELS, joinCells, sumBlocks, sumPixels } from "./picture-area.ts";
import { countPictureFlashes, findPictureFlashes } from "./picture-flash.ts";
import { measureSides } from "./side-measures.ts";

/** Eight fronts on the north side whose windows are one colour light each. */
const layout = buildLayout(
  Array.from({ length: 8 }, () => ({
    side: "north" as const,
    outlets: [{ kind: "colour" as const, part: "windows" }],
  })),
);
const ALL = [0, 1, 2, 3, 4, 5, 6, 7];
const context = (cues: readonly WrittenCue[], square = layout, tempo = 120) =>
  createCheckContext({ timeline: buildShow(square, cues), layout: square, song: buildSong({}, { tempo }) });
const every = (step: number, action: (beat: number, turn: number) => WrittenCue | WrittenCue[]) =>
  Array.from({ length: Math.floor(32 / step) }, (_, turn) => action(turn * step, turn)).flat();
/** General and red flashes of the north side. */
const count = (cues: readonly WrittenCue[], tempo?: number) =>
  countPictureFlashes(context(cues, layout, tempo)).map(({ worst }) => worst);
/** Where some lights of the north side shine. */
const cellsOf = (lights: readonly number[]) => {
  const north = measureSides(layout).find(({ side }) => side === "north");
  return lights.flatMap((light) => north?.cells.get(light) ?? []);
};
const rules = (cues: readonly WrittenCue[]) => findPictureFlashes(context(cues)).map(({ rule }) => rule);

describe("countPictureFlashes (WCAG 2.2, 2.3.1)", () => {
  it("counts windows that pulse together, four times a second on half beats", () => {
    expect(count(every(0.5, (beat) => pulse(beat, ALL, 0.5)))).toEqual([4, 0]);
    expect(count(every(1, (beat) => pulse(beat, ALL, 1)))).toEqual([2, 0]);
  });
  it("lets three in a second pass, as the criterion does", () => {
    expect(
      count(
        every(1, (beat) => pulse(beat, ALL, 1)),
        180,
      ),
    ).toEqual([3, 0]);
    expect(
      count(
        every(1, (beat) => pulse(beat, ALL, 1)),
        181,
      ),
    ).toEqual([4, 0]);
  });
  it("takes relative luminance: a full blue is 0.0722 and no general flash, a full red is 0.2126 and both", () => {
    expect(count(every(0.5, (beat) => pulse(beat, ALL, 0.5, 0x00_00_ff)))).toEqual([0, 0]);
    expect(count(every(0.5, (beat) => pulse(beat, ALL, 0.5, 0xff_00_00)))).toEqual([4, 4]);
  });
  it("counts a dim red against black by the definition of 2.1: linear red above 0.0625", () => {
    const blink = (level: number) =>
      every(0.5, (beat) => [colour(beat, ALL, 0xff_00_00), on(beat, ALL, level), off(beat + 0.25, ALL)]);
    // Levels 35 and 28 are Y 0.085 and 0.055.
    expect(count(blink(35))).toEqual([0, 4]);
    expect(count(blink(28))).toEqual([0, 0]);
    expect(rules(blink(35))).toEqual(["picture-red-flash"]);
  });
  it("counts a change from red to a colour more than 0.2 away by the definition of 2.2, however dim", () => {
    const swap = (other: number) => [
      on(0, ALL, 20),
      ...every(0.25, (beat, turn) => colour(beat, ALL, turn % 2 ? 0xff_00_00 : other)),
    ];
    // Published distances from red: blue .4572; (255, 128, 0) .1322. Level 20 is Y 0.03.
    expect(count(swap(0x00_00_ff))).toEqual([0, 4]);
    expect(count(swap(0xff_80_00))).toEqual([0, 0]);
  });
  it("needs a quarter of a block of 341 x 256 pixels", () => {
    expect(sumPixels(joinCells(cellsOf([0])))).toBeLessThan(FLASH_AREA_PIXELS);
    expect(count(every(0.5, (beat) => pulse(beat, 0, 0.5)))).toEqual([0, 0]);
  });
  it("leaves to the street rule what that stops already", () => {
    expect(rules(every(0.5, (beat) => pulse(beat, ALL, 0.5)))).toEqual([]);
  });
  it("finds what only the picture shows, with its lines", () => {
    const found = findPictureFlashes(
      context(
        every(0.5, (beat) => pulse(beat, 0, 0.5, undefined, 3)),
        buildBroadStreet(),
      ),
    );
    expect(found).toMatchObject([
      {
        rule: "picture-flash",
        severity: "stop",
        measured: { value: 4, limit: 3 },
        lights: ["front-a/windows"],
        lines: [3],
      },
    ]);
  });
});

describe("sumBlocks", () => {
  it("adds up what lies in each block, as counting pixel by pixel would, up to a cell", () => {
    const blocks = sumBlocks(cellsOf(ALL));
    expect(blocks).toHaveLength(BLOCK_COUNT);
    const panes = sideGeometry(layout, "north").flatMap((front) => front.lights.flatMap((light) => light.panes));
    const beads = sideGeometry(layout, "north").flatMap((front) => front.lights.flatMap((light) => light.beads));
    // Block 22 lies in the middle of the top row: x 352 to 688, y 0 to 256.
    const inside = (x: number, y: number) => x >= 352 && x < 688 && y >= 0 && y < 256;
    let expected = 0;
    for (const { x, y, width, height, shape } of panes) {
      const filled =
        shape === "rect"
          ? 1
          : shape === "round"
            ? Math.PI / 4
            : 1 - ((2 - Math.PI / 2) * Math.min(width / 2, height) ** 2) / (width * height);
      for (let i = 0; i < 40; i++)
        for (let j = 0; j < 40; j++)
          if (inside(x + ((i + 0.5) * width) / 40, y + ((j + 0.5) * height) / 40))
            expected += (filled * width * height) / 1600;
    }
    for (const { x, y, radius } of beads) if (inside(x, y)) expected += Math.PI * radius * radius;
    // Cells that panes and lamps fill twice count once, so the sum may be a little less.
    expect(blocks[22]).toBeLessThanOrEqual(expected * 1.02 + 1);
    expect(blocks[22]).toBeGreaterThanOrEqual(expected * 0.8);
  });
  it("gives no block more than all lights together", () => {
    expect(Math.max(...sumBlocks(cellsOf(ALL)))).toBeLessThanOrEqual(sumPixels(joinCells(cellsOf(ALL))));
  });
});
