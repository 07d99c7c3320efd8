import { readFileSync, readdirSync } from "node:fs";
import { setTimeout as sleep } from "node:timers/promises";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import type { RunInput } from "../../sandbox/engine/model.ts";
import { SMALL_LAYOUT, SMALL_SONG, runWell } from "../../tests/support/run-script.ts";
import { createRunPool, type RunPool } from "./run-pool.ts";

const HONEST = 'for (const front of square.fronts) {\n  front.pulse(1, "gold");\n  wait(roll(3));\n}';
const SLOW_MS = 300_000;
/** Odd steps through a stretch of time: every phase of a run is met, start-up and hand-over too. */
const moments = (count: number, upToMs: number): number[] =>
  Array.from({ length: count }, (_, index) => 1 + ((index * 7919) % upToMs));

function inputOf(source: string): RunInput {
  return { source, songId: "small", song: SMALL_SONG, layout: SMALL_LAYOUT, seed: 7 };
}

/** Processes that this one has started. Linux tells them in /proc. */
function listChildren(): number[] {
  return readdirSync("/proc/self/task").flatMap((task) =>
    readFileSync(`/proc/self/task/${task}/children`, "utf8").split(" ").filter(Boolean).map(Number),
  );
}

describe("a run that is ended at any moment", () => {
  let pool: RunPool;
  let child: number;
  let golden: string;

  /** The pool's process now: the child of ours that was not there before. */
  const others = new Set(listChildren());
  const findChild = (): number | undefined => listChildren().find((pid) => !others.has(pid));

  beforeAll(async () => {
    golden = (await runWell(HONEST)).hash;
    pool = createRunPool({ threads: 2, deadlineMs: 60_000 });
    expect(await pool.run(inputOf(HONEST))).toMatchObject({ ok: true, hash: golden });
    child = findChild() ?? 0;
    expect(child).toBeGreaterThan(0);
  }, SLOW_MS);
  afterAll(() => pool.close());

  it("settles once, with one of two problems, and leaves the pool ready", { timeout: SLOW_MS }, async () => {
    const ended = moments(8, 400).map((deadlineMs) => pool.run(inputOf("while (true) {}"), { deadlineMs }));
    const codes = (await Promise.all(ended)).map((outcome) => (outcome.ok ? "ran" : outcome.problem.code));
    expect(codes.filter((code) => code !== "endless" && code !== "too-much-work")).toEqual([]);
    expect(codes).toContain("too-much-work");
    expect(await pool.run(inputOf(HONEST))).toMatchObject({ ok: true, hash: golden });
    // Threads are ended, not the process.
    expect(findChild()).toBe(child);
  });

  it("is made again when the whole process dies under it", { timeout: SLOW_MS }, async () => {
    for (const moment of moments(2, 150)) {
      const runs = Array.from({ length: 4 }, () => pool.run(inputOf(HONEST)));
      await sleep(moment);
      const pid = findChild();
      if (pid !== undefined) process.kill(pid, "SIGKILL");
      for (const outcome of await Promise.all(runs)) expect(outcome).toMatchObject({ ok: true, hash: golden });
    }
    expect(await pool.run(inputOf(HONEST))).toMatchObject({ ok: true, hash: golden });
    expect(findChild()).not.toBe(child);
  });
});
