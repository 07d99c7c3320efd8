import fc from "fast-check";
import { judgeRun } from "../../sandbox/checks/judge-run.ts";
import { listNames } from "../../sandbox/engine/tables.ts";
import { drawnProgram, randomText, slippedScript } from "../any-source/sources.ts";
import { listGoldenScripts } from "../golden/golden-scripts.ts";
import { runScript, SMALL_LAYOUT, SMALL_SONG } from "../support/run-script.ts";
import type { Figure } from "./measure.ts";

const SOURCES = 5000;

/** Five thousand source texts through the whole pipeline: how many made the host throw, which should be none. */
export async function benchAnySource(): Promise<Figure[]> {
  const seed = Date.now() % 2 ** 31;
  console.log(`any source: seed ${seed}`);
  const scripts = listGoldenScripts().map(({ input }) => input.source);
  const texts = fc.oneof(
    { weight: 5, arbitrary: randomText },
    { weight: 4, arbitrary: slippedScript(scripts) },
    { weight: 1, arbitrary: drawnProgram(listNames(SMALL_LAYOUT, SMALL_SONG)) },
  );
  let thrown = 0;
  let ran = 0;
  for (const source of fc.sample(texts, { seed, numRuns: SOURCES })) {
    try {
      const outcome = await runScript(source);
      judgeRun(outcome, SMALL_LAYOUT, SMALL_SONG);
      if (outcome.ok) ran++;
      else if (outcome.problem.code === "could-not-run") throw new Error(outcome.problem.details);
    } catch (error) {
      thrown++;
      console.log(JSON.stringify(source), error);
    }
  }
  const figure = (name: string, value: number): Figure => ({
    name,
    value,
    unit: "of 5000 texts",
    against: null,
    ratio: null,
  });
  return [figure("host exceptions for any source text", thrown), figure("texts that ran to their end", ran)];
}
