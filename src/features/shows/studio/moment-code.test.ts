import { describe, expect, it } from "vitest";
import type { BeatMap } from "../../../../shared/contracts/songs.ts";
import { listMomentCodes } from "./moment-code.ts";

/** Eight bars of four. */
const song: BeatMap = {
  version: 1,
  beats: Array.from({ length: 33 }, (_, beat) => beat * 500_000),
  beatsPerBar: 4,
  bars: Array.from({ length: 8 }, (_, bar) => ({ number: bar + 1, start: bar * 4, beats: 4 })),
  sections: [
    { name: "verse", start: 4, end: 12 },
    { name: "chorus", start: 12, end: 20 },
    { name: "chorus", start: 20, end: 28 },
  ],
  instruments: [],
  loudness: [],
};
const codes = (bar: number, beat: number) => listMomentCodes(song, bar, beat).map(({ code }) => code);

describe("listMomentCodes", () => {
  it("writes a beat by its bar and by its number in the song", () => {
    expect(codes(3, 2)).toEqual([
      "waitUntil(song.bar(3, 2));",
      "at(song.bar(3, 2), () => {\n  \n});",
      "song.bar(3, 2)",
      "9",
    ]);
  });

  it("names the section that begins there, the second of a name by its number", () => {
    expect(codes(2, 1)).toContain('song.section("verse").start');
    expect(codes(6, 1)).toContain('waitUntil(song.section("chorus", 2).start);');
  });
});
