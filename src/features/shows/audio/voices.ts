import { pitchFrequency } from "../../../../sandbox/music/score.ts";
import type { Family } from "./instrument-family.ts";
import { FMSynth, MonoSynth, Synth, type Context } from "./tone.ts";

/** One note to be played: `at` in seconds of the context, `lasts` in seconds. */
export interface PlayedNote {
  readonly pitch: number;
  readonly velocity: number;
  readonly at: number;
  readonly lasts: number;
}

/** What plays the notes of one track. */
export interface Player {
  play(note: PlayedNote): void;
  /** Lets go of every note that sounds or is laid; `at` comes after all of them have begun. */
  release(at: number): void;
  dispose(): void;
}

type Voice = FMSynth | MonoSynth | Synth;

interface Timbre {
  readonly voices: number;
  /** Decibels; evens the families out by ear on laptop speakers. */
  readonly volume: number;
  readonly create: (context: Context, volume: number) => Voice;
}

const TIMBRES: { readonly [F in Exclude<Family, "drums">]: Timbre } = {
  bells: {
    voices: 6,
    volume: -4,
    create: (context, volume) =>
      new FMSynth({
        context,
        volume,
        harmonicity: 3.01,
        modulationIndex: 6,
        oscillator: { type: "sine" },
        envelope: { attack: 0.002, decay: 1.1, sustain: 0.04, release: 1.2 },
        modulation: { type: "sine" },
        modulationEnvelope: { attack: 0.002, decay: 0.35, sustain: 0.05, release: 0.6 },
      }),
  },
  piano: {
    voices: 8,
    volume: -8,
    create: (context, volume) =>
      new FMSynth({
        context,
        volume,
        harmonicity: 1,
        modulationIndex: 3,
        envelope: { attack: 0.004, decay: 0.9, sustain: 0.12, release: 0.5 },
        modulationEnvelope: { attack: 0.004, decay: 0.4, sustain: 0.1, release: 0.4 },
      }),
  },
  // Laptop speakers give little below 200 Hz: the saw's overtones carry the pitch.
  bass: {
    voices: 2,
    volume: -16,
    create: (context, volume) =>
      new MonoSynth({
        context,
        volume,
        oscillator: { type: "sawtooth" },
        filter: { type: "lowpass", rolloff: -12, Q: 0.8 },
        envelope: { attack: 0.008, decay: 0.3, sustain: 0.55, release: 0.18 },
        filterEnvelope: { attack: 0.005, decay: 0.25, sustain: 0.35, release: 0.2, baseFrequency: 180, octaves: 2.6 },
      }),
  },
  strings: {
    voices: 6,
    volume: -21,
    create: (context, volume) =>
      new MonoSynth({
        context,
        volume,
        oscillator: { type: "sawtooth" },
        filter: { type: "lowpass", rolloff: -12, Q: 0.4 },
        envelope: { attack: 0.16, decay: 0.3, sustain: 0.8, release: 0.7 },
        filterEnvelope: { attack: 0.25, decay: 0.3, sustain: 0.7, release: 0.6, baseFrequency: 420, octaves: 1.8 },
      }),
  },
  flute: {
    voices: 3,
    volume: -10,
    create: (context, volume) =>
      new Synth({
        context,
        volume,
        oscillator: { type: "triangle" },
        envelope: { attack: 0.05, decay: 0.15, sustain: 0.75, release: 0.22 },
      }),
  },
  brass: {
    voices: 4,
    volume: -17,
    create: (context, volume) =>
      new MonoSynth({
        context,
        volume,
        oscillator: { type: "sawtooth" },
        filter: { type: "lowpass", rolloff: -12, Q: 0.7 },
        envelope: { attack: 0.04, decay: 0.2, sustain: 0.7, release: 0.2 },
        filterEnvelope: { attack: 0.06, decay: 0.2, sustain: 0.5, release: 0.2, baseFrequency: 350, octaves: 2.4 },
      }),
  },
  plucked: {
    voices: 6,
    volume: -6,
    create: (context, volume) =>
      new FMSynth({
        context,
        volume,
        harmonicity: 2,
        modulationIndex: 4,
        envelope: { attack: 0.002, decay: 0.5, sustain: 0, release: 0.4 },
        modulationEnvelope: { attack: 0.002, decay: 0.12, sustain: 0, release: 0.1 },
      }),
  },
};

/**
 * Plays tones with a fixed set of voices, the longest unused first. Voices take absolute times, so
 * notes can be laid ahead of time without a timer (a polyphonic synth of Tone's would need one).
 */
export class TonePlayer implements Player {
  readonly #voices: readonly Voice[];
  /** The time until which each voice holds its note. */
  readonly #busyUntil: number[];
  readonly #startedAt: number[] = [];

  constructor(family: Exclude<Family, "drums">, context: Context, output: AudioNode) {
    const timbre = TIMBRES[family];
    this.#voices = Array.from({ length: timbre.voices }, () => timbre.create(context, timbre.volume).connect(output));
    this.#busyUntil = this.#voices.map(() => 0);
  }

  play({ pitch, velocity, at, lasts }: PlayedNote): void {
    const place = this.#busyUntil.indexOf(Math.min(...this.#busyUntil));
    const voice = this.#voices[place];
    if (!voice) return;
    // A stolen voice starts its new note a little later than its old one did: Tone wants rising times.
    const from = Math.max(at, (this.#startedAt[place] ?? 0) + 0.001);
    this.#startedAt[place] = from;
    this.#busyUntil[place] = at + lasts;
    voice.triggerAttackRelease(pitchFrequency(pitch), Math.max(0.04, lasts), from, velocity);
  }

  release(at: number): void {
    this.#voices.forEach((voice, place) => {
      if ((this.#startedAt[place] ?? at) < at) voice.triggerRelease(at);
      this.#busyUntil[place] = at;
    });
  }

  dispose(): void {
    for (const voice of this.#voices) voice.dispose();
  }
}
