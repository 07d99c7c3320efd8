/** A small notation for tunes: what a person can check against a printed page. Lengths are in quarter notes. */

export interface Tone {
  /** From the start of the passage. */
  readonly start: number;
  readonly length: number;
  /** MIDI key number: "C4" is 60. */
  readonly pitch: number;
}

export interface Passage {
  readonly length: number;
  readonly tones: readonly Tone[];
}

const STEPS: { readonly [letter: string]: number } = { C: 0, D: 2, E: 4, F: 5, G: 7, A: 9, B: 11 };
const SHIFT: { readonly [sign: string]: number } = { "#": 1, b: -1, "": 0 };

/** The MIDI key number of a name like "F#4"; middle C is "C4". */
export function keyNumber(name: string): number {
  const match = /^([A-G])([#b]?)(\d)$/.exec(name);
  if (!match) throw new RangeError(`"${name}" names no tone.`);
  const [, letter = "", sign = "", octave = ""] = match;
  return 12 * (Number(octave) + 1) + (STEPS[letter] ?? 0) + (SHIFT[sign] ?? 0);
}

/**
 * Reads a tune: "G4 A4:.5 r:2 | B4:4". A tone is a name, then its length if it is not `usual`; "r" is
 * a rest; "|" ends a bar, and every bar must be full.
 */
export function readTune(text: string, barLength: number, usual = 1): Passage {
  const tones: Tone[] = [];
  let at = 0;
  text.split("|").forEach((bar, n) => {
    const before = at;
    for (const word of bar.trim().split(/\s+/)) {
      const [name = "", length] = word.split(":");
      const lasts = length === undefined ? usual : Number(length);
      if (name !== "r") tones.push({ start: at, length: lasts, pitch: keyNumber(name) });
      at += lasts;
    }
    if (Math.abs(at - before - barLength) > 1e-9)
      throw new RangeError(`Bar ${n + 1} of "${text.slice(0, 30)}" lasts ${at - before}, not ${barLength}.`);
  });
  return { length: at, tones };
}

export interface Chord {
  readonly start: number;
  readonly length: number;
  /** 0 is C, 11 is B. */
  readonly root: number;
  /** Steps above the root. */
  readonly steps: readonly number[];
}

const KINDS: { readonly [kind: string]: readonly number[] } = {
  "": [0, 4, 7],
  m: [0, 3, 7],
  "7": [0, 4, 7, 10],
  sus: [0, 5, 7],
};

/** Reads chords: "G | Em C | D7". The chords of a bar share it evenly. */
export function readChords(text: string, barLength: number): readonly Chord[] {
  return text.split("|").flatMap((bar, b) => {
    const names = bar.trim().split(/\s+/);
    const length = barLength / names.length;
    return names.map((name, n) => {
      const match = /^([A-G])([#b]?)(.*)$/.exec(name);
      const steps = KINDS[match?.[3] ?? "?"];
      if (!match || !steps) throw new RangeError(`"${name}" names no chord.`);
      const root = ((STEPS[match[1] ?? ""] ?? 0) + (SHIFT[match[2] ?? ""] ?? 0) + 12) % 12;
      return { start: b * barLength + n * length, length, root, steps };
    });
  });
}
