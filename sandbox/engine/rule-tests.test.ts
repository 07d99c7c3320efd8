import { readdirSync, readFileSync } from "node:fs";
import path from "node:path";
import { describe, expect, it } from "vitest";

/** The evaluation rules of the language are numbered from 1 to this. */
const RULES = 34;
const SANDBOX = path.resolve(import.meta.dirname, "..");
/** `it("7: ...", `it("14, 15 and 16: ...` and `describe("rule 31: ...`: a test that names its rules. */
const NAMED = /^\s*(?:it|describe)(?:\.each\([^"]*)?\(\s*"(?:rules? )?(\d+(?:(?:, | and )\d+)*): /gm;

/** Each rule with the files whose tests name it. */
function listNamedRules(): Map<number, string[]> {
  const named = new Map<number, string[]>();
  for (const file of readdirSync(SANDBOX, { recursive: true, encoding: "utf8" })) {
    if (!file.endsWith(".test.ts")) continue;
    for (const [, numbers = ""] of readFileSync(path.join(SANDBOX, file), "utf8").matchAll(NAMED))
      for (const number of numbers.match(/\d+/g) ?? [])
        named.set(Number(number), [...(named.get(Number(number)) ?? []), file]);
  }
  return named;
}

describe("evaluation rules", () => {
  const named = listNamedRules();

  it.each(Array.from({ length: RULES }, (_, index) => index + 1))("rule %i has a test that names it", (rule) => {
    expect(named.get(rule) ?? []).not.toEqual([]);
  });

  it("have no test that names a rule that there is not", () => {
    expect([...named.keys()].filter((rule) => rule < 1 || rule > RULES)).toEqual([]);
  });

  it("on what lights show have a test of the cue and one of the light", () => {
    for (const rule of [12, 13, 14, 15, 16, 18, 19, 20, 21])
      expect(named.get(rule), `rule ${rule}`).toEqual(
        expect.arrayContaining([path.join("engine", "rules.test.ts"), path.join("timeline", "cursor.test.ts")]),
      );
  });
});
