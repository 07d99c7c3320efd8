import ts from "typescript";
import { placeOf, type CompiledScript } from "../language/compile.ts";
import { LINES_BEFORE, type Site } from "../language/mark.ts";
import { createProblem, isProblemCode, type ProblemPlace } from "../language/problem.ts";
import { toExcerpt, toOffset, toRange } from "../language/ranges.ts";
import type { SentenceValues } from "../language/sentence.ts";
import type { ProblemCode } from "../language/problems/index.ts";
import type { GuestFailure } from "./guest.ts";
import type { Problem } from "./model.ts";
import { findOnlyText, findOrigin } from "./origin.ts";
import type { RuntimeResult } from "./runtime.ts";

/** The problem of a run in the words of the catalogue, at its place in the script; null when it ended well. */
export function explainFailure(compiled: CompiledScript, result: RuntimeResult): Problem | null {
  const sites = (result.report?.sites ?? [0]).map((site) => compiled.marked.sites[site] ?? scriptSite(compiled));
  const site = sites.at(-1) ?? scriptSite(compiled);
  const failure = result.report?.failure ?? null;
  // Without its report nobody knows how a run ended: never take that for a good end.
  if (result.end === "ended" && result.report === null) return explainBroken(compiled, site, "The run gave no report.");
  if (result.end === "out-of-fuel") return explainFuel(compiled, sites);
  if (result.end === "unreadable") return explainUnreadable(compiled, result.details);
  if (result.end === "broken") return explainBroken(compiled, site, result.details);
  if (failure === null) return null;
  if (failure.code === "engine") return explainEngine(compiled, site, failure);
  if (failure.code === "thrown") return explainThrown(compiled, site, failure);
  const meant = failure.site === undefined ? site : (compiled.marked.sites[failure.site] ?? site);
  return explainLibrary(compiled, meant, failure, sites);
}

function scriptSite(compiled: CompiledScript): Site {
  return compiled.marked.sites[0] as Site;
}

/** Head of the outermost loop around the innermost call that is in one: that loop has no end. */
function headOfLoop(compiled: CompiledScript, sites: readonly Site[]): ProblemPlace | null {
  for (const site of sites.toReversed()) {
    const loop = loopAround(site.node);
    if (loop !== null) return headOf(compiled, loop);
  }
  return null;
}

function explainFuel(compiled: CompiledScript, sites: readonly Site[]): Problem {
  const head = headOfLoop(compiled, sites);
  if (head !== null) return createProblem("endless", {}, head);
  const site = sites.at(-1) ?? scriptSite(compiled);
  return createProblem("too-much-work", {}, placeOfSite(compiled, site));
}

function loopAround(node: ts.Node): ts.Node | null {
  let outermost: ts.Node | null = null;
  for (let at: ts.Node | undefined = node; at !== undefined && !ts.isFunctionLike(at); at = at.parent)
    if (ts.isIterationStatement(at, false)) outermost = at;
  return outermost;
}

/** A statement's first line only: a loop as far as its body. */
function headOf(compiled: CompiledScript, node: ts.Node): ProblemPlace {
  const start = node.getStart(compiled.file);
  const body =
    ts.isIterationStatement(node, false) && !ts.isDoStatement(node) ? node.statement.getStart(compiled.file) : node.end;
  const lineEnd = compiled.text.indexOf("\n", start);
  const end = Math.min(body, lineEnd < 0 ? node.end : lineEnd);
  const text = compiled.text.slice(start, end).trimEnd();
  return {
    range: toRange(compiled.file, start, start + text.length),
    excerpt: toExcerpt(compiled.text, start, start + text.length),
  };
}

function explainUnreadable(compiled: CompiledScript, details: string): Problem {
  const place = placeInStack(compiled, details) ?? {
    range: { line: 1, column: 1, endLine: 1, endColumn: 1 },
    excerpt: "",
  };
  if (details.includes("stack overflow")) return createProblem("too-deep", {}, { ...place, details });
  return createProblem("unreadable", {}, { ...place, details });
}

function explainBroken(compiled: CompiledScript, site: Site, details: string): Problem {
  const place = { ...placeOfSite(compiled, site), details };
  if (details.includes("out of memory")) return createProblem("too-big", {}, place);
  return createProblem("could-not-run", {}, place);
}

/** Offset in the script of the top frame of an engine's stack, or -1. */
function offsetInStack(compiled: CompiledScript, stack: string): number {
  const found = /script\.js:(\d+)(?::(\d+))?/.exec(stack);
  const line = Number(found?.[1] ?? 0) - LINES_BEFORE;
  if (line < 1) return -1;
  const column = found?.[2] === undefined ? 1 : compiled.marked.toScriptColumn(line, Number(found[2]));
  return toOffset(compiled.text, line, column);
}

/** The innermost node at an offset. */
function nodeAt(file: ts.SourceFile, offset: number): ts.Node {
  let innermost: ts.Node = file;
  const look = (node: ts.Node): void => {
    if (offset < node.getStart(file) || offset >= node.end) return;
    innermost = node;
    ts.forEachChild(node, look);
  };
  look(file);
  return innermost;
}

/** The place in the script of the top frame of an engine's stack. */
function placeInStack(compiled: CompiledScript, stack: string): ProblemPlace | null {
  const start = offsetInStack(compiled, stack);
  if (start < 0) return null;
  const node = nodeAt(compiled.file, start);
  // The engine points at the bracket of a call; its name says more.
  if (compiled.text.charAt(start) === "(" && ts.isCallExpression(node)) return placeOfCall(compiled, node);
  const word = /^[\w$.]+/.exec(compiled.text.slice(start))?.[0] ?? compiled.text.slice(start, start + 1);
  return {
    range: toRange(compiled.file, start, start + word.length),
    excerpt: toExcerpt(compiled.text, start, start + word.length),
  };
}

/** Where a call site is shown: the name of what is called, up to the end of the call when it is on one line. */
function placeOfSite(compiled: CompiledScript, site: Site): ProblemPlace {
  const { file } = compiled;
  if (site.kind === "loop") return headOf(compiled, site.node);
  if (site.kind === "function") return headOf(compiled, nameOf(site.node) ?? site.node);
  if (site.kind === "item") return placeOf(file, site.node);
  return ts.isCallExpression(site.node) ? placeOfCall(compiled, site.node) : headOf(compiled, site.node);
}

function placeOfCall({ file, text }: CompiledScript, node: ts.CallExpression): ProblemPlace {
  const callee = node.expression;
  const start = ts.isPropertyAccessExpression(callee) ? callee.name.getStart(file) : callee.getStart(file);
  const line = text.indexOf("\n", start);
  const end = line >= 0 && line < node.end ? callee.end : node.end;
  return { range: toRange(file, start, end), excerpt: toExcerpt(text, start, end) };
}

function nameOf(node: ts.Node): ts.Node | undefined {
  if (ts.isFunctionLike(node) && node.name !== undefined) return node.name;
  if (node.parent !== undefined && ts.isVariableDeclaration(node.parent)) return node.parent.name;
  return undefined;
}

/** The function around a node, as a sentence names it. */
function functionName(compiled: CompiledScript, node: ts.Node): string {
  for (let at: ts.Node | undefined = node; at !== undefined; at = at.parent) {
    if (!ts.isFunctionLike(at)) continue;
    const name = nameOf(at);
    if (name !== undefined) return name.getText(compiled.file);
  }
  return "This";
}

function explainLibrary(compiled: CompiledScript, site: Site, failure: GuestFailure, sites: readonly Site[]): Problem {
  const written = failure.argument === undefined ? undefined : argumentOf(site, failure.argument);
  const argument = written === undefined ? undefined : (originOf(compiled, written, failure, sites) ?? written);
  const place = argument === undefined ? placeOfSite(compiled, site) : placeOf(compiled.file, argument);
  if (failure.code === "calls-itself") {
    const name = functionName(compiled, site.node);
    return createProblem("calls-itself", { name }, placeOfSite(compiled, callInside(sites, name) ?? site));
  }
  if (failure.code === "clock-stood-still")
    return createProblem("clock-stood-still", {}, headOfLoop(compiled, sites) ?? place);
  if (failure.code === "not-an-action") return explainAction(compiled, failure, argument, place);
  const code: ProblemCode = isProblemCode(failure.code) ? failure.code : "could-not-run";
  return createProblem(
    code,
    { ...failure.values, ...extraValues(compiled, failure, argument) },
    { ...place, ...fixOf(compiled, failure, argument) },
  );
}

/** Where a wrong value was written down; a wrong name that stands in the script once is meant wherever it stands. */
function originOf(
  compiled: CompiledScript,
  argument: ts.Node,
  { values }: GuestFailure,
  sites: readonly Site[],
): ts.Node | null {
  const origin = findOrigin(argument, sites);
  const name = values["name"];
  return origin ?? (typeof name === "string" ? findOnlyText(compiled, name) : null);
}

/** The innermost call of a function by itself. */
function callInside(sites: readonly Site[], name: string): Site | null {
  const isOfItself = ({ node }: Site): boolean =>
    ts.isCallExpression(node) && ts.isIdentifier(node.expression) && node.expression.text === name;
  return sites.findLast(isOfItself) ?? null;
}

function argumentOf(site: Site, index: number): ts.Node | undefined {
  if (!ts.isCallExpression(site.node)) return undefined;
  const argument = site.node.arguments[index];
  return argument === undefined || ts.isSpreadElement(argument) ? undefined : argument;
}

/** Something ran where steps were wanted: `at(8, all.off())`. */
function explainAction(
  compiled: CompiledScript,
  failure: GuestFailure,
  argument: ts.Node | undefined,
  place: ProblemPlace,
): Problem {
  const word = String(failure.values["word"] ?? "at");
  if (argument !== undefined && ts.isCallExpression(argument)) {
    const start = argument.getStart(compiled.file);
    const range = toRange(compiled.file, start, start);
    const when = failure.values["when"] === undefined ? "later" : `at beat ${failure.values["when"]}`;
    return createProblem(
      "ran-too-early",
      { when },
      { ...place, fix: { range, text: "() => ", label: "Put `() =>` in front" } },
    );
  }
  return createProblem(
    "not-an-action",
    { word, got: String(failure.values["got"] ?? ""), example: ACTION_EXAMPLES[word] ?? `${word}(() => { ... })` },
    place,
  );
}

const ACTION_EXAMPLES: { readonly [word: string]: string } = {
  at: "at(8, () => { ... })",
  repeat: "repeat(4, () => { ... })",
  together: "together(() => { ... }, () => { ... })",
  inTurn: "inTurn(1, front => { ... })",
  forEach: "forEach(front => { ... })",
  filter: "filter(front => ...)",
  map: "map(front => ...)",
};

function extraValues(compiled: CompiledScript, failure: GuestFailure, argument: ts.Node | undefined): SentenceValues {
  if (failure.code === "missing-value") return { things: failure.values["count"] === 1 ? "thing" : "things" };
  const number = failure.code === "wants-a-number" ? numberInQuotes(argument) : null;
  return number === null ? {} : { number };
}

function numberInQuotes(argument: ts.Node | undefined): string | null {
  if (argument === undefined || !ts.isStringLiteralLike(argument)) return null;
  return argument.text.trim() !== "" && Number.isFinite(Number(argument.text)) ? argument.text.trim() : null;
}

/** Replacements that are certain: the name that was meant, the number without its quotes. */
function fixOf(compiled: CompiledScript, failure: GuestFailure, argument: ts.Node | undefined): Pick<Problem, "fix"> {
  if (argument === undefined || !ts.isStringLiteralLike(argument)) return {};
  const { range } = placeOf(compiled.file, argument);
  const meant = failure.values["meant"];
  if (typeof meant === "string") return { fix: { range, text: JSON.stringify(meant), label: `Write "${meant}"` } };
  const number = failure.code === "wants-a-number" ? numberInQuotes(argument) : null;
  return number === null ? {} : { fix: { range, text: number, label: "Take the quotes off" } };
}

function explainThrown(compiled: CompiledScript, site: Site, failure: GuestFailure): Problem {
  const offset = offsetInStack(compiled, failure.stack ?? "");
  let thrower: ts.Node | undefined = offset < 0 ? undefined : nodeAt(compiled.file, offset);
  while (thrower !== undefined && !ts.isThrowStatement(thrower)) thrower = thrower.parent;
  const place = thrower === undefined ? placeOfSite(compiled, site) : placeOf(compiled.file, thrower);
  return createProblem(
    "thrown",
    failure.message === undefined || failure.message === "" ? {} : { message: failure.message },
    place,
  );
}

const TOO_BIG = [
  "out of memory",
  "invalid array length",
  "string too long",
  "array too large",
  "too many arguments",
  "invalid repeat count",
];

/** An error of QuickJS itself, by its own words; those are pinned with the engine and covered by tests. */
function explainEngine(compiled: CompiledScript, site: Site, failure: GuestFailure): Problem {
  const message = failure.message ?? "";
  const details = `${failure.name ?? "Error"}: ${message}`;
  const inStack = failure.stack === undefined ? null : placeInStack(compiled, failure.stack);
  const place = { ...(inStack ?? placeOfSite(compiled, site)), details };
  if (message.includes("stack overflow"))
    return createProblem(
      "calls-itself",
      { name: functionName(compiled, site.node) },
      { ...placeOfSite(compiled, site), details },
    );
  if (TOO_BIG.some((words) => message.includes(words))) return createProblem("too-big", {}, place);
  if (message.includes("is not initialized"))
    return createProblem("not-made-yet", { name: quoted(message) ?? place.excerpt }, place);
  if (failure.name === "ReferenceError")
    return createProblem("out-of-reach", { name: quoted(message) ?? place.excerpt }, place);
  if (message.includes("read-only") || message.includes("not extensible") || message.includes("no setter"))
    return createProblem("can-not-change", {}, place);
  if (message.includes("cannot read property") || message.includes("cannot set property")) {
    return explainNothing(compiled, failure, quoted(message) ?? "", place);
  }
  if (message.includes("not iterable")) return createProblem("not-a-list", {}, place);
  if (message.includes("not a function"))
    return explainSkill(compiled, site, { ...placeOfSite(compiled, site), details });
  return createProblem("could-not-run", {}, place);
}

/** `x.on()` where `x` holds nothing: named with what holds it when that is a plain name. */
function explainNothing(compiled: CompiledScript, failure: GuestFailure, name: string, place: ProblemPlace): Problem {
  const offset = offsetInStack(compiled, failure.stack ?? "");
  const node = offset < 0 ? compiled.file : nodeAt(compiled.file, offset);
  const access = ts.isPropertyAccessExpression(node.parent ?? node) ? node.parent : node;
  if (!ts.isPropertyAccessExpression(access)) return createProblem("nothing-there", { name }, place);
  const exact = { ...placeOf(compiled.file, access), details: place.details };
  return createProblem(
    "nothing-there",
    ts.isIdentifier(access.expression) ? { name, owner: access.expression.text } : { name },
    exact,
  );
}

function quoted(message: string): string | null {
  return /'([^']+)'/.exec(message)?.[1] ?? /^(\S+) is not/.exec(message)?.[1] ?? null;
}

/** A call of what is no function: a thing that lights do not have, or a name for something else. */
function explainSkill(compiled: CompiledScript, site: Site, place: ProblemPlace): Problem {
  if (!ts.isCallExpression(site.node)) return createProblem("not-a-function", { name: "This" }, place);
  const callee = site.node.expression;
  if (!ts.isPropertyAccessExpression(callee))
    return createProblem("not-a-function", { name: callee.getText(compiled.file) }, place);
  const owner = callee.expression.getText(compiled.file);
  const isShort = owner.length <= 20 && !owner.includes("\n");
  return createProblem(
    "unknown-skill",
    {
      owner: isShort ? `\`${owner}\`` : "This",
      name: callee.name.text,
      skills: "Check what it is, and what it can do.",
    },
    place,
  );
}
