import ts from "typescript";
import { near } from "../near-name.ts";
import { isVariableUse, type Declaration } from "../scope.ts";
import { ALLOWED_GLOBALS, FOREIGN_GLOBALS, GLOBAL_WORDS, MARK_PREFIX, NAME_PARAMETERS, TIMERS } from "../words.ts";
import type { DialectCheck, DialectContext } from "./report.ts";

const KNOWN: ReadonlySet<string> = new Set<string>([...GLOBAL_WORDS, ...ALLOWED_GLOBALS]);

/** Names of functions that make code from text. */
const MAKES_CODE: ReadonlySet<string> = new Set(["eval", "Function"]);

/** Words, their making and their changing: every name has to be known, free and not fixed. */
export const checkVariables: DialectCheck = (node, context) => {
  if (!ts.isIdentifier(node)) return;
  const { parent } = node;
  const own = context.scopes.named(node.text).find((declaration) => declaration.identifier === node);
  if (own !== undefined) return checkMaking(own, context);
  if (ts.isBindingElement(parent) || !isVariableUse(node)) return;
  const declaration = context.scopes.resolve(node.text, node);
  if (isWritten(node)) return checkWriting(node, declaration, context);
  if (declaration === null) checkUnknown(node, context);
};

function checkMaking(declaration: Declaration, { scopes, report }: DialectContext): void {
  const { name, identifier, kind, scope } = declaration;
  if (name.startsWith(MARK_PREFIX) || (kind !== "type" && KNOWN.has(name)))
    return report("taken-word", identifier, { name });
  const twin = scopes
    .named(name)
    .find((other) => other.scope === scope && other.kind !== "type" && other.kind !== "var" && other !== declaration);
  if (twin !== undefined && kind !== "type" && kind !== "var" && twin.identifier.pos < identifier.pos)
    report("made-twice", identifier, { name });
}

const ASSIGNMENTS = { first: ts.SyntaxKind.FirstAssignment, last: ts.SyntaxKind.LastAssignment };

function isWritten(node: ts.Identifier): boolean {
  const { parent } = node;
  if (ts.isBinaryExpression(parent) && parent.left === node)
    return parent.operatorToken.kind >= ASSIGNMENTS.first && parent.operatorToken.kind <= ASSIGNMENTS.last;
  if (!ts.isPrefixUnaryExpression(parent) && !ts.isPostfixUnaryExpression(parent)) return false;
  return parent.operator === ts.SyntaxKind.PlusPlusToken || parent.operator === ts.SyntaxKind.MinusMinusToken;
}

function checkWriting(node: ts.Identifier, declaration: Declaration | null, context: DialectContext): void {
  const name = node.text;
  if (declaration === null) {
    if (KNOWN.has(name)) return context.report("taken-word", node, { name });
    return checkUnknown(node, context);
  }
  if (declaration.kind !== "const") return;
  const list = declaration.identifier.parent.parent;
  const word = ts.isVariableDeclarationList(list) ? list.getFirstToken() : undefined;
  const fix =
    word === undefined ? undefined : ({ node: word, at: "instead", text: "let", label: "Use `let`" } as const);
  context.report("constant", node.parent, { name }, fix);
}

/** The kind of name that an argument of a known word is, or null. */
function nameKindOf(node: ts.Identifier): string | null {
  const call = node.parent;
  if (!ts.isCallExpression(call) || !ts.isPropertyAccessExpression(call.expression)) return null;
  const word = call.expression.name.text;
  const parameter = Object.hasOwn(NAME_PARAMETERS, word) ? NAME_PARAMETERS[word] : undefined;
  return parameter !== undefined && call.arguments[parameter.argument] === node ? parameter.kind : null;
}

function checkUnknown(node: ts.Identifier, context: DialectContext): void {
  const { scopes, report } = context;
  const name = node.text;
  if (KNOWN.has(name)) return;
  if (name.startsWith(MARK_PREFIX)) return report("taken-word", node, { name });
  if (MAKES_CODE.has(name)) return report("no-eval", node);
  if (TIMERS.has(name)) return report("no-timer", node, { word: name });
  const kind = nameKindOf(node);
  if (kind !== null)
    return report(
      "needs-quotes",
      node,
      { kind, name },
      { node, at: "instead", text: JSON.stringify(name), label: "Put it in quotes" },
    );
  if (name === "Promise") return report("no-async", node);
  const instead = Object.hasOwn(FOREIGN_GLOBALS, name) ? FOREIGN_GLOBALS[name] : undefined;
  if (instead !== undefined) return report("not-here", node, { word: name, try: instead });
  if (scopes.named(name).some((declaration) => declaration.kind !== "type"))
    return report("out-of-reach", node, { name });
  const candidates = [
    ...GLOBAL_WORDS,
    ...scopes.declarations.map((declaration) => declaration.name),
    ...ALLOWED_GLOBALS,
  ];
  const meant = near(name, candidates);
  if (meant === null) return report("unknown-word", node, { name });
  report("unknown-word", node, { name, meant }, { node, at: "instead", text: meant, label: `Write \`${meant}\`` });
}
