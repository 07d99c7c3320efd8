import { MembraneSynth, NoiseSynth, type Context } from "./tone.ts";
import type { PlayedNote, Player } from "./voices.ts";

type Drum = "kick" | "snare" | "hat" | "crash" | "tom" | "shaker";

/** Drums by key (General MIDI level 1, percussion key map); the rest are toms. */
const DRUM_OF_KEY: ReadonlyMap<number, Drum> = new Map<number, Drum>([
  [35, "kick"],
  [36, "kick"],
  [37, "snare"],
  [38, "snare"],
  [39, "snare"],
  [40, "snare"],
  [42, "hat"],
  [44, "hat"],
  [46, "hat"],
  [49, "crash"],
  [51, "hat"],
  [52, "crash"],
  [53, "hat"],
  [54, "shaker"],
  [55, "crash"],
  [57, "crash"],
  [59, "hat"],
  [69, "shaker"],
  [70, "shaker"],
  [82, "shaker"],
  [83, "shaker"],
]);

/** Which drum a key of the drum channel names. */
export function findDrum(key: number): Drum {
  return DRUM_OF_KEY.get(key) ?? "tom";
}

interface Noise {
  readonly colour: "white" | "pink";
  readonly decay: number;
  readonly volume: number;
}

const NOISES: { readonly [D in "snare" | "hat" | "crash" | "shaker"]: Noise } = {
  snare: { colour: "pink", decay: 0.16, volume: -11 },
  hat: { colour: "white", decay: 0.05, volume: -26 },
  crash: { colour: "white", decay: 0.9, volume: -26 },
  shaker: { colour: "white", decay: 0.08, volume: -28 },
};

/** A small kit: skins that sound by a falling tone, metal and wires by shaped noise. */
export class DrumKit implements Player {
  readonly #kick: MembraneSynth;
  readonly #tom: MembraneSynth;
  readonly #noises = new Map<Drum, NoiseSynth>();
  readonly #lastAt = new Map<Drum, number>();

  constructor(context: Context, output: AudioNode) {
    this.#kick = new MembraneSynth({
      context,
      volume: -7,
      pitchDecay: 0.04,
      octaves: 5,
      envelope: { attack: 0.001, decay: 0.32, sustain: 0, release: 0.1 },
    });
    this.#tom = new MembraneSynth({
      context,
      volume: -13,
      pitchDecay: 0.06,
      octaves: 2,
      envelope: { attack: 0.001, decay: 0.28, sustain: 0, release: 0.1 },
    });
    this.#kick.connect(output);
    this.#tom.connect(output);
    for (const [drum, { colour, decay, volume }] of Object.entries(NOISES)) {
      const noise = new NoiseSynth({
        context,
        volume,
        noise: { type: colour },
        envelope: { attack: 0.001, decay, sustain: 0, release: 0.03 },
      });
      noise.connect(output);
      this.#noises.set(drum as Drum, noise);
    }
  }

  play({ pitch, velocity, at }: PlayedNote): void {
    const drum = findDrum(pitch);
    // Two strokes of one drum at one moment are one; Tone wants rising times.
    if (at <= (this.#lastAt.get(drum) ?? -1)) return;
    this.#lastAt.set(drum, at);
    if (drum === "kick") this.#kick.triggerAttackRelease(52, 0.2, at, velocity);
    else if (drum === "tom") this.#tom.triggerAttackRelease(70 + (pitch % 12) * 9, 0.2, at, velocity);
    else this.#noises.get(drum)?.triggerAttackRelease(0.05, at, velocity);
  }

  /** Strokes die away by themselves. */
  release(): void {
    this.#lastAt.clear();
  }

  dispose(): void {
    this.#kick.dispose();
    this.#tom.dispose();
    for (const noise of this.#noises.values()) noise.dispose();
  }
}
