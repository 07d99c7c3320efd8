import ts from "typescript";
import type { Problem } from "../../engine/model.ts";
import { createProblem } from "../problem.ts";
import type { ProblemCode } from "../problems/index.ts";
import { toExcerpt, toRange } from "../ranges.ts";
import type { Scopes } from "../scope.ts";
import type { SentenceValues } from "../sentence.ts";
import type { NameTable } from "../names.ts";

/** A certain fix: text in the place of a node, or put before or after it. */
export interface NodeFix {
  readonly node: ts.Node;
  readonly at: "instead" | "before" | "after";
  readonly text: string;
  readonly label: string;
}

/** What a check of the dialect is given: the script, its names, and where to put what it finds. */
export interface DialectContext {
  readonly file: ts.SourceFile;
  readonly scopes: Scopes;
  readonly names: NameTable | null;
  /** Names of fields and methods that the script itself makes. */
  readonly ownFields: ReadonlySet<string>;
  report(code: ProblemCode, node: ts.Node, values?: SentenceValues, fix?: NodeFix): void;
}

/** One look at one node. */
export type DialectCheck = (node: ts.Node, context: DialectContext) => void;

function toFix(file: ts.SourceFile, { node, at, text, label }: NodeFix): NonNullable<Problem["fix"]> {
  const start = at === "after" ? node.end : node.getStart(file);
  const end = at === "before" ? start : node.end;
  return { range: toRange(file, start, end), text, label };
}

/** The names of fields, methods and keys that a script makes itself: not slips for words of the language. */
function readOwnFields(file: ts.SourceFile): Set<string> {
  const fields = new Set<string>();
  const visit = (node: ts.Node): void => {
    if (
      (ts.isPropertyAssignment(node) ||
        ts.isShorthandPropertyAssignment(node) ||
        ts.isMethodDeclaration(node) ||
        ts.isPropertyDeclaration(node) ||
        ts.isPropertySignature(node) ||
        ts.isMethodSignature(node)) &&
      (ts.isIdentifier(node.name) || ts.isStringLiteral(node.name))
    )
      fields.add(node.name.text);
    if (
      ts.isBinaryExpression(node) &&
      node.operatorToken.kind === ts.SyntaxKind.EqualsToken &&
      ts.isPropertyAccessExpression(node.left)
    )
      if (node.left.expression.kind === ts.SyntaxKind.ThisKeyword) fields.add(node.left.name.text);
    ts.forEachChild(node, visit);
  };
  visit(file);
  return fields;
}

/** Runs checks over every node of a script; gives the problem that stands first, or null. */
export function runChecks(
  file: ts.SourceFile,
  scopes: Scopes,
  names: NameTable | null,
  checks: readonly DialectCheck[],
): Problem | null {
  let first: Problem | null = null;
  let firstAt = Infinity;
  const context: DialectContext = {
    file,
    scopes,
    names,
    ownFields: readOwnFields(file),
    report: (code, node, values = {}, fix) => {
      const start = node.getStart(file);
      if (start >= firstAt) return;
      firstAt = start;
      const place = { range: toRange(file, start, node.end), excerpt: toExcerpt(file.text, start, node.end) };
      first = createProblem(code, values, fix === undefined ? place : { ...place, fix: toFix(file, fix) });
    },
  };
  const visit = (node: ts.Node): void => {
    for (const check of checks) check(node, context);
    ts.forEachChild(node, visit);
  };
  visit(file);
  return first;
}
