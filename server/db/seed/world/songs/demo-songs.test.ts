import { describe, expect, it } from "vitest";
import { BeatMapSchema } from "../../../../../shared/contracts/songs.ts";
import { buildBeatMap } from "../../../../../sandbox/music/beat-map.ts";
import { readMidi } from "../../../../../sandbox/music/read-midi.ts";
import { DEMO_SONGS, demoSong } from "./demo-songs.ts";
import { keyNumber, readChords, readTune } from "./notation.ts";

describe("notation", () => {
  it("names tones as the trade does: middle C is C4, A4 is key 69", () => {
    expect(["C4", "A4", "F#4", "Bb4", "C6"].map(keyNumber)).toEqual([60, 69, 66, 70, 84]);
    expect(() => keyNumber("H4")).toThrow(RangeError);
  });

  it("counts every bar", () => {
    expect(readTune("C4 D4:.5 r:.5 E4:2 | G4:4", 4).tones).toEqual([
      { start: 0, length: 1, pitch: 60 },
      { start: 1, length: 0.5, pitch: 62 },
      { start: 2, length: 2, pitch: 64 },
      { start: 4, length: 4, pitch: 67 },
    ]);
    expect(() => readTune("C4 D4 | E4:4", 4)).toThrow("Bar 1");
    expect(readChords("G | Em D7", 4)).toEqual([
      { start: 0, length: 4, root: 7, steps: [0, 4, 7] },
      { start: 4, length: 2, root: 4, steps: [0, 3, 7] },
      { start: 6, length: 2, root: 2, steps: [0, 4, 7, 10] },
    ]);
    expect(() => readChords("Gmaj13", 4)).toThrow(RangeError);
  });
});

describe("the songs of the demo world", () => {
  it.each(DEMO_SONGS.map((song) => [song.title, song] as const))(
    "%s is a MIDI file whose beat map is the stored one",
    (_, song) => {
      expect(buildBeatMap(readMidi(song.file))).toEqual(song.beatMap);
      expect(BeatMapSchema.safeParse(song.beatMap).success).toBe(true);
      const seconds = ((song.beatMap.beats.at(-1) ?? 0) - (song.beatMap.beats[0] ?? 0)) / 1_000_000;
      expect(seconds).toBeGreaterThanOrEqual(90);
      expect(seconds).toBeLessThanOrEqual(180);
      expect(song.beatMap.instruments.map((one) => one.name)).toContain("drums");
      expect(song.beatMap.sections.map((section) => section.name)).toContain("chorus");
    },
  );

  it.each(["frost-fair", "quillhaven-bells", "jingle-bells", "good-king-wenceslas"])(
    "%s is in four, with intro, verse, two choruses and an ending",
    (id) => {
      const { beatMap } = demoSong(id);
      const names = beatMap.sections.map((section) => section.name);
      expect(beatMap.beatsPerBar).toBe(4);
      expect(names[0]).toBe("intro");
      expect(names).toContain("verse");
      expect(names.filter((name) => name === "chorus").length).toBeGreaterThanOrEqual(2);
      expect(names.at(-1)).toBe("ending");
      expect(beatMap.instruments.find((one) => one.name === "bells")?.notes.length).toBeGreaterThan(20);
    },
  );

  it("has the frost fair of 144 beats at 96 a minute: exactly 90 seconds", () => {
    const { beatMap } = demoSong("frost-fair");
    expect(beatMap.beats).toHaveLength(145);
    expect(beatMap.beats.at(-1)).toBe(90_000_000);
    expect(beatMap.sections.map((section) => [section.name, section.start])).toEqual([
      ["intro", 0],
      ["verse", 16],
      ["chorus", 48],
      ["bridge", 80],
      ["chorus", 96],
      ["ending", 128],
    ]);
  });

  it("has a waltz with one beat before bar 1, and a jig counted in two", () => {
    const waltz = demoSong("lantern-waltz").beatMap;
    expect(waltz.beatsPerBar).toBe(3);
    expect(waltz.bars.slice(0, 2)).toEqual([
      { number: 0, start: 0, beats: 1 },
      { number: 1, start: 1, beats: 3 },
    ]);
    const jig = demoSong("skaters-jig").beatMap;
    expect(jig.beatsPerBar).toBe(2);
    // 147 quarter notes a minute are 98 dotted quarters a minute.
    expect((jig.beats[1] ?? 0) - (jig.beats[0] ?? 0)).toBeCloseTo(60_000_000 / 98, -1);
  });

  it("is loudest in a chorus", () => {
    for (const { beatMap, title } of DEMO_SONGS) {
      const mean = (start: number, end: number): number => {
        const part = beatMap.loudness.slice(start * 4, end * 4);
        return part.reduce((sum, value) => sum + value, 0) / part.length;
      };
      const first = beatMap.sections[0];
      const chorus = beatMap.sections.filter((section) => section.name === "chorus").at(-1);
      expect(mean(chorus?.start ?? 0, chorus?.end ?? 0), title).toBeGreaterThan(
        mean(first?.start ?? 0, first?.end ?? 0),
      );
    }
  });
});

describe("public-domain tunes, against the printed melody (scale steps of the first phrases, from memory of the hymnal)", () => {
  const firstPitches = (id: string, instrument: string, section: string, count: number): number[] => {
    const { beatMap } = demoSong(id);
    const at = beatMap.sections.find((one) => one.name === section)?.start ?? 0;
    const notes = beatMap.instruments.find((one) => one.name === instrument)?.notes ?? [];
    return notes
      .filter((note) => note.start >= at)
      .slice(0, count)
      .map((note) => note.pitch - 67);
  };

  it("Jingle Bells: mi mi mi, mi mi mi, mi so do re mi", () => {
    expect(firstPitches("jingle-bells", "bells", "chorus", 11)).toEqual([4, 4, 4, 4, 4, 4, 4, 7, 0, 2, 4]);
  });

  it("Good King Wenceslas: do do do re do do so, la so la ti do do", () => {
    expect(firstPitches("good-king-wenceslas", "flute", "verse", 13)).toEqual([
      0, 0, 0, 2, 0, 0, -5, -3, -5, -3, -1, 0, 0,
    ]);
  });
});
