import type { SectionPlan, SongPlan } from "./arrange.ts";
import { SIX } from "./drum-patterns.ts";

const TUNE =
  "G4 B4 D5 G5 D5 B4 | G4 B4 D5 D5:1 B4 | C5 E5 G5 E5 C5 E5 | D5 B4 G4 B4:1 D5 | E5 D5 B4 G4 B4 E5 | C5 A4 E5 C5:1 A4 | F#4 A4 D5 C5 A4 F#4 | G4:1 B4 G4:1 r";
const ANSWER =
  "E5:1 G5 B5 G5 E5 | C5:1 E5 G5 E5 C5 | D5:1 G5 B5 G5 D5 | F#5:1 A5 D5:1 A4 | E5:1 G5 B5 A5 G5 | E5 G5 E5 C5:1 E5 | D5 F#5 A5 C6 A5 F#5 | G5:1 D5 G5:1 r";
const CHIMES = "G5:1.5 r:1.5 | r:3 | C6:1.5 r:1.5 | r:3 | B5:1.5 r:1.5 | r:3 | A5:1.5 r:1.5 | G5:3";

const twice = (text: string): string => `${text} | ${text}`;

const VERSE: SectionPlan = {
  name: "verse",
  chords: twice("G | G | C | G | Em | Am | D7 | G"),
  flute: twice(TUNE),
  bells: twice(CHIMES),
  drums: [SIX.soft, SIX.soft, SIX.soft, SIX.full],
  lastDrums: SIX.fill,
  strings: 48,
  bass: "halves",
  force: 82,
};

const CHORUS: SectionPlan = {
  name: "chorus",
  chords: twice("Em | C | G | D | Em | C | D7 | G"),
  bells: twice(ANSWER),
  drums: [SIX.first, SIX.full, SIX.full, SIX.full],
  lastDrums: SIX.fill,
  strings: 64,
  bass: "halves",
  force: 96,
};

/** An original jig in G major: bars of six eighths, counted in two, 98 of those beats a minute. */
export const SKATERS_JIG: SongPlan = {
  id: "skaters-jig",
  title: "Skaters' Jig",
  credit: "Original for Quillhaven Winter Lights",
  perMinute: 147,
  meter: { beats: 6, unit: 8 },
  usual: 0.5,
  sections: [
    {
      name: "intro",
      chords: "G | G | D | D",
      bells: "G5:1.5 D6:1.5 | B5:1.5 G5:1.5 | A5:1.5 F#5:1.5 | D5:3",
      drums: [SIX.soft],
      bass: "long",
      force: 76,
    },
    VERSE,
    CHORUS,
    { ...VERSE, strings: 54 },
    CHORUS,
    {
      name: "ending",
      chords: "G | G | C | G | Em | C | D | G",
      flute: `${TUNE.split(" | ").slice(0, 4).join(" | ")} | B4:1.5 G4:1.5 | C5:1.5 E5:1.5 | D5:1.5 F#5:1.5 | G5:3`,
      drums: [SIX.soft],
      lastDrums: SIX.last,
      strings: 56,
      bass: "halves",
      force: 82,
      slowTo: 108,
    },
  ],
};
