import type * as ts from "typescript";
import type { Finding, Problem } from "../engine/model.ts";
import { checkDialect } from "./dialect/index.ts";
import { findSlips } from "./slips.ts";
import { markScript, type MarkedScript } from "./mark.ts";
import { findDeepBracket, findDeepNode } from "./nesting.ts";
import { parseScript, parserDiagnostics, stripTypes } from "./parse.ts";
import { createProblem } from "./problem.ts";
import type { ProblemCode } from "./problems/index.ts";
import { toExcerpt, toRange } from "./ranges.ts";
import { MAX_SOURCE_BYTES, normaliseSource, utf8Length } from "./source.ts";
import { explainSyntax } from "./syntax-problems.ts";
import type { NameTable } from "./names.ts";

/** A script that can be run. `text` is its normalised source, to which all positions refer. */
export interface CompiledScript {
  readonly ok: true;
  readonly text: string;
  readonly file: ts.SourceFile;
  readonly marked: MarkedScript;
  /** What the text alone gives away; stops nothing. */
  readonly findings: readonly Finding[];
}

export type CompileOutcome = CompiledScript | { readonly ok: false; readonly text: string; readonly problem: Problem };

/**
 * Gives a script ready for the engine, or its first problem; never throws for any text. `names` are
 * those of the layout and the song at hand: a name in quotes that is none of them is a problem.
 */
export function compileScript(source: string, names: NameTable | null): CompileOutcome {
  const text = normaliseSource(source);
  const deep = findDeepBracket(text);
  if (deep >= 0) return refuse(text, "too-deep", deep);
  if (utf8Length(text) > MAX_SOURCE_BYTES) return refuse(text, "too-long", 0);
  try {
    return compileText(text, names);
  } catch (error) {
    // Only a text that nests without brackets gets here: the host's stack ended before our count did.
    if (error instanceof RangeError) return refuse(text, "too-deep", 0);
    throw error;
  }
}

function compileText(text: string, names: NameTable | null): CompileOutcome {
  const file = parseScript(text);
  const deep = findDeepNode(file);
  if (deep >= 0) return refuse(text, "too-deep", deep);
  const diagnostics = parserDiagnostics(file);
  if (diagnostics.length > 0) return { ok: false, text, problem: explainSyntax(file, diagnostics) };
  const problem = checkDialect(file, names);
  if (problem !== null) return { ok: false, text, problem };
  const script = stripTypes(file);
  return { ok: true, text, file, marked: markScript(file, script), findings: findSlips(file) };
}

function refuse(text: string, code: ProblemCode, at: number): CompileOutcome {
  const before = text.slice(0, at).split("\n");
  const line = before.length;
  const column = (before.at(-1) ?? "").length + 1;
  const range = { line, column, endLine: line, endColumn: column + 1 };
  return { ok: false, text, problem: createProblem(code, {}, { range, excerpt: toExcerpt(text, at, at + 1) }) };
}

/** The range and the excerpt of a node. */
export function placeOf(file: ts.SourceFile, node: ts.Node): Pick<Problem, "range" | "excerpt"> {
  const start = node.getStart(file);
  return { range: toRange(file, start, node.end), excerpt: toExcerpt(file.text, start, node.end) };
}
