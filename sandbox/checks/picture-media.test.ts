import { describe, expect, it } from "vitest";
import { buildLayout, buildShow, buildSong, colour, on } from "../../tests/factories/small-show.ts";
import { createCheckContext } from "./context.ts";
import { countPictureFlashes, findPictureFlashes } from "./picture-flash.ts";

/**
 * The worked examples again, this time through the show check as it stands: a light fills the middle of
 * the reference picture and shows the frames one after another.
 *
 * Source: the grey codes and colours of jbjord/pse-test-media (BSD 3-Clause, by an author of the TRACE
 * guideline), 30 frames a second; WCAG 2.2, success criterion 2.3.1, and its technique G19.
 */
const layout = buildLayout(
  Array.from({ length: 8 }, () => ({
    side: "north" as const,
    outlets: [{ kind: "colour" as const, part: "windows" }],
  })),
);
const ALL = [0, 1, 2, 3, 4, 5, 6, 7];
const song = buildSong();
/** At 120 beats a minute a frame of 1/30 s is 64 ticks. */
const FRAME_BEATS = 1 / 15;
/** The light is white, then falls to the first frame's colour; a second and a half later the example begins. */
const FALL_BEAT = 1;
const FIRST_BEAT = 4;

/** A colour 0xRRGGBB and the number of frames that it stays. */
type Step = number | readonly [colour: number, frames: number];

/** Most general and red flashes in a second. */
function count(steps: readonly Step[]) {
  let frame = 0;
  const cues = steps.map((step, index) => {
    const [shown, frames] = typeof step === "number" ? [step, 1] : step;
    const beat = index === 0 ? FALL_BEAT : FIRST_BEAT + frame * FRAME_BEATS;
    frame += frames;
    return colour(beat, ALL, shown);
  });
  const context = createCheckContext({ timeline: buildShow(layout, [on(0, ALL), ...cues]), layout, song });
  const [general, red] = countPictureFlashes(context);
  return { general: general?.worst, red: red?.worst, isPass: (general?.worst ?? 0) <= 3 && (red?.worst ?? 0) <= 3 };
}
const grey = (code: number) => code * 0x01_01_01;
const greys = (...steps: Step[]) =>
  count(steps.map((step) => (typeof step === "number" ? grey(step) : [grey(step[0]), step[1]])));

describe("general flashes of the public test set (pse-test-media)", () => {
  it("f001 fails: seven transitions between 64 and 109", () => {
    expect(greys(64, 109, 64, 109, 64, 109, 64, [109, 25])).toMatchObject({ general: 4, isPass: false });
  });
  it("c001 passes: six transitions are three flashes", () => {
    expect(greys(64, 109, 64, 109, 64, 109, [64, 25])).toMatchObject({ general: 3, isPass: true });
  });
  it("l001 passes: 64 and 108 are 0.0987 apart, so only coming on counts", () => {
    expect(greys(64, 108, 64, 108, 64, 108, 64, [108, 25])).toMatchObject({ general: 1, isPass: true });
  });
  it("y001 passes: its third peak is 108", () => {
    expect(greys(64, 109, 64, 109, 64, 108, 64, [109, 25])).toMatchObject({ isPass: true });
  });
  it("f009 fails and l009 passes: 231 against 244 and 243", () => {
    expect(greys(231, 244, 231, 244, 231, 244, 231, [244, 25]).isPass).toBe(false);
    expect(greys(231, 243, 231, 243, 231, 243, 231, [243, 25]).isPass).toBe(true);
  });
  it("leaves 232 against white alone: its darker state is not below 0.80", () => {
    expect(greys(232, 255, 232, 255, 232, 255, 232, [255, 25]).isPass).toBe(true);
  });
  it("f011 fails and c011 passes: seven transitions within 29 frames, and over exactly one second", () => {
    const until = (last: number) => greys([64, 1], 109, [64, 6], 109, [64, 7], 109, [64, last - 16], 109, [64, 20]);
    expect(until(29)).toMatchObject({ general: 4, isPass: false });
    expect(until(30)).toMatchObject({ general: 3, isPass: true });
  });
  it("f031 fails: 64, 109, 139 in steps is one transition a climb", () => {
    const steps = [64, 109, 139, 109] as const;
    expect(greys(...steps, ...steps, ...steps, 64, 109, [139, 25])).toMatchObject({ general: 4, isPass: false });
  });
  it("l031 fails here: only a rule that lets changes of more than 66 ms go would pass it, and WCAG has none", () => {
    const steps = [64, 108, 136, 108] as const;
    expect(greys(...steps, ...steps, ...steps, 64, 108, [136, 25])).toMatchObject({ general: 4, isPass: false });
  });
});

describe("red flashes of the public test set (pse-test-media)", () => {
  const [RED, OTHER] = [0x65_22_22, 0x09_3f_3f];
  const alternate = (a: number, b: number) => count([a, b, a, b, a, b, a, [b, 25]]);
  it("red f001 fails, with hardly any change in luminance", () => {
    expect(alternate(RED, OTHER)).toMatchObject({ general: 1, red: 4, isPass: false });
  });
  it("red s001 passes: (100, 34, 34) is no saturated red", () => {
    expect(alternate(0x64_22_22, OTHER)).toMatchObject({ red: 0, isPass: true });
  });
  it("red d001 passes by the definition of 2.2 and fails by that of 2.1, which is stricter here", () => {
    expect(alternate(RED, 0x19_3e_3e)).toMatchObject({ general: 1, red: 4, isPass: false });
  });
  it("red against (255, 128, 0) and (180, 0, 0): no red flash in 2.2, and one in 2.1", () => {
    expect(alternate(0xff_00_00, 0xff_80_00).red).toBe(4);
    expect(alternate(0xff_00_00, 0xb4_00_00).red).toBe(4);
  });
});

describe("technique G19: a flash is a pair of opposing transitions", () => {
  const alternating = (transitions: number) =>
    greys(...Array.from({ length: transitions }, (_, turn) => (turn % 2 === 0 ? 0 : 200)), [
      transitions % 2 === 0 ? 0 : 200,
      25,
    ]);
  it("lets six alternating transitions in a second pass and seven fail, whichever way the first goes", () => {
    expect([alternating(6), alternating(7)].map(({ isPass }) => isPass)).toEqual([true, false]);
    const fromBright = (transitions: number) =>
      greys(0, [200, 40], ...Array.from({ length: transitions - 1 }, (_, turn) => (turn % 2 === 0 ? 0 : 200)), [
        transitions % 2 === 0 ? 200 : 0,
        25,
      ]);
    expect([fromBright(6), fromBright(7)].map(({ isPass }) => isPass)).toEqual([true, false]);
  });
});

describe("steps of music that switch between dark and bright (computed: transitions a second are steps a second)", () => {
  const rulesAt = (tempo: number, step: number) => {
    const cues = Array.from({ length: Math.floor(32 / step) }, (_, turn) => on(turn * step, ALL, turn % 2 ? 0 : 100));
    const show = { timeline: buildShow(layout, cues), layout, song: buildSong({}, { tempo }) };
    return countPictureFlashes(createCheckContext(show))[0]?.worst ?? 0;
  };
  it("120 a minute: quarters and eighths pass, sixteenths fail", () => {
    expect([1, 0.5, 0.25].map((step) => rulesAt(120, step))).toEqual([1, 2, 4]);
  });
  it("eighths pass at 180 a minute, exactly six a second, and fail at 181", () => {
    expect(rulesAt(180, 0.5)).toBe(3);
    expect(rulesAt(181, 0.5)).toBe(4);
  });
  it("sixteenths pass at 90 a minute and fail at 100", () => {
    expect(rulesAt(90, 0.25)).toBe(3);
    expect(rulesAt(100, 0.25)).toBe(4);
  });
});

describe("what the picture rule says of them", () => {
  it("names a stop with the count and the limit, unless the street rule stops the side already", () => {
    const frames = [0x65_22_22, 0x09_3f_3f];
    const cues = Array.from({ length: 8 }, (_, turn) =>
      colour(FIRST_BEAT + turn * FRAME_BEATS, ALL, frames[turn % 2] ?? 0),
    );
    const context = createCheckContext({ timeline: buildShow(layout, [on(0, ALL), ...cues]), layout, song });
    expect(findPictureFlashes(context)).toMatchObject([
      { rule: "picture-red-flash", severity: "stop", measured: { value: 4, limit: 3 } },
    ]);
  });
});
