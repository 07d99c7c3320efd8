import ts from "typescript";
import { StreamTable, statementOf } from "./streams.ts";
import { GLOBAL_WORDS, MARK_PREFIX } from "./words.ts";

/**
 * The marking of a script: the same lines and the same meaning, but at every call the script notes
 * where it is, and every function notes who called it. From these notes come the chain of lines of
 * each cue (rule 29), the place of a problem, the depth of calls (rule 34) and the luck (rule 26).
 *
 * `$$l` is the call site now, `$$s` the sites of the callers, `$$d` their number. A call that has calls
 * in its arguments notes its place after them, by spreading an empty list that is made by a comma:
 * `f(g(), ...($$l = 7, $$0))` passes nothing more and runs at the right moment. A function gives its
 * caller's site back on every way out; since scripts have no `try`, a throw needs none.
 */

/** What a site is: a call, a loop, a function, or a place of a list. Index 0 is the script itself. */
export interface Site {
  readonly kind: "script" | "call" | "loop" | "function" | "item";
  readonly node: ts.Node;
  /** Line from 1. */
  readonly line: number;
}

export interface MarkedScript {
  /** Text for the engine: an expression that gives a function of the library's words. */
  readonly code: string;
  readonly sites: readonly Site[];
  /** Luck: the stream of each site, and the key of each stream. */
  readonly streamOf: readonly number[];
  readonly streams: readonly (readonly [number, number, number])[];
  /** Offset in the script of an offset in `code` on the same line: what was put in is taken off. */
  toScriptColumn(line: number, column: number): number;
}

/** Lines that `code` has before the script's first. */
export const LINES_BEFORE = 1;

const M = MARK_PREFIX;

/** What is put around a node, and just inside its last sign. */
interface Wrap {
  readonly before: string;
  readonly after: string;
}

/** Writes the script from left to right with things put in, and remembers the columns they took. */
class Writer {
  readonly #script: string;
  readonly #pieces: string[] = [];
  /** On each line: columns (from 0, in the marked text) and lengths of what was put in. */
  readonly #inserted: { column: number; length: number }[][] = [[]];
  #at = 0;
  #column = 0;

  constructor(script: string) {
    this.#script = script;
  }

  copyTo(end: number): void {
    if (end <= this.#at) return;
    const piece = this.#script.slice(this.#at, end);
    this.#pieces.push(piece);
    this.#at = end;
    const lines = piece.split("\n");
    for (let i = 1; i < lines.length; i++) this.#inserted.push([]);
    const last = lines[lines.length - 1] ?? "";
    this.#column = lines.length > 1 ? last.length : this.#column + last.length;
  }

  put(text: string): void {
    if (text === "") return;
    this.#pieces.push(text);
    this.#inserted[this.#inserted.length - 1]?.push({ column: this.#column, length: text.length });
    this.#column += text.length;
  }

  /** Puts text in the place of the next sign. */
  replaceSign(text: string): void {
    this.#at++;
    this.put(text);
    // The sign was one column of the script.
    const put = this.#inserted[this.#inserted.length - 1]?.at(-1);
    if (put !== undefined) put.length--;
  }

  finish(): string {
    this.copyTo(this.#script.length);
    return this.#pieces.join("");
  }

  /** The script's column (from 1) of a column of the marked text on the same line. */
  toScriptColumn(line: number, markedColumn: number): number {
    let taken = 0;
    for (const { column, length } of this.#inserted[line - 1] ?? []) {
      if (column >= markedColumn - 1) break;
      taken += Math.min(length, markedColumn - 1 - column);
    }
    return markedColumn - taken;
  }
}

/** The line on which a reader would look for a call: that of its name. */
function namePosition(node: ts.Node, file: ts.SourceFile): number {
  if (!ts.isCallExpression(node)) return node.getStart(file);
  const callee = node.expression;
  return ts.isPropertyAccessExpression(callee) ? callee.name.getStart(file) : callee.getStart(file);
}

type Frame = ts.FunctionLikeDeclaration;

class Marker {
  readonly sites: Site[];
  readonly writer: Writer;
  readonly #file: ts.SourceFile;
  readonly #hasCall = new Map<ts.Node, boolean>();
  readonly #wraps = new Map<ts.Node, Wrap[]>();

  constructor(file: ts.SourceFile, script: string) {
    this.#file = file;
    this.writer = new Writer(script);
    this.sites = [{ kind: "script", node: file, line: 1 }];
  }

  #site(kind: Site["kind"], node: ts.Node): number {
    const { line } = this.#file.getLineAndCharacterOfPosition(namePosition(node, this.#file));
    return this.sites.push({ kind, node, line: line + 1 }) - 1;
  }

  /** Puts text around a node that is still to be written; what is asked for first is outermost. */
  #wrap(node: ts.Node, before: string, after: string): void {
    const wraps = this.#wraps.get(node);
    if (wraps === undefined) this.#wraps.set(node, [{ before, after }]);
    else wraps.push({ before, after });
  }

  /** Whether running a node runs a call; function bodies in it run later. */
  #calls(node: ts.Node): boolean {
    const known = this.#hasCall.get(node);
    if (known !== undefined) return known;
    let has = ts.isCallExpression(node) || ts.isNewExpression(node);
    if (!has && !ts.isFunctionLike(node))
      ts.forEachChild(node, (child) => {
        has ||= this.#calls(child);
      });
    this.#hasCall.set(node, has);
    return has;
  }

  /** Writes a node with its marks. `frame` is the function around it when that keeps a frame. */
  write(node: ts.Node, frame: Frame | null): void {
    if (isTypeOnly(node)) return;
    const start = node.getStart(this.#file);
    this.writer.copyTo(start);
    const wraps = this.#wraps.get(node) ?? [];
    for (const wrap of wraps) this.writer.put(wrap.before);
    this.#writeInside(node, frame);
    this.writer.copyTo(node.end);
    for (const wrap of wraps.toReversed()) this.writer.put(wrap.after);
  }

  #writeInside(node: ts.Node, frame: Frame | null): void {
    if (ts.isCallExpression(node)) return this.#writeCall(node, frame);
    if (ts.isNewExpression(node)) return this.#writeNew(node, frame);
    if (ts.isElementAccessExpression(node) && isUsedItem(node)) return this.#writeItem(node, frame);
    if (ts.isForStatement(node) && node.condition === undefined) return this.#writeEndlessFor(node, frame);
    if (ts.isWhileStatement(node) || ts.isDoStatement(node)) this.#noteLoop(node, node.expression);
    else if (ts.isForStatement(node) && node.condition !== undefined) this.#noteLoop(node, node.condition);
    else if (ts.isForOfStatement(node) && !this.#calls(node.expression))
      this.#wrap(node.expression, `(${M}l=${this.#site("loop", node)},`, ")");
    else if (ts.isReturnStatement(node) && frame !== null) return this.#writeReturn(node, frame);
    else if (ts.isFunctionLike(node) && (node as Frame).body !== undefined) return this.#writeFunction(node as Frame);
    this.#writeChildren(node, frame);
  }

  #writeChildren(node: ts.Node, frame: Frame | null): void {
    ts.forEachChild(node, (child) => this.write(child, frame));
  }

  #writeCall(node: ts.CallExpression, frame: Frame | null): void {
    const id = this.#site("call", node);
    const owner = ownerOf(node);
    const isEarly = owner !== null && !this.#calls(owner) && !this.#callsInArguments(node);
    if (isEarly) {
      const statement = statementAt(node, owner, this.#file);
      // At the start of a statement a bracket would join it to a line before that has no semicolon.
      if (statement !== null) this.writer.put(`${M}l=${id},`);
      else this.#wrap(owner, `(${M}l=${id},`, ")");
    } else this.#noteAfter(node, id);
    this.#writeChildren(node, frame);
    if (!isEarly && node.arguments.length === 0) this.#putInside(node, `...(${M}l=${id},${M}0)`);
  }

  #callsInArguments(node: ts.CallExpression): boolean {
    if (ts.isElementAccessExpression(node.expression) && this.#calls(node.expression.argumentExpression)) return true;
    return node.arguments.some((argument) => this.#calls(argument));
  }

  /** Notes the place after the arguments, without passing one more. */
  #noteAfter(node: ts.CallExpression | ts.NewExpression, id: number): void {
    const last = node.arguments?.at(-1);
    if (last !== undefined) this.#wrap(last, "", `,...(${M}l=${id},${M}0)`);
  }

  /** Puts text before the closing bracket of a node. */
  #putInside(node: ts.Node, text: string): void {
    this.writer.copyTo(node.end - 1);
    this.writer.put(text);
  }

  #writeNew(node: ts.NewExpression, frame: Frame | null): void {
    const id = this.#site("call", node);
    this.#noteAfter(node, id);
    this.#writeChildren(node, frame);
    if (node.arguments === undefined) {
      this.writer.copyTo(node.end);
      this.writer.put(`(...(${M}l=${id},${M}0))`);
    } else if (node.arguments.length === 0) this.#putInside(node, `...(${M}l=${id},${M}0)`);
  }

  /** `list[i].on()`: a place that the list does not have gets a problem of its own. */
  #writeItem(node: ts.ElementAccessExpression, frame: Frame | null): void {
    const id = this.#site("item", node);
    this.writer.put(`${M}i(`);
    this.write(node.expression, frame);
    this.writer.copyTo(bracketOf(node, this.#file));
    this.writer.replaceSign(",");
    this.write(node.argumentExpression, frame);
    this.writer.copyTo(node.end - 1);
    this.writer.replaceSign(`,${id})`);
  }

  #noteLoop(node: ts.Node, condition: ts.Expression): void {
    this.#wrap(condition, `${M}l=${this.#site("loop", node)},`, "");
  }

  #writeEndlessFor(node: ts.ForStatement, frame: Frame | null): void {
    const id = this.#site("loop", node);
    if (node.initializer !== undefined) this.write(node.initializer, frame);
    this.writer.copyTo(findSign(";", node.initializer?.end ?? node.getStart(this.#file), this.#file) + 1);
    this.writer.put(`${M}l=${id}`);
    if (node.incrementor !== undefined) this.write(node.incrementor, frame);
    this.write(node.statement, frame);
  }

  #writeReturn(node: ts.ReturnStatement, frame: Frame): void {
    if (node.expression !== undefined) {
      this.#wrap(node.expression, `${M}r(`, ")");
      return this.#writeChildren(node, frame);
    }
    this.writer.copyTo(node.getStart(this.#file) + "return".length);
    this.writer.put(` ${M}x()`);
  }

  #writeFunction(node: Frame): void {
    const { body } = node;
    const hasFrame = body !== undefined && this.#calls(body);
    const id = hasFrame ? this.#site("function", node) : 0;
    if (hasFrame && !ts.isBlock(body)) this.#wrap(body, `${M}a(${M}e(${id}),`, ")");
    ts.forEachChild(node, (child) => {
      if (ts.isParameter(child)) this.#noteDefault(child);
      if (child === body && ts.isBlock(body) && hasFrame) this.#writeBody(body, node, id);
      else this.write(child, null);
    });
  }

  #writeBody(body: ts.Block, frame: Frame, id: number): void {
    this.writer.copyTo(body.getStart(this.#file) + 1);
    this.writer.put(`${M}e(${id});`);
    this.#writeChildren(body, frame);
    this.#putInside(body, `;${M}x()`);
    this.writer.copyTo(body.end);
  }

  /** A default that calls something runs before the function has its frame: the caller's site is put back. */
  #noteDefault(parameter: ts.ParameterDeclaration): void {
    const { initializer } = parameter;
    if (initializer !== undefined && this.#calls(initializer)) this.#wrap(initializer, `${M}v(${M}l,`, ")");
  }
}

function isTypeOnly(node: ts.Node): boolean {
  if (ts.isInterfaceDeclaration(node) || ts.isTypeAliasDeclaration(node) || ts.isTypeParameterDeclaration(node))
    return true;
  return ts.isTypeNode(node) && !ts.isExpressionWithTypeArguments(node);
}

/** What stands before the last dot or bracket of a call's name, or the plain name; null where it can not be wrapped. */
function ownerOf(node: ts.CallExpression): ts.Expression | null {
  const callee = node.expression;
  if (ts.isIdentifier(callee)) return callee;
  if (!ts.isPropertyAccessExpression(callee) && !ts.isElementAccessExpression(callee)) return null;
  const owner = callee.expression;
  // Brackets would end the reach of a `?.`, and `super` does not stand alone.
  return owner.kind === ts.SyntaxKind.SuperKeyword || ts.isOptionalChain(owner) ? null : owner;
}

/** The statement that begins with this call's owner, or null. */
function statementAt(
  node: ts.CallExpression,
  owner: ts.Expression,
  file: ts.SourceFile,
): ts.ExpressionStatement | null {
  let top: ts.Node = node;
  while (!ts.isStatement(top) && !ts.isFunctionLike(top)) {
    if (ts.isElementAccessExpression(top) && isUsedItem(top)) return null;
    top = top.parent;
  }
  if (!ts.isExpressionStatement(top)) return null;
  return top.getStart(file) === owner.getStart(file) && top.getStart(file) === node.getStart(file) ? top : null;
}

/** Whether the script goes on to use what it finds at a place of a list. */
function isUsedItem(node: ts.ElementAccessExpression): boolean {
  const { parent } = node;
  const isOwner =
    (ts.isPropertyAccessExpression(parent) || ts.isElementAccessExpression(parent)) && parent.expression === node;
  if (!isOwner || parent.questionDotToken !== undefined || ts.isOptionalChain(node)) return false;
  return node.expression.kind !== ts.SyntaxKind.SuperKeyword && !ts.isStringLiteralLike(node.argumentExpression);
}

/** Offset of the `[` of an element access. */
function bracketOf(node: ts.ElementAccessExpression, file: ts.SourceFile): number {
  return findSign("[", node.expression.end, file);
}

/** Offset of a sign from a place on, comments passed over; the place itself when there is none. */
function findSign(sign: string, from: number, file: ts.SourceFile): number {
  const scanner = ts.createScanner(ts.ScriptTarget.ES2022, true, ts.LanguageVariant.Standard, file.text);
  scanner.setTextPos(from);
  while (scanner.scan() !== ts.SyntaxKind.EndOfFileToken)
    if (scanner.getTokenText() === sign) return scanner.getTokenStart();
  return from;
}

const BEFORE =
  `(function(${M}w,${M}){"use strict";const {${GLOBAL_WORDS.join(",")}}=${M}w;const ${M}0=${M}.none,${M}i=${M}.item,${M}s=[];let ${M}l=0,${M}d=0;` +
  `${M}.lend({site:()=>${M}l,callers:${M}s,depth:()=>${M}d});` +
  `const ${M}e=f=>{if(${M}d>=${M}.maxDepth){${M}l=f;${M}.tooDeep("")}${M}s[${M}d++]=${M}l},${M}x=()=>{${M}l=${M}s[--${M}d]},` +
  `${M}r=v=>{${M}l=${M}s[--${M}d];return v},${M}a=(_,v)=>{${M}l=${M}s[--${M}d];return v},${M}v=(l,v)=>{${M}l=l;return v};(()=>{\n`;
const AFTER = "\n})()})";

/**
 * Marks a script. `script` is its text without types, at the positions of `file`, whose nodes have
 * their parents set. Cost: two walks of the tree. Gives fresh objects.
 */
export function markScript(file: ts.SourceFile, script: string): MarkedScript {
  const marker = new Marker(file, script);
  ts.forEachChild(file, (node) => marker.write(node, null));
  const { sites, writer } = marker;
  const statements = sites.map((site) => (site.kind === "script" ? file : statementOf(site.node)));
  const table = new StreamTable(file, script, new Set(statements));
  return {
    code: BEFORE + writer.finish() + AFTER,
    sites,
    streamOf: statements.map((statement) => table.indexOf(statement)),
    streams: table.streams.map((stream) => stream.key),
    toScriptColumn: (line, column) => writer.toScriptColumn(line, column),
  };
}
