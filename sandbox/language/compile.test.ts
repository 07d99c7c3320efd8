import fc from "fast-check";
import { readFileSync, readdirSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { runScript } from "../../tests/support/run-script.ts";
import { compileScript } from "./compile.ts";
import { letterDistance, near } from "./near-name.ts";
import { normaliseSource, utf8Length } from "./source.ts";

const SAMPLES = new URL("../../tests/samples/", import.meta.url);
const sources = readdirSync(SAMPLES)
  .filter((file) => file.endsWith(".ts") && !file.endsWith(".test.ts"))
  .map((file) => readFileSync(new URL(file, SAMPLES), "utf8"));

/** A sample with a stretch taken out, doubled, or replaced by signs that scripts are made of. */
const mutated = fc
  .record({
    source: fc.constantFrom(...sources),
    at: fc.double({ min: 0, max: 1, noNaN: true }),
    length: fc.nat(12),
    put: fc.array(
      fc.constantFrom(
        "(",
        ")",
        "{",
        "}",
        "[",
        "]",
        ";",
        ",",
        "=>",
        "=",
        " ",
        "\n",
        '"',
        "`",
        "${",
        "wait",
        "square",
        ".on",
        "1",
        "/",
        "//",
        "async ",
        "@",
        "?.",
        "...",
        "🎄",
      ),
      { maxLength: 4 },
    ),
  })
  .map(({ source, at, length, put }) => {
    const start = Math.floor(at * source.length);
    return source.slice(0, start) + put.join("") + source.slice(start + length);
  });

const anything = fc.oneof(
  fc.string({ unit: "binary", maxLength: 200 }),
  fc.string({ unit: "grapheme", maxLength: 200 }),
  mutated,
);

describe("compileScript", () => {
  it("never throws, and a problem lies inside the script", () => {
    fc.assert(
      fc.property(anything, (source) => {
        const outcome = compileScript(source, null);
        if (outcome.ok) return;
        const lines = outcome.text.split("\n");
        const { range } = outcome.problem;
        expect(range.line).toBeGreaterThanOrEqual(1);
        expect(range.line).toBeLessThanOrEqual(lines.length);
        expect(range.column).toBeGreaterThanOrEqual(1);
        expect(range.column).toBeLessThanOrEqual((lines[range.line - 1]?.length ?? 0) + 1);
      }),
      { numRuns: 300 },
    );
  });

  it("keeps every line on its line", () => {
    for (const source of sources) {
      const outcome = compileScript(source, null);
      if (!outcome.ok) throw new Error(outcome.problem.sentence);
      expect(outcome.marked.code.split("\n").length).toBe(outcome.text.split("\n").length + 2);
    }
  });

  it("runs whatever it lets through without failing itself", { timeout: 120_000 }, async () => {
    await fc.assert(
      fc.asyncProperty(mutated, async (source) => {
        const outcome = await runScript(source);
        if (outcome.ok) expect(outcome.hash).toMatch(/^[0-9a-f]{64}$/);
        else expect(outcome.problem.sentence).not.toBe("");
      }),
      { numRuns: 60 },
    );
  });

  it("gives equal outcomes for equal input", { timeout: 60_000 }, async () => {
    await fc.assert(
      fc.asyncProperty(mutated, fc.nat(0xff_ff_ff_ff), async (source, seed) => {
        expect(await runScript(source, { seed })).toEqual(await runScript(source, { seed }));
      }),
      { numRuns: 12 },
    );
  });
});

describe("normaliseSource", () => {
  it("ends lines in LF, drops a byte order mark and composes letters", () => {
    expect(normaliseSource("\uFEFFa\r\nb\rc\u2028d")).toBe("a\nb\nc\nd");
    expect(normaliseSource("cafe\u0301")).toBe("caf\u00e9");
  });

  it("is settled after one time", () => {
    fc.assert(
      fc.property(
        fc.string({ unit: "binary" }),
        (text) => normaliseSource(normaliseSource(text)) === normaliseSource(text),
      ),
    );
  });

  it("counts bytes as an encoder does", () => {
    fc.assert(
      fc.property(fc.string({ unit: "binary" }), (text) => utf8Length(text) === new TextEncoder().encode(text).length),
    );
  });
});

describe("near", () => {
  it.each([
    ["bakry", "bakery"],
    ["Wait", "wait"],
    ["golden", "gold"],
    ["colur", "colour"],
    ["zeppelin", null],
    ["x", null],
  ])("offers for %s: %s", (name, meant) => {
    expect(near(name, ["bakery", "wait", "gold", "goldenrod", "colour", "library"])).toBe(meant);
  });

  it("counts a swap of neighbours as one letter", () => {
    expect(letterDistance("fornt", "front")).toBe(1);
    expect(letterDistance("", "abc")).toBe(3);
  });
});
