import { describe, expect, it } from "vitest";
import { buildLayout, buildShow, buildSong, colour, fadeTo, off, on, pulse } from "../../tests/factories/small-show.ts";
import type { WrittenCue } from "./build.ts";
import { nameColour } from "./colour-word.ts";
import { describeShow } from "./describe.ts";
import { barNumberAt, listSongSpans } from "./spans.ts";

/** Twelve fronts: 0 to 5 north, 6 to 11 south; a colour light each. */
const layout = buildLayout(
  Array.from({ length: 12 }, (_, front) => ({
    side: front < 6 ? ("north" as const) : ("south" as const),
    outlets: [{ kind: "colour" as const }],
  })),
);
const NORTH = [0, 1, 2, 3, 4, 5];
const ALL = Array.from({ length: 12 }, (_, light) => light);
const song = buildSong({
  sections: [
    { name: "verse", start: 4, end: 12 },
    { name: "chorus", start: 12, end: 20 },
    { name: "chorus", start: 20, end: 28 },
  ],
});
const describeCues = (cues: readonly WrittenCue[], overrides = {}) =>
  describeShow(buildShow(layout, cues, overrides), layout, song);

describe("describeShow", () => {
  it("tells part by part who lights up, how, and in what colour", () => {
    const cues = [
      colour(0, ALL, 0xff_d7_00),
      ...Array.from({ length: 16 }, (_, turn) => pulse(4 + turn / 2, turn % 6, 1)),
      ...[12, 16].flatMap((beat) => [fadeTo(beat, ALL, 80, 2), fadeTo(beat + 2, ALL, beat === 16 ? 0 : 10, 2)]),
      ...Array.from({ length: 8 }, (_, turn) => pulse(20 + turn, ALL, 1, 0x00_00_ff)),
      off(28, ALL),
    ];
    const beats = describeCues(cues).starts.map((tick) => tick / 960);
    expect(beats).toEqual([0, 4, 12, 20, 28]);
    expect(describeCues(cues).steps).toEqual([
      "Bar 1: all is dark.",
      "Bars 2 to 3 (verse): the north side lights up one front after another, in gold.",
      "Bars 4 to 5 (first chorus): the whole square grows brighter and dims, in gold.",
      "Bars 6 to 7 (second chorus): the whole square lights up all together, in blue.",
      "Bar 8: all is dark.",
    ]);
  });
  it("sums a show up in a sentence", () => {
    const cues = [
      ...Array.from({ length: 16 }, (_, turn) => pulse(4 + turn / 2, turn % 6, 1)),
      ...Array.from({ length: 8 }, (_, turn) => pulse(12 + turn, ALL, 1)),
    ];
    expect(describeCues(cues).summary).toBe("Starts dark, mostly dark, busiest in the verse, dark at the end.");
    expect(describeCues([on(0, ALL)]).summary).toBe(
      "Starts bright, mostly still, busiest in bar 1, lit until the end.",
    );
    expect(describeCues([]).summary).toBe("All is dark.");
  });
  it("joins parts that read the same", () => {
    expect(describeCues([on(0, NORTH)]).steps.slice(1)).toEqual([
      "Bars 2 to 8 (verse, first chorus, second chorus): the north side stays lit.",
    ]);
  });
  it("names a single front, slow changes and sparkles", () => {
    expect(describeCues([on(4, 2)]).steps[1]).toContain('only the front "front c" lights up.');
    expect(describeCues([fadeTo(4, ALL, 100, 8)]).steps[1]).toContain("the whole square slowly grows brighter.");
    expect(
      describeCues(Array.from({ length: 16 }, (_, turn) => pulse(4 + turn / 2, (turn * 5) % 12, 1))).steps[1],
    ).toContain("sparkles here and there");
  });
  it("calls a few fronts by their names, and the pick-up by its", () => {
    expect(describeCues([on(4, 2), on(6, 9)]).steps[1]).toContain(
      'only the fronts "front c" and "front j" light up one by one.',
    );
    const waltz = buildSong({
      beatsPerBar: 3,
      bars: [
        { number: 0, start: 0, beats: 2 },
        ...Array.from({ length: 10 }, (_, bar) => ({ number: bar + 1, start: 2 + bar * 3, beats: 3 })),
      ],
      beats: Array.from({ length: 33 }, (_, beat) => beat * 500_000),
    });
    expect(describeShow(buildShow(layout, [on(0, ALL)]), layout, waltz).steps[0]).toMatch(
      /^The pick-up and bars 1 to 3: /,
    );
  });
  it("says that an incomplete show is not whole", () => {
    const { steps, summary } = describeCues([on(0, ALL)], { isComplete: false });
    expect(steps.at(-1)).toBe("The script stopped here, so the show is not whole.");
    expect(summary).toContain("then the script stops");
  });
});

describe("listSongSpans", () => {
  it("covers the song once, in order, whatever sections it has", () => {
    for (const map of [song, buildSong(), buildSong({ sections: [{ name: "all", start: 0, end: 32 }] })]) {
      const spans = listSongSpans(map);
      expect(spans[0]?.start).toBe(0);
      expect(spans.at(-1)?.end).toBe(32 * 960);
      for (let index = 1; index < spans.length; index++) expect(spans[index]?.start).toBe(spans[index - 1]?.end);
    }
    expect(listSongSpans(buildSong()).map(({ firstBar, lastBar }) => [firstBar, lastBar])).toEqual([
      [1, 4],
      [5, 8],
    ]);
  });
  it("counts a pick-up as bar 0", () => {
    const waltz = buildSong({
      beatsPerBar: 3,
      beats: [0, 1, 2, 3, 4, 5, 6, 7].map((beat) => beat * 500_000),
      bars: [
        { number: 0, start: 0, beats: 1 },
        { number: 1, start: 1, beats: 3 },
        { number: 2, start: 4, beats: 3 },
      ],
    });
    expect([0, 959, 960, 3840, 99_999].map((tick) => barNumberAt(waltz, tick))).toEqual([0, 0, 1, 2, 2]);
  });
});

describe("nameColour", () => {
  it("gives the everyday word of colours that scripts name", () => {
    const words = {
      "#ff0000": "red",
      "#ffa500": "orange",
      "#ffd700": "gold",
      "#ffff00": "yellow",
      "#008000": "green",
      "#40e0d0": "turquoise",
      "#0000ff": "blue",
      "#ee82ee": "pink",
      "#ffffff": "white",
      "#000000": "black",
      "#add8e6": "light blue",
    };
    for (const [hex, word] of Object.entries(words))
      expect([hex, nameColour(Number.parseInt(hex.slice(1), 16))]).toEqual([hex, word]);
  });
});
