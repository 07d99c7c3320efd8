import { describe, expect, it } from "vitest";
import { BeatMapSchema } from "../../shared/contracts/songs.ts";
import { buildBeatMap } from "./beat-map.ts";
import type { MidiFile, MidiNote } from "./midi-file.ts";
import { countedBeats, meterGrid } from "./meter-grid.ts";

const Q = 480;
const note = (quarters: number, length = 1, pitch = 60, velocity = 100, channel = 0): MidiNote => ({
  tick: quarters * Q,
  ticks: length * Q,
  channel,
  pitch,
  velocity,
});
const song = (notes: MidiNote[], rest: Partial<MidiFile> = {}): MidiFile => ({
  format: 1,
  ticksPerQuarter: Q,
  tempos: [],
  meters: [],
  markers: [],
  tracks: [{ name: "bells", program: null, notes }],
  ...rest,
});

describe("beats and bars (LANGUAGE rules 2, 21, 22)", () => {
  it("counts beat 0 from the last beat at or before the first sound", () => {
    expect(buildBeatMap(song([note(0)])).beats).toEqual([0, 500_000, 1_000_000, 1_500_000, 2_000_000]);
    // The first sound is in the middle of the third beat of bar 1: two beats are left in that bar.
    const map = buildBeatMap(song([note(2.5, 0.5), note(4, 4)]));
    expect(map.beats[0]).toBe(1_000_000);
    expect(map.bars).toEqual([
      { number: 0, start: 0, beats: 2 },
      { number: 1, start: 2, beats: 4 },
    ]);
    expect(map.instruments[0]?.hits).toEqual([0.5, 2]);
  });

  it("drops whole silent bars and numbers the first one left as bar 1", () => {
    const map = buildBeatMap(song([note(8)]));
    expect(map.bars).toEqual([{ number: 1, start: 0, beats: 4 }]);
    expect(map.beats[0]).toBe(4_000_000);
  });

  it("ends with the last whole bar at or after the last sound", () => {
    expect(buildBeatMap(song([note(0, 4)])).beats).toHaveLength(4 + 1);
    expect(buildBeatMap(song([note(0, 4.01)])).beats).toHaveLength(8 + 1);
  });

  it("counts 6/8 in two, 9/8 in three, 3/8 in three, 2/2 in two", () => {
    expect(
      [
        [6, 8],
        [9, 8],
        [12, 8],
        [3, 8],
        [2, 2],
        [7, 8],
      ].map(([beats = 0, unit = 0]) => countedBeats({ tick: 0, beats, unit })),
    ).toEqual([2, 3, 4, 3, 2, 7]);
    const map = buildBeatMap(song([note(0, 3)], { meters: [{ tick: 0, beats: 6, unit: 8 }] }));
    expect(map.beatsPerBar).toBe(2);
    // A dotted quarter at 120 quarters a minute lasts 0.75 s.
    expect(map.beats).toEqual([0, 750_000, 1_500_000]);
  });

  it("knows a pick-up that the file writes as a short first meter", () => {
    const map = buildBeatMap(
      song([note(0), note(1, 3)], {
        meters: [
          { tick: 0, beats: 1, unit: 4 },
          { tick: Q, beats: 3, unit: 4 },
        ],
      }),
    );
    expect(map.beatsPerBar).toBe(3);
    expect(map.bars).toEqual([
      { number: 0, start: 0, beats: 1 },
      { number: 1, start: 1, beats: 3 },
    ]);
  });

  it("begins a new bar with every meter", () => {
    const grid = meterGrid(
      {
        ticksPerQuarter: Q,
        meters: [
          { tick: 0, beats: 4, unit: 4 },
          { tick: 6 * Q, beats: 3, unit: 4 },
        ],
      },
      9 * Q,
    );
    expect(grid.map((bar) => [bar.tick / Q, bar.beats])).toEqual([
      [0, 4],
      [4, 2],
      [6, 3],
    ]);
  });

  it("follows tempo changes inside a bar", () => {
    const map = buildBeatMap(song([note(0, 4)], { tempos: [{ tick: 2 * Q, microsPerQuarter: 600_000 }] }));
    expect(map.beats).toEqual([0, 500_000, 1_000_000, 1_600_000, 2_200_000]);
  });
});

describe("sections and instruments (LANGUAGE rule 23)", () => {
  it("opens a section at every marker and closes it at the next", () => {
    const markers = [
      { tick: 0, name: "intro" },
      { tick: 4 * Q, name: "chorus" },
      { tick: 8 * Q, name: "" },
      { tick: 12 * Q, name: "chorus" },
    ];
    expect(buildBeatMap(song([note(0, 16)], { markers })).sections).toEqual([
      { name: "intro", start: 0, end: 4 },
      { name: "chorus", start: 4, end: 8 },
      { name: "chorus", start: 12, end: 16 },
    ]);
  });

  it("sorts hits and notes, one a moment, one a start and pitch, the longest", () => {
    const map = buildBeatMap(song([note(1, 1, 64), note(0, 1, 60), note(0, 2, 60), note(0, 1, 67)]));
    expect(map.instruments).toEqual([
      {
        name: "bells",
        hits: [0, 1],
        notes: [
          { start: 0, beats: 2, pitch: 60 },
          { start: 0, beats: 1, pitch: 67 },
          { start: 1, beats: 1, pitch: 64 },
        ],
      },
    ]);
  });

  it("rounds moments to 1/960 beat", () => {
    const third = { ...note(0), tick: Q / 3 };
    expect(buildBeatMap(song([note(0), third])).instruments[0]?.hits[1]).toBe(320 / 960);
  });

  it("joins tracks of one name and names those without by their channel", () => {
    const file = song([], {
      tracks: [
        { name: "", program: null, notes: [note(0), note(1, 1, 36, 100, 9)] },
        { name: "flute", program: 73, notes: [note(2)] },
        { name: "flute", program: 73, notes: [note(3)] },
      ],
    });
    expect(buildBeatMap(file).instruments.map((one) => [one.name, one.hits.length])).toEqual([
      ["channel 1", 1],
      ["drums", 1],
      ["flute", 2],
    ]);
  });

  it("refuses a file without notes, and one that is far too long", () => {
    expect(() => buildBeatMap(song([]))).toThrow("This MIDI file has no notes. Choose another one.");
    expect(() => buildBeatMap(song([note(0), note(30_000)]))).toThrow("This song is too long for a show.");
  });
});

describe("loudness", () => {
  it("has four values a beat, 100 at the loudest, 0 where nothing sounds, less for a softer note", () => {
    const map = buildBeatMap(song([note(0, 1, 60, 127), note(2, 1, 60, 64)]));
    expect(map.loudness).toHaveLength(16);
    expect(map.loudness[0]).toBe(100);
    expect(map.loudness.slice(4, 8)).toEqual([0, 0, 0, 0]);
    // Power goes with velocity squared, so level goes with velocity: 64 / 127.
    expect(map.loudness[8]).toBe(50);
    expect(map.loudness[1]).toBeLessThan(100);
    expect(BeatMapSchema.safeParse(map).success).toBe(true);
  });

  it("adds the powers of notes that sound together", () => {
    const map = buildBeatMap(song([note(0, 1, 60, 100), note(2, 1, 60, 100), note(2, 1, 64, 100)]));
    expect(map.loudness[0]).toBe(71);
    expect(map.loudness[8]).toBe(100);
  });
});
