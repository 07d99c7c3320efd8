import type { SectionPlan, SongPlan } from "./arrange.ts";
import { FOUR } from "./drum-patterns.ts";

const VERSE: SectionPlan = {
  name: "verse",
  chords: "C | Am | F | G | C | Am | F G | C",
  flute:
    "E4 G4 C5:1.5 B4:.5 | A4:1.5 B4:.5 C5:2 | A4 F4 A4 C5 | B4:3 G4 | E4 G4 C5:1.5 B4:.5 | A4 C5 E5:2 | F5 D5 B4 D5 | C5:3 r",
  bells: "C6 r:3 | A5 r:3 | F5 r:3 | G5 B5 D6 r | C6 r:3 | A5 r C6 r | F5 A5 G5 B5 | C6:2 G5:2",
  drums: [FOUR.steady],
  lastDrums: FOUR.fill,
  strings: 54,
  bass: "halves",
  force: 84,
};

const CHORUS: SectionPlan = {
  name: "chorus",
  chords: "F | G | Em | Am | F | G | C | C",
  bells:
    "A5 G5 F5 A5 | B5:1.5 A5:.5 G5 D5 | E5 G5 B5 G5 | C6:3 B5 | A5 F5 A5 C6 | B5 G5 B5 D6 | C6:.5 B5:.5 A5:.5 G5:.5 F5:.5 E5:.5 D5:.5 C5:.5 | C5:2 C6:2",
  drums: [FOUR.first, FOUR.full, FOUR.full, FOUR.full],
  lastDrums: FOUR.fill,
  strings: 70,
  harp: 56,
  bass: "beats",
  force: 98,
};

/** An original in C major around the peal of eight bells. 56 bars of four at 104 a minute. */
export const QUILLHAVEN_BELLS: SongPlan = {
  id: "quillhaven-bells",
  title: "Quillhaven Bells",
  credit: "Original for Quillhaven Winter Lights",
  perMinute: 104,
  meter: { beats: 4, unit: 4 },
  sections: [
    {
      name: "intro",
      chords: "C | F C | G | C",
      bells:
        "C6:.5 B5:.5 A5:.5 G5:.5 F5:.5 E5:.5 D5:.5 C5:.5 | C6:.5 B5:.5 A5:.5 G5:.5 F5:.5 E5:.5 D5:.5 C5:.5 | B5:.5 C6:.5 G5:.5 A5:.5 E5:.5 F5:.5 C5:.5 D5:.5 | C5:2 G5:2",
      drums: [FOUR.soft],
      bass: "none",
      force: 76,
    },
    VERSE,
    CHORUS,
    { ...VERSE, harp: 44 },
    CHORUS,
    {
      name: "bridge",
      chords: "Am | Em | F | C | Dm | Am | F | G",
      flute: "A4:2 C5:2 | B4:2 G4:2 | A4:2 F4:2 | G4:4 | F4:2 A4:2 | E4:2 A4:2 | A4:2 C5:2 | B4:2 D5:2",
      strings: 58,
      harp: 46,
      bass: "long",
      force: 74,
      drums: [FOUR.soft],
    },
    CHORUS,
    {
      name: "ending",
      chords: "C | F | G | C",
      bells: "C6:.5 B5:.5 A5:.5 G5:.5 F5:.5 E5:.5 D5:.5 C5:.5 | A5:2 F5:2 | G5:2 B5:2 | C6:4",
      drums: [FOUR.soft],
      lastDrums: FOUR.last,
      strings: 60,
      bass: "long",
      force: 82,
      slowTo: 78,
    },
  ],
};
