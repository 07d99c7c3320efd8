import type { FrontTable, PartTable } from "../guest.ts";
import { text, unknownName } from "./arguments.ts";
import { Lights, listOf, singleLight, singles } from "./lights.ts";
import { state } from "./state.ts";

/** Everything of the square is made once, when it is first asked for (rule 28). */
const partLights = new Map<PartTable, Lights>();
const fronts: Front[] = [];
const sides = new Map<string, Lights>();
const parts = new Map<string, Lights>();
let everyLight: Lights | null = null;
let everyFront: Lights | null = null;
let partNames: string[] | null = null;

function partOf(table: PartTable): Lights {
  let part = partLights.get(table);
  if (part === undefined) {
    const items: Lights[] = [];
    for (const index of table.lights) items.push(singleLight(index));
    part = new Lights({
      name: table.name,
      box: table.box,
      indexes: Uint16Array.from(table.lights),
      items: Object.freeze(items),
    });
    partLights.set(table, part);
  }
  return part;
}

function knownPart(word: string, value: unknown): string {
  const name = text(word, value, 0);
  if (partNames === null) {
    const all = new Set<string>();
    for (const front of state.tables.fronts) for (const part of front.parts) all.add(part.name);
    partNames = [...all];
  }
  if (!partNames.includes(name)) unknownName("unknown-part", name, partNames);
  return name;
}

/** One front: its items are its single lights. */
export class Front extends Lights {
  readonly #table: FrontTable;

  constructor(table: FrontTable) {
    const items: Lights[] = [];
    for (const part of table.parts) for (const index of part.lights) items.push(singleLight(index));
    const indexes: number[] = [];
    for (const item of items) for (const index of Lights.indexesOf(item)) indexes.push(index);
    super({ name: table.name, box: table.box, indexes: Uint16Array.from(indexes), items: Object.freeze(items) });
    this.#table = table;
  }

  static isFront(value: unknown): value is Front {
    return typeof value === "object" && value !== null && #table in value;
  }

  /** That part of this front; empty when the front has none. */
  part(name: string): Lights {
    const wanted = knownPart("part", name);
    for (const part of this.#table.parts) if (part.name === wanted) return partOf(part);
    return singles([]);
  }
}

function frontAt(index: number): Front {
  let front = fronts[index];
  if (front === undefined) {
    front = new Front(state.tables.fronts[index] as FrontTable);
    fronts[index] = front;
  }
  return front;
}

/** The word `square`. */
export const square = Object.freeze({
  get all(): Lights {
    if (everyLight === null) {
      const indexes: number[] = [];
      for (let i = 0; i < state.tables.lightCount; i++) indexes.push(i);
      everyLight = singles(indexes);
    }
    return everyLight;
  },

  get fronts(): Lights {
    if (everyFront === null) {
      const items: Front[] = [];
      for (let i = 0; i < state.tables.fronts.length; i++) items.push(frontAt(i));
      everyFront = listOf("fronts", items);
    }
    return everyFront;
  },

  front(name: string): Front {
    const wanted = text("front", name, 0);
    const tables = state.tables.fronts;
    for (let i = 0; i < tables.length; i++) if (tables[i]?.name === wanted) return frontAt(i);
    const names: string[] = [];
    for (const front of tables) names.push(front.name);
    return unknownName("unknown-front", wanted, names);
  },

  side(name: string): Lights {
    const wanted = text("side", name, 0);
    if (!state.tables.sides.includes(wanted)) unknownName("unknown-side", wanted, state.tables.sides);
    let side = sides.get(wanted);
    if (side === undefined) {
      const items: Front[] = [];
      const tables = state.tables.fronts;
      for (let i = 0; i < tables.length; i++) if (tables[i]?.side === wanted) items.push(frontAt(i));
      side = listOf(wanted, items);
      sides.set(wanted, side);
    }
    return side;
  },

  parts(name: string): Lights {
    const wanted = knownPart("parts", name);
    let found = parts.get(wanted);
    if (found === undefined) {
      const items: Lights[] = [];
      for (const front of state.tables.fronts)
        for (const part of front.parts) if (part.name === wanted) items.push(partOf(part));
      found = listOf(wanted, items);
      parts.set(wanted, found);
    }
    return found;
  },
});
