import type { LightFacts } from "./light-facts.ts";

interface Remembered {
  readonly content: Uint32Array;
  readonly facts: LightFacts;
}

/**
 * What a check keeps for the next one on the same square, song and rules, so that after a small edit
 * only what the edit changed is worked out again. Nothing of it shows in the findings: a check with a
 * memory gives what one without gives. Holds what the last check used.
 */
export class CheckMemory {
  #facts = new Map<string, Remembered[]>();
  #older = new Map<string, Remembered[]>();

  /** Starts a new check: what neither it nor the next one asks for is forgotten. */
  turnPage(): void {
    this.#older = this.#facts;
    this.#facts = new Map();
  }

  /** Gives the facts of a light that is told this content; `work` is called when nothing is known. */
  recallFacts(content: Uint32Array, work: () => LightFacts): LightFacts {
    const key = hashContent(content);
    const isSame = (known: Remembered) => areEqual(known.content, content);
    const current = this.#facts.get(key);
    const known = current?.find(isSame);
    if (known !== undefined) return known.facts;
    const remembered = this.#older.get(key)?.find(isSame) ?? { content, facts: work() };
    if (current === undefined) this.#facts.set(key, [remembered]);
    else current.push(remembered);
    return remembered.facts;
  }
}

/**
 * Gives a way to keep one value a name in a memory: it is worked out again only when one of the things
 * it is made from is another one than last time (compared with `Object.is`).
 */
export function createRecall<Value>(): (
  memory: CheckMemory,
  name: string,
  madeFrom: readonly unknown[],
  work: () => Value,
) => Value {
  const kept = new WeakMap<
    CheckMemory,
    Map<string, { readonly madeFrom: readonly unknown[]; readonly value: Value }>
  >();
  return (memory, name, madeFrom, work) => {
    const values = kept.get(memory) ?? new Map<string, { madeFrom: readonly unknown[]; value: Value }>();
    kept.set(memory, values);
    const known = values.get(name);
    const isSame =
      known?.madeFrom.length === madeFrom.length &&
      known.madeFrom.every((part, place) => Object.is(part, madeFrom[place]));
    if (known !== undefined && isSame) return known.value;
    const value = work();
    values.set(name, { madeFrom, value });
    return value;
  };
}

/** FNV-1a of the words, and their number; contents of one hash are still compared. */
function hashContent(content: Uint32Array): string {
  let hash = 0x81_1c_9d_c5;
  for (let place = 0; place < content.length; place++) hash = Math.imul(hash ^ (content[place] ?? 0), 0x01_00_01_93);
  return `${hash} ${content.length}`;
}

function areEqual(a: Uint32Array, b: Uint32Array): boolean {
  if (a.length !== b.length) return false;
  for (let place = 0; place < a.length; place++) if (a[place] !== b[place]) return false;
  return true;
}
