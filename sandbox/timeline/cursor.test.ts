import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { TICKS_PER_BEAT } from "../../shared/units.ts";
import { buildFront, buildShow, colour, fadeTo, off, on, pulse } from "../../tests/factories/small-show.ts";
import type { WrittenCue } from "./build.ts";
import { colourToLinear, levelToY, WARM_WHITE } from "./colour.ts";
import { createCursor, type Frame } from "./cursor.ts";

const GOLD = 0xff_d7_00;
const BLUE = 0x00_00_ff;
const RED = 0xff_00_00;

/** Light 0 is a relay, 1 a dimmer, 2 a colour light. */
const layout = buildFront("relay", "dimmer", { kind: "colour" });
const [RELAY, DIMMER, COLOUR] = [0, 1, 2];

function sample(cues: readonly WrittenCue[], beat: number): Frame {
  return createCursor(buildShow(layout, cues), layout).seek(beat * TICKS_PER_BEAT);
}
const levelOf = (cues: readonly WrittenCue[], beat: number, light = DIMMER) => sample(cues, beat).level[light];
const rgbOf = (cues: readonly WrittenCue[], beat: number, light = COLOUR) => [
  ...sample(cues, beat).rgb.slice(light * 3, light * 3 + 3),
];
const scaled = (hex: number, level: number) =>
  colourToLinear(hex).map((channel) => Math.fround(channel * levelToY(level)));

describe("rule 12: a cue stands for one change of each of its lights", () => {
  it("changes every light of the selection and no other", () => {
    const frame = sample([on(0, [1, 2], 40)], 1);
    expect([...frame.level]).toEqual([0, 40, 40]);
    expect([...frame.cue]).toEqual([-1, 0, 0]);
  });
});

describe("rule 13: first state and order", () => {
  it("starts dark and white", () => {
    expect([...sample([], 0).rgb]).toEqual(Array(9).fill(0));
    expect(rgbOf([on(0, COLOUR, 100)], 0)).toEqual([1, 1, 1]);
  });
  it("sorts by moment first, then by the order written", () => {
    const cues = [on(2, DIMMER, 30, 1), on(1, DIMMER, 20, 2), on(2, DIMMER, 70, 3)];
    expect(levelOf(cues, 1)).toBe(20);
    expect(levelOf(cues, 2)).toBe(70);
  });
});

describe("rule 14: level cues", () => {
  it("fades in a straight line from the level reached", () => {
    const cues = [on(0, DIMMER, 80), fadeTo(1, DIMMER, 20, 2)];
    expect(levelOf(cues, 1)).toBe(80);
    expect(levelOf(cues, 2)).toBe(50);
    expect(levelOf(cues, 2.5)).toBe(35);
    expect(levelOf(cues, 3)).toBe(20);
    expect(levelOf(cues, 9)).toBe(20);
  });
  it("ends all running pulses with off, and none that comes later", () => {
    const cues = [pulse(0, DIMMER, 4), off(1, DIMMER), pulse(1, DIMMER, 2)];
    expect(levelOf(cues, 0.5)).toBe(87.5);
    expect(levelOf(cues, 2)).toBe(50);
    expect(levelOf([pulse(0, DIMMER, 4), off(1, DIMMER)], 1)).toBe(0);
  });
});

describe("rule 15: a level cue cuts a running fade", () => {
  it("goes on from where the fade was cut", () => {
    const cues = [fadeTo(0, DIMMER, 100, 4), fadeTo(2, DIMMER, 0, 1)];
    expect(levelOf(cues, 2)).toBe(50);
    expect(levelOf(cues, 2.5)).toBe(25);
    expect(levelOf(cues, 4)).toBe(0);
  });
  it("takes fadeTo(l, 0) for on(l)", () => {
    expect(levelOf([fadeTo(1, DIMMER, 60, 0)], 1)).toBe(60);
  });
  it("leaves pulses running with on(0)", () => {
    expect(levelOf([pulse(0, DIMMER, 4), on(1, DIMMER, 0)], 2)).toBe(50);
  });
});

describe("rule 16: colours", () => {
  it("moves in a straight line in linear RGB from the colour reached", () => {
    const cues = [on(0, COLOUR), colour(0, COLOUR, RED), colour(1, COLOUR, BLUE, 2)];
    expect(rgbOf(cues, 1)).toEqual([1, 0, 0]);
    expect(rgbOf(cues, 2)).toEqual([0.5, 0, 0.5]);
    expect(rgbOf(cues, 3)).toEqual([0, 0, 1]);
  });
  it("cuts a running colour fade and leaves the level alone", () => {
    const cues = [fadeTo(0, COLOUR, 100, 4), colour(0, COLOUR, RED, 4), colour(2, COLOUR, BLUE, 2)];
    const half = levelToY(75);
    const [red, green, blue] = rgbOf(cues, 3);
    // At 2 the colour was half way from white to red: (1, .5, .5); half way on to blue: (.5, .25, .75).
    expect(red).toBeCloseTo(0.5 * half, 6);
    expect(green).toBeCloseTo(0.25 * half, 6);
    expect(blue).toBeCloseTo(0.75 * half, 6);
  });
  it("does nothing to a light without colour", () => {
    const frame = sample([on(0, DIMMER), colour(0, DIMMER, BLUE)], 1);
    expect([...frame.rgb.slice(3, 6)]).toEqual(colourToLinear(WARM_WHITE).map(Math.fround));
  });
});

describe("rule 18: pulses", () => {
  it("falls from 100 at its start to nothing at its end, which is outside", () => {
    const cues = [pulse(1, DIMMER, 2)];
    expect(levelOf(cues, 0.999)).toBe(0);
    expect(levelOf(cues, 1)).toBe(100);
    expect(levelOf(cues, 1.5)).toBe(75);
    expect(levelOf(cues, 3)).toBe(0);
  });
  it("never shows a pulse of no beats", () => {
    expect(levelOf([pulse(1, DIMMER, 0)], 1)).toBe(0);
  });
  it("shines in its own colour, or else in the light's", () => {
    expect(rgbOf([pulse(0, COLOUR, 2, GOLD)], 1)).toEqual(scaled(GOLD, 50));
    expect(rgbOf([colour(0, COLOUR, BLUE), pulse(0, COLOUR, 2)], 1)).toEqual(scaled(BLUE, 50));
  });
});

describe("rule 19: what a colour light shows", () => {
  it("takes per channel the largest of the level and every pulse", () => {
    const cues = [
      colour(0, COLOUR, BLUE),
      on(0, COLOUR, 60),
      pulse(0, COLOUR, 4, RED),
      pulse(0, COLOUR, 2, 0x80_00_00),
    ];
    const [red, green, blue] = rgbOf(cues, 1);
    expect(red).toBeCloseTo(levelToY(75), 6);
    expect(green).toBe(0);
    expect(blue).toBeCloseTo(levelToY(60), 6);
  });
  it("counts a black light as dark", () => {
    const frame = sample([colour(0, COLOUR, 0), on(0, COLOUR)], 1);
    expect(frame.level[COLOUR]).toBe(0);
    expect(frame.cue[COLOUR]).toBe(-1);
  });
});

describe("rule 20: lights without colour", () => {
  it("takes the largest of level and pulses", () => {
    const cues = [on(0, DIMMER, 60), pulse(0, DIMMER, 2)];
    expect(levelOf(cues, 0.5)).toBe(75);
    expect(levelOf(cues, 1.5)).toBe(60);
  });
  it("switches on from level 50 on, fully", () => {
    expect(levelOf([on(0, RELAY, 49.99)], 1, RELAY)).toBe(0);
    expect(levelOf([on(0, RELAY, 50)], 1, RELAY)).toBe(100);
    const fade = [fadeTo(0, RELAY, 100, 4)];
    expect(levelOf(fade, 1.999, RELAY)).toBe(0);
    expect(levelOf(fade, 2, RELAY)).toBe(100);
  });
  it("is on for as long as a pulse runs", () => {
    const cues = [pulse(0, RELAY, 2)];
    expect(levelOf(cues, 1.999, RELAY)).toBe(100);
    expect(levelOf(cues, 2, RELAY)).toBe(0);
  });
});

describe("rule 21: the end", () => {
  it("is dark from the song's end on, and before its start", () => {
    const cues = [on(0, [0, 1, 2])];
    expect([...sample(cues, 31.999).level]).toEqual([100, 100, 100]);
    expect([...sample(cues, 32).level]).toEqual([0, 0, 0]);
    expect([...sample(cues, -0.001).level]).toEqual([0, 0, 0]);
    expect([...sample(cues, Number.NaN).cue]).toEqual([-1, -1, -1]);
  });
});

describe("which cue lights a light", () => {
  it("names the brightest, and the later of two that are equal", () => {
    const cues = [
      on(0, DIMMER, 60, 1),
      pulse(0, DIMMER, 2, undefined, 2),
      on(8, DIMMER, 100, 3),
      pulse(8, DIMMER, 1, undefined, 4),
    ];
    expect(sample(cues, 0.5).cue[DIMMER]).toBe(1);
    expect(sample(cues, 1).cue[DIMMER]).toBe(0);
    expect(sample(cues, 8).cue[DIMMER]).toBe(3);
  });
  it("names the cue that gave the colour", () => {
    const cues = [on(0, COLOUR, 60), colour(1, COLOUR, BLUE), pulse(2, COLOUR, 1, GOLD)];
    expect(sample(cues, 0.5).colourCue[COLOUR]).toBe(-1);
    expect(sample(cues, 1).colourCue[COLOUR]).toBe(1);
    expect(sample(cues, 2).colourCue[COLOUR]).toBe(2);
  });
});

/** Works a light out from the rules alone, cue by cue, without tracks or cursors. */
function workOut(
  cues: readonly WrittenCue[],
  light: number,
  tick: number,
  endTick: number,
): { level: number; rgb: number[] } {
  const past = cues
    .filter((cue) => cue.tick <= tick && [...(cue.lights as number[])].includes(light))
    .sort((a, b) => a.tick - b.tick);
  let level = (_at: number) => 0;
  let tint = (_at: number): number[] => [1, 1, 1];
  let pulses: { start: number; length: number; colour: number | undefined }[] = [];
  const line = (from: number[], to: number[], start: number, length: number) => (at: number) =>
    at - start >= length ? to : from.map((value, i) => value + ((to[i] ?? 0) - value) * ((at - start) / length));
  for (const { tick: start, action, length = 0, ...cue } of past) {
    if (action === "pulse") pulses.push({ start, length, colour: cue.colour });
    else if (action === "colour") tint = line(tint(start), [...colourToLinear(cue.colour ?? 0)], start, length);
    else {
      const ramp = line(
        [level(start)],
        [action === "off" ? 0 : (cue.level ?? 0) / 100],
        start,
        action === "fadeTo" ? length : 0,
      );
      level = (at) => ramp(at)[0] ?? 0;
      if (action === "off") pulses = [];
    }
  }
  if (tick < 0 || tick >= endTick) return { level: 0, rgb: [0, 0, 0] };
  const running = pulses
    .filter(({ start, length }) => tick - start < length)
    .map(({ start, length, colour: own }) => ({ envelope: 100 * (1 - (tick - start) / length), own }));
  if (light !== COLOUR) {
    const isOn = level(tick) >= 50 || running.length > 0;
    const shown =
      light === RELAY ? (isOn ? 100 : 0) : Math.max(level(tick), ...running.map(({ envelope }) => envelope));
    return { level: shown, rgb: colourToLinear(WARM_WHITE).map((channel) => channel * levelToY(shown)) };
  }
  const sources = [{ envelope: level(tick), own: undefined as number | undefined }, ...running].map(
    ({ envelope, own }) => ({
      envelope,
      rgb: (own === undefined ? tint(tick) : [...colourToLinear(own)]).map((channel) => channel * levelToY(envelope)),
    }),
  );
  const rgb = [0, 1, 2].map((channel) => Math.max(...sources.map((source) => source.rgb[channel] ?? 0)));
  return {
    level: Math.max(0, ...sources.filter((source) => source.rgb.some((c) => c > 0)).map(({ envelope }) => envelope)),
    rgb,
  };
}

const END = 32 * TICKS_PER_BEAT;
const beats = fc.integer({ min: 0, max: 63 }).map((half) => half / 2);
const lengths = fc.constantFrom(0, 0.25, 1, 3, 20);
const someLights = fc.subarray([0, 1, 2], { minLength: 1 });
const someColour = fc.constantFrom(GOLD, BLUE, RED, 0, 0x12_34_56);
const someCue: fc.Arbitrary<WrittenCue> = fc.oneof(
  fc.tuple(beats, someLights, fc.integer({ min: 0, max: 100 })).map((a) => on(...a)),
  fc.tuple(beats, someLights).map((a) => off(...a)),
  fc.tuple(beats, someLights, fc.integer({ min: 0, max: 100 }), lengths).map((a) => fadeTo(...a)),
  fc.tuple(beats, someLights, lengths, fc.option(someColour, { nil: undefined })).map((a) => pulse(...a)),
  fc.tuple(beats, someLights, someColour, lengths).map((a) => colour(...a)),
);
const someCues = fc.array(someCue, { maxLength: 40 });
const moments = fc.array(fc.integer({ min: -100, max: END + 100 }), { minLength: 1, maxLength: 20 });

describe("sampling", () => {
  it("at t equals what the rules work out for t", () => {
    fc.assert(
      fc.property(someCues, moments, (cues, ticks) => {
        const cursor = createCursor(buildShow(layout, cues), layout);
        for (const tick of ticks) {
          const frame = cursor.seek(tick);
          for (const light of [RELAY, DIMMER, COLOUR]) {
            const expected = workOut(cues, light, tick, END);
            expect(frame.level[light]).toBeCloseTo(expected.level, 4);
            expected.rgb.forEach((channel, i) => expect(frame.rgb[light * 3 + i]).toBeCloseTo(channel, 5));
            expect((frame.cue[light] ?? -1) >= 0).toBe(expected.level > 0);
          }
        }
      }),
      { numRuns: 150 },
    );
  });

  it("at t equals playing to t, whatever way the cursor came", () => {
    fc.assert(
      fc.property(someCues, moments, fc.integer({ min: 1, max: 500 }), (cues, ticks, step) => {
        const timeline = buildShow(layout, cues);
        const wanderer = createCursor(timeline, layout);
        for (const tick of ticks) {
          wanderer.seek(tick);
          const player = createCursor(timeline, layout);
          for (let at = tick - 10 * step; at < tick; at += step) player.seek(at);
          player.seek(tick);
          expect(wanderer.frame).toEqual(player.frame);
          expect(wanderer.frame).toEqual(createCursor(timeline, layout).seek(tick));
        }
      }),
      { numRuns: 100 },
    );
  });

  it("does not depend on the order of cues at different moments", () => {
    fc.assert(
      fc.property(someCues, fc.integer({ min: 0, max: END }), (cues, tick) => {
        const moments = [...new Set(cues.map((cue) => cue.tick))].sort((a, b) => b - a);
        const shuffled = moments.flatMap((at) => cues.filter((cue) => cue.tick === at));
        const [a, b] = [cues, shuffled].map((written) => createCursor(buildShow(layout, written), layout).seek(tick));
        expect(a).toEqual(b);
      }),
      { numRuns: 60 },
    );
  });

  it("refuses a layout with another number of lights", () => {
    expect(() => createCursor(buildShow(layout, []), buildFront("relay"))).toThrow(
      "The timeline is for 3 lights, the layout has 1.",
    );
  });
});
