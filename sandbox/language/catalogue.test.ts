import { describe, expect, it } from "vitest";
import { colorsNamed } from "culori";
import { COLOUR_NAMES } from "./colour-names.ts";
import { RUN_FINDINGS } from "./problems/findings.ts";
import { PROBLEMS } from "./problems/index.ts";
import { TYPE_NOTES } from "./problems/types.ts";
import { ALLOWED_GLOBALS, GLOBAL_WORDS } from "./words.ts";

const ENTRIES = Object.entries({ ...PROBLEMS, ...RUN_FINDINGS, ...TYPE_NOTES });
const MAX_WORDS = 20;
const MAX_GRADE = 6;
const MAX_AVERAGE_GRADE = 4;

/** A sentence as it is read: its optional stretches in, a short name in every place. */
function readable(template: string): string {
  return template
    .replaceAll("[?", "")
    .replaceAll("?]", "")
    .replace(/\{(\w+)\}/g, "2");
}

/** Vowel groups, a silent e apart: a rough count of syllables; a word of code counts one. */
function countSyllables(word: string): number {
  if (/[`"\d]/.test(word)) return 1;
  const letters = word.toLowerCase().replace(/[^a-z]/g, "");
  const groups =
    letters.replace(/(?<=[^aeiouyl])e$|(?<=[^aeiouy]{1,2}[^aeioudty])ed$/, "").match(/[aeiouy]+/g)?.length ?? 1;
  return Math.max(1, groups);
}

/** Reading grade. Source: Flesch-Kincaid grade level (Kincaid and others, 1975). */
function readingGrade(text: string): number {
  const sentences = text.split(/[.?!](?:\s|$)/).filter((part) => part.trim() !== "").length;
  const words = text
    .replace(/`[^`]*`|"[^"]*"/g, "`x`")
    .split(/\s+/)
    .filter((word) => /[\w`]/.test(word));
  const syllables = words.reduce((sum, word) => sum + countSyllables(word), 0);
  return 0.39 * (words.length / sentences) + 11.8 * (syllables / words.length) - 15.59;
}

describe("the catalogue of problems and findings", () => {
  it.each(ENTRIES)(
    "%s has a sentence of 20 words or fewer that a 12-year-old can read, and a hint",
    (_, { sentence, hint }) => {
      const text = readable(sentence);
      expect(text.split(/\s+/).length).toBeLessThanOrEqual(MAX_WORDS);
      expect(readingGrade(text)).toBeLessThanOrEqual(MAX_GRADE);
      expect(sentence.trimEnd()).toMatch(/[.?](\?\])?$/);
      expect(hint).not.toBe("");
      expect(text + hint).not.toMatch(/\b(oops|sorry|error|invalid|unexpected)\b/i);
    },
  );

  it("reads at grade 4 or lower on average", () => {
    const grades = ENTRIES.map(([, { sentence }]) => readingGrade(readable(sentence)));
    expect(grades.reduce((a, b) => a + b, 0) / grades.length).toBeLessThanOrEqual(MAX_AVERAGE_GRADE);
  });

  it("has codes in kebab-case that belong to one list only", () => {
    for (const [code] of ENTRIES) expect(code).toMatch(/^[a-z]+(-[a-z]+)*$/);
    expect(Object.keys(PROBLEMS).filter((code) => Object.hasOwn(RUN_FINDINGS, code))).toEqual([]);
  });
});

describe("words and names", () => {
  it("knows the colours of CSS Color 4 with their values", () => {
    // Source: CSS Color Module Level 4, section 6.1, as the reference library culori has it.
    const expected = Object.fromEntries(
      Object.entries(colorsNamed as Record<string, number>).filter(([name]) => name !== "transparent"),
    );
    expect(COLOUR_NAMES).toEqual(expected);
    expect(Object.keys(COLOUR_NAMES)).toHaveLength(148);
  });

  it("keeps its global words apart from TypeScript's", () => {
    expect(GLOBAL_WORDS.filter((word) => ALLOWED_GLOBALS.has(word))).toEqual([]);
  });
});
