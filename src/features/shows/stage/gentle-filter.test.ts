import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { GentleFilter } from "./gentle-filter.ts";

const FRAME_SECONDS = 1 / 60;
/** WCAG 2.2, "general flash and red flash thresholds": three flashes a second, changes of 10 % of the largest luminance. */
const MOST_FLASHES = 3;
const FLASH_CHANGE = 0.1;

/** Flashes in the worst second: pairs of opposing changes of 10 % or more, counted at turning points. */
function countFlashes(levels: readonly number[]): number {
  const turns: number[] = [];
  let low = levels[0] ?? 0;
  let high = low;
  let way = 0;
  levels.forEach((level, frame) => {
    low = Math.min(low, level);
    high = Math.max(high, level);
    if (way <= 0 && level - low >= FLASH_CHANGE) [way, high] = (turns.push(frame), [1, level]);
    else if (way >= 0 && high - level >= FLASH_CHANGE) [way, low] = (turns.push(frame), [-1, level]);
    if (way > 0) low = level;
    if (way < 0) high = level;
  });
  return Math.max(0, ...turns.map((from) => Math.floor(turns.filter((at) => at >= from && at < from + 60).length / 2)));
}

describe("GentleFilter", () => {
  it("counts more than three flashes where there are more (the counter itself can fail)", () => {
    const strobe = Array.from({ length: 240 }, (_, frame) => (Math.floor(frame / 6) % 2 === 0 ? 1 : 0));
    expect(countFlashes(strobe)).toBeGreaterThan(MOST_FLASHES);
  });

  it("lets no light flash more than three times a second, whatever the show does", () => {
    fc.assert(
      fc.property(
        fc.array(fc.record({ level: fc.constantFrom(0, 0.3, 1), frames: fc.integer({ min: 1, max: 12 }) }), {
          minLength: 20,
          maxLength: 60,
        }),
        (parts) => {
          const filter = new GentleFilter(1);
          const shown: number[] = [];
          for (const { level, frames } of parts)
            for (let frame = 0; frame < frames; frame += 1) {
              filter.follow(new Float32Array([level, level, level]), FRAME_SECONDS);
              shown.push(filter.rgb[0] ?? 0);
            }
          expect(countFlashes(shown)).toBeLessThanOrEqual(MOST_FLASHES);
        },
      ),
    );
  });

  it("reaches a steady light in the end and says so", () => {
    const filter = new GentleFilter(2);
    const target = new Float32Array([1, 0.5, 0, 0.2, 0.2, 0.2]);
    let frames = 0;
    while (!filter.follow(target, FRAME_SECONDS)) frames += 1;
    expect([...filter.rgb]).toEqual([...target]);
    expect(frames).toBeLessThan(120);
  });

  it("does not jump after a tab was hidden", () => {
    const filter = new GentleFilter(1);
    filter.follow(new Float32Array([1, 1, 1]), 3600);
    expect(filter.rgb[0]).toBeLessThan(0.1);
  });
});
