import type { CheckContext } from "./context.ts";
import { lineOfCue } from "./finding.ts";

/** Places of one kind that belong to the same script line and the same other line. */
export interface LinePair {
  readonly line: number;
  /** The line that is to blame, or null when there is none. */
  readonly byLine: number | null;
  readonly ticks: Set<number>;
  readonly lights: Set<number>;
}

/** Collects places by the line that wrote a cue and the line of the cue that spoilt it, so that a loop gives one finding. */
export class LinePairs {
  readonly #pairs = new Map<string, LinePair>();
  readonly #context: CheckContext;

  constructor(context: CheckContext) {
    this.#context = context;
  }

  /** `byCue` is -1 when no other cue is to blame. */
  add(cue: number, byCue: number, lights: Iterable<number>): void {
    const line = lineOfCue(this.#context, cue);
    const byLine = byCue < 0 ? null : lineOfCue(this.#context, byCue);
    const key = `${line} ${byLine}`;
    const pair = this.#pairs.get(key) ?? { line, byLine, ticks: new Set(), lights: new Set() };
    pair.ticks.add(this.#context.timeline.cues.tick[cue] ?? 0);
    for (const light of lights) pair.lights.add(light);
    this.#pairs.set(key, pair);
  }

  /** In order of lines. */
  list(): readonly LinePair[] {
    return [...this.#pairs.values()].sort((a, b) => a.line - b.line || (a.byLine ?? 0) - (b.byLine ?? 0));
  }
}

/** "Line 4", or "This line" when a line spoils its own work. */
export function nameLine(pair: LinePair): string {
  return pair.byLine === pair.line ? "This line" : `Line ${pair.byLine}`;
}

/** Gives the list of a key, a new one when there was none. */
export function listOf<Key, Item>(lists: Map<Key, Item[]>, key: Key): Item[] {
  const known = lists.get(key);
  if (known !== undefined) return known;
  const list: Item[] = [];
  lists.set(key, list);
  return list;
}
