import { describe, expect, it } from "vitest";
import {
  buildBroadStreet,
  buildFront,
  buildLayout,
  buildSong,
  type OutletSketch,
} from "../../tests/factories/small-show.ts";
import { runScript } from "../../tests/support/run-script.ts";
import type { BeatMap } from "../../shared/contracts/songs.ts";
import type { Layout } from "../../shared/contracts/square.ts";
import { RUN_FINDINGS } from "../language/problems/findings.ts";
import { judgeRun } from "./judge-run.ts";
import { SEVERITIES } from "./severities.ts";

/** A script as a pupil writes it, and what is said of it. */
interface Case {
  readonly rule: string;
  /** Script lines of the finding; none where it is about the show as a whole. */
  readonly lines: readonly number[];
  /** Where it is first seen, in beats; null where it is about the show as a whole. */
  readonly beat: number | null;
  readonly script: string;
  readonly layout?: Layout;
  readonly song?: BeatMap;
  /** The song that the show is checked with, when the beat map was made anew since. */
  readonly newSong?: BeatMap;
}

const BOXES = buildFront("relay", "dimmer", { kind: "colour" }, "solid-state");
const windows = (count: number, kind: OutletSketch): Layout =>
  buildLayout(Array.from({ length: count }, () => ({ side: "north" as const, outlets: [kind] })));
const TWO_SIDES = buildLayout([
  { side: "north", outlets: ["dimmer"] },
  { side: "south", outlets: ["dimmer"] },
]);
const COLOURS = windows(8, { kind: "colour", part: "windows" });
const HEAVY = buildFront({ kind: "dimmer", watts: 900 }, { kind: "dimmer", watts: 900 });
const SLOW = buildSong({}, { tempo: 60 });

const CASES: readonly Case[] = [
  { rule: "level-clamped", lines: [2], beat: 1, script: "wait(1);\nsquare.all.on(120);" },
  { rule: "after-the-end", lines: [2], beat: 40, script: "square.all.on();\nat(40, () => square.all.on(5));" },
  {
    rule: "nothing-to-light",
    lines: [3],
    beat: 1,
    script: 'square.all.on();\nwait(1);\nsquare.all.filter(light => light.box === "none").off();',
  },
  { rule: "count-rounded", lines: [2], beat: 0, script: "square.all.on();\nrepeat(2.5, () => wait(1));" },
  { rule: "long-wait", lines: [2], beat: 0, script: "square.all.on();\nwait(500);" },
  {
    rule: "same-each-turn",
    lines: [2],
    beat: null,
    script: "for (const front of square.fronts) {\n  at(2, () => front.on());\n}",
  },
  {
    rule: "never-so",
    lines: [2],
    beat: null,
    script: "for (let turn = 0; turn < 8; turn++) {\n  if (turn % 4 === 4) square.all.on();\n  wait(1);\n}",
  },
  { rule: "never-run", lines: [1], beat: null, script: "function wave() {\n  square.all.on();\n}\nwait(1);" },
  {
    rule: "all-each-turn",
    lines: [2],
    beat: null,
    script: "for (const front of square.fronts) {\n  square.fronts.pulse(1);\n  wait(2);\n}",
  },
  {
    rule: "last-wait",
    lines: [3],
    beat: null,
    script: "at(song.bars, () => {\n  square.all.on();\n  wait(2);\n});",
  },
  {
    rule: "street-flash",
    lines: [2],
    beat: 0,
    script: "repeat(40, () => {\n  square.all.pulse(0.4);\n  wait(0.5);\n});",
  },
  {
    rule: "street-flash-all-sides",
    lines: [2, 4],
    beat: 0,
    layout: TWO_SIDES,
    script:
      'repeat(32, () => {\n  square.side("north").pulse(1);\n  wait(0.5);\n  square.side("south").pulse(1);\n  wait(0.5);\n});',
  },
  {
    rule: "street-flash-long-run",
    lines: [2],
    beat: 0,
    song: buildSong({}, { tempo: 179 }),
    script: "repeat(32, () => {\n  square.all.pulse(1);\n  wait(1);\n});",
  },
  {
    rule: "picture-flash",
    lines: [2],
    beat: 1.5,
    layout: buildBroadStreet(),
    script: "repeat(60, () => {\n  square.fronts[0].pulse(0.5);\n  wait(0.5);\n});",
  },
  {
    rule: "picture-red-flash",
    lines: [2],
    beat: 1.5,
    layout: COLOURS,
    script:
      'repeat(60, () => {\n  square.all.colour("red").on(35);\n  wait(0.25);\n  square.all.off();\n  wait(0.25);\n});',
  },
  { rule: "circuit-overload", lines: [3], beat: 4, layout: HEAVY, script: "\nwait(4);\nsquare.all.on();" },
  {
    rule: "circuit-everything-on",
    lines: [],
    beat: null,
    layout: HEAVY,
    script: 'square.parts("roof").on();\nwait(2);\nsquare.parts("roof").off();',
  },
  {
    rule: "circuit-inrush",
    lines: [3],
    beat: 4,
    layout: HEAVY,
    script: "wait(4);\nfor (const front of square.fronts) {\n  front.on(60);\n}",
  },
  { rule: "incomplete", lines: [], beat: null, script: "square.all.on();\nwait(-1);" },
  { rule: "nothing-lit", lines: [], beat: null, script: "wait(4);" },
  {
    rule: "wrong-length",
    lines: [],
    beat: null,
    script: "square.all.on();",
    newSong: buildSong({}, { bars: 9 }),
  },
  {
    rule: "relay-dwell",
    lines: [3],
    beat: 1,
    script: 'square.parts("windows").on();\nwait(1);\nsquare.parts("roof").pulse(0.25);',
  },
  {
    rule: "relay-rate",
    lines: [2],
    beat: 0,
    song: buildSong({}, { bars: 40 }),
    script: 'repeat(100, () => {\n  square.parts("roof").pulse(1);\n  wait(1.5);\n});',
  },
  {
    rule: "relay-wear",
    lines: [2],
    beat: 0,
    song: buildSong({}, { bars: 80 }),
    script: 'repeat(300, () => {\n  square.parts("roof").pulse(0.5);\n  wait(1);\n});',
  },
  {
    rule: "half-cycle",
    lines: [2],
    beat: 1,
    script: 'wait(1);\nsquare.parts("sign").pulse(0.005);',
  },
  { rule: "never-switches", lines: [2], beat: 1, script: 'wait(1);\nsquare.parts("roof").on(40);' },
  { rule: "never-seen", lines: [2], beat: 1, script: "wait(1);\nsquare.all.on();\nsquare.all.off();" },
  {
    rule: "fade-cut",
    lines: [1],
    beat: 0,
    script: 'square.parts("windows").fadeTo(80, 4);\nwait(2);\nsquare.parts("windows").on();',
  },
  {
    rule: "colour-never-lit",
    lines: [2],
    beat: 1,
    script: 'wait(1);\nsquare.parts("door").colour("red");\nsquare.parts("windows").on();',
  },
  {
    rule: "colour-not-shown",
    lines: [3],
    beat: 2,
    script: 'square.all.on();\nwait(2);\nsquare.parts("windows").colour("red");',
  },
  {
    rule: "off-grid",
    lines: [3],
    beat: 1.11,
    script: "square.all.on();\nwait(1.11);\nsquare.all.on(50);",
  },
  { rule: "ends-early", lines: [], beat: null, script: "square.all.on();\nwait(4);\nsquare.all.off();" },
  {
    rule: "long-dark",
    lines: [],
    beat: 4,
    song: SLOW,
    script: "square.all.on();\nwait(4);\nsquare.all.off();\nwait(20);\nsquare.all.on();",
  },
  { rule: "dark-fronts", lines: [], beat: null, layout: COLOURS, script: "square.fronts[0].on();" },
];

describe("findings", () => {
  it("are all shown by a script below", () => {
    const shown = CASES.map(({ rule }) => rule);
    expect(shown.toSorted()).toEqual([...Object.keys(RUN_FINDINGS), ...Object.keys(SEVERITIES)].toSorted());
  });

  it.each(CASES)("$rule in lines $lines", async ({ rule, lines, beat, script, layout = BOXES, song, newSong }) => {
    const played = song ?? buildSong();
    const outcome = await runScript(script, { layout, song: played });
    const found = judgeRun(outcome, layout, newSong ?? played).findings.find((finding) => finding.rule === rule);
    if (found === undefined) throw new Error("It was not found.");
    const [tick = Number.NaN] = found.moments;
    // A rise is timed where its line crosses the step, a hair beside the tick.
    expect({ lines: found.lines, tick: beat === null ? null : Math.abs(Math.round(tick)) }).toEqual({
      lines,
      tick: beat === null ? null : Math.round(beat * 960),
    });
    expect(`${found.sentence} ${found.hint ?? ""}`).not.toMatch(/\{\w+\}|undefined|NaN|\[\?/);
  });
});
