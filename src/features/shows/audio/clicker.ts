const FIRST_HZ = 1568;
const OTHER_HZ = 1046.5;
const CLICK_SECONDS = 0.06;
const LOUDNESS = 0.5;
/** Time constant of the fade when what is laid ahead is taken back. */
const FADE_SECONDS = 0.005;

/** The metronome's sound: a short wooden tick, made here and laid at times of an audio context. */
export class Clicker {
  readonly #context: BaseAudioContext;
  readonly #gate: GainNode;

  constructor(context: BaseAudioContext, destination: AudioNode) {
    this.#context = context;
    this.#gate = context.createGain();
    this.#gate.connect(destination);
  }

  play(at: number, isFirst: boolean): void {
    const tone = this.#context.createOscillator();
    const shape = this.#context.createGain();
    tone.type = "triangle";
    tone.frequency.setValueAtTime(isFirst ? FIRST_HZ : OTHER_HZ, at);
    shape.gain.setValueAtTime(0, at);
    shape.gain.linearRampToValueAtTime(LOUDNESS, at + 0.001);
    shape.gain.exponentialRampToValueAtTime(0.001, at + CLICK_SECONDS);
    tone.connect(shape).connect(this.#gate);
    tone.start(at);
    tone.stop(at + CLICK_SECONDS);
  }

  /** Silences what is laid ahead. */
  hush(): void {
    const { gain } = this.#gate;
    gain.cancelScheduledValues(0);
    gain.setTargetAtTime(0, this.#context.currentTime, FADE_SECONDS);
  }

  /** Lets strokes be heard again from a time of the context on. */
  open(at: number): void {
    this.#gate.gain.setValueAtTime(1, at);
  }

  dispose(): void {
    this.#gate.disconnect();
  }
}
