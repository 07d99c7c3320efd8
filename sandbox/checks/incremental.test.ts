import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { buildLayout, buildShow, buildSong, colour, fadeTo, off, on, pulse } from "../../tests/factories/small-show.ts";
import type { WrittenCue } from "../timeline/build.ts";
import { openSetting } from "./context.ts";
import { checkShow, createShowCheck } from "./index.ts";

/** Two sides and a tree, every kind of box, 12 lights; big parts, so that flashes are found, too. */
const layout = buildLayout([
  { side: "north", outlets: ["relay", { kind: "colour", part: "windows" }, "dimmer"] },
  { side: "north", outlets: ["solid-state", { kind: "colour", part: "windows" }] },
  { side: "south", outlets: [{ kind: "dimmer", part: "windows", watts: 900 }, 4] },
  { side: null, outlets: ["dimmer", { kind: "colour", part: "lamps" }] },
]);
const song = buildSong();
const LIGHTS = Array.from({ length: 12 }, (_, light) => light);

const beat = fc.integer({ min: 0, max: 127 }).map((quarter) => quarter / 4);
const some = fc.oneof(fc.constant(LIGHTS), fc.subarray(LIGHTS, { minLength: 1 }));
const level = fc.constantFrom(0, 20, 50, 100);
const length = fc.constantFrom(0, 0.01, 0.25, 1, 6);
const hue = fc.constantFrom(0xff_00_00, 0x00_00_ff, 0xff_ff_ff);
const line = fc.integer({ min: 1, max: 9 });
const someCue: fc.Arbitrary<WrittenCue> = fc.oneof(
  fc.tuple(beat, some, level, line).map((a) => on(...a)),
  fc.tuple(beat, some, line).map((a) => off(...a)),
  fc.tuple(beat, some, level, length, line).map((a) => fadeTo(...a)),
  fc.tuple(beat, some, length, fc.option(hue, { nil: undefined }), line).map((a) => pulse(...a)),
  fc.tuple(beat, some, hue, length, line).map((a) => colour(...a)),
);
/** A pulse on every half beat of four bars, which some sides may not have. */
const flashing = fc
  .tuple(some, line)
  .map(([lights, at]) => Array.from({ length: 32 }, (_, turn) => pulse(turn / 2, lights, 0.5, undefined, at)));

/** A few hundred whole checks; a busy machine takes its time. */
const SLOW_MS = 180_000;

/** What an edit does to the cues of a show. */
const edit: fc.Arbitrary<(cues: readonly WrittenCue[]) => readonly WrittenCue[]> = fc.oneof(
  fc.array(someCue, { minLength: 1, maxLength: 6 }).map((more) => (cues: readonly WrittenCue[]) => [...cues, ...more]),
  flashing.map((more) => (cues: readonly WrittenCue[]) => [...more, ...cues]),
  fc.nat().map((at) => (cues: readonly WrittenCue[]) => cues.filter((_, cue) => cue !== at % (cues.length + 1))),
  fc.nat().map((from) => (cues: readonly WrittenCue[]) => cues.slice(from % (cues.length + 1))),
  // A line was added above: nothing but the lines changes.
  fc.constant((cues: readonly WrittenCue[]) => cues.map((cue) => ({ ...cue, chain: cue.chain.map((at) => at + 1) }))),
  fc
    .nat({ max: 500 })
    .map(
      (later) => (cues: readonly WrittenCue[]) =>
        cues.map((cue, index) => (index % 7 === 0 ? { ...cue, tick: cue.tick + later } : cue)),
    ),
  fc.constant((cues: readonly WrittenCue[]) => cues),
);

describe("createShowCheck", () => {
  it("finds after every edit what a check from scratch finds", { timeout: SLOW_MS }, () => {
    fc.assert(
      fc.property(fc.array(edit, { minLength: 1, maxLength: 7 }), fc.array(fc.boolean()), (edits, completes) => {
        const check = createShowCheck({ layout, song });
        let cues: readonly WrittenCue[] = [];
        edits.forEach((change, step) => {
          cues = change(cues);
          const timeline = buildShow(layout, cues, { isComplete: completes[step] ?? true });
          expect(check(timeline)).toEqual(checkShow({ timeline, layout, song }));
        });
      }),
      { numRuns: 40 },
    );
  });

  it("works the facts of a light out again only when what it is told has changed", () => {
    const open = openSetting({ layout, song });
    const before = open(buildShow(layout, [on(0, LIGHTS, 50), pulse(4, [0, 1], 1)])).facts();
    const after = open(
      buildShow(layout, [on(0, LIGHTS, 50, 3), pulse(2, 5, 1), pulse(4, [0, 1], 1, undefined, 4)]),
    ).facts();
    expect(LIGHTS.filter((light) => before[light] !== after[light])).toEqual([5]);
  });

  it("keeps what the last check used and forgets the rest", () => {
    const open = openSetting({ layout, song });
    const early = open(buildShow(layout, [pulse(4, 1, 1)])).facts()[1];
    expect(open(buildShow(layout, [pulse(4, 1, 1), on(9, 2)])).facts()[1]).toBe(early);
    open(buildShow(layout, [pulse(8, 1, 1)])).facts();
    expect(open(buildShow(layout, [pulse(4, 1, 1)])).facts()[1]).not.toBe(early);
  });
});
