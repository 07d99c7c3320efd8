import { describe, expect, it } from "vitest";
import { buildFront, buildShow, buildSong, colour, fadeTo, off, on, pulse } from "../../tests/factories/small-show.ts";
import type { WrittenCue } from "../timeline/build.ts";
import { findColourNeverLit } from "./colour-never-lit.ts";
import { findColourNotShown } from "./colour-not-shown.ts";
import { createCheckContext, type CheckContext } from "./context.ts";
import { findFadeCut } from "./fade-cut.ts";
import { findNeverSeen } from "./never-seen.ts";
import { findNeverSwitches } from "./never-switches.ts";
import { findOffGrid } from "./off-grid.ts";

/** 0 relay, 1 dimmer, 2 and 3 colour. */
const layout = buildFront("relay", "dimmer", { kind: "colour" }, { kind: "colour" });
const context = (cues: readonly WrittenCue[], song = buildSong()): CheckContext =>
  createCheckContext({ timeline: buildShow(layout, cues), layout, song });

describe("rule 31: never seen", () => {
  const lines = (cues: readonly WrittenCue[]) => findNeverSeen(context(cues)).map((finding) => finding.lines[0]);

  it("finds a level cue that is replaced at the same tick on all its lights", () => {
    const [finding, ...more] = findNeverSeen(context([on(1, [1, 2], 100, 2), off(1, [1, 2, 3], 3)]));
    expect(finding).toMatchObject({
      rule: "never-seen",
      severity: "warn",
      lines: [2],
      moments: [960],
      lights: ["front-a/windows", "front-a/door"],
    });
    expect(finding?.sentence).toBe("Nobody sees this. Line 3 changes the same lights at the same time.");
    expect(more).toEqual([]);
  });
  it("leaves a cue alone that one light still shows", () => {
    expect(lines([on(1, [1, 2], 100, 2), off(1, 1, 3)])).toEqual([]);
  });
  it("finds one that several others replace together", () => {
    expect(lines([on(1, [1, 2], 100, 2), off(1, 1, 3), on(1, 2, 50, 4)])).toEqual([2]);
  });
  it("leaves a later tick alone", () => {
    expect(lines([on(1, 1, 100, 2), off(1 + 1 / 960, 1, 3)])).toEqual([]);
  });
  it("counts the level that a fade starts from as seen, a fade under a fade not", () => {
    expect(lines([on(1, 1, 100, 2), fadeTo(1, 1, 0, 2, 3)])).toEqual([]);
    expect(lines([on(1, 1, 100, 2), fadeTo(1, 1, 0, 2, 3), fadeTo(1, 1, 20, 2, 4)])).toEqual([3]);
    expect(lines([on(1, 1, 100, 2), on(1, 1, 90, 3), fadeTo(1, 1, 0, 2, 4)])).toEqual([2]);
  });
  it("counts an off that ended a running pulse as seen", () => {
    expect(lines([pulse(0, 1, 4, undefined, 1), off(1, 1, 2), on(1, 1, 50, 3)])).toEqual([]);
    expect(lines([pulse(0, 1, 1, undefined, 1), off(1, 1, 2), on(1, 1, 50, 3)])).toEqual([2]);
  });
  it("finds a pulse that is ended at its own tick", () => {
    const [finding] = findNeverSeen(context([pulse(1, 1, 1, undefined, 2), off(1, 1, 3)]));
    expect(finding?.sentence).toBe("Nobody sees this. Line 3 changes the same lights at the same time.");
    expect(finding?.lines).toEqual([2]);
  });
  it("does not hold a pulse against a pulse", () => {
    expect(lines([pulse(1, 1, 1, undefined, 2), pulse(1, 1, 2, undefined, 3)])).toEqual([]);
  });
  it("finds a pulse of no beats", () => {
    expect(findNeverSeen(context([pulse(1, 1, 0, undefined, 2)])).map(({ sentence }) => sentence)).toEqual([
      "Nobody sees this pulse. It lasts for 0 beats.",
    ]);
  });
  it("gives one finding for a loop", () => {
    const turns = Array.from({ length: 20 }, (_, turn) => [on(turn, 1, 100, 4), off(turn, 1, 4)]).flat();
    const [finding, ...more] = findNeverSeen(context(turns));
    expect(finding?.moments).toHaveLength(20);
    expect(finding?.sentence).toContain("This line changes the same lights");
    expect(more).toEqual([]);
  });
});

describe("rule 32: fade cut", () => {
  const cut = (cues: readonly WrittenCue[]) =>
    findFadeCut(context(cues)).map(({ lines, sentence }) => [lines[0], sentence]);

  it("finds a fade that is replaced before its end", () => {
    expect(cut([fadeTo(0, 1, 80, 4, 2), on(2, 1, 10, 4)])).toEqual([
      [2, "This fade stops half way. Line 4 cuts it off."],
    ]);
    expect(cut([colour(0, 2, 0xff, 4, 2), colour(2, 2, 0xff_00, 0, 5)])).toEqual([
      [2, "This fade stops half way. Line 5 cuts it off."],
    ]);
  });
  it("leaves a fade alone that ends as the next begins, within the rounding of ticks", () => {
    expect(cut([fadeTo(0, 1, 80, 2), fadeTo(2, 1, 20, 2)])).toEqual([]);
    expect(cut([fadeTo(0, 1, 80, 2), fadeTo(2 - 1 / 960, 1, 20, 2)])).toEqual([]);
  });
  it("leaves a pulse over a fade and a colour change in a level fade alone", () => {
    expect(cut([fadeTo(0, 2, 80, 4), pulse(1, 2, 1), colour(2, 2, 0xff)])).toEqual([]);
  });
  it("says nothing about colours on lights that have none", () => {
    expect(cut([colour(0, 1, 0xff, 4), colour(2, 1, 0xff_00)])).toEqual([]);
  });
});

describe("rule 33: colour never lit", () => {
  const dark = (cues: readonly WrittenCue[]) => findColourNeverLit(context(cues)).map(({ lines }) => lines[0]);

  it("finds a colour on lights that stay dark until the end", () => {
    expect(findColourNeverLit(context([colour(1, [2, 3], 0xff, 0, 2)]))[0]).toMatchObject({
      severity: "note",
      sentence: "The lights have a colour, but they are off.",
      lights: ["front-a/door", "front-a/sign"],
    });
  });
  it("finds one that is replaced before the lights come on", () => {
    expect(dark([colour(1, 2, 0xff, 0, 2), colour(3, 2, 0xff_00, 0, 3), on(4, 2)])).toEqual([2]);
  });
  it("is content when one of the lights is lit, by level, fade or pulse", () => {
    expect(dark([colour(1, [2, 3], 0xff), on(2, 3, 1)])).toEqual([]);
    expect(dark([on(0, 2), colour(1, 2, 0xff)])).toEqual([]);
    expect(dark([fadeTo(0, 2, 100, 4), off(2, 2), colour(1, 2, 0xff)])).toEqual([]);
    expect(dark([colour(1, 2, 0xff), pulse(9, 2, 1)])).toEqual([]);
    expect(dark([pulse(0, 2, 4), colour(1, 2, 0xff)])).toEqual([]);
  });
  it("does not count what is lit before, or from the next colour on", () => {
    expect(dark([pulse(0, 2, 1), colour(1, 2, 0xff, 0, 2)])).toEqual([2]);
    expect(dark([on(0, 2), off(1, 2), colour(1, 2, 0xff, 0, 2)])).toEqual([2]);
    expect(dark([colour(1, 2, 0xff, 0, 2), colour(2, 2, 0xff_00, 0, 3), on(2, 2)])).toEqual([2]);
  });
  it("leaves lights alone that have no colour", () => {
    expect(dark([colour(1, [0, 1], 0xff)])).toEqual([]);
  });
});

describe("colour not shown", () => {
  const plain = (cues: readonly WrittenCue[]) => findColourNotShown(context(cues)).map(({ lines }) => lines[0]);

  it("finds a line that gives colours to lights without colour alone", () => {
    expect(findColourNotShown(context([colour(1, [0, 1], 0xff, 0, 4), colour(2, 1, 0xff, 0, 4)]))).toMatchObject([
      {
        rule: "colour-not-shown",
        severity: "note",
        lines: [4],
        moments: [960, 1920],
        lights: ["front-a/roof", "front-a/windows"],
      },
    ]);
  });
  it("leaves a line alone that reaches a colour light, at once or in another turn", () => {
    expect(plain([colour(1, [1, 2], 0xff)])).toEqual([]);
    expect(plain([colour(1, 1, 0xff, 0, 4), colour(2, 2, 0xff, 0, 4), colour(3, 1, 0xff, 0, 5)])).toEqual([5]);
  });
  it("leaves pulses alone: they are seen, whatever their colour", () => {
    expect(plain([pulse(1, 1, 1, 0xff)])).toEqual([]);
  });
});

describe("never switches", () => {
  const stays = (cues: readonly WrittenCue[]) =>
    findNeverSwitches(context(cues)).map(({ lines, lights }) => [lines[0], ...lights]);

  it("finds levels and fades that stay below 50 on a box that is on or off", () => {
    expect(stays([on(0, [0, 1], 49.99, 2)])).toEqual([[2, "front-a/roof"]]);
    expect(stays([fadeTo(0, 0, 40, 4, 3)])).toEqual([[3, "front-a/roof"]]);
    expect(findNeverSwitches(context([on(0, 0, 30)]))[0]?.measured).toEqual({ value: 30, limit: 50, unit: "level" });
  });
  it("leaves 50, a way down and dimmers alone", () => {
    expect(stays([on(0, 0, 50)])).toEqual([]);
    expect(stays([on(0, 0, 90), fadeTo(2, 0, 20, 2)])).toEqual([]);
    expect(stays([on(0, [1, 2], 20), on(1, 0, 0)])).toEqual([]);
  });
});

describe("off the grid", () => {
  it("counts steps that are neither on eighths, sixths nor a sound of the song", () => {
    const song = buildSong({
      instruments: [{ name: "bells", hits: [2.03], notes: [{ start: 3.07, beats: 1, pitch: 60 }] }],
    });
    const cues = [
      on(0, 1, 1, 1),
      on(0.125, 1, 2, 2),
      on(1 / 3, 1, 3, 3),
      on(2.03, 1, 4, 4),
      on(3.07, 1, 5, 5),
      on(4.1, 1, 6, 6),
      on(5.6, 1, 7, 7),
    ];
    const [finding] = findOffGrid(context(cues, song));
    expect(finding).toMatchObject({
      severity: "note",
      sentence: "2 of 7 steps are off the beat.",
      lines: [6, 7],
      moments: [3936, 5376],
    });
    expect(findOffGrid(context(cues.slice(0, 5), song))).toEqual([]);
  });
});
