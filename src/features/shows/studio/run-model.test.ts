import { describe, expect, it } from "vitest";
import type { Finding, RunOutcome } from "../../../../sandbox/engine/model.ts";
import { buildTimeline } from "../../../../sandbox/timeline/build.ts";
import type { Timeline } from "../../../../sandbox/timeline/model.ts";
import {
  findGentleReason,
  findRibbonTimeline,
  FIRST_RUN_STATE,
  listActLines,
  listFindings,
  presentRun,
  reduceRun,
  type RunEvent,
} from "./run-model.ts";

function build(isComplete: boolean): Timeline {
  const head = { language: 1, songId: "s", layoutHash: "h", seed: 1, lightCount: 4, endTick: 9600, isComplete };
  return buildTimeline(head, [
    { tick: 0, action: "on", lights: [0], level: 10_000, chain: [7, 2] },
    { tick: 960, action: "off", lights: [0], chain: [3] },
  ]);
}

const report = { notes: [], findings: [], fuel: 1, cueCount: 2 };
const good: RunOutcome = { ok: true, timeline: build(true), hash: "x", ...report };
const range = { line: 4, column: 1, endLine: 4, endColumn: 3 };
const bad: RunOutcome = {
  ok: false,
  problem: { code: "unknown-word", sentence: "I do not know the word `Wait`.", hint: "", range, excerpt: "" },
  timeline: build(false),
  ...report,
};
const flash: Finding = {
  rule: "street-flash",
  severity: "stop",
  sentence: "Too many flashes.",
  moments: [0],
  lights: [],
  lines: [2],
};

function play(...events: RunEvent[]) {
  return events.reduce(reduceRun, FIRST_RUN_STATE);
}
const finish = (run: number, outcome: RunOutcome): RunEvent[] => [
  { type: "started", run },
  { type: "finished", run, source: `source ${run}`, outcome },
];

describe("reduceRun", () => {
  it("keeps the last good run on stage when the next one has a problem", () => {
    const state = play(...finish(1, good), ...finish(2, bad));
    expect(state.onStage).toBe(good.timeline);
    expect(findRibbonTimeline(state)).toBe(bad.timeline);
    expect(presentRun(state)).toBe("Line 4: I do not know the word Wait.");
  });

  it("drops the answer to a run that was overtaken", () => {
    const state = play(
      { type: "started", run: 1 },
      { type: "started", run: 2 },
      { type: "finished", run: 1, source: "old", outcome: good },
    );
    expect(state).toMatchObject({ isRunning: true, onStage: null });
  });

  it("drops findings about a show that is no longer on stage", () => {
    const other: RunOutcome = { ...good, timeline: build(true) };
    const state = play(...finish(1, good), ...finish(2, other), {
      type: "checked",
      timeline: good.timeline,
      findings: [flash],
    });
    expect(state.checked).toBeNull();
  });

  it("says in words when nothing could be run", () => {
    expect(presentRun(play({ type: "started", run: 1 }, { type: "failed", run: 1, reason: "No." }))).toBe("No.");
  });
});

describe("findGentleReason", () => {
  it("is on by itself until the flash check has passed, and after a flash stop", () => {
    const unchecked = play(...finish(1, good));
    expect(findGentleReason(unchecked)).toContain("not done");
    expect(
      findGentleReason(reduceRun(unchecked, { type: "checked", timeline: good.timeline, findings: [flash] })),
    ).toContain("too often");
    expect(
      findGentleReason(reduceRun(unchecked, { type: "checked", timeline: good.timeline, findings: [] })),
    ).toBeNull();
  });

  it("does not mind other stops", () => {
    const stop: Finding = { ...flash, rule: "circuit-overload" };
    expect(
      findGentleReason(play(...finish(1, good), { type: "checked", timeline: good.timeline, findings: [stop] })),
    ).toBeNull();
  });
});

describe("listFindings", () => {
  it("puts stops first, whoever found them", () => {
    const note: Finding = { ...flash, rule: "level-clamped", severity: "note" };
    const withNote: RunOutcome = { ...good, findings: [note] };
    const state = play(...finish(1, withNote), { type: "checked", timeline: withNote.timeline, findings: [flash] });
    expect(listFindings(state).map((finding) => finding.severity)).toEqual(["stop", "note"]);
  });
});

describe("listActLines", () => {
  it("names the lines that act, not those that call them", () => {
    expect(listActLines(build(true))).toEqual([2, 3]);
    expect(listActLines(null)).toEqual([]);
  });
});
