import ts from "typescript";
import type { Finding } from "../engine/model.ts";
import { createFinding } from "./finding.ts";
import type { RunFindingCode } from "./problems/findings.ts";
import type { SentenceValues } from "./sentence.ts";
import { ACT_WORDS } from "./words.ts";

/** Callbacks after which the clock goes back: a wait at their end does nothing. */
const GOES_BACK: ReadonlySet<string> = new Set(["at", "inTurn"]);

function calledName(node: ts.CallExpression): string {
  const callee = node.expression;
  if (ts.isIdentifier(callee)) return callee.text;
  return ts.isPropertyAccessExpression(callee) ? callee.name.text : "";
}

function isRepeated(node: ts.Node): boolean {
  for (let at = node.parent; at !== undefined; at = at.parent)
    if (ts.isIterationStatement(at, false) || ts.isFunctionLike(at)) return true;
  return false;
}

/** `at(2, ...)` in a loop: beat 2 of the song each time. */
function isSameEachTurn(node: ts.CallExpression): boolean {
  const [when] = node.arguments;
  return (
    ts.isIdentifier(node.expression) &&
    node.expression.text === "at" &&
    when !== undefined &&
    ts.isNumericLiteral(when) &&
    isRepeated(node)
  );
}

/** The last statement of an action, when it is a plain `wait(...)`. */
function lastWait(action: ts.Expression | undefined): ts.Node | null {
  if (action === undefined || (!ts.isArrowFunction(action) && !ts.isFunctionExpression(action))) return null;
  const { body } = action;
  const last = ts.isBlock(body) ? body.statements.at(-1) : body;
  const call = last !== undefined && ts.isExpressionStatement(last) ? last.expression : last;
  return call !== undefined &&
    ts.isCallExpression(call) &&
    ts.isIdentifier(call.expression) &&
    call.expression.text === "wait"
    ? call
    : null;
}

const ACTS: ReadonlySet<string> = new Set(ACT_WORDS);
const EQUALS: ReadonlySet<ts.SyntaxKind> = new Set([
  ts.SyntaxKind.EqualsEqualsEqualsToken,
  ts.SyntaxKind.EqualsEqualsToken,
]);

/** `turn % 4 === 4`: what is left after sharing by 4 is 0 to 3. */
function neverSo(node: ts.Node): Slip | null {
  if (!ts.isBinaryExpression(node) || !EQUALS.has(node.operatorToken.kind)) return null;
  const sum = ts.isParenthesizedExpression(node.left) ? node.left.expression : node.left;
  if (!ts.isBinaryExpression(sum) || sum.operatorToken.kind !== ts.SyntaxKind.PercentToken) return null;
  if (!ts.isNumericLiteral(sum.right) || !ts.isNumericLiteral(node.right)) return null;
  const [by, number] = [Number(sum.right.text), Number(node.right.text)];
  return by > 0 && number >= by ? { rule: "never-so", node, values: { sum: sum.getText(), by, number } } : null;
}

/** How often each name stands in a script. */
function countNames(file: ts.SourceFile): ReadonlyMap<string, number> {
  const counts = new Map<string, number>();
  const visit = (node: ts.Node): void => {
    if (ts.isIdentifier(node)) counts.set(node.text, (counts.get(node.text) ?? 0) + 1);
    ts.forEachChild(node, visit);
  };
  visit(file);
  return counts;
}

/** A function whose name stands nowhere else. */
function neverRun(node: ts.Node, names: ReadonlyMap<string, number>): Slip | null {
  const isMade =
    ts.isFunctionDeclaration(node) ||
    (ts.isVariableDeclaration(node) && node.initializer !== undefined && ts.isFunctionLike(node.initializer));
  if (!isMade || node.name === undefined || !ts.isIdentifier(node.name)) return null;
  const { text } = node.name;
  return names.get(text) === 1 ? { rule: "never-run", node: node.name, values: { name: text } } : null;
}

/** `for (const front of north) { north.pulse(1); }`: the whole list in a turn that never names its own item. */
function allEachTurn(node: ts.Node, file: ts.SourceFile): Slip | null {
  if (!ts.isForOfStatement(node) || !ts.isVariableDeclarationList(node.initializer)) return null;
  const name = node.initializer.declarations[0]?.name;
  if (name === undefined || !ts.isIdentifier(name)) return null;
  const list = node.expression.getText(file);
  let isItemUsed = false;
  let use: ts.Node | null = null;
  const visit = (at: ts.Node): void => {
    if (ts.isIdentifier(at) && at.text === name.text) isItemUsed = true;
    if (ts.isPropertyAccessExpression(at) && at.expression.getText(file) === list && ACTS.has(at.name.text)) use ??= at;
    ts.forEachChild(at, visit);
  };
  visit(node.statement);
  return use === null || isItemUsed ? null : { rule: "all-each-turn", node: use, values: { list, item: name.text } };
}

interface Slip {
  readonly rule: RunFindingCode;
  readonly node: ts.Node;
  readonly values: SentenceValues;
}

function slipsOfCall(node: ts.Node, file: ts.SourceFile): readonly Slip[] {
  if (!ts.isCallExpression(node)) return [];
  const beat = node.arguments[0]?.getText(file) ?? "";
  const wait = GOES_BACK.has(calledName(node)) ? lastWait(node.arguments[1]) : null;
  return [
    ...(isSameEachTurn(node) ? [{ rule: "same-each-turn", node, values: { beat } } as const] : []),
    ...(wait === null ? [] : [{ rule: "last-wait", node: wait, values: {} } as const]),
  ];
}

/** What the text alone gives away: likely slips that stop nothing, in the order of the text. */
export function findSlips(file: ts.SourceFile): readonly Finding[] {
  const slips: Slip[] = [];
  const names = countNames(file);
  const visit = (node: ts.Node): void => {
    const single = neverSo(node) ?? neverRun(node, names) ?? allEachTurn(node, file);
    slips.push(...slipsOfCall(node, file), ...(single === null ? [] : [single]));
    ts.forEachChild(node, visit);
  };
  visit(file);
  return slips.map(({ rule, node, values }) => {
    const line = file.getLineAndCharacterOfPosition(node.getStart(file)).line + 1;
    return createFinding(rule, values, { lines: [line] });
  });
}
