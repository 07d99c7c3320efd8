import { describe, expect, it } from "vitest";
import { buildLayout, buildShow, buildSong, fadeTo, off, on, pulse } from "../../tests/factories/small-show.ts";
import { EvidenceSchema } from "../../shared/contracts/marking.ts";
import type { WrittenCue } from "../timeline/build.ts";
import { listFunctionCalls } from "./calls.ts";
import { gatherEvidence, type EvidenceTopic } from "./evidence.ts";

const layout = buildLayout([
  { side: "north", outlets: ["relay"] },
  { side: "north", outlets: ["dimmer"] },
  { side: "south", outlets: [{ kind: "dimmer", watts: 720 }] },
]);
const song = buildSong({
  sections: [
    { name: "verse", start: 0, end: 16 },
    { name: "chorus", start: 16, end: 32 },
  ],
  instruments: [
    { name: "drums", hits: [0, 1, 2, 3, 16], notes: [] },
    { name: "bells", hits: [5], notes: [] },
  ],
});
const gather = (cues: readonly WrittenCue[], source = "") =>
  gatherEvidence({ timeline: buildShow(layout, cues), layout, song, source });
const facts = (topic: EvidenceTopic, cues: readonly WrittenCue[], source?: string) =>
  gather(cues, source)
    .filter((fact) => fact.topic === topic)
    .map(({ kind, text }) => `${kind}: ${text}`);

describe("gatherEvidence", () => {
  it("counts fronts and sides that light up", () => {
    expect(facts("coverage", [on(0, [0, 1, 2])])).toEqual([
      "tick: 3 of 3 fronts light up.",
      "tick: All 2 sides light up.",
    ]);
    expect(facts("coverage", [on(0, 1)])).toEqual([
      "triangle: 1 of 3 fronts light up. Dark: front a and front c.",
      "triangle: 1 side stays dark: south.",
    ]);
  });
  it("counts pulses within 20 ms of a hit of the instrument that fits best", () => {
    // 20 ms are 0.04 beats at 120 a minute.
    const cues = [
      pulse(0, [1, 2], 1, undefined, 3),
      pulse(1.039, 1, 1, undefined, 4),
      pulse(2.05, 1, 1, undefined, 5),
      pulse(16, 1, 1, undefined, 6),
    ];
    const [hits] = gather(cues).filter(({ text }) => text.includes("hit"));
    expect(hits).toMatchObject({
      kind: "tick",
      text: "3 of 4 pulse moments are on a hit of the drums.",
      lines: [5],
      moments: [1968],
    });
  });
  it("counts bars in which nothing changes; a running fade is a change", () => {
    expect(facts("music", [fadeTo(0, 1, 100, 32)])[1]).toBe("tick: Something changes in every bar.");
    expect(facts("music", [on(0, 1), off(16, 1)])[1]).toBe(
      "triangle: Nothing changes in 6 of 8 bars: 2, 3, 4, 6, 7 and 8.",
    );
  });
  it("compares the light of chorus and verse", () => {
    expect(facts("dynamics", [on(0, 1, 30), on(16, [1, 2], 90)])).toEqual([
      "tick: The chorus has 60 % of the light that the square can give, the verse 10 %.",
    ]);
    expect(facts("dynamics", [on(0, 1, 90)])[0]).toContain("info:");
  });
  it("counts calls with different values, loops and conditions", () => {
    const source =
      "function sweep(lights, step) {\n  for (const f of lights) { for (const p of f) p.pulse(1); wait(step); }\n}\nsweep(square.all, 1);\nsweep(square.all, 2);\nif (now() > 4) sweep(square.all, 1);";
    expect(facts("code", [], source)).toEqual([
      "tick: `sweep` is called on 3 lines with 2 different sets of values.",
      "tick: 2 loops, 1 of them inside another, 1 condition.",
    ]);
    expect(facts("code", [], "square.all.on();")).toEqual([
      "info: The script has no function of its own.",
      "info: 0 loops, 0 of them inside another, 0 conditions.",
    ]);
  });
  it("tells peak load, flashes and relay clicks", () => {
    // 760 W of the 1440 W that 15 A at 120 V may carry for hours.
    expect(facts("safety", [on(0, 2), pulse(0, 0, 1), pulse(4, 0, 1)])).toEqual([
      "tick: The fullest circuit takes 53 % of what it may take (a planning aid).",
      "tick: The north side flashes at most 1 time in a second. The limit is 3.",
      "info: The relays come on 2 times in a show, the busiest 2 times: in a season 0 % of its life.",
    ]);
  });
  it("fits what travels to the person who marks", () => {
    for (const fact of gather([on(0, 1), pulse(2.3, 2, 1)], "repeat(4, () => {});"))
      expect(EvidenceSchema.safeParse(fact).success).toBe(true);
  });
});

describe("listFunctionCalls", () => {
  it("leaves calls of a function to itself out, and takes arrows for functions", () => {
    const calls = listFunctionCalls("const grow = (n) => { if (n > 0) grow(n - 1); };\ngrow(3);\nfunction idle() {}");
    expect(calls).toEqual([
      { name: "grow", parameters: 1, line: 1, callLines: [2], differentValues: 1 },
      { name: "idle", parameters: 0, line: 3, callLines: [], differentValues: 0 },
    ]);
  });
});
