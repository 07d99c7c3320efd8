import type { SectionPlan, SongPlan } from "./arrange.ts";
import { FOUR } from "./drum-patterns.ts";

const VERSE_TUNE =
  "D4 B4 A4 G4 | D4:3 D4:.5 D4:.5 | D4 B4 A4 G4 | E4:4 | E4 C5 B4 A4 | F#4:4 | D5 D5 C5 A4 | B4:4 | D4 B4 A4 G4 | D4:4 | D4 B4 A4 G4 | E4:3 E4 | E4 C5 B4 A4 | D5 D5 D5 D5 | E5 D5 C5 A4 | G4:2 D5:2";

const CHORUS: SectionPlan = {
  name: "chorus",
  chords: "G | G | G | G | C | G | A7 | D7 | G | G | G | G | C | G | D7 | G",
  bells:
    "B4 B4 B4:2 | B4 B4 B4:2 | B4 D5 G4:1.5 A4:.5 | B4:4 | C5 C5 C5:1.5 C5:.5 | C5 B4 B4 B4:.5 B4:.5 | B4 A4 A4 B4 | A4:2 D5:2 | B4 B4 B4:2 | B4 B4 B4:2 | B4 D5 G4:1.5 A4:.5 | B4:4 | C5 C5 C5:1.5 C5:.5 | C5 B4 B4 B4:.5 B4:.5 | D5 D5 C5 A4 | G4:4",
  drums: [FOUR.full],
  lastDrums: FOUR.fill,
  strings: 66,
  bass: "halves",
  force: 98,
};

/** The tune of 1857 in G major, 56 bars of four at 116 a minute. */
export const JINGLE_BELLS: SongPlan = {
  id: "jingle-bells",
  title: "Jingle Bells",
  credit: "Tune: James Lord Pierpont, 1857 (public domain); arranged for Quillhaven Winter Lights",
  perMinute: 116,
  meter: { beats: 4, unit: 4 },
  sections: [
    {
      name: "intro",
      chords: "G | C | D7 | G",
      bells: "B5 B5 B5:2 | C6 B5 A5 G5 | F#5 A5 D6 C6 | B5:2 G5:2",
      drums: [FOUR.sleigh],
      bass: "long",
      force: 78,
    },
    {
      name: "verse",
      chords: "G | G | G | C | Am | D7 | D7 | G | G | G | G | C | Am | D7 | Am D7 | G",
      flute: VERSE_TUNE,
      bells:
        "r:2 B5 D6 | r:4 | r:2 B5 D6 | r:4 | r:2 C6 E6 | r:4 | r:2 A5 C6 | r:4 | r:2 B5 D6 | r:4 | r:2 B5 D6 | r:4 | r:2 C6 E6 | r:4 | r:2 A5 C6 | B5:2 G5:2",
      drums: [FOUR.sleigh, FOUR.sleigh, FOUR.sleigh, FOUR.steady],
      lastDrums: FOUR.fill,
      strings: 52,
      bass: "halves",
      force: 84,
    },
    CHORUS,
    { ...CHORUS, harp: 54, drums: [FOUR.first, FOUR.full, FOUR.full, FOUR.full] },
    {
      name: "ending",
      chords: "C | G | D7 | G",
      bells: "C5 C5 C5:1.5 C5:.5 | C5 B4 B4 B4:.5 B4:.5 | D5 D5 C5 A4 | G4:2 G5:2",
      drums: [FOUR.sleigh],
      lastDrums: FOUR.last,
      strings: 60,
      bass: "halves",
      force: 90,
      slowTo: 84,
    },
  ],
};
