import type { SectionPlan, SongPlan } from "./arrange.ts";
import { THREE } from "./drum-patterns.ts";

const VERSE: SectionPlan = {
  name: "verse",
  chords: "F | F | Dm | Dm | Bb | Gm | C | C | F | F | Dm | Dm | Gm | C7 | F | F",
  flute:
    "F4:2 A4 | C5:2 A4 | D5:2 C5 | A4:3 | Bb4:2 A4 | G4:2 F4 | E4:2 F4 | G4:2 C4 | F4:2 A4 | C5:2 A4 | D5:2 E5 | F5:3 | D5:2 Bb4 | G4:2 E4 | F4:3 | F4:2 r",
  bells:
    "r A5 C6 | r:3 | r A5 D6 | r:3 | r Bb5 D6 | r:3 | r G5 C6 | r:3 | r A5 C6 | r:3 | r A5 D6 | r:3 | r G5 Bb5 | r E5 G5 | F5:3 | r:3",
  drums: [THREE.soft],
  strings: 52,
  bass: "long",
  force: 82,
};

const CHORUS: SectionPlan = {
  name: "chorus",
  chords: "Bb | C | Am | Dm | Gm | C | F | F | Bb | C | Am | Dm | Gm | C7 | F | F",
  bells:
    "D5 F5 Bb5 | G5:2 E5 | E5 A5 C6 | A5:2 F5 | G5 Bb5 D6 | C6:2 Bb5 | A5:2 G5 | F5:3 | D5 F5 Bb5 | C6:2 G5 | A5 C6 E6 | D6:2 A5 | Bb5 A5 G5 | C6:2 E5 | F5:3 | F5:2 r",
  drums: [THREE.first, THREE.full, THREE.full, THREE.full],
  strings: 66,
  harp: 52,
  bass: "halves",
  force: 94,
};

/** An original in F major: bars of three at 138 a minute, with one beat before bar 1. */
export const LANTERN_WALTZ: SongPlan = {
  id: "lantern-waltz",
  title: "Lantern Waltz",
  credit: "Original for Quillhaven Winter Lights",
  perMinute: 138,
  meter: { beats: 3, unit: 4 },
  pickUp: "r:2 C4",
  sections: [
    VERSE,
    CHORUS,
    { ...VERSE, strings: 58, harp: 42 },
    CHORUS,
    {
      name: "ending",
      chords: "Bb | Bb | F | F | C | C7 | F | F",
      flute: "D5:2 C5 | Bb4:2 A4 | C5:2 A4 | F4:3 | G4:2 A4 | Bb4:2 G4 | F4:3 | F4:3",
      drums: [THREE.soft],
      lastDrums: THREE.last,
      strings: 56,
      bass: "long",
      force: 76,
      slowTo: 96,
    },
  ],
};
