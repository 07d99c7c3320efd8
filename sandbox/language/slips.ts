import ts from "typescript";
import type { Finding } from "../engine/model.ts";
import { createFinding } from "./finding.ts";

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

/** What the text alone gives away: likely slips that stop nothing, in the order of their lines. */
export function findSlips(file: ts.SourceFile): readonly Finding[] {
  const findings: Finding[] = [];
  const add = (
    rule: "same-each-turn" | "last-wait",
    node: ts.Node,
    values: { readonly [name: string]: string },
  ): void => {
    const line = file.getLineAndCharacterOfPosition(node.getStart(file)).line + 1;
    findings.push(createFinding(rule, values, { lines: [line] }));
  };
  const visit = (node: ts.Node): void => {
    if (ts.isCallExpression(node)) {
      if (isSameEachTurn(node)) add("same-each-turn", node, { beat: node.arguments[0]?.getText(file) ?? "" });
      const wait = GOES_BACK.has(calledName(node)) ? lastWait(node.arguments[1]) : null;
      if (wait !== null) add("last-wait", wait, {});
    }
    ts.forEachChild(node, visit);
  };
  visit(file);
  return findings;
}
