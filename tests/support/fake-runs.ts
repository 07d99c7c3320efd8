import type { FeatureDeps } from "../../server/deps.ts";
import { judgeRun } from "../../sandbox/checks/judge-run.ts";
import type { RunOutcome } from "../../sandbox/engine/model.ts";
import { listLights } from "../../sandbox/square/lights.ts";
import { buildTimeline } from "../../sandbox/timeline/build.ts";
import { TICKS_PER_BEAT } from "../../shared/units.ts";

type RunPool = FeatureDeps["runs"];

/** A script that the fake refuses, for tests of "does not run". */
export const BROKEN_SOURCE = "this does not run";

/**
 * A run pool without the engine, for tests of what happens around a run: every script comes out as an
 * empty timeline of the song, but for `BROKEN_SOURCE`, which has a problem in line 1.
 */
export function createFakeRuns(): RunPool {
  const run = (input: Parameters<RunPool["run"]>[0]): Promise<RunOutcome> => {
    const report = { notes: [], findings: [], fuel: 1, cueCount: 0 };
    if (input.source === BROKEN_SOURCE) {
      const range = { line: 1, column: 1, endLine: 1, endColumn: 5 };
      const problem = {
        code: "unknown-word",
        sentence: "Line 1 has a word that is not known.",
        hint: "Look at the word.",
        range,
        excerpt: "this",
      };
      return Promise.resolve({ ok: false, problem, timeline: null, ...report });
    }
    const timeline = buildTimeline(
      {
        language: 1,
        songId: input.songId,
        layoutHash: "fake",
        seed: input.seed,
        lightCount: listLights(input.layout).length,
        endTick: (input.song.beats.length - 1) * TICKS_PER_BEAT,
        isComplete: true,
      },
      [],
    );
    return Promise.resolve({ ok: true, timeline, hash: "0".repeat(64), ...report });
  };
  return {
    run,
    judge: async (input: Parameters<RunPool["judge"]>[0]) => judgeRun(await run(input), input.layout, input.song),
    close: () => Promise.resolve(),
  } as unknown as RunPool;
}
