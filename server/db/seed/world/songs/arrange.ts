import { DRUM_CHANNEL } from "../../../../../sandbox/music/midi-file.ts";
import type { Marker, MidiFile, MidiNote, MidiTrack, TempoChange } from "../../../../../sandbox/music/midi-file.ts";
import { DRUM_KEYS } from "./drum-patterns.ts";
import type { Drum, DrumBar } from "./drum-patterns.ts";
import { readChords, readTune } from "./notation.ts";
import type { Chord, Passage } from "./notation.ts";

/** How the bass moves under a chord. */
export type BassLine = "none" | "long" | "halves" | "beats";

/** One section of a song: its chords say how many bars it has; every tune in it has as many. */
export interface SectionPlan {
  readonly name: string;
  readonly chords: string;
  readonly bells?: string;
  readonly flute?: string;
  /** Bars of drums, taken in turn; the last bar of the section is `lastDrums` where that is given. */
  readonly drums?: readonly DrumBar[];
  readonly lastDrums?: DrumBar;
  /** Velocity (1 to 127) of the strings' held chords; none when left out. */
  readonly strings?: number;
  /** Velocity of the harp's broken chords; none when left out. */
  readonly harp?: number;
  readonly bass: BassLine;
  /** Velocity of the tune; 88 when left out. */
  readonly force?: number;
  /** Quarter notes a minute from here on. */
  readonly perMinute?: number;
  /** Slows down to this many quarter notes a minute over the last two bars. */
  readonly slowTo?: number;
}

/** A song as its arranger writes it down. */
export interface SongPlan {
  readonly id: string;
  readonly title: string;
  /** Who made the tune and when, and that the arrangement is ours. */
  readonly credit: string;
  /** Quarter notes a minute. */
  readonly perMinute: number;
  readonly meter: { readonly beats: number; readonly unit: number };
  /** Length in quarter notes of a tone that names none. */
  readonly usual?: number;
  /** Tones before bar 1, for the flute. */
  readonly pickUp?: string;
  readonly sections: readonly SectionPlan[];
}

const TICKS_PER_QUARTER = 480;
const CHANNELS = { bells: 0, flute: 1, strings: 2, harp: 3, bass: 4, drums: DRUM_CHANNEL } as const;
/** General MIDI programs, counted from 0. */
const PROGRAMS = { bells: 14, flute: 73, strings: 48, harp: 46, bass: 32, drums: null } as const;
type Player = keyof typeof CHANNELS;
const PLAYERS: readonly Player[] = ["bells", "flute", "strings", "harp", "bass", "drums"];

const ticks = (quarters: number): number => Math.round(quarters * TICKS_PER_QUARTER);

/** Collects the notes of every player; positions in quarter notes from the start of the file. */
class Pages {
  readonly #notes = new Map<Player, MidiNote[]>(PLAYERS.map((player) => [player, []]));

  add(player: Player, at: number, length: number, pitch: number, velocity: number): void {
    const note = {
      tick: ticks(at),
      ticks: ticks(length),
      channel: CHANNELS[player],
      pitch,
      velocity: Math.min(127, Math.max(1, Math.round(velocity))),
    };
    this.#notes.get(player)?.push(note);
  }

  tracks(): MidiTrack[] {
    return PLAYERS.map((player) => ({
      name: player,
      program: PROGRAMS[player],
      notes: (this.#notes.get(player) ?? []).sort((a, b) => a.tick - b.tick || a.pitch - b.pitch),
    })).filter((track) => track.notes.length > 0);
  }
}

function addTune(
  pages: Pages,
  player: "bells" | "flute",
  at: number,
  tune: Passage,
  barLength: number,
  force: number,
): void {
  for (const tone of tune.tones) {
    const inBar = tone.start % barLength;
    const lift = inBar === 0 ? 10 : Number.isInteger(inBar) ? 0 : -8;
    pages.add(player, at + tone.start, tone.length * (player === "bells" ? 0.95 : 0.9), tone.pitch, force + lift);
  }
}

/** The tones of a chord in close position, from the lowest root at or above `floor`. */
function voicing(chord: Chord, floor: number): number[] {
  const root = floor + ((chord.root - (floor % 12) + 12) % 12);
  return chord.steps.map((step) => (root + step >= floor + 14 ? root + step - 12 : root + step)).sort((a, b) => a - b);
}

function addChords(pages: Pages, at: number, chords: readonly Chord[], section: SectionPlan): void {
  for (const chord of chords) {
    if (section.strings !== undefined)
      for (const pitch of voicing(chord, 55))
        pages.add("strings", at + chord.start, chord.length * 0.97, pitch, section.strings);
    if (section.harp === undefined) continue;
    const tones = voicing(chord, 67);
    const rising = [...tones, (tones[0] ?? 67) + 12];
    for (let n = 0; n * 0.5 < chord.length; n += 1) {
      const round = n % (2 * rising.length - 2);
      const pitch = rising[round < rising.length ? round : 2 * rising.length - 2 - round] ?? 67;
      pages.add("harp", at + chord.start + n * 0.5, 0.5, pitch, section.harp + (n === 0 ? 8 : 0));
    }
  }
}

/** Lengths (in quarter notes) into which a bass line cuts a chord. */
function bassStep(line: BassLine, chord: Chord, beat: number): number {
  if (line === "long") return chord.length;
  if (line === "halves") return Math.max(beat, chord.length / 2);
  return beat;
}

function addBass(pages: Pages, at: number, chords: readonly Chord[], line: BassLine, beat: number): void {
  if (line === "none") return;
  for (const chord of chords) {
    const step = bassStep(line, chord, beat);
    // From the lowest string of a bass, E2 (key 40), upwards.
    const root = 40 + ((chord.root - 4 + 12) % 12);
    for (let n = 0; n * step < chord.length - 1e-9; n += 1) {
      pages.add("bass", at + chord.start + n * step, step * 0.85, n % 2 === 0 ? root : root + 7, n === 0 ? 92 : 78);
    }
  }
}

function addDrums(pages: Pages, at: number, bars: number, section: SectionPlan, barLength: number): void {
  const { drums = [], lastDrums } = section;
  for (let bar = 0; bar < bars; bar += 1) {
    const pattern = bar === bars - 1 && lastDrums ? lastDrums : drums[bar % Math.max(1, drums.length)];
    for (const [drum, row] of Object.entries(pattern ?? {}) as [Drum, string][]) {
      [...row].forEach((mark, n) => {
        if (mark === ".") return;
        const length = barLength / row.length;
        pages.add(
          "drums",
          at + bar * barLength + n * length,
          Math.min(0.25, length),
          DRUM_KEYS[drum],
          mark === "X" ? 112 : drum === "hat" || drum === "jingles" ? 58 : 88,
        );
      });
    }
  }
}

const tempo = (at: number, perMinute: number): TempoChange => ({
  tick: ticks(at),
  microsPerQuarter: Math.round(60_000_000 / perMinute),
});

/** Tempo steps on every quarter note of the last two bars, evenly from one tempo to the other. */
function slowing(end: number, barLength: number, from: number, to: number): TempoChange[] {
  const count = 2 * barLength;
  return Array.from({ length: count }, (_, n) => tempo(end - count + n, from + ((to - from) * (n + 1)) / count));
}

/** Plays a plan: the MIDI file of a song, with a marker for every section and a track for every player. */
export function arrange(plan: SongPlan): MidiFile {
  const barLength = (plan.meter.beats * 4) / plan.meter.unit;
  const beat = plan.meter.unit === 8 && plan.meter.beats % 3 === 0 ? 1.5 : 4 / plan.meter.unit;
  const pages = new Pages();
  const markers: Marker[] = [];
  let perMinute = plan.perMinute;
  const tempos: TempoChange[] = [tempo(0, perMinute)];
  let at = 0;
  if (plan.pickUp !== undefined) {
    addTune(pages, "flute", 0, readTune(plan.pickUp, barLength, plan.usual), barLength, 84);
    at = barLength;
  }
  for (const section of plan.sections) {
    const chords = readChords(section.chords, barLength);
    const bars = section.chords.split("|").length;
    const length = bars * barLength;
    markers.push({ tick: ticks(at), name: section.name });
    if (section.perMinute !== undefined) {
      perMinute = section.perMinute;
      tempos.push(tempo(at, perMinute));
    }
    for (const player of ["bells", "flute"] as const) {
      const text = section[player];
      if (text === undefined) continue;
      const tune = readTune(text, barLength, plan.usual);
      if (tune.length !== length)
        throw new RangeError(`The ${player} of "${section.name}" in ${plan.title} last ${tune.length}, not ${length}.`);
      addTune(pages, player, at, tune, barLength, section.force ?? 88);
    }
    addChords(pages, at, chords, section);
    addBass(pages, at, chords, section.bass, beat);
    addDrums(pages, at, bars, section, barLength);
    at += length;
    if (section.slowTo !== undefined) tempos.push(...slowing(at, barLength, perMinute, section.slowTo));
  }
  return {
    format: 1,
    ticksPerQuarter: TICKS_PER_QUARTER,
    tempos,
    meters: [{ tick: 0, ...plan.meter }],
    markers,
    tracks: pages.tracks(),
  };
}
