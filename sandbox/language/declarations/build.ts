import type { NameTable } from "../names.ts";
import { listWordsOf, type WordEntry, type WordOwner } from "../reference/index.ts";

/** Names that stand in the declarations as types, by the kind of name. */
const NAME_TYPES = {
  front: "FrontName",
  side: "SideName",
  part: "PartName",
  section: "SectionName",
  instrument: "InstrumentName",
  colour: "Colour",
} as const satisfies { readonly [K in keyof NameTable]: string };

/**
 * The declarations of the language for the names of a layout and a song: what the type checker knows
 * beside its library. A parameter that takes a name takes any text as well (else
 * `let favourite = "red"` would not fit); a misspelt name in quotes is found by the dialect check.
 */
export function buildDeclarations(names: NameTable): string {
  return [
    "type Beats = number;",
    "type Moment = number;",
    "type Level = number;",
    ...Object.entries(NAME_TYPES).map(([kind, type]) => declareNames(type, names[kind as keyof NameTable])),
    "interface Group<Item> extends Iterable<Item> {",
    "  readonly [place: number]: Item;",
    ...members("lights"),
    "  color(colour: Colour, beats?: Beats): this;",
    "}",
    "interface Lights extends Group<Lights> {}",
    "interface Front extends Group<Lights> {",
    ...members("front"),
    "}",
    "interface Fronts extends Group<Front> {}",
    "interface Square {",
    ...members("square"),
    "}",
    "interface Song {",
    ...members("song"),
    "}",
    "interface Section {",
    ...members("section"),
    "}",
    "interface Note {",
    ...members("note"),
    "}",
    "interface Console {",
    ...members("console"),
    "}",
    "declare const console: Console;",
    ...listWordsOf("script").map(declareGlobal),
    "",
  ].join("\n");
}

function declareNames(type: string, names: readonly string[]): string {
  const literals = [...new Set(names)].map((name) => JSON.stringify(name));
  return `type ${type} = ${[...literals, "(string & {})"].join(" | ")};`;
}

function members(owner: WordOwner): string[] {
  return listWordsOf(owner).map(
    (entry) => `  ${comment(entry)}${isValue(entry) ? "readonly " : ""}${entry.word}${entry.type};`,
  );
}

function declareGlobal(entry: WordEntry): string {
  return `${comment(entry)}declare ${isValue(entry) ? "const" : "function"} ${entry.word}${entry.type};`;
}

function comment({ meaning }: WordEntry): string {
  return `/** ${meaning} */ `;
}

/** Whether a word is a value; the others are run. */
export function isValue({ type }: WordEntry): boolean {
  return type.startsWith(":");
}
