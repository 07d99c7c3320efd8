/** What a word hangs on: `script` stands alone, the others follow a dot. */
export type WordOwner = "script" | "square" | "song" | "section" | "note" | "lights" | "front" | "console";

/** The chapters of the reference, in its order. */
export const WORD_GROUPS = ["time", "song", "square", "act", "choose", "colour", "chance", "notes"] as const;
export type WordGroup = (typeof WORD_GROUPS)[number];

/**
 * One word of the language: the only source of its declaration for the type checker, of completion
 * and hover, and of the reference page.
 */
export interface WordEntry {
  readonly word: string;
  readonly owners: readonly WordOwner[];
  readonly group: WordGroup;
  /** What follows the word in a declaration: `(beats: Beats): void`, or `: Lights` for a value. */
  readonly type: string;
  /** What to write, with its parameters. */
  readonly usage: string;
  /** What it does, in 12 words or fewer. */
  readonly meaning: string;
  /** What completion puts in: `${...}` are places to fill. Left out: the word itself. */
  readonly snippet?: string;
  /**
   * A whole script that shows it. `{front}`, `{part}`, `{side}`, `{section}`, `{instrument}` and
   * `{lastSection}` stand for names of the square and the song at hand.
   */
  readonly example: string;
}
