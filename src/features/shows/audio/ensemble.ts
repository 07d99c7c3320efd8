import type { Score } from "../../../../shared/contracts/songs.ts";
import { numbersFrom } from "../../../../sandbox/square/stable-chance.ts";
import { DrumKit } from "./drum-kit.ts";
import { findFamily } from "./instrument-family.ts";
import type { QueuedNote } from "./note-queue.ts";
import type { Context } from "./tone.ts";
import { TonePlayer, type Player } from "./voices.ts";

/** Share of the sound that comes from the room. */
const ROOM_SHARE = 0.16;
const ROOM_SECONDS = 0.9;
/** Time constant of the fade when everything is hushed. */
const FADE_SECONDS = 0.01;

/** The compressor takes the peaks off; this brings the rest up to what a laptop needs. */
const MAKE_UP_GAIN = 1.9;

/**
 * All instruments of a score in one audio context, through a room and a compressor. Building them is
 * slow (some 10 ms a voice), so they are kept: `hush` silences what sounds and what is laid ahead.
 */
export class Ensemble {
  readonly #raw: BaseAudioContext;
  readonly #gate: GainNode;
  readonly #nodes: readonly AudioNode[];
  readonly #players: readonly Player[];

  private constructor(raw: BaseAudioContext, chain: Chain, players: readonly Player[]) {
    this.#raw = raw;
    this.#gate = chain.gate;
    this.#nodes = chain.nodes;
    this.#players = players;
  }

  /** Builds a score's instruments; gives the page a turn between two of them. */
  static async create(score: Score, context: Context, destination: AudioNode): Promise<Ensemble> {
    const chain = createChain(context.rawContext, destination);
    const players: Player[] = [];
    for (const track of score.tracks) {
      const family = findFamily(track);
      players.push(
        family === "drums" ? new DrumKit(context, chain.input) : new TonePlayer(family, context, chain.input),
      );
      await new Promise((resolve) => setTimeout(resolve, 0));
    }
    return new Ensemble(context.rawContext, chain, players);
  }

  /** Lays a note at a time of the context. Times of one track rise. */
  play(note: QueuedNote, at: number, lasts: number): void {
    this.#players[note.track]?.play({ pitch: note.pitch, velocity: note.velocity, at, lasts });
  }

  /** Silences everything now and lets go of it at `laidUntil`, the time up to which notes were laid. */
  hush(laidUntil: number): void {
    const { gain } = this.#gate;
    gain.cancelScheduledValues(0);
    gain.setTargetAtTime(0, this.#raw.currentTime, FADE_SECONDS);
    for (const player of this.#players) player.release(laidUntil);
  }

  /** Lets the instruments be heard again from a time of the context on. */
  open(at: number): void {
    this.#gate.gain.setValueAtTime(1, at);
  }

  dispose(): void {
    for (const player of this.#players) player.dispose();
    for (const node of this.#nodes) node.disconnect();
  }
}

interface Chain {
  readonly input: GainNode;
  readonly gate: GainNode;
  readonly nodes: readonly AudioNode[];
}

function createChain(raw: BaseAudioContext, destination: AudioNode): Chain {
  const input = raw.createGain();
  const dry = raw.createGain();
  const wet = raw.createGain();
  const room = raw.createConvolver();
  const compressor = raw.createDynamicsCompressor();
  const makeUp = raw.createGain();
  const gate = raw.createGain();
  dry.gain.value = 1 - ROOM_SHARE;
  wet.gain.value = ROOM_SHARE * 2;
  room.buffer = createRoom(raw);
  compressor.threshold.value = -18;
  compressor.ratio.value = 6;
  compressor.attack.value = 0.004;
  compressor.release.value = 0.2;
  makeUp.gain.value = MAKE_UP_GAIN;
  input.connect(dry).connect(compressor);
  input.connect(room).connect(wet).connect(compressor);
  compressor.connect(makeUp).connect(gate).connect(destination);
  return { input, gate, nodes: [input, dry, wet, room, compressor, makeUp, gate] };
}

/** The echo of a small square: noise that dies away, the same each time. */
function createRoom(raw: BaseAudioContext): AudioBuffer {
  const buffer = raw.createBuffer(1, Math.ceil(raw.sampleRate * ROOM_SECONDS), raw.sampleRate);
  const samples = buffer.getChannelData(0);
  const next = numbersFrom(17);
  for (let i = 0; i < samples.length; i += 1) samples[i] = (next() * 2 - 1) * (1 - i / samples.length) ** 3.2;
  return buffer;
}
