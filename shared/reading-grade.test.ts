import { describe, expect, it } from "vitest";
import { countSyllables, countText, readingGrade } from "./reading-grade.ts";

describe("reading grade (Flesch-Kincaid; values computed by hand from the formula)", () => {
  it.each([
    [{ sentences: 1, words: 6, syllables: 6 }, -1.45],
    [{ sentences: 1, words: 13, syllables: 26 }, 13.08],
    [{ sentences: 8, words: 100, syllables: 130 }, 4.63],
  ])("%j", (count, grade) => {
    expect(readingGrade(count)).toBeCloseTo(grade, 1);
  });

  it.each([
    ["wait", 1],
    ["light", 1],
    ["bakery", 3],
    ["colour", 2],
    ["variable", 4],
    ["note", 1],
    ["named", 1],
    ["time", 1],
    ["square", 1],
  ])("%s has %i", (word, count) => {
    expect(Math.abs(countSyllables(word) - count)).toBeLessThanOrEqual(1);
  });

  it("takes code as one short word", () => {
    expect(countText('Write `square.front("bakery").on()` here. Then run it.')).toMatchObject({
      sentences: 2,
      words: 6,
    });
    expect(readingGrade(countText(""))).toBe(0);
  });
});
