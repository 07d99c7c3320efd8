import ts from "typescript";
import { ALLOWED_GLOBALS, GLOBAL_WORDS } from "./words.ts";
import { findWord, type WordEntry, type WordOwner, wordId } from "./reference/index.ts";
import { SCRIPT_FILE, type ScriptService, WORDS_FILE } from "./type-check.ts";

/** Offsets in the script's text. */
export interface Span {
  readonly from: number;
  readonly to: number;
}

export interface Hover extends Span {
  /** What to write, or what it is: `wait(beats)`, `const north: Fronts`. */
  readonly title: string;
  readonly meaning: string | null;
  /** Id of the word on the reference page; null for a name of the script's own. */
  readonly wordId: string | null;
}

export interface Offer {
  readonly name: string;
  /** word: of the language. name: in quotes, of the square or the song. own: of the script. other: of TypeScript. */
  readonly kind: "word" | "name" | "own" | "other";
  readonly wordId: string | null;
}

export interface Signature {
  /** `fadeTo(level: Level, beats: Beats)` with the offsets of its parameters in it. */
  readonly label: string;
  readonly parameters: readonly Span[];
  readonly active: number;
  readonly meaning: string | null;
}

const OWNER_OF_INTERFACE: Readonly<Record<string, WordOwner>> = {
  Group: "lights",
  Front: "front",
  Square: "square",
  Song: "song",
  Section: "section",
  Note: "note",
  Console: "console",
};

/** The word of the language that a symbol is, or null. */
function findEntry(symbol: ts.Symbol | undefined): WordEntry | null {
  const declaration = symbol?.declarations?.find((one) => one.getSourceFile().fileName === WORDS_FILE);
  if (!symbol || !declaration) return null;
  const parent = declaration.parent;
  if (!ts.isInterfaceDeclaration(parent)) return findWord("script", symbol.name);
  const owner = OWNER_OF_INTERFACE[parent.name.text];
  return owner === undefined ? null : findWord(owner, symbol.name === "color" ? "colour" : symbol.name);
}

function locate(script: ScriptService, at: number): { checker: ts.TypeChecker; node: ts.Node } | null {
  const program = script.service.getProgram();
  const file = program?.getSourceFile(SCRIPT_FILE);
  if (!program || !file) return null;
  let found: ts.Node = file;
  const visit = (node: ts.Node): void => {
    if (node.getStart(file) > at || node.end < at) return;
    found = node;
    ts.forEachChild(node, visit);
  };
  ts.forEachChild(file, visit);
  return { checker: program.getTypeChecker(), node: found };
}

/** What stands at a place: a word with its meaning, or a name with its kind; null where nothing has one. */
export function findHover(script: ScriptService, at: number): Hover | null {
  const place = locate(script, at);
  if (!place || !ts.isIdentifier(place.node)) return null;
  const span = { from: place.node.getStart(), to: place.node.end };
  const entry = findEntry(place.checker.getSymbolAtLocation(place.node));
  if (entry) return { ...span, title: entry.usage, meaning: entry.meaning, wordId: wordId(entry) };
  const info = script.service.getQuickInfoAtPosition(SCRIPT_FILE, at);
  if (!info) return null;
  const title = ts.displayPartsToString(info.displayParts).replace(/^\((?:method|property|parameter|local .*?)\) /, "");
  return title === "" || title === "any" ? null : { ...span, title, meaning: null, wordId: null };
}

/** What fits at a place, best first as the checker sorts it. Empty in numbers, comments and unknown texts. */
export function listOffers(script: ScriptService, at: number): readonly Offer[] {
  const found = script.service.getCompletionsAtPosition(SCRIPT_FILE, at, {});
  if (!found) return [];
  const place = locate(script, Math.max(0, at - 1));
  const owner = found.isMemberCompletion && place ? findOwner(place) : null;
  return found.entries.flatMap((entry): Offer[] => {
    const { name, kind, sortText } = entry;
    if (kind === ts.ScriptElementKind.string) return [{ name, kind: "name", wordId: null }];
    if (name === "color" || !/^[\w$]+$/.test(name) || kind === ts.ScriptElementKind.keyword) return [];
    const word = owner ? findMember(owner, name) : found.isMemberCompletion ? null : findWord("script", name);
    if (word) return [{ name, kind: "word", wordId: wordId(word) }];
    if (found.isMemberCompletion) return [{ name, kind: "other", wordId: null }];
    const isOwn = sortText < GLOBAL_SORT && !GLOBALS.has(name);
    if (isOwn) return [{ name, kind: "own", wordId: null }];
    return ALLOWED_GLOBALS.has(name) ? [{ name, kind: "other", wordId: null }] : [];
  });
}

/** How the compiler sorts what every script has; a script's own names come before. */
const GLOBAL_SORT = "15";
const GLOBALS: ReadonlySet<string> = new Set(GLOBAL_WORDS);

function findMember(owner: WordOwner, name: string): WordEntry | null {
  return findWord(owner, name) ?? (owner === "front" ? findWord("lights", name) : null);
}

/** What stands before the dot, when it is of the language. */
function findOwner({ checker, node }: { checker: ts.TypeChecker; node: ts.Node }): WordOwner | null {
  const access = ts.isPropertyAccessExpression(node)
    ? node
    : ts.isPropertyAccessExpression(node.parent)
      ? node.parent
      : null;
  const name = access && checker.getTypeAtLocation(access.expression).symbol?.name;
  if (!name) return null;
  return name === "Lights" || name === "Fronts" ? "lights" : (OWNER_OF_INTERFACE[name] ?? null);
}

/** What the call around a place takes; null outside of brackets of a call. */
export function findSignature(script: ScriptService, at: number): Signature | null {
  const help = script.service.getSignatureHelpItems(SCRIPT_FILE, at, undefined);
  const item = help?.items[help.selectedItemIndex];
  if (!help || !item) return null;
  let label = ts.displayPartsToString(item.prefixDisplayParts);
  const between = ts.displayPartsToString(item.separatorDisplayParts);
  const parameters = item.parameters.map(({ displayParts }, i): Span => {
    if (i > 0) label += between;
    const from = label.length;
    label += ts.displayPartsToString(displayParts);
    return { from, to: label.length };
  });
  label += ")";
  return {
    label,
    parameters,
    active: Math.min(help.argumentIndex, Math.max(0, parameters.length - 1)),
    meaning: ts.displayPartsToString(item.documentation) || null,
  };
}

/** Where a name was made: a place in the script, or a word of the reference; null when neither. */
export function findDefinition(script: ScriptService, at: number): Span | { readonly wordId: string } | null {
  const [found] = script.service.getDefinitionAtPosition(SCRIPT_FILE, at) ?? [];
  if (found?.fileName === SCRIPT_FILE) {
    const { start, length } = found.textSpan;
    return { from: start, to: start + length };
  }
  const hover = findHover(script, at);
  return hover?.wordId ? { wordId: hover.wordId } : null;
}

/** Every place of the name that stands here, in order; empty for what is not the script's own. */
export function listRenamePlaces(script: ScriptService, at: number): readonly Span[] {
  const info = script.service.getRenameInfo(SCRIPT_FILE, at, {});
  if (!info.canRename) return [];
  const places = script.service.findRenameLocations(SCRIPT_FILE, at, false, false, {}) ?? [];
  if (places.some((place) => place.fileName !== SCRIPT_FILE)) return [];
  return places
    .map(({ textSpan: { start, length } }) => ({ from: start, to: start + length }))
    .sort((a, b) => a.from - b.from);
}

/** Why a script can not use a new name, as a sentence; null when it can. */
export function findNameFault(script: ScriptService, name: string): string | null {
  if (!/^[A-Za-z_$][\w$]*$/.test(name)) return "A name starts with a letter and has no spaces.";
  if (GLOBALS.has(name) || ALLOWED_GLOBALS.has(name) || ts.identifierToKeywordKind(ts.factory.createIdentifier(name)))
    return `The word ${name} has a job here already.`;
  return new RegExp(`(?<![\\w$])${name.replaceAll("$", "\\$")}(?![\\w$])`).test(script.text)
    ? `The script uses ${name} already.`
    : null;
}

/** The changes that lay the script out: two spaces for each pair of braces, spaces round signs. */
export function listLayoutChanges(script: ScriptService): readonly (Span & { readonly text: string })[] {
  const settings: ts.FormatCodeSettings = {
    ...ts.getDefaultFormatCodeSettings("\n"),
    indentSize: 2,
    tabSize: 2,
    convertTabsToSpaces: true,
    insertSpaceAfterOpeningAndBeforeClosingNonemptyBraces: true,
  };
  return script.service
    .getFormattingEditsForDocument(SCRIPT_FILE, settings)
    .map(({ span, newText }) => ({ from: span.start, to: span.start + span.length, text: newText }));
}
