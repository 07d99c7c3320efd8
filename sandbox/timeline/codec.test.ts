import { crc32 as zlibCrc32 } from "node:zlib";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { buildFront, buildShow, colour, fadeTo, off, on, pulse } from "../../tests/factories/small-show.ts";
import { ByteReader, ByteWriter, TimelineFormatError } from "./bytes.ts";
import { buildTimeline, type WrittenCue } from "./build.ts";
import { encodeCanonical } from "./canonical.ts";
import { decodeTimeline, encodeTimeline } from "./codec.ts";
import { crc32 } from "./crc32.ts";
import { parseTimelineJson, timelineToJson } from "./json.ts";
import type { Timeline } from "./model.ts";

const layout = buildFront("relay", "dimmer", { kind: "colour" }, 4);
const head = {
  language: 1,
  songId: "song-a",
  layoutHash: "0f",
  seed: 0xff_ff_ff_ff,
  lightCount: 7,
  endTick: 30_720,
  isComplete: true,
};

const lights = fc.shuffledSubarray([0, 1, 2, 3, 4, 5, 6], { minLength: 1 });
const line = fc.array(fc.integer({ min: 1, max: 400 }), { minLength: 1, maxLength: 4 });
const tick = fc.integer({ min: 0, max: head.endTick - 1 });
const level = fc.integer({ min: 0, max: 10_000 });
const length = fc.oneof(fc.integer({ min: 0, max: 5000 }), fc.constant(0xff_ff_ff_ff));
const rgb = fc.integer({ min: 0, max: 0xff_ff_ff });
const written: fc.Arbitrary<WrittenCue> = fc.oneof(
  fc.record({ tick, action: fc.constant("on" as const), lights, level, chain: line }),
  fc.record({ tick, action: fc.constant("off" as const), lights, chain: line }),
  fc.record({ tick, action: fc.constant("fadeTo" as const), lights, level, length, chain: line }),
  fc.record({
    tick,
    action: fc.constant("pulse" as const),
    lights,
    length,
    colour: fc.option(rgb, { nil: undefined }),
    chain: line,
  }),
  fc.record({ tick, action: fc.constant("colour" as const), lights, length, colour: rgb, chain: line }),
);
const timelines = fc
  .record({
    cues: fc.array(written, { maxLength: 60 }),
    isComplete: fc.boolean(),
    seed: fc.integer({ min: 0, max: 0xff_ff_ff_ff }),
  })
  .map(({ cues, ...rest }) => buildTimeline({ ...head, ...rest }, cues));

const sample = buildShow(layout, [
  on(0, [0, 1, 2], 50, 3),
  pulse(1, [2, 1], 0.5, 0xff_d7_00, [2, 9]),
  pulse(1, [1, 2], 0.5, undefined, [2, 9]),
  fadeTo(2, 3, 12.5, 4, 5),
  colour(3, [4, 5], 0, 1, 6),
  off(4, [0, 1, 2], 3),
]);

describe("buildTimeline", () => {
  it("sorts by tick and keeps the order written within one", () => {
    const { cues } = buildShow(layout, [on(2, 0, 10), on(1, 0, 20), on(2, 0, 30)]);
    expect([...cues.tick]).toEqual([960, 1920, 1920]);
    expect([...cues.level]).toEqual([2000, 1000, 3000]);
  });
  it("keeps equal selections and chains once, by first use", () => {
    expect(sample.selections.map((list) => [...list])).toEqual([[0, 1, 2], [2, 1], [1, 2], [3], [4, 5]]);
    expect(sample.chains).toEqual([[3], [2, 9], [5], [6]]);
    expect([...sample.cues.selection]).toEqual([0, 1, 2, 3, 4, 0]);
  });
  it.each([
    ["a light that is not there", { lights: [7] }, "names light 7, but there are 7 lights"],
    ["a light of more than 16 bits", { lights: [65_536] }, "light indexes have 16 bits"],
    ["a light twice", { lights: [1, 1] }, "names light 1 twice"],
    ["no light", { lights: [] }, "Selection 0 is empty"],
    ["a tick at the end", { tick: 30_720 }, "not before the end (30720)"],
    ["a broken tick", { tick: 0.5 }, "tick 0.5"],
    ["a level above 100", { level: 10_001 }, "level 10001"],
    ["line 0", { chain: [0] }, "A line of chain 0 is 0"],
  ])("refuses %s", (_, change, message) => {
    expect(() =>
      buildTimeline(head, [{ tick: 0, action: "on", lights: [0], level: 1, chain: [1], ...change }]),
    ).toThrow(message);
  });
});

describe("encodeTimeline and decodeTimeline", () => {
  it("give back what they were given", () => {
    fc.assert(
      fc.property(timelines, (timeline) => {
        expect(decodeTimeline(encodeTimeline(timeline))).toEqual(timeline);
      }),
    );
  });
  it("keep an incomplete timeline incomplete", () => {
    const timeline = buildShow(layout, [on(0, 0)], { isComplete: false });
    expect(decodeTimeline(encodeTimeline(timeline)).isComplete).toBe(false);
  });
  it("refuse every single changed or missing byte", () => {
    const bytes = encodeTimeline(sample);
    for (let at = 0; at < bytes.length; at++) {
      const changed = bytes.slice();
      changed[at] = (changed[at] ?? 0) ^ 0x41;
      expect(() => decodeTimeline(changed), `byte ${at}`).toThrow(TimelineFormatError);
      expect(() => decodeTimeline(bytes.subarray(0, at)), `cut at ${at}`).toThrow(TimelineFormatError);
    }
  });
  it("never throw anything but a format error, even when the check sum fits", () => {
    fc.assert(
      fc.property(fc.uint8Array({ maxLength: 200 }), fc.nat(60), (noise, keep) => {
        const bytes = encodeTimeline(sample);
        const body = Uint8Array.from([...bytes.subarray(0, 6 + (keep % (bytes.length - 10))), ...noise]);
        const sum = crc32(body);
        const forged = Uint8Array.from([...body, sum & 0xff, (sum >>> 8) & 0xff, (sum >>> 16) & 0xff, sum >>> 24]);
        try {
          decodeTimeline(forged);
        } catch (error) {
          expect(error).toBeInstanceOf(TimelineFormatError);
        }
      }),
      { numRuns: 500 },
    );
  });
  it("say what is wrong", () => {
    const bytes = encodeTimeline(sample);
    expect(() => decodeTimeline(new Uint8Array(0))).toThrow("These bytes are not a timeline.");
    const newer = bytes.slice();
    newer[4] = 9;
    expect(() => decodeTimeline(newer)).toThrow("This timeline has the format 9; this build reads format 1.");
    const damaged = bytes.slice();
    damaged[30] = (damaged[30] ?? 0) ^ 1;
    expect(() => decodeTimeline(damaged)).toThrow("The timeline is damaged: its check sum does not fit.");
  });
  it("read the stored sample of format 1, as every later build has to", () => {
    const stored =
      "4442544c010101070000000780f00106736f6e672d61086c61796f75742d610202000101020201030202090200c0070003000188270000e0030081aeff07000196ff8159";
    const timeline = buildShow(layout, [on(0, [0, 1], 50, 3), pulse(1, [2], 0.5, 0xff_d7_00, [2, 9])]);
    expect(decodeTimeline(Buffer.from(stored, "hex"))).toEqual(timeline);
    expect(Buffer.from(encodeTimeline(timeline)).toString("hex")).toBe(stored);
  });
});

describe("the JSON twin", () => {
  it("gives back what it was given, through text", () => {
    fc.assert(
      fc.property(timelines, (timeline) => {
        expect(parseTimelineJson(JSON.parse(JSON.stringify(timelineToJson(timeline))))).toEqual(timeline);
      }),
    );
  });
  it.each([
    [null, "The timeline has to be an object."],
    [{}, '"format" has to be "duskbell-timeline".'],
    [{ ...timelineToJson(sample), version: 2 }, '"version" has to be 1.'],
    [
      { ...timelineToJson(sample), selections: [[-1]] },
      '"selections[0][0]" has to be a whole number of at most 32 bits.',
    ],
    [
      { ...timelineToJson(sample), cues: [{ tick: 0, action: "glow" }] },
      '"cues[0].action" has to be one of on, off, fadeTo, pulse, colour.',
    ],
    [
      { ...timelineToJson(sample), cues: [{ tick: 0, action: "on", selection: 99, chain: 0, level: 1 }] },
      '"cues[0].selection" is not in "selections".',
    ],
    [
      { ...timelineToJson(sample), cues: [{ tick: 0, action: "on", selection: 0, chain: 0, level: 101 }] },
      '"cues[0].level" has to be a number from 0 to 100.',
    ],
    [
      {
        ...timelineToJson(sample),
        cues: [{ tick: 0, action: "colour", selection: 0, chain: 0, length: 0, colour: "gold" }],
      },
      '"cues[0].colour" has to be a colour like "#ffd700".',
    ],
  ])("names the field that is wrong (%#)", (json, message) => {
    expect(() => parseTimelineJson(json)).toThrow(message);
  });
});

describe("encodeCanonical", () => {
  /** The same show, stored differently: selections and chains numbered backwards, every chain longer. */
  function restore(timeline: Timeline): Timeline {
    const lastSelection = timeline.selections.length - 1;
    const lastChain = timeline.chains.length - 1;
    return {
      ...timeline,
      isComplete: !timeline.isComplete,
      selections: timeline.selections.toReversed(),
      chains: timeline.chains.toReversed().map((lines) => [...lines, 77]),
      cues: {
        ...timeline.cues,
        selection: timeline.cues.selection.map((index) => lastSelection - index),
        chain: timeline.cues.chain.map((index) => lastChain - index),
      },
    };
  }
  it("does not depend on how selections and chains are stored", () => {
    fc.assert(
      fc.property(timelines, (timeline) => {
        expect(encodeCanonical(restore(timeline))).toEqual(encodeCanonical(timeline));
      }),
    );
  });
  it("does not depend on values that an action does not have", () => {
    const level = sample.cues.level.map((value, cue) => (sample.cues.action[cue] === 3 ? 10_000 : value));
    expect(encodeCanonical({ ...sample, cues: { ...sample.cues, level } })).toEqual(encodeCanonical(sample));
  });
  it.each([
    ["the song", { songId: "song-b" }],
    ["the layout", { layoutHash: "1f" }],
    ["the seed", { seed: 8 }],
    ["the language", { language: 2 }],
    ["the end", { endTick: 30_719 }],
  ])("changes with %s", (_, change) => {
    expect(encodeCanonical({ ...sample, ...change })).not.toEqual(encodeCanonical(sample));
  });
  it("changes with every cue", () => {
    const shows = [
      [on(0, 0, 50)],
      [on(0, 0, 50.01)],
      [on(1, 0, 50)],
      [on(0, 1, 50)],
      [off(0, 0)],
      [fadeTo(0, 0, 50, 1)],
      [fadeTo(0, 0, 50, 2)],
      [pulse(0, 0, 1)],
      [pulse(0, 0, 1, 0)],
      [colour(0, 0, 0, 1)],
      [on(0, 0, 50), off(1, 0)],
    ];
    const hexes = shows.map((cues) => Buffer.from(encodeCanonical(buildShow(layout, cues))).toString("hex"));
    expect(new Set(hexes).size).toBe(shows.length);
  });
});

describe("crc32", () => {
  it("gives the check value of the published CRC-32 (ITU-T V.42) for 123456789", () => {
    expect(crc32(Buffer.from("123456789"))).toBe(0xcb_f4_39_26);
  });
  it("agrees with zlib as shipped in Node", () => {
    fc.assert(fc.property(fc.uint8Array({ maxLength: 300 }), (bytes) => crc32(bytes) === zlibCrc32(bytes)));
  });
});

describe("whole numbers in bytes", () => {
  it("come back as they were, in the shortest form", () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 0xff_ff_ff_ff }), (value) => {
        const writer = new ByteWriter();
        writer.whole(value);
        const bytes = writer.finish();
        expect(bytes.length).toBe(Math.max(1, Math.ceil(Math.log2(value + 1) / 7)));
        expect(new ByteReader(bytes).whole("it")).toBe(value);
      }),
    );
  });
  it("are refused in a longer form, so that equal shows have equal bytes", () => {
    expect(() => new ByteReader(Uint8Array.of(0x80, 0x00)).whole("The level")).toThrow(
      "The level is not a whole number of 32 bits",
    );
    expect(() => new ByteReader(Uint8Array.of(0xff, 0xff, 0xff, 0xff, 0x7f)).whole("The level")).toThrow(
      TimelineFormatError,
    );
  });
});
