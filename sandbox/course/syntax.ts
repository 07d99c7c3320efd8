import ts from "typescript";
import type { Use } from "./exercise.ts";

/** Every node of a script below `node`, the outermost first. */
function* below(node: ts.Node): Generator<ts.Node> {
  const children: ts.Node[] = [];
  ts.forEachChild(node, (child) => {
    children.push(child);
  });
  for (const child of children) {
    yield child;
    yield* below(child);
  }
}

const isLoop = (node: ts.Node): boolean =>
  ts.isForStatement(node) || ts.isForOfStatement(node) || ts.isWhileStatement(node) || ts.isDoStatement(node);

function isInLoop(node: ts.Node): boolean {
  for (let above = node.parent; above; above = above.parent) if (isLoop(above)) return true;
  return false;
}

/** Variables that loops declare for themselves are no variables of the learner's. */
function isOwnVariable(node: ts.Node): node is ts.VariableDeclaration {
  if (!ts.isVariableDeclaration(node)) return false;
  const above = node.parent.parent;
  return !ts.isForStatement(above) && !ts.isForOfStatement(above);
}

const isConstant = (node: ts.VariableDeclaration): boolean => (node.parent.flags & ts.NodeFlags.Const) !== 0;

const ASSIGNMENTS: ReadonlySet<ts.SyntaxKind> = new Set([
  ts.SyntaxKind.EqualsToken,
  ts.SyntaxKind.PlusEqualsToken,
  ts.SyntaxKind.MinusEqualsToken,
  ts.SyntaxKind.AsteriskEqualsToken,
  ts.SyntaxKind.SlashEqualsToken,
]);

function changesVariable(node: ts.Node): boolean {
  if (ts.isBinaryExpression(node)) return ASSIGNMENTS.has(node.operatorToken.kind) && ts.isIdentifier(node.left);
  return (
    (ts.isPostfixUnaryExpression(node) || ts.isPrefixUnaryExpression(node)) &&
    (node.operator === ts.SyntaxKind.PlusPlusToken || node.operator === ts.SyntaxKind.MinusMinusToken) &&
    !ts.isForStatement(node.parent)
  );
}

const USE_TEST: { readonly [U in Use]: (node: ts.Node) => boolean } = {
  "for-of": ts.isForOfStatement,
  for: ts.isForStatement,
  variable: isOwnVariable,
  "changing-variable": changesVariable,
  constant: (node) => isOwnVariable(node) && isConstant(node),
  function: (node) =>
    ts.isFunctionDeclaration(node) ||
    (isOwnVariable(node) && node.initializer !== undefined && ts.isArrowFunction(node.initializer)),
  if: ts.isIfStatement,
  "nested-loop": (node) => isLoop(node) && isInLoop(node),
};

/** What was counted, and where it was first and last seen (lines from 1). */
export interface Count {
  readonly count: number;
  readonly lines: readonly number[];
}

function countNodes(source: string, matches: (node: ts.Node) => boolean): Count {
  const file = ts.createSourceFile("script.ts", source, ts.ScriptTarget.ES2022, true, ts.ScriptKind.TS);
  const lines: number[] = [];
  for (const node of below(file))
    if (matches(node)) lines.push(file.getLineAndCharacterOfPosition(node.getStart(file)).line + 1);
  return { count: lines.length, lines };
}

/** How often a script uses something, and on which lines. */
export function countUses(source: string, use: Use): Count {
  return countNodes(source, USE_TEST[use]);
}

/** How often a word is named; comments and texts in quotes do not count. */
export function countWord(source: string, word: string): Count {
  return countNodes(source, (node) => ts.isIdentifier(node) && node.text === word);
}

/** How often a text stands in quotes. */
export function countQuoted(source: string, text: string): Count {
  return countNodes(source, (node) => ts.isStringLiteralLike(node) && node.text === text);
}
