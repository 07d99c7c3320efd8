import { TimelineFormatError } from "./bytes.ts";
import { ACTION_CODE, NO_COLOUR, type Action, type CueTable, type Timeline } from "./model.ts";
import { assertTimeline, FULL_LEVEL, MAX_LIGHTS } from "./validate.ts";

/** One cue as a script wrote it; numbers as in `Timeline`, already rounded. */
export interface WrittenCue {
  readonly tick: number;
  readonly action: Action;
  /** Light indexes in the order of the selection; at least one, each once. */
  readonly lights: ArrayLike<number>;
  /** `on` and `fadeTo` only: level x 100. */
  readonly level?: number;
  /** `fadeTo`, `pulse` and `colour` only: ticks. */
  readonly length?: number;
  /** `pulse` and `colour` only: 0xRRGGBB. */
  readonly colour?: number;
  /** Script lines, outermost call first. */
  readonly chain: readonly number[];
}

/** What a timeline holds besides its cues. */
export type TimelineHead = Omit<Timeline, "version" | "cues" | "selections" | "chains">;

/**
 * Gives a timeline of cues in the order they were written: sorted by tick (cues of one tick stay in
 * order), selections and chains interned by first use. Fields that an action does not have are set
 * to 0 or `NO_COLOUR`, so that equal shows are equal. Throws `TimelineFormatError` for a cue that
 * breaks a promise of the model. n log n; the arrays are fresh.
 */
export function buildTimeline(head: TimelineHead, written: Iterable<WrittenCue>): Timeline {
  const sorted = [...written].sort((a, b) => a.tick - b.tick);
  const count = sorted.length;
  const cues: CueTable = {
    count,
    tick: new Uint32Array(count),
    action: new Uint8Array(count),
    selection: new Uint32Array(count),
    level: new Uint16Array(count),
    length: new Uint32Array(count),
    colour: new Uint32Array(count).fill(NO_COLOUR),
    chain: new Uint32Array(count),
  };
  const selections = new Interner<ArrayLike<number>, Uint16Array>((lights) => Uint16Array.from(lights));
  const chains = new Interner<readonly number[], readonly number[]>((lines) => [...lines]);
  sorted.forEach((cue, index) => {
    const { action } = cue;
    assertWritten(cue, index);
    cues.tick[index] = cue.tick;
    cues.action[index] = ACTION_CODE[action];
    cues.selection[index] = selections.intern(cue.lights);
    cues.chain[index] = chains.intern(cue.chain);
    if (action === "on" || action === "fadeTo") cues.level[index] = cue.level ?? 0;
    if (action === "fadeTo" || action === "pulse" || action === "colour") cues.length[index] = cue.length ?? 0;
    if (action === "pulse" || action === "colour") cues.colour[index] = cue.colour ?? NO_COLOUR;
  });
  const timeline: Timeline = { version: 1, ...head, cues, selections: selections.values, chains: chains.values };
  assertTimeline(timeline);
  return timeline;
}

/** Typed arrays wrap numbers that do not fit without a word, so they are looked at before. */
function assertWritten({ tick, lights, level = 0, length = 0, colour = 0 }: WrittenCue, index: number): void {
  const isWhole = (value: number, most: number) => Number.isInteger(value) && value >= 0 && value <= most;
  if (!isWhole(tick, 0xff_ff_ff_ff))
    throw new TimelineFormatError(`Cue ${index} has the tick ${tick}; it has to be a whole number of 32 bits.`);
  if (!isWhole(level, FULL_LEVEL))
    throw new TimelineFormatError(
      `Cue ${index} has the level ${level}; it has to be a whole number up to ${FULL_LEVEL}.`,
    );
  if (!isWhole(length, 0xff_ff_ff_ff))
    throw new TimelineFormatError(`Cue ${index} has the length ${length}; it has to be a whole number of 32 bits.`);
  if (!isWhole(colour, 0xff_ff_ff) && colour !== NO_COLOUR)
    throw new TimelineFormatError(`Cue ${index} has a colour of more than 24 bits.`);
  for (let i = 0; i < lights.length; i++)
    if (!isWhole(lights[i] ?? -1, MAX_LIGHTS - 1))
      throw new TimelineFormatError(`Cue ${index} names the light ${lights[i]}; light indexes have 16 bits.`);
}

/** Keeps each distinct list of numbers once and gives its index. */
class Interner<Input extends ArrayLike<number>, Kept> {
  readonly values: Kept[] = [];
  readonly #indexes = new Map<string, number>();
  readonly #keep: (list: Input) => Kept;

  constructor(keep: (list: Input) => Kept) {
    this.#keep = keep;
  }

  intern(list: Input): number {
    const key = Array.prototype.join.call(list, ",");
    const known = this.#indexes.get(key);
    if (known !== undefined) return known;
    const index = this.values.length;
    this.values.push(this.#keep(list));
    this.#indexes.set(key, index);
    return index;
  }
}
