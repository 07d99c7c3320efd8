import ts from "typescript";
import type { Requirement } from "../../shared/contracts/assignments.ts";
import { parseScript } from "../language/parse.ts";
import { GLOBAL_WORDS, LIGHTS_MEMBERS, SONG_MEMBERS, SQUARE_MEMBERS } from "../language/words.ts";

/** What an assignment can ask for, and the single words of the language. */
export type UseKind = Requirement["kind"] | "word";

/** One use of something in a script. */
export interface Use {
  readonly kind: UseKind;
  /** The function's name, the word used, or what is written (`for`, `repeat`, `if`). */
  readonly name: string;
  /** From 1. */
  readonly line: number;
}

/** Words that run their action again and again, like a loop does. */
const LOOP_WORDS: ReadonlySet<string> = new Set(["repeat", "forEach", "inTurn"]);

/** Words that stand behind a point. */
const MEMBERS: ReadonlySet<string> = new Set([...LIGHTS_MEMBERS, ...SQUARE_MEMBERS, ...SONG_MEMBERS, "color", "pitch"]);
const GLOBALS: ReadonlySet<string> = new Set(GLOBAL_WORDS);

/**
 * Gives what a script uses, in the order of the text: loops, loops in loops, functions of its own,
 * conditions, lists, the song, and the words of the language. Read from the syntax tree, so words in
 * comments and texts do not count. A script that can not be read at all gives none; one with a
 * mistake gives what the parser understood.
 */
export function listUses(source: string): Use[] {
  const uses: Use[] = [];
  try {
    const file = parseScript(source);
    visit(file, 0);
    function visit(node: ts.Node, loopDepth: number): void {
      const loop = loopName(node);
      const found: readonly (readonly [UseKind, string])[] = [
        ...(loop === null ? [] : [["loop", loop] as const]),
        ...(loop === null || loopDepth === 0 ? [] : [["nested-loop", loop] as const]),
        ...functionUses(node),
        ...songUses(node),
        ...otherUses(node),
      ];
      const line = file.getLineAndCharacterOfPosition(node.getStart(file)).line + 1;
      for (const [kind, name] of found) uses.push({ kind, name, line });
      ts.forEachChild(node, (child) => {
        visit(child, loop !== null && isLoopBody(node, child) ? loopDepth + 1 : loopDepth);
      });
    }
  } catch (error) {
    // The parser and this walk call themselves: a script nested beyond the stack is refused elsewhere.
    if (!(error instanceof RangeError)) throw error;
    return [];
  }
  return uses;
}

/** Gives the requirements that a script does not meet, as the assignment states them. */
export function listUnmet(source: string, requirements: readonly Requirement[]): Requirement[] {
  const uses = listUses(source);
  return requirements.filter(({ kind, atLeast }) => uses.filter((use) => use.kind === kind).length < atLeast);
}

function loopName(node: ts.Node): string | null {
  if (ts.isForStatement(node) || ts.isForOfStatement(node)) return "for";
  if (ts.isWhileStatement(node) || ts.isDoStatement(node)) return "while";
  if (!ts.isCallExpression(node)) return null;
  const name = calledName(node);
  return LOOP_WORDS.has(name) ? name : null;
}

/** A loop's body is its statement, or the action that a word is given; its head is outside. */
function isLoopBody(loop: ts.Node, child: ts.Node): boolean {
  if (ts.isCallExpression(loop)) return child !== loop.expression;
  return ts.isStatement(child);
}

function calledName(call: ts.CallExpression): string {
  const { expression } = call;
  return ts.isIdentifier(expression)
    ? expression.text
    : ts.isPropertyAccessExpression(expression)
      ? expression.name.text
      : "";
}

function functionUses(node: ts.Node): (readonly [UseKind, string])[] {
  const own = ownFunction(node);
  if (own === null) return [];
  const { name, parameters } = own;
  return [["function", name], ...(parameters > 0 ? [["function-with-parameters", name] as const] : [])];
}

/** A function that the script gives a name: `function f() {}` or `const f = () => {}`. */
function ownFunction(node: ts.Node): { readonly name: string; readonly parameters: number } | null {
  if (ts.isFunctionDeclaration(node) && node.name !== undefined)
    return { name: node.name.text, parameters: node.parameters.length };
  if (!ts.isVariableDeclaration(node) || !ts.isIdentifier(node.name) || node.initializer === undefined) return null;
  const { initializer } = node;
  if (!ts.isArrowFunction(initializer) && !ts.isFunctionExpression(initializer)) return null;
  return { name: node.name.text, parameters: initializer.parameters.length };
}

/** What is read of `song`: behind a point, in brackets, or taken apart by a pattern. */
function songUses(node: ts.Node): (readonly [UseKind, string])[] {
  if (ts.isPropertyAccessExpression(node) && isSong(node.expression)) return [["song-data", `song.${node.name.text}`]];
  if (ts.isElementAccessExpression(node) && isSong(node.expression))
    return [["song-data", `song[${node.argumentExpression.getText()}]`]];
  if (!ts.isVariableDeclaration(node) || !ts.isObjectBindingPattern(node.name) || !isSong(node.initializer)) return [];
  return node.name.elements.map(({ propertyName, name }) => ["song-data", `song.${(propertyName ?? name).getText()}`]);
}

function isSong(node: ts.Node | undefined): boolean {
  if (node === undefined) return false;
  return ts.isParenthesizedExpression(node) ? isSong(node.expression) : ts.isIdentifier(node) && node.text === "song";
}

function otherUses(node: ts.Node): (readonly [UseKind, string])[] {
  if (ts.isIfStatement(node)) return [["condition", "if"]];
  if (ts.isSwitchStatement(node)) return [["condition", "switch"]];
  if (ts.isConditionalExpression(node)) return [["condition", "? :"]];
  if (ts.isArrayLiteralExpression(node) || ts.isElementAccessExpression(node) || ts.isArrayBindingPattern(node))
    return [["list", "[ ]"]];
  if (ts.isPropertyAccessExpression(node)) {
    return MEMBERS.has(node.name.text) ? [["word", node.name.text]] : [];
  }
  if (ts.isIdentifier(node) && GLOBALS.has(node.text) && standsAlone(node)) return [["word", node.text]];
  return [];
}

/** Not a name that the script gives, and not the part behind a point, which is counted with its object. */
function standsAlone(node: ts.Identifier): boolean {
  const { parent } = node;
  if (ts.isPropertyAccessExpression(parent)) return parent.expression === node;
  if (
    ts.isVariableDeclaration(parent) ||
    ts.isParameter(parent) ||
    ts.isFunctionDeclaration(parent) ||
    ts.isBindingElement(parent) ||
    ts.isPropertyAssignment(parent)
  )
    return "initializer" in parent && parent.initializer === node;
  return true;
}
