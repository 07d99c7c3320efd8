import { describe, expect, it } from "vitest";
import { colourToLinear, levelToY } from "../../../../sandbox/timeline/colour.ts";
import { toShownColour } from "./shown-colour.ts";

function shownAt(colour: number, level: number) {
  const y = levelToY(level);
  const [red, green, blue] = colourToLinear(colour);
  return toShownColour(red * y, green * y, blue * y);
}

describe("toShownColour", () => {
  it("shows a level as it is seen: 50 is half", () => {
    expect(shownAt(0xffffff, 50).alpha).toBeCloseTo(0.5, 5);
    expect(shownAt(0xff0000, 50).alpha).toBeCloseTo(0.5, 5);
    expect(shownAt(0xffffff, 100).alpha).toBe(1);
  });

  it("keeps the colour whatever the level", () => {
    const full = shownAt(0xffa62a, 100).colour;
    expect(shownAt(0xffa62a, 30).colour).toBe(full);
    expect(Math.abs(((full >> 8) & 0xff) - 0xa6)).toBeLessThanOrEqual(4);
  });

  it("is dark where nothing is to be seen", () => {
    expect(shownAt(0xffffff, 0).alpha).toBe(0);
    expect(shownAt(0xffffff, 0.5).alpha).toBe(0);
  });

  it("makes few colours of a slow fade", () => {
    const colours = new Set(Array.from({ length: 1000 }, (_, i) => toShownColour(1, i / 1000, 1 - i / 1000).colour));
    expect(colours.size).toBeLessThanOrEqual(64);
  });
});
