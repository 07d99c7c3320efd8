// @vitest-environment node
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { buildStreet } from "./street-geometry.ts";
import { streetLevel } from "./street-player.ts";

const sceneOptions = fc.record({
  width: fc.integer({ min: 120, max: 2000 }),
  height: fc.integer({ min: 40, max: 900 }),
  fronts: fc.integer({ min: 1, max: 20 }),
  seed: fc.integer({ min: 0, max: 1000 }),
  isTall: fc.boolean(),
});

describe("buildStreet", () => {
  it("fills the width with houses that stand on the ground inside the scene", () => {
    fc.assert(
      fc.property(sceneOptions, (options) => {
        const street = buildStreet(options);
        const last = street.fronts.at(-1);
        expect(street.fronts).toHaveLength(options.fronts);
        expect((last?.x ?? 0) + (last?.width ?? 0)).toBeCloseTo(options.width, 5);
        for (const front of street.fronts) {
          for (const pane of front.windows) {
            expect(pane.x).toBeGreaterThanOrEqual(front.x);
            expect(pane.x + pane.width).toBeLessThanOrEqual(front.x + front.width);
            expect(pane.y + pane.height).toBeLessThanOrEqual(street.ground);
          }
        }
      }),
    );
  });

  it("is the same street for the same seed and another for another", () => {
    const options = { width: 600, height: 240, fronts: 9, seed: 12, isTall: false };
    expect(buildStreet(options)).toEqual(buildStreet(options));
    expect(buildStreet({ ...options, seed: 13 })).not.toEqual(buildStreet(options));
  });
});

describe("streetLevel", () => {
  // WCAG 2.2, success criterion 2.3.1: nothing flashes more than three times a second. This is far slower.
  it("never moves by more than a sixth in a tenth of a second", () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 0, max: 19 }),
        fc.integer({ min: 1, max: 20 }),
        fc.double({ min: 0, max: 1000, noNaN: true }),
        (house, houses, seconds) => {
          const before = streetLevel(house % houses, houses, seconds);
          const after = streetLevel(house % houses, houses, seconds + 0.1);
          expect(before).toBeGreaterThanOrEqual(0);
          expect(before).toBeLessThanOrEqual(1);
          expect(Math.abs(after - before)).toBeLessThan(1 / 6);
        },
      ),
    );
  });

  it("has some houses lit and some dark at any time", () => {
    for (let seconds = 0; seconds < 60; seconds += 0.5) {
      const levels = Array.from({ length: 9 }, (_, house) => streetLevel(house, 9, seconds));
      expect(Math.max(...levels)).toBeGreaterThan(0.5);
      expect(Math.min(...levels)).toBeLessThan(0.5);
    }
  });
});
