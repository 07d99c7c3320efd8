import { converter, parse, wcagLuminance } from "culori";
import { describe, expect, it } from "vitest";
import {
  colourToHex,
  colourToLinear,
  levelToY,
  linearToColour,
  linearToSrgb,
  relativeLuminance,
  srgbToLinear,
  yToLevel,
} from "./colour.ts";

const toLinear = converter("lrgb");
const toLab = converter("lab65");

describe("level and light", () => {
  it("meets the points of CIE 15 (L* from Y), as computed from the formula", () => {
    for (const [level, y] of [
      [25, 0.04415],
      [50, 0.18419],
      [75, 0.48278],
      [100, 1],
      [0, 0],
    ] as const)
      expect(levelToY(level)).toBeCloseTo(y, 5);
    expect(yToLevel(0.18)).toBeCloseTo(49.496, 3);
    expect(yToLevel(0.5)).toBeCloseTo(76.069, 3);
    // The line and the curve meet at Y = 0.008856, L* = 8.
    expect(levelToY(8)).toBeCloseTo(0.008856, 6);
  });
  it("agrees with culori 4.0.2 on the L* of greys and primaries", () => {
    for (const colour of ["#808080", "#7f7f7f", "#777777", "#bcbcbc", "#010101", "#ffffff"]) {
      const [red, green, blue] = colourToLinear(Number.parseInt(colour.slice(1), 16));
      // culori's matrix rounds differently in the fourth place, so three decimals.
      expect(yToLevel(relativeLuminance(red, green, blue))).toBeCloseTo(toLab(parse(colour))?.l ?? -1, 2);
    }
  });
  it("meets the L* of #777777 and of the primaries that culori 4.0.2 gives (lab65)", () => {
    const lightness = (hex: string) => {
      const [red, green, blue] = colourToLinear(Number.parseInt(hex.slice(1), 16));
      return yToLevel(relativeLuminance(red, green, blue));
    };
    for (const [hex, known] of [
      ["#777777", 50.034],
      ["#ff0000", 53.2371],
      ["#00ff00", 87.7355],
      ["#0000ff", 32.3009],
    ] as const) {
      expect(toLab(parse(hex))?.l).toBeCloseTo(known, 3);
      // WCAG's weights have four places, culori's matrix more: a fiftieth of a level apart at most.
      expect(Math.abs(lightness(hex) - known)).toBeLessThan(0.02);
    }
  });
  it("gives back the level it was given", () => {
    for (let level = 0; level <= 100; level += 0.25) expect(yToLevel(levelToY(level))).toBeCloseTo(level, 9);
  });
});

describe("sRGB", () => {
  it("agrees with culori 4.0.2 on every channel value", () => {
    for (let value = 0; value < 256; value++) {
      expect(srgbToLinear(value)).toBeCloseTo(toLinear({ mode: "rgb", r: value / 255, g: 0, b: 0 }).r, 12);
      expect(Math.round(linearToSrgb(srgbToLinear(value)))).toBe(value);
    }
  });
  it("agrees with culori 4.0.2 and the definition in WCAG 2.2 on relative luminance", () => {
    const known = {
      "#808080": 0.2158605,
      "#7f7f7f": 0.2122308,
      "#777777": 0.184475,
      "#bcbcbc": 0.5028865,
      "#ff0000": 0.2126,
      "#00ff00": 0.7152,
      "#0000ff": 0.0722,
    };
    for (const [hex, luminance] of Object.entries(known)) {
      const [red, green, blue] = colourToLinear(Number.parseInt(hex.slice(1), 16));
      expect(relativeLuminance(red, green, blue)).toBeCloseTo(luminance, 6);
      expect(relativeLuminance(red, green, blue)).toBeCloseTo(wcagLuminance(hex), 6);
    }
  });
  it("packs, unpacks and clamps", () => {
    expect(linearToColour(...colourToLinear(0x12_34_56))).toBe(0x12_34_56);
    expect(linearToColour(2, -1, 0)).toBe(0xff_00_00);
    expect(colourToHex(0x00_0a_ff)).toBe("#000aff");
  });
});
