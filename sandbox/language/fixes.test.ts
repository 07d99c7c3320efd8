import { describe, expect, it } from "vitest";
import { runScript } from "../../tests/support/run-script.ts";
import type { Problem } from "../engine/model.ts";
import { toOffset } from "./ranges.ts";

function applyFix(source: string, { range, text }: NonNullable<Problem["fix"]>): string {
  const from = toOffset(source, range.line, range.column);
  return source.slice(0, from) + text + source.slice(toOffset(source, range.endLine, range.endColumn));
}

/** A script with a problem, and what it becomes by its offered fix. */
const CASES: readonly (readonly [code: string, source: string, fixed: string])[] = [
  ["not-run", "square.all.on;", "square.all.on();"],
  ["one-equals", "let n = 1;\nif (n = 2) wait(1);", "let n = 1;\nif (n === 2) wait(1);"],
  ["ran-too-early", "at(8, square.all.off());", "at(8, () => square.all.off());"],
  [
    "constant",
    "const level = 1;\nlevel = 2;\nsquare.all.on(level);",
    "let level = 1;\nlevel = 2;\nsquare.all.on(level);",
  ],
  ["needs-quotes", "square.front(bakery).on();", 'square.front("bakery").on();'],
  ["unknown-front", 'square.front("bakry").on();', 'square.front("bakery").on();'],
  ["unknown-colour", 'square.all.on().colour("golden");', 'square.all.on().colour("gold");'],
  ["unknown-word", "Wait(1);", "wait(1);"],
  ["wants-a-number", 'square.all.on("100");', "square.all.on(100);"],
  ["missing-bracket", "square.all.on(50;", "square.all.on(50);"],
  ["missing-bracket", 'square.front("bakery".on();', 'square.front("bakery").on();'],
  ["missing-bracket", "wait(2 * (3 + 1); // four", "wait(2 * (3 + 1)); // four"],
  ["missing-bracket", "if (now() > 3 {\n  wait(1);\n}", "if (now() > 3) {\n  wait(1);\n}"],
  ["missing-bracket", "for (let i = 0; i < 3; i++ {\n  wait(1);\n}", "for (let i = 0; i < 3; i++) {\n  wait(1);\n}"],
  [
    "missing-bracket",
    "for (const f of square.fronts) {\n  f.on();\n  wait(1);\nsquare.all.off();",
    "for (const f of square.fronts) {\n  f.on();\n  wait(1);\n}\nsquare.all.off();",
  ],
  [
    "missing-bracket",
    'for (const f of square.fronts) {\n  if (f.box === "relay") {\n    f.on();\n  wait(1);\n}',
    'for (const f of square.fronts) {\n  if (f.box === "relay") {\n    f.on();\n  }\n  wait(1);\n}',
  ],
  ["missing-bracket", "repeat(4, () => {\n  wait(1);\n", "repeat(4, () => {\n  wait(1);\n});\n"],
  ["missing-bracket", "repeat(4, () => {\n  wait(1);\n);", "repeat(4, () => {\n  wait(1);\n});"],
  ["missing-bracket", 'const names = ["bakery", "tree";', 'const names = ["bakery", "tree"];'],
  ["extra-bracket", "square.all.on(50));", "square.all.on(50);"],
  ["extra-bracket", "wait(1);\n}\nwait(1);", "wait(1);\n\nwait(1);"],
  ["missing-quote", 'square.front("bakery).on();', 'square.front("bakery").on();'],
  ["missing-quote", 'console.log("hello);', 'console.log("hello");'],
  ["curly-quotes", "square.front(“bakery”).on();", 'square.front("bakery").on();'],
  ["missing-comma", "square.all.fadeTo(50 2);", "square.all.fadeTo(50, 2);"],
  ["unknown-word", "fro (const f of square.fronts) {\n  f.on();\n}", "for (const f of square.fronts) {\n  f.on();\n}"],
];

describe("an offered fix", () => {
  it.each(CASES)("%s: %j is mended", async (code, source, fixed) => {
    const outcome = await runScript(source);
    expect(outcome).toMatchObject({ ok: false, problem: { code } });
    const fix = outcome.ok ? undefined : outcome.problem.fix;
    expect(fix && applyFix(source, fix)).toBe(fixed);
    expect((await runScript(fixed)).ok).toBe(true);
  });

  it.each([
    ["two brackets are missing", "square.all.on(50;\nsquare.all.on(60;"],
    ["nothing can be read", "square.all.on(((;"],
    ["the quote may end anywhere", 'console.log("a, b);\nwait(1'],
  ])("is not made where %s", async (_, source) => {
    const outcome = await runScript(source);
    expect(outcome.ok).toBe(false);
    if (!outcome.ok) expect(outcome.problem.fix).toBeUndefined();
  });
});
