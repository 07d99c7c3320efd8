import { describe, expect, it } from "vitest";
import { runKillRounds } from "./kill-rounds.ts";

const KILLS = 5;

describe("kill -9 of the server while 30 students save", () => {
  it("loses no acknowledged save and leaves a sound file, five times over", async () => {
    const report = await runKillRounds(KILLS);
    expect(report.faults).toEqual([]);
    expect(report.kills).toBe(KILLS);
    // Every kill met saves: a round waits for its first answer.
    expect(report.acknowledged).toBeGreaterThanOrEqual(KILLS);
  }, 180_000);
});
