import type { SectionPlan, SongPlan } from "./arrange.ts";
import { FOUR } from "./drum-patterns.ts";

const CHORUS: SectionPlan = {
  name: "chorus",
  chords: "G | A | F#m | Bm | G | A | D | D",
  bells: "B4 D5 G5:2 | A5:1.5 G5:.5 E5:2 | F#5 A5 C#6 A5 | B5:3 A5 | B5 A5 G5 B5 | A5 G5 E5 C#5 | D5:2 F#5 A5 | D6:4",
  drums: [FOUR.full],
  lastDrums: FOUR.fill,
  strings: 72,
  harp: 58,
  bass: "beats",
  force: 98,
};

/** An original in D major: a market on the frozen river. 36 bars of four at 96 a minute, 90 seconds. */
export const FROST_FAIR: SongPlan = {
  id: "frost-fair",
  title: "Frost Fair",
  credit: "Original for Quillhaven Winter Lights",
  perMinute: 96,
  meter: { beats: 4, unit: 4 },
  sections: [
    {
      name: "intro",
      chords: "D | Bm | G | A",
      bells: "F#5:2 A5:2 | D5:2 F#5:2 | G5:2 B5:2 | A5:4",
      drums: [FOUR.soft],
      strings: 44,
      bass: "long",
      force: 72,
    },
    {
      name: "verse",
      chords: "D | Bm | G | A | D | F#m | G A | D",
      flute:
        "F#4:1.5 G4:.5 A4 D5 | B4:1.5 A4:.5 F#4:2 | G4 A4 B4 G4 | E4:3 A4 | F#4:1.5 G4:.5 A4 D5 | C#5:1.5 B4:.5 A4:2 | B4 G4 A4 C#5 | D5:3 r",
      bells: "r:2 D5 F#5 | r:2 D5 B4 | r:2 B4 D5 | r:2 C#5 E5 | r:2 D5 F#5 | r:2 C#5 F#5 | r:2 E5 A5 | F#5:2 D5:2",
      drums: [FOUR.steady],
      lastDrums: FOUR.fill,
      strings: 56,
      bass: "halves",
      force: 84,
    },
    CHORUS,
    {
      name: "bridge",
      chords: "Bm | F#m | G | A",
      flute: "B4:3 C#5 | A4:4 | G4:2 B4:2 | A4:2 C#5:2",
      strings: 50,
      harp: 50,
      bass: "long",
      force: 76,
      drums: [FOUR.soft],
    },
    { ...CHORUS, drums: [FOUR.first, FOUR.full, FOUR.full, FOUR.full] },
    {
      name: "ending",
      chords: "D | G | A | D",
      bells: "F#5:2 D5:2 | B4:2 G4:2 | A4:2 C#5:2 | D5:4",
      drums: [FOUR.soft],
      lastDrums: FOUR.last,
      strings: 54,
      bass: "long",
      force: 78,
    },
  ],
};
