import { describe, expect, it } from "vitest";
import { buildLayout, buildShow, buildSong, colour, fadeTo, off, on, pulse } from "../../tests/factories/small-show.ts";
import type { WrittenCue } from "../timeline/build.ts";
import { createCheckContext } from "./context.ts";
import { countStreetFlashes, findStreetFlashes } from "./street-flash.ts";

/** Two sides of ten fronts with a colour light each, and a tree. Lights 0 to 9 north, 10 to 19 south, 20 the tree. */
const layout = buildLayout([
  ...Array.from({ length: 10 }, () => ({ side: "north" as const, outlets: [{ kind: "colour" as const }] })),
  ...Array.from({ length: 10 }, () => ({ side: "south" as const, outlets: [{ kind: "colour" as const }] })),
  { side: null, outlets: [{ kind: "colour" as const }] },
]);
const NORTH = Array.from({ length: 10 }, (_, light) => light);
const SOUTH = NORTH.map((light) => light + 10);
const ALL = Array.from({ length: 21 }, (_, light) => light);

/** At 120 beats a minute unless said otherwise. */
const context = (cues: readonly WrittenCue[], tempo = 120) =>
  createCheckContext({ timeline: buildShow(layout, cues), layout, song: buildSong({}, { tempo }) });
const findings = (cues: readonly WrittenCue[], tempo?: number) =>
  findStreetFlashes(context(cues, tempo)).map(({ rule }) => rule);
const worst = (cues: readonly WrittenCue[], tempo?: number) =>
  countStreetFlashes(context(cues, tempo)).map((count) => count.worst);
const every = (step: number, action: (beat: number, turn: number) => WrittenCue | WrittenCue[]) =>
  Array.from({ length: Math.floor(32 / step) }, (_, turn) => action(turn * step, turn)).flat();

describe("shows that do not flash", () => {
  it("passes a sweep of single fronts, however fast", () => {
    expect(findings(every(0.25, (beat, turn) => pulse(beat, turn % 20, 1)))).toEqual([]);
    expect(worst(every(0.25, (beat, turn) => pulse(beat, turn % 20, 1)))).toEqual([0, 0, 0]);
  });
  it("passes the whole square pulsing on every beat: 2 a second", () => {
    expect(worst(every(1, (beat) => pulse(beat, ALL, 1)))).toEqual([2, 2, 2]);
    expect(findings(every(1, (beat) => pulse(beat, ALL, 1)))).toEqual([]);
  });
  it("passes two sides that take turns on the beat", () => {
    expect(findings(every(1, (beat, turn) => pulse(beat, turn % 2 ? NORTH : SOUTH, 1)))).toEqual([]);
  });
  it("passes slow breathing of everything", () => {
    expect(findings(every(4, (beat) => [fadeTo(beat, ALL, 90, 2), fadeTo(beat + 2, ALL, 20, 2)]))).toEqual([]);
  });
  it("passes sparkles of one light after another on sixteenths", () => {
    expect(findings(every(0.25, (beat, turn) => pulse(beat, (turn * 7) % 21, 0.5)))).toEqual([]);
  });
  it("passes quick changes of less than a tenth, and above 80 % (WCAG 2.2)", () => {
    // Levels 50 and 57 are Y .184 and .249; 93 and 100 are .829 and 1.
    expect(worst(every(0.25, (beat, turn) => on(beat, ALL, turn % 2 ? 57 : 50)))[0]).toBe(1);
    expect(worst(every(0.25, (beat, turn) => on(beat, ALL, turn % 2 ? 100 : 93)))[0]).toBe(1);
    expect(worst(every(0.25, (beat, turn) => on(beat, ALL, turn % 2 ? 100 : 85)))[0]).toBeGreaterThan(3);
  });
});

describe("shows that flash", () => {
  it("stops the whole square pulsing on half beats: 4 a second", () => {
    const found = findStreetFlashes(context(every(0.5, (beat) => pulse(beat, ALL, 0.5, undefined, 7))));
    expect(found.map(({ rule, severity }) => [rule, severity])).toEqual([["street-flash", "stop"]]);
    expect(found[0]).toMatchObject({ measured: { value: 4, limit: 3, unit: "flashes a second" }, lines: [7] });
    expect(found[0]?.sentence).toBe(
      "The north and south sides flash 4 times in one second in bar 1. More than 3 can harm people.",
    );
  });
  it("names every line that flashes too often, wherever in the show", () => {
    const cues = [0, 16].flatMap((from) =>
      Array.from({ length: 8 }, (_, turn) => pulse(from + turn / 2, NORTH, 0.5, undefined, from + 2)),
    );
    const [found] = findStreetFlashes(context(cues));
    expect(found).toMatchObject({ lines: [2, 18], measured: { value: 4 } });
    expect(found?.sentence).toMatch(/^The north side flashes 4 times in one second in bar 1\./);
  });
  it("stops two halves of a side that each pulse on the beat, half a beat apart", () => {
    const cues = every(1, (beat) => [pulse(beat, NORTH.slice(0, 5), 1), pulse(beat + 0.5, NORTH.slice(5), 1)]);
    expect(findings(cues)).toEqual(["street-flash"]);
  });
  it("stops different quarters that take turns on half beats", () => {
    expect(
      findings(
        every(0.5, (beat, turn) =>
          pulse(
            beat,
            [0, 1, 2].map((light) => ((turn % 3) * 3 + light) % 10),
            0.5,
          ),
        ),
      ),
    ).toEqual(["street-flash"]);
  });
  it("adds up lights within 20 ms, and not beyond (TRACE, 2024)", () => {
    // 20 ms are 0.04 beats at 120 a minute.
    const staggered = (gap: number) =>
      every(0.5, (beat) => NORTH.slice(0, 3).map((light) => pulse(beat + light * gap, light, 0.3)));
    expect(findings(staggered(0.019))).toEqual(["street-flash"]);
    expect(findings(staggered(0.06))).toEqual([]);
  });
  it("counts fades that go up and down four times a second", () => {
    expect(
      findings(every(0.5, (beat) => [fadeTo(beat, NORTH, 90, 0.25), fadeTo(beat + 0.25, NORTH, 10, 0.25)])),
    ).toEqual(["street-flash"]);
  });
  it("counts flashes of a saturated blue, which has little luminance", () => {
    expect(findings(every(0.5, (beat) => pulse(beat, NORTH, 0.5, 0x00_00_ff)))).toEqual(["street-flash"]);
  });
  it("counts a change between a bright and a dark colour", () => {
    expect(
      findings([on(0, NORTH), ...every(0.25, (beat, turn) => colour(beat, NORTH, turn % 2 ? 0xff_ff_00 : 0x00_00_ff))]),
    ).toEqual(["street-flash"]);
  });
  it("warns of sides that each keep the limit and exceed it together", () => {
    const cues = every(1, (beat) => [pulse(beat, NORTH, 1), pulse(beat + 0.5, SOUTH, 1)]);
    const found = findStreetFlashes(context(cues));
    expect(found.map(({ rule, severity }) => [rule, severity])).toEqual([["street-flash-all-sides", "warn"]]);
  });
});

describe("two houses that are each legal at two flashes a second (computed; changes within 20 ms are one by TRACE, 2024)", () => {
  const [LEFT, RIGHT] = [NORTH.slice(0, 5), NORTH.slice(5)];
  /** At 120 beats a minute: on for half a beat, off for half a beat. */
  const blink = (lights: readonly number[], later: number) =>
    every(1, (beat) => [on(beat + later, lights), off(beat + later + 0.5, lights)]).filter(
      ({ tick }) => tick < 31 * 960,
    );
  it("pass one by one, and in step", () => {
    expect(worst(blink(LEFT, 0))[0]).toBe(2);
    expect(worst([...blink(LEFT, 0), ...blink(RIGHT, 0)])[0]).toBe(2);
    // 20 ms are 0.04 beats.
    expect(worst([...blink(LEFT, 0), ...blink(RIGHT, 0.038)])[0]).toBe(2);
  });
  it("fail together when one is more than 20 ms late: four flashes a second in one view", () => {
    expect(worst([...blink(LEFT, 0), ...blink(RIGHT, 0.05)])[0]).toBe(4);
  });
  it("fail together in exactly opposite states, where the mean over the view would see nothing", () => {
    expect(worst([...blink(LEFT, 0), ...blink(RIGHT, 0.5)])[0]).toBe(4);
  });
});

describe("the limit", () => {
  it("lets three flashes a second pass and not the next faster tempo (WCAG 2.2, 2.3.1; 180 and 181 beats a minute)", () => {
    const onBeats = every(1, (beat) => pulse(beat, NORTH, 1));
    expect(worst(onBeats, 180)[0]).toBe(3);
    expect(worst(onBeats, 181)[0]).toBe(4);
  });
  it("takes a second as half-open: a fourth flash exactly one second later does not count (as cases f011 and c011 of the public test set)", () => {
    // At 60 beats a minute a beat is a second.
    const flashes = (last: number) => [0, 1 / 3, 2 / 3, last].map((beat) => pulse(beat, NORTH, 0.2));
    expect(worst(flashes(1), 60)[0]).toBe(3);
    expect(worst(flashes(29 / 30), 60)[0]).toBe(4);
  });
  it("takes a quarter of the lights in view as enough, and one less not", () => {
    const flash = (lights: number[]) => every(0.5, (beat) => [on(beat, lights), off(beat + 0.25, lights)]);
    // North and the tree are 11 lights: 3 are 27 %, 2 are 18 %.
    expect(worst(flash([0, 1, 2]))[0]).toBe(4);
    expect(worst(flash([0, 1]))[0]).toBe(0);
  });
  it("sees the tree from every side", () => {
    const cues = every(0.5, (beat) => pulse(beat, [0, 1, 20], 0.5));
    expect(findings(cues)).toEqual(["street-flash"]);
  });
  it("lets the pixels of a strip weigh as much as one light", () => {
    const strip = buildLayout([
      { side: "north", outlets: [40, ...Array.from({ length: 7 }, () => ({ kind: "colour" as const }))] },
    ]);
    const pixels = Array.from({ length: 40 }, (_, pixel) => pixel);
    const count = (lights: number[]) =>
      countStreetFlashes(
        createCheckContext({
          timeline: buildShow(
            strip,
            every(0.5, (beat) => pulse(beat, lights, 0.5)),
          ),
          layout: strip,
          song: buildSong(),
        }),
      )[0]?.worst;
    expect(count(pixels)).toBe(0);
    expect(count([...pixels, 40])).toBe(4);
  });
  it("reports a long run at the limit", () => {
    const found = findStreetFlashes(
      context(
        every(1, (beat) => pulse(beat, NORTH, 1)),
        179,
      ),
    );
    expect(found.map(({ rule }) => rule)).toEqual(["street-flash-long-run"]);
    expect(found[0]?.measured?.value).toBeCloseTo((31 * 60) / 179, 1);
  });
});
