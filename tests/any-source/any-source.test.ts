import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { judgeRun } from "../../sandbox/checks/judge-run.ts";
import { listNames } from "../../sandbox/engine/tables.ts";
import { listGoldenScripts } from "../golden/golden-scripts.ts";
import { runScript, SMALL_LAYOUT, SMALL_SONG } from "../support/run-script.ts";
import { drawnProgram, randomText, slippedScript } from "./sources.ts";

const SLOW_MS = 240_000;
const names = listNames(SMALL_LAYOUT, SMALL_SONG);
const scripts = listGoldenScripts().map(({ input }) => input.source);

/**
 * Through everything that is made of a script: checks, run, show check, ribbon, words. The engine maps what
 * its host throws to `could-not-run`, so that this code is a throw too.
 */
async function judge(source: string): Promise<string> {
  const outcome = await runScript(source);
  const judged = judgeRun(outcome, SMALL_LAYOUT, SMALL_SONG);
  if (outcome.ok) return "ran";
  const { code, range, details } = outcome.problem;
  expect(code, details).not.toBe("could-not-run");
  expect(range.line).toBeGreaterThanOrEqual(1);
  expect(range.column).toBeGreaterThanOrEqual(1);
  expect(range.line).toBeLessThanOrEqual(source.split(/\r\n|[\n\r\u2028\u2029]/).length);
  expect(judged.problem?.code).toBe(code);
  return code;
}

describe("any source text", { timeout: SLOW_MS }, () => {
  it("is judged without a throw when it is no program at all", () =>
    fc.assert(
      fc.asyncProperty(randomText, async (source) => void (await judge(source))),
      { numRuns: 250 },
    ));

  it("is judged without a throw when it is a real script with slips", () =>
    fc.assert(
      fc.asyncProperty(slippedScript(scripts), async (source) => void (await judge(source))),
      { numRuns: 100 },
    ));

  it("runs to its end when the grammar drew it", () =>
    fc.assert(
      fc.asyncProperty(drawnProgram(names), async (source) => {
        expect(await judge(source)).toBe("ran");
      }),
      { numRuns: 25 },
    ));
});
