import { describe, expect, it } from "vitest";
import { countText, readingGrade } from "../../shared/reading-grade.ts";
import {
  buildBroadStreet,
  buildFront,
  buildLayout,
  buildShow,
  buildSong,
  colour,
  fadeTo,
  off,
  on,
  pulse,
} from "../../tests/factories/small-show.ts";
import type { Finding } from "../engine/model.ts";
import type { WrittenCue } from "../timeline/build.ts";
import { checkShow } from "./index.ts";
import { SEVERITIES } from "./severities.ts";

/** Shows that between them have every finding there is. */
const mixed = buildFront(
  "relay",
  { kind: "dimmer", watts: 1600 },
  { kind: "colour" },
  { kind: "dimmer", watts: 2500, circuit: "b" },
  "solid-state",
);
const sides = buildLayout([
  { side: "north", outlets: ["dimmer"] },
  { side: "south", outlets: ["dimmer"] },
]);
const windows = buildLayout(
  Array.from({ length: 8 }, () => ({
    side: "north" as const,
    outlets: [{ kind: "colour" as const, part: "windows" }],
  })),
);
const WINDOWS = [0, 1, 2, 3, 4, 5, 6, 7];
const turns = (step: number, action: (beat: number) => WrittenCue[]) =>
  Array.from({ length: Math.floor(32 / step) }, (_, turn) => action(turn * step)).flat();
const check = (layout: typeof mixed, cues: readonly WrittenCue[], overrides = {}, song = buildSong()) =>
  checkShow({ timeline: buildShow(layout, cues, overrides), layout, song });

const FINDINGS: readonly Finding[] = [
  ...check(
    mixed,
    turns(0.5, (beat) => [pulse(beat, [0, 1, 2, 3], 0.4)]),
  ),
  ...check(
    mixed,
    [
      on(0, 0, 40, 2),
      on(0.11, 1, 10, 3),
      off(0.11, 1, 4),
      pulse(1, 4, 0.005),
      fadeTo(2, 2, 90, 4, 5),
      off(3, 2, 6),
      colour(4, 2, 0xff),
      pulse(5, 2, 0),
    ],
    { isComplete: false },
    buildSong({}, { bars: 9, tempo: 60 }),
  ),
  ...check(mixed, []),
  ...check(
    sides,
    turns(1, (beat) => [pulse(beat, 0, 1), pulse(beat + 0.5, 1, 1)]),
  ),
  ...check(
    sides,
    turns(1, (beat) => [pulse(beat, [0, 1], 1)]),
    {},
    buildSong({}, { tempo: 179 }),
  ),
  ...check(
    windows,
    turns(0.5, (beat) => [colour(beat, WINDOWS, 0xff_00_00), on(beat, WINDOWS, 35), off(beat + 0.25, WINDOWS)]),
  ),
  ...check(
    buildBroadStreet(),
    turns(0.5, (beat) => [pulse(beat, 0, 0.5)]),
  ),
  ...check(sides, [on(0, 0), off(4, 0), on(28, 0), colour(2, 1, 0xff)], {}, buildSong({}, { tempo: 60 })),
  ...check(
    buildFront("relay", "dimmer"),
    Array.from({ length: 300 }, (_, beat) => pulse(beat, 0, 0.5)),
    { endTick: 400 * 960 },
    buildSong({}, { bars: 100 }),
  ),
];

describe("what the show check says", () => {
  it("is covered here, every rule of it", () => {
    expect([...new Set(FINDINGS.map(({ rule }) => rule))].sort()).toEqual(Object.keys(SEVERITIES).sort());
  });
  it("takes the severity of the table", () => {
    for (const { rule, severity } of FINDINGS)
      expect(severity).toBe(SEVERITIES[rule as keyof typeof SEVERITIES].severity);
  });
  it("has at most 20 words a sentence, of grade 6 at most and 4 on average", () => {
    const grades = FINDINGS.map(({ sentence }) => {
      expect(countText(sentence).words, sentence).toBeLessThanOrEqual(20);
      const grade = readingGrade(countText(sentence));
      expect(grade, sentence).toBeLessThanOrEqual(6);
      return grade;
    });
    expect(grades.reduce((sum, grade) => sum + grade, 0) / grades.length).toBeLessThanOrEqual(4);
  });
  it("says what to do in a hint that reads as easily, and what it leaves to others", () => {
    for (const { hint, rule } of FINDINGS)
      if (hint !== undefined) expect(readingGrade(countText(hint)), `${rule}: ${hint}`).toBeLessThanOrEqual(9);
    const safety = FINDINGS.filter(({ rule }) => rule.startsWith("street-flash") || rule.startsWith("circuit"));
    for (const { hint, rule } of safety)
      if (rule !== "street-flash-long-run") expect(hint).toMatch(/safety officer decides|electrician decide/);
  });
});
