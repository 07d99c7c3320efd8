import { describe, expect, it } from "vitest";
import { buildFront, buildShow, fadeTo, on, pulse } from "../../tests/factories/small-show.ts";
import { createCursor } from "./cursor.ts";
import { createLinesLit, linesOfCue } from "./lines.ts";

const layout = buildFront("relay", "dimmer", "dimmer");

describe("createLinesLit", () => {
  const timeline = buildShow(layout, [
    on(0, 0, 100, 2),
    on(0, 1, 40, [9, 4]),
    fadeTo(2, 2, 80, 4, [9, 5]),
    pulse(8, [1, 2], 2, undefined, 12),
  ]);
  const cursor = createCursor(timeline, layout);
  const linesLit = createLinesLit(timeline);
  const at = (beat: number) =>
    Object.fromEntries(
      [...linesLit(cursor.seek(beat * 960)).entries()]
        .filter(([, share]) => share > 0)
        .map(([line, share]) => [line, Math.round(share * 100)]),
    );

  it("counts every line of the chain with the brightest light it lights", () => {
    expect(at(0)).toEqual({ 2: 100, 4: 40, 9: 40 });
    expect(at(4)).toEqual({ 2: 100, 4: 40, 5: 40, 9: 40 });
    expect(at(6)).toEqual({ 2: 100, 4: 40, 5: 80, 9: 80 });
  });
  it("leaves out what is not seen under a pulse, and comes back to it after", () => {
    expect(at(8)).toEqual({ 2: 100, 12: 100 });
    expect(at(9.5)).toEqual({ 2: 100, 4: 40, 5: 80, 9: 80 });
  });
  it("is all dark at the end", () => {
    expect(at(32)).toEqual({});
  });
});

describe("linesOfCue", () => {
  it("gives the calls from outermost to innermost", () => {
    const timeline = buildShow(layout, [on(0, 1, 40, [9, 4])]);
    expect(linesOfCue(timeline, 0)).toEqual([9, 4]);
    expect(linesOfCue(timeline, -1)).toEqual([]);
  });
});
