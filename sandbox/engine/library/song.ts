import type { InstrumentTable, NoteTable, SectionTable } from "../guest.ts";
import { moment, number, text, tidy, unknownName, whole } from "./arguments.ts";
import { fail, state } from "./state.ts";

/** A section of the song, or the song itself: a stretch `start <= m < end` with its bars and beats. */
export class Section {
  readonly #isSection = true;
  readonly name: string;
  readonly start: number;
  readonly end: number;
  readonly bars: readonly number[];
  readonly beats: readonly number[];

  constructor(table: SectionTable) {
    this.name = table.name;
    this.start = table.start;
    this.end = table.end;
    this.bars = barsWithin(table.start, table.end);
    this.beats = beatsWithin(table.start, table.end);
    Object.freeze(this);
  }

  static is(value: unknown): value is Section {
    return typeof value === "object" && value !== null && #isSection in value && value.#isSection;
  }
}

/** Starts of the bars from bar 1 on; a pick-up is bar 0 and not among them (rule 22). */
function barsWithin(start: number, end: number): readonly number[] {
  const bars: number[] = [];
  for (const bar of state.tables.song.bars)
    if (bar.number > 0 && bar.start >= start && bar.start < end) bars.push(bar.start);
  return Object.freeze(bars);
}

function beatsWithin(start: number, end: number): readonly number[] {
  const beats: number[] = [];
  for (let beat = Math.ceil(start); beat < end; beat++) beats.push(beat);
  return Object.freeze(beats);
}

let made: readonly Section[] | null = null;

function sections(): readonly Section[] {
  if (made === null) {
    const list: Section[] = [];
    for (const table of state.tables.song.sections) list.push(new Section(table));
    made = Object.freeze(list);
  }
  return made;
}

function songEnd(): number {
  return state.tables.song.beats.length - 1;
}

interface Stretch {
  readonly start: number;
  readonly end: number;
}

/** The stretch that a script names; all of the song when it names none. */
function stretch(word: string, within: unknown): Stretch {
  if (within === undefined || within === (song as unknown)) return { start: 0, end: Infinity };
  if (!Section.is(within)) return fail("wants-a-section", { word }, 1);
  return within;
}

function instrument(word: string, value: unknown): InstrumentTable {
  const name = text(word, value, 0);
  const names: string[] = [];
  for (const candidate of state.tables.song.instruments) {
    if (candidate.name === name) return candidate;
    names.push(candidate.name);
  }
  return unknownName("unknown-instrument", name, names);
}

let songBars: readonly number[] | null = null;
let songBeats: readonly number[] | null = null;

/** The word `song`. */
export const song = Object.freeze({
  get start(): number {
    return 0;
  },

  get end(): number {
    return songEnd();
  },

  get bars(): readonly number[] {
    songBars ??= barsWithin(0, songEnd());
    return songBars;
  },

  get beats(): readonly number[] {
    songBeats ??= beatsWithin(0, songEnd());
    return songBeats;
  },

  get beatsPerBar(): number {
    return state.tables.song.beatsPerBar;
  },

  get sections(): readonly Section[] {
    return sections();
  },

  /** The moment of a bar, or of a beat in it; the bar after the last has beat 1 only (rule 22). */
  bar(wanted: number, beat: number = 1): number {
    const { bars } = state.tables.song;
    const asked = number("bar", wanted, 0);
    const place = number("bar", beat, 1);
    const first = bars[0];
    const last = bars[bars.length - 1];
    if (first === undefined || last === undefined) return fail("no-such-bar", { bar: tidy(asked), last: 0 }, 0);
    if (asked === last.number + 1) {
      if (place === 1) return last.start + last.beats;
      return fail("no-such-bar", { bar: tidy(asked), last: last.number }, 0);
    }
    const found = Number.isInteger(asked) ? bars[asked - first.number] : undefined;
    if (found === undefined) return fail("no-such-bar", { bar: tidy(asked), last: last.number }, 0);
    if (!(place >= 1 && place < found.beats + 1))
      return fail("no-such-beat", { bar: asked, beats: found.beats, beat: tidy(place), next: asked + 1 }, 1);
    return found.start + place - 1;
  },

  section(name: string, nth: number = 1): Section {
    const wanted = text("section", name, 0);
    const turn = whole("section", nth, 1, 1);
    let count = 0;
    for (const section of sections()) if (section.name === wanted && ++count === turn) return section;
    if (count > 0)
      return fail(
        "no-such-section",
        { name: wanted, count, nth: turn, plural: count === 1 ? "section" : "sections" },
        1,
      );
    const names: string[] = [];
    for (const section of sections()) names.push(section.name);
    return unknownName("unknown-section", wanted, names);
  },

  hits(name: string, within?: unknown): readonly number[] {
    const { hits } = instrument("hits", name);
    const { start, end } = stretch("hits", within);
    const found: number[] = [];
    for (const hit of hits) if (hit >= start && hit < end) found.push(hit);
    return Object.freeze(found);
  },

  notes(name: string, within?: unknown): readonly NoteTable[] {
    const { notes } = instrument("notes", name);
    const { start, end } = stretch("notes", within);
    const found: NoteTable[] = [];
    for (const note of notes) if (note.start >= start && note.start < end) found.push(Object.freeze(note));
    return Object.freeze(found);
  },

  /** 0 to 100: the quarter of a beat in which the moment lies; silent after the end. */
  howLoud(place: number): number {
    return state.tables.song.loudness[Math.floor(moment("howLoud", place, 0) * 4)] ?? 0;
  },
});
