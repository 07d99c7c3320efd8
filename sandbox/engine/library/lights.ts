import { action, beats, call, number, tidy, whole, type Callback } from "./arguments.ts";
import { parseColour } from "./colour.ts";
import { NO_COLOUR, internSelection, writeCue } from "./cues.ts";
import { drawBelow } from "./luck.ts";
import { fail, notice, state } from "./state.ts";
import { TICKS_PER_BEAT } from "../../../shared/units.ts";

/** Actions as the timeline stores them (`ACTION_CODE` in the timeline's model). */
const ON = 0;
const OFF = 1;
const FADE = 2;
const PULSE = 3;
const COLOUR = 4;
const FULL = 100;
const LONGEST_TICKS = 0xff_ff_ff_ff;
/** Beats up to which a length needs no second look. */
const LONGEST_PLAIN = 1_000_000;

/** A level as stored; what lies outside is clamped with a warning (rule 17). */
function level(word: string, value: unknown): number {
  if (typeof value === "number" && value >= 0 && value <= FULL) return Math.round(value * 100);
  const asked = number(word, value, 0);
  const used = asked < 0 ? 0 : FULL;
  notice("level-clamped", { used });
  return used * 100;
}

/** A length as stored. */
function ticks(word: string, value: unknown, argument: number): number {
  if (typeof value === "number" && value >= 0 && value <= LONGEST_PLAIN) return Math.round(value * TICKS_PER_BEAT);
  return Math.min(LONGEST_TICKS, Math.round(beats(word, value, argument) * TICKS_PER_BEAT));
}

/** What a list is made of: enough to make its items when someone asks for them. */
export interface LightsPlan {
  readonly name: string;
  readonly box: string;
  /** Single lights, in order, each once. */
  readonly indexes: Uint16Array;
  /** The items; absent for a single light, whose one item is itself. */
  readonly items?: readonly Lights[];
}

/**
 * A frozen list of items in order; acting on it writes cues (rules 8 and 12). Prints, compares and
 * counts as its items.
 */
export class Lights {
  readonly #indexes: Uint16Array;
  readonly #items: readonly Lights[];
  #selection = -1;
  readonly length: number;
  readonly name: string;
  readonly box: string;
  readonly [place: number]: Lights;

  constructor(plan: LightsPlan) {
    this.#indexes = plan.indexes;
    this.name = plan.name;
    this.box = plan.box;
    const items = plan.items ?? [this];
    this.#items = items;
    this.length = items.length;
    const self = this as { [place: number]: Lights };
    for (let i = 0; i < items.length; i++) self[i] = items[i] as Lights;
    Object.freeze(this);
  }

  static indexesOf(lights: Lights): Uint16Array {
    return lights.#indexes;
  }

  static itemsOf(lights: Lights): readonly Lights[] {
    return lights.#items;
  }

  static is(value: unknown): value is Lights {
    return typeof value === "object" && value !== null && #indexes in value;
  }

  [Symbol.iterator](): IterableIterator<Lights> {
    return this.#items[Symbol.iterator]() as IterableIterator<Lights>;
  }

  #write(action: number, value: number, long: number, colour: number, isQuiet: boolean): this {
    if (this.#selection < 0) this.#selection = this.#indexes.length === 0 ? 0 : internSelection(this.#indexes);
    writeCue(this.#selection, this.#indexes.length, action, value, long, colour, isQuiet);
    return this;
  }

  on(asked: number = FULL): this {
    const value = level("on", asked);
    return this.#write(ON, value, 0, NO_COLOUR, value === 0);
  }

  off(): this {
    return this.#write(OFF, 0, 0, NO_COLOUR, true);
  }

  fadeTo(asked: number, length: number): this {
    if (arguments.length < 2)
      fail("missing-value", {
        word: "fadeTo",
        count: 2,
        what: "a level and the beats",
        example: `fadeTo(${typeof asked === "number" ? tidy(asked) : 50}, 2)`,
      });
    const value = level("fadeTo", asked);
    return this.#write(FADE, value, ticks("fadeTo", length, 1), NO_COLOUR, value === 0);
  }

  pulse(length: number, colour?: string): this {
    if (arguments.length < 1)
      fail("missing-value", { word: "pulse", count: 1, what: "the beats", example: "pulse(1)" });
    const long = ticks("pulse", length, 0);
    return this.#write(PULSE, 0, long, colour === undefined ? NO_COLOUR : parseColour("pulse", colour, 1), false);
  }

  colour(colour: string, length: number = 0): this {
    if (arguments.length < 1)
      fail("missing-value", { word: "colour", count: 1, what: "a colour", example: 'colour("gold")' });
    return this.#write(COLOUR, 0, ticks("colour", length, 1), parseColour("colour", colour, 0), false);
  }

  color(colour: string, length: number = 0): this {
    return this.colour(colour, length);
  }

  first(count: number): Lights {
    return this.pick(this.#items.slice(0, whole("first", count, 0, 0)));
  }

  everyNth(step: number, from: number = 0): Lights {
    const stride = whole("everyNth", step, 0, 1);
    const picked: Lights[] = [];
    for (let i = whole("everyNth", from, 1, 0); i < this.#items.length; i += stride)
      picked.push(this.#items[i] as Lights);
    return this.pick(picked);
  }

  reversed(): Lights {
    return this.pick(this.#items.toReversed());
  }

  /** Fisher-Yates from the end (rule 11). */
  shuffled(): Lights {
    const mixed = this.#items.slice();
    for (let i = mixed.length - 1; i > 0; i--) {
      const j = drawBelow(i + 1);
      const moved = mixed[i] as Lights;
      mixed[i] = mixed[j] as Lights;
      mixed[j] = moved;
    }
    return this.pick(mixed);
  }

  split(groups: number): readonly Lights[] {
    const count = whole("split", groups, 0, 1);
    if (count > state.tables.lightCount + 1) fail("wants-whole", { word: "split", least: 1, got: count }, 0);
    const short = Math.floor(this.#items.length / count);
    const longer = this.#items.length % count;
    const runs: Lights[] = [];
    let at = 0;
    for (let i = 0; i < count; i++) {
      const end = at + short + (i < longer ? 1 : 0);
      runs.push(this.pick(this.#items.slice(at, end)));
      at = end;
    }
    return Object.freeze(runs);
  }

  and(other: Lights): Lights {
    return singles([...this.#indexes, ...lightsArgument("and", other).#indexes]);
  }

  except(other: Lights): Lights {
    const gone = new Set(lightsArgument("except", other).#indexes);
    const left: number[] = [];
    for (const index of this.#indexes) if (!gone.has(index)) left.push(index);
    return singles(left);
  }

  get lights(): Lights {
    return singles([...this.#indexes]);
  }

  /** Item i at now + i x step; then the clock goes back (rule 6). */
  inTurn(step: number, each: Callback): this {
    const apart = beats("inTurn", step, 0);
    const run = action("inTurn", each, 1);
    const start = state.clock;
    for (let i = 0; i < this.#items.length; i++) {
      state.clock = start + i * apart;
      call(run, this.#items[i], i);
    }
    state.clock = start;
    return this;
  }

  forEach(each: Callback): void {
    const run = action("forEach", each, 0);
    for (let i = 0; i < this.#items.length; i++) call(run, this.#items[i], i);
  }

  filter(keep: Callback): Lights {
    const run = action("filter", keep, 0);
    const left: Lights[] = [];
    for (let i = 0; i < this.#items.length; i++) {
      const item = this.#items[i] as Lights;
      if (call(run, item, i)) left.push(item);
    }
    return this.pick(left);
  }

  map(change: Callback): unknown[] {
    const run = action("map", change, 0);
    const answers: unknown[] = [];
    for (let i = 0; i < this.#items.length; i++) answers.push(call(run, this.#items[i], i));
    return answers;
  }

  /** A list of some of the items; the single lights are those of the items, each once. */
  private pick(items: readonly Lights[]): Lights {
    return listOf("lights", items);
  }
}

function lightsArgument(word: string, value: unknown): Lights {
  if (!Lights.is(value)) return fail("wants-lights", { word }, 0);
  return value;
}

const single: (Lights | undefined)[] = [];

/** The single light of an index: always the same object (rule 28). */
export function singleLight(index: number): Lights {
  let light = single[index];
  if (light === undefined) {
    const { boxOf, partOf } = state.tables;
    light = new Lights({ name: partOf[index] ?? "", box: boxOf[index] ?? "", indexes: new Uint16Array([index]) });
    single[index] = light;
  }
  return light;
}

/** A list of single lights; an index that comes again is left out. */
export function singles(indexes: readonly number[]): Lights {
  const seen = new Uint8Array(state.tables.lightCount);
  const items: Lights[] = [];
  for (const index of indexes) {
    if (seen[index] === 1) continue;
    seen[index] = 1;
    items.push(singleLight(index));
  }
  return listOf("lights", items);
}

/** The one kind of box of all items, or "mixed". */
function commonBox(items: readonly Lights[]): string {
  const box = items[0]?.box ?? "";
  for (const item of items) if (item.box !== box) return "mixed";
  return box;
}

/** A list of items, with their single lights in order, each once. */
export function listOf(name: string, items: readonly Lights[]): Lights {
  const seen = new Uint8Array(state.tables.lightCount);
  const indexes: number[] = [];
  for (const item of items) {
    for (const index of Lights.indexesOf(item)) {
      if (seen[index] === 1) continue;
      seen[index] = 1;
      indexes.push(index);
    }
  }
  return new Lights({
    name,
    box: commonBox(items),
    indexes: Uint16Array.from(indexes),
    items: Object.freeze(items.slice()),
  });
}
