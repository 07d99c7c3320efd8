import ts from "typescript";
import type { CompiledScript } from "../language/compile.ts";
import type { Site } from "../language/mark.ts";

/** Helpers inside helpers beyond this are not followed. */
const MOST_STEPS = 10;

const isLiteral = (node: ts.Node): boolean =>
  ts.isStringLiteralLike(node) ||
  ts.isNumericLiteral(node) ||
  (ts.isPrefixUnaryExpression(node) && ts.isNumericLiteral(node.operand));

/**
 * Where a wrong value was written down: the argument itself, the constant that holds it, or the call that
 * handed it to a helper. `calls` are the sites around the failed call, outermost first, the failed one last.
 * null when it was worked out, or can not be followed.
 */
export function findOrigin(argument: ts.Node, calls: readonly Site[]): ts.Node | null {
  let at = argument;
  let call = calls.length - 1;
  for (let step = 0; step < MOST_STEPS; step++) {
    if (isLiteral(at)) return at;
    if (!ts.isIdentifier(at)) return null;
    const declaration = findDeclaration(at, at.text);
    if (declaration === null) return null;
    if (ts.isVariableDeclaration(declaration)) {
      if (declaration.initializer === undefined || !isConstant(declaration)) return null;
      at = declaration.initializer;
      continue;
    }
    const helper = declaration.parent;
    call -= 1;
    const caller = calls[call]?.node;
    if (caller === undefined || !ts.isCallExpression(caller) || !isCallOf(caller, helper)) return null;
    const handed = caller.arguments[helper.parameters.indexOf(declaration)];
    if (handed === undefined || ts.isSpreadElement(handed)) return null;
    at = handed;
  }
  return null;
}

/** The only text of the script that says just this; null when there is none, or more than one. */
export function findOnlyText({ file }: CompiledScript, text: string): ts.StringLiteralLike | null {
  const found: ts.StringLiteralLike[] = [];
  const visit = (node: ts.Node): void => {
    if (ts.isStringLiteralLike(node) && node.text === text) found.push(node);
    ts.forEachChild(node, visit);
  };
  visit(file);
  const [only, second] = found;
  return only !== undefined && second === undefined ? only : null;
}

type NamedValue = ts.VariableDeclaration | (ts.ParameterDeclaration & { readonly parent: ts.FunctionLikeDeclaration });

/** What makes a name, looked for outwards from where it is used. */
function findDeclaration(from: ts.Node, name: string): NamedValue | null {
  for (let at: ts.Node | undefined = from; at !== undefined; at = at.parent) {
    if (ts.isFunctionLike(at)) {
      const parameter = at.parameters.find((one) => ts.isIdentifier(one.name) && one.name.text === name);
      if (parameter !== undefined) return parameter as NamedValue;
    }
    const statements = ts.isSourceFile(at) || ts.isBlock(at) ? at.statements : [];
    for (const statement of statements) {
      if (!ts.isVariableStatement(statement)) continue;
      for (const declaration of statement.declarationList.declarations)
        if (ts.isIdentifier(declaration.name) && declaration.name.text === name) return declaration;
    }
  }
  return null;
}

const isConstant = ({ parent }: ts.VariableDeclaration): boolean => (parent.flags & ts.NodeFlags.Const) !== 0;

function isCallOf(call: ts.CallExpression, helper: ts.FunctionLikeDeclaration): boolean {
  if (!ts.isIdentifier(call.expression)) return false;
  const { parent } = helper;
  const name = helper.name ?? (parent !== undefined && ts.isVariableDeclaration(parent) ? parent.name : undefined);
  return name !== undefined && ts.isIdentifier(name) && name.text === call.expression.text;
}
