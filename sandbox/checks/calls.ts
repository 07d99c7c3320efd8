import ts from "typescript";
import { parseScript } from "../language/parse.ts";

/** How a function of the script is called. */
export interface FunctionCalls {
  readonly name: string;
  /** Number of parameters it names. */
  readonly parameters: number;
  /** Line of the function. */
  readonly line: number;
  /** Lines of its calls, in order; inside the function itself they do not count. */
  readonly callLines: readonly number[];
  /** How many different sets of values are written in the calls; texts are compared, not worked out. */
  readonly differentValues: number;
}

/** Gives the functions that a script makes, each with its calls, in order. A script that can not be read gives none. */
export function listFunctionCalls(source: string): readonly FunctionCalls[] {
  try {
    const file = parseScript(source);
    const lineOf = (node: ts.Node) => file.getLineAndCharacterOfPosition(node.getStart(file)).line + 1;
    const made: { name: string; parameters: number; node: ts.Node }[] = [];
    const calls: ts.CallExpression[] = [];
    walk(file, (node) => {
      if (ts.isFunctionDeclaration(node) && node.name !== undefined)
        made.push({ name: node.name.text, parameters: node.parameters.length, node });
      else if (
        ts.isVariableDeclaration(node) &&
        ts.isIdentifier(node.name) &&
        node.initializer !== undefined &&
        (ts.isArrowFunction(node.initializer) || ts.isFunctionExpression(node.initializer))
      )
        made.push({ name: node.name.text, parameters: node.initializer.parameters.length, node });
      if (ts.isCallExpression(node)) calls.push(node);
    });
    return made.map(({ name, parameters, node }) => {
      const its = calls.filter(
        (call) => ts.isIdentifier(call.expression) && call.expression.text === name && !isInside(call, node),
      );
      const values = its.map((call) =>
        call.arguments.map((argument) => argument.getText(file).replace(/\s+/g, " ")).join(", "),
      );
      return {
        name,
        parameters,
        line: lineOf(node),
        callLines: its.map(lineOf),
        differentValues: new Set(values).size,
      };
    });
  } catch (error) {
    if (!(error instanceof RangeError)) throw error;
    return [];
  }
}

function walk(node: ts.Node, visit: (node: ts.Node) => void): void {
  visit(node);
  ts.forEachChild(node, (child) => walk(child, visit));
}

function isInside(node: ts.Node, outer: ts.Node): boolean {
  return node.getStart() >= outer.getStart() && node.getEnd() <= outer.getEnd();
}
