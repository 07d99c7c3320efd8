import type { SectionPlan, SongPlan } from "./arrange.ts";
import { FOUR } from "./drum-patterns.ts";

const FIRST_HALF =
  "G4 G4 G4 A4 | G4 G4 D4:2 | E4 D4 E4 F#4 | G4:2 G4:2 | G4 G4 G4 A4 | G4 G4 D4:2 | E4 D4 E4 F#4 | G4:2 G4:2";
const SECOND_HALF =
  "D5 C5 B4 A4 | B4 A4 G4:2 | E4 D4 E4 F#4 | G4:2 G4:2 | D4 D4 E4 F#4 | G4 G4 A4:2 | D5 C5 B4 A4 | G4:2 C5:2 | G4:4";
const CHIMES = "B5 r:3 | r:2 D5 G5 | G5 r A5 r | B5:2 D6:2 | B5 r:3 | r:2 D5 G5 | G5 r A5 r | B5:2 D6:2";

const verse = (rest: Omit<SectionPlan, "name" | "chords">): SectionPlan => ({
  name: "verse",
  chords: "G | G | C G Am D | G | G | G | C G Am D | G",
  ...rest,
});
const chorus = (rest: Omit<SectionPlan, "name" | "chords">): SectionPlan => ({
  name: "chorus",
  chords: "G Am G D | G | C G Am D | G | G G C D | C D | G Am G D | Em C | G",
  ...rest,
});

/** The spring carol of 1582 in G major, three stanzas; the second half of each is called its chorus here. */
export const GOOD_KING_WENCESLAS: SongPlan = {
  id: "good-king-wenceslas",
  title: "Good King Wenceslas",
  credit: "Tune: Piae Cantiones, 1582 (public domain); arranged for Quillhaven Winter Lights",
  perMinute: 120,
  meter: { beats: 4, unit: 4 },
  sections: [
    {
      name: "intro",
      chords: "G | C D | G | D",
      bells: "G5 G5 G5 A5 | G5 E5 F#5:2 | G5:2 B5:2 | A5:4",
      drums: [FOUR.soft],
      bass: "long",
      force: 76,
    },
    verse({ flute: FIRST_HALF, bells: CHIMES, strings: 48, bass: "long", drums: [FOUR.soft], force: 80 }),
    chorus({ bells: SECOND_HALF, strings: 56, bass: "halves", drums: [FOUR.steady], lastDrums: FOUR.fill, force: 88 }),
    verse({ flute: FIRST_HALF, bells: CHIMES, strings: 54, bass: "halves", drums: [FOUR.steady], force: 82 }),
    chorus({
      bells: SECOND_HALF,
      flute: SECOND_HALF,
      strings: 62,
      bass: "beats",
      drums: [FOUR.full],
      lastDrums: FOUR.fill,
      force: 92,
    }),
    verse({ bells: FIRST_HALF, strings: 60, harp: 48, bass: "halves", drums: [FOUR.full], force: 88 }),
    chorus({
      bells: SECOND_HALF,
      flute: SECOND_HALF,
      strings: 70,
      harp: 54,
      bass: "beats",
      drums: [FOUR.first, FOUR.full, FOUR.full, FOUR.full],
      force: 100,
    }),
    {
      name: "ending",
      chords: "Em | C | D | G",
      bells: "B5:2 G5:2 | E5:2 C5:2 | D5:2 F#5:2 | G5:4",
      strings: 58,
      bass: "long",
      drums: [FOUR.soft],
      lastDrums: FOUR.last,
      force: 82,
      slowTo: 80,
    },
  ],
};
