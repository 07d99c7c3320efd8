import { wcagLuminance } from "culori";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { colourToLinear, relativeLuminance } from "../timeline/colour.ts";
import { chromaticityDistance, countFlashes, countRedFlashes, isSaturatedRed } from "./flash-series.ts";

/**
 * The cases are the grey codes and colours of a public, BSD-3 licensed set of flash test media by the
 * authors of the TRACE guideline (jbjord/pse-test-media), 30 frames a second; luminances from WCAG 2.2.
 */
const FPS = 30;
const grey = (code: number) => relativeLuminance(...colourToLinear(code * 0x01_01_01));
const series = (...codes: (number | readonly [number, number])[]) =>
  codes.flatMap((code) =>
    typeof code === "number" ? [grey(code)] : Array.from({ length: code[1] }, () => grey(code[0])),
  );
const isPass = (luminances: readonly number[]) => countFlashes(luminances, FPS).isPass;

describe("countFlashes", () => {
  it("f001: seven transitions of 0.1017 in a second are too many", () => {
    const luminances = series(64, 109, 64, 109, 64, 109, 64, [109, 25]);
    expect(grey(109) - grey(64)).toBeCloseTo(0.1017, 4);
    expect(countFlashes(luminances, FPS)).toMatchObject({ worst: 7, isPass: false });
  });
  it("c001: six transitions are three flashes and pass (G19)", () => {
    expect(countFlashes(series(64, 109, 64, 109, 64, 109, [64, 25]), FPS)).toMatchObject({ worst: 6, isPass: true });
  });
  it("l001: a change of 0.0987 is none", () => {
    expect(grey(108) - grey(64)).toBeCloseTo(0.0987, 4);
    expect(countFlashes(series(64, 108, 64, 108, 64, 108, 64, [108, 25]), FPS).worst).toBe(0);
  });
  it("G19: passes at three flashes, fails at three and a half, whichever way the first goes", () => {
    for (const [a, b] of [
      [0, 255],
      [255, 0],
    ] as const) {
      const alternate = (transitions: number) =>
        series(...Array.from({ length: transitions + 1 }, (_, turn) => (turn % 2 ? b : a)));
      expect([6, 7].map((transitions) => isPass(alternate(transitions)))).toEqual([true, false]);
    }
  });
  it("counts sixteenths that toggle: 90 beats a minute pass at the limit, 100 fail", () => {
    const toggles = (tempo: number) =>
      Array.from({ length: 3000 }, (_, millis) => Math.floor((millis * tempo * 4) / 60_000) % 2);
    expect([90, 100].map((tempo) => countFlashes(toggles(tempo), 1000).isPass)).toEqual([true, false]);
  });
  it("y001: one flash below 0.1 leaves fewer than seven", () => {
    expect(isPass(series(64, 109, 64, 109, 64, 108, 64, [109, 25]))).toBe(true);
  });
  it("f009 and l009: the darker state has to be below 0.80", () => {
    expect([grey(231), grey(232)].map((y) => Math.round(y * 10_000))).toEqual([7991, 8070]);
    expect(isPass(series(231, 244, 231, 244, 231, 244, 231, [244, 25]))).toBe(false);
    expect(isPass(series(231, 243, 231, 243, 231, 243, 231, [243, 25]))).toBe(true);
    expect(isPass(series(232, 255, 232, 255, 232, 255, 232, [255, 25]))).toBe(true);
  });
  it("f011 and c011: seven transitions within 29 frames fail, over exactly one second they pass", () => {
    const until = (last: number) => {
      const luminances = Array.from({ length: 60 }, () => grey(64));
      // Three pulses of one frame are six transitions; the seventh lies `last` frames after the first.
      for (const frame of [1, 8, 16, last + 1]) luminances[frame] = grey(109);
      return luminances;
    };
    expect(countFlashes(until(29), FPS).isPass).toBe(false);
    expect(countFlashes(until(30), FPS).isPass).toBe(true);
  });
  it("f031: a change in several frames is one transition, measured from valley to peak", () => {
    const steps = [64, 109, 139, 109] as const;
    const climbs = series(...steps, ...steps, ...steps, 64, 109, [139, 25]);
    expect(countFlashes(climbs, FPS)).toMatchObject({ worst: 7, isPass: false });
  });
  it("l031: by WCAG it fails too; only a rule that lets slow changes go would pass it", () => {
    const steps = [64, 108, 136, 108] as const;
    expect(grey(136) - grey(64)).toBeCloseTo(0.195, 3);
    expect(isPass(series(...steps, ...steps, ...steps, 64, 108, [136, 25]))).toBe(false);
  });
  it("takes the smallest greys at 0.1 and 0.8 as published: 90 and 232", () => {
    expect([89, 90].map((code) => grey(code) >= 0.1)).toEqual([false, true]);
    expect(grey(89)).toBeCloseTo(wcagLuminance("#595959"), 6);
  });
  it("counts eighths of 180 beats a minute as the limit, of 181 as too many (6 intervals are 0.9945 s)", () => {
    const toggles = (tempo: number) =>
      Array.from({ length: 3000 }, (_, millis) => Math.floor((millis * tempo * 2) / 60_000) % 2);
    expect(countFlashes(toggles(180), 1000).worst).toBe(6);
    expect(countFlashes(toggles(181), 1000).worst).toBe(7);
  });
  it("never finds fewer transitions when the swing grows", () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: 0, max: 0.7, noNaN: true }), { minLength: 2, maxLength: 60 }),
        (luminances) => {
          const calmer = luminances.map((value) => value * 0.5);
          expect(countFlashes(calmer, FPS).transitions.length).toBeLessThanOrEqual(
            countFlashes(luminances, FPS).transitions.length,
          );
        },
      ),
    );
  });
});

describe("countRedFlashes", () => {
  const rgb = (red: number, green: number, blue: number) => colourToLinear((red << 16) | (green << 8) | blue);
  const alternate = (a: readonly [number, number, number], b: readonly [number, number, number]) => [
    a,
    b,
    a,
    b,
    a,
    b,
    a,
    ...Array.from({ length: 25 }, () => b),
  ];
  const red = rgb(101, 34, 34);

  it("red f001: saturated red against a colour 0.2058 away, with hardly any change in luminance", () => {
    const other = rgb(9, 63, 63);
    expect(chromaticityDistance(red, other)).toBeCloseTo(0.2058, 4);
    expect(
      countFlashes(
        alternate(red, other).map((colour) => relativeLuminance(...colour)),
        FPS,
      ).worst,
    ).toBe(0);
    expect(countRedFlashes(alternate(red, other), FPS, "current")).toMatchObject({ worst: 7, isPass: false });
  });
  it("red s001: a red of 0.7993 is not saturated", () => {
    expect([red, rgb(100, 34, 34)].map(isSaturatedRed)).toEqual([true, false]);
    expect(countRedFlashes(alternate(rgb(100, 34, 34), rgb(9, 63, 63)), FPS, "current").worst).toBe(0);
  });
  it("red d001: a distance of 0.1954 is no red flash now, though it was one in 2.1", () => {
    const other = rgb(25, 62, 62);
    expect(chromaticityDistance(red, other)).toBeCloseTo(0.1954, 4);
    expect(countRedFlashes(alternate(red, other), FPS, "current").worst).toBe(0);
    expect(countRedFlashes(alternate(red, other), FPS, "former").worst).toBe(7);
  });
  it("needs the former rule for red against black, which has no chromaticity", () => {
    const pure = rgb(255, 0, 0);
    expect(countRedFlashes(alternate(pure, rgb(0, 0, 0)), FPS, "current").worst).toBe(0);
    expect(countRedFlashes(alternate(pure, rgb(0, 0, 0)), FPS, "former").worst).toBe(7);
    // Flagged once linear red is above 20 / 320 = 0.0625.
    expect(
      [0.0624, 0.0626].map((value) => countRedFlashes(alternate([value, 0, 0], [0, 0, 0]), FPS, "former").worst),
    ).toEqual([0, 7]);
  });
  it("has the published distances from pure red", () => {
    const pure = rgb(255, 0, 0);
    const known = [
      [rgb(255, 255, 255), 0.2587],
      [rgb(0, 255, 0), 0.3281],
      [rgb(0, 0, 255), 0.4572],
      [rgb(255, 0, 255), 0.2419],
      [rgb(255, 128, 0), 0.1322],
      [rgb(180, 0, 0), 0],
    ] as const;
    for (const [colour, distance] of known) expect(chromaticityDistance(pure, colour)).toBeCloseTo(distance, 4);
    // The last two are no red flashes in 2.2, and both are in 2.0 and 2.1.
    for (const [other] of known.slice(4)) {
      const flashes = (["current", "former"] as const).map(
        (rule) => countRedFlashes(alternate(pure, other), FPS, rule).worst,
      );
      expect(flashes).toEqual([0, 7]);
    }
  });
});
