import ts from "typescript";

/** How deep a script may nest: the engine's own parser fails near 112 at its stack of 32 KiB. */
export const MAX_NESTING = 80;
/** How long a chain (`a.b().c()`, `1 + 2 + 3`) may get: keeps every later walk of the tree in its stack. */
const MAX_CHAIN = 400;
/**
 * Levels of the tree past which a host's stack may end first, in the parser: on one host it does, on
 * another it does not. Scripts within `MAX_NESTING` stay far below.
 */
const MAX_LEVELS = 300;

const OPENING = "([{";
const CLOSING = ")]}";

/**
 * Offset of the bracket that opens level `MAX_NESTING + 1`, or -1. Looks at text only and does not
 * recurse, so that it can run before any parser. Brackets in texts and comments may be counted, but
 * only where a script would be past every reader's patience: those of one line are skipped.
 */
export function findDeepBracket(text: string): number {
  let depth = 0;
  for (let i = 0; i < text.length; i++) {
    const char = text.charAt(i);
    if (char === '"' || char === "'") i = endOfText(text, i, char);
    else if (char === "/" && text.charAt(i + 1) === "/") i = endOfLine(text, i);
    else if (char === "/" && text.charAt(i + 1) === "*") {
      const end = text.indexOf("*/", i + 2);
      i = end < 0 ? text.length : end + 1;
    } else if (OPENING.includes(char)) {
      if (++depth > MAX_NESTING) return i;
    } else if (CLOSING.includes(char) && depth > 0) depth--;
  }
  return -1;
}

function endOfLine(text: string, from: number): number {
  const end = text.indexOf("\n", from);
  return end < 0 ? text.length : end;
}

function endOfText(text: string, from: number, quote: string): number {
  for (let i = from + 1; i < text.length; i++) {
    const char = text.charAt(i);
    if (char === "\\") i++;
    else if (char === quote || char === "\n") return i;
  }
  return text.length;
}

/** Levels that a construct costs in the engine's parser, beside its place in the tree. */
function weightOf(node: ts.Node): number {
  if (ts.isTypeNode(node)) return 1;
  switch (node.kind) {
    case ts.SyntaxKind.Block:
    case ts.SyntaxKind.CaseBlock:
    case ts.SyntaxKind.ParenthesizedExpression:
    case ts.SyntaxKind.ArrayLiteralExpression:
    case ts.SyntaxKind.ObjectLiteralExpression:
    case ts.SyntaxKind.ArrayBindingPattern:
    case ts.SyntaxKind.ObjectBindingPattern:
    case ts.SyntaxKind.CallExpression:
    case ts.SyntaxKind.NewExpression:
    case ts.SyntaxKind.ElementAccessExpression:
    case ts.SyntaxKind.TemplateExpression:
    case ts.SyntaxKind.ArrowFunction:
    case ts.SyntaxKind.FunctionExpression:
    case ts.SyntaxKind.ClassExpression:
    case ts.SyntaxKind.ClassDeclaration:
    case ts.SyntaxKind.PrefixUnaryExpression:
    case ts.SyntaxKind.TypeOfExpression:
    case ts.SyntaxKind.VoidExpression:
    case ts.SyntaxKind.DeleteExpression:
    case ts.SyntaxKind.AwaitExpression:
    case ts.SyntaxKind.YieldExpression:
    case ts.SyntaxKind.SpreadElement:
    case ts.SyntaxKind.ConditionalExpression:
    case ts.SyntaxKind.IfStatement:
    case ts.SyntaxKind.ForStatement:
    case ts.SyntaxKind.ForOfStatement:
    case ts.SyntaxKind.WhileStatement:
    case ts.SyntaxKind.DoStatement:
    case ts.SyntaxKind.LabeledStatement:
    case ts.SyntaxKind.BinaryExpression:
      return 1;
    default:
      return 0;
  }
}

/** The operand at which a chain goes on to the left: parsed in a loop, not by nesting. */
function leftOperand(node: ts.Node): ts.Node | undefined {
  if (ts.isPropertyAccessExpression(node) || ts.isCallExpression(node) || ts.isElementAccessExpression(node))
    return node.expression;
  if (ts.isNonNullExpression(node) || ts.isAsExpression(node) || ts.isPostfixUnaryExpression(node))
    return leftOfPostfix(node);
  if (ts.isBinaryExpression(node)) return node.left;
  return undefined;
}

function leftOfPostfix(node: ts.NonNullExpression | ts.AsExpression | ts.PostfixUnaryExpression): ts.Node {
  return ts.isPostfixUnaryExpression(node) ? node.operand : node.expression;
}

interface Waiting {
  readonly node: ts.Node;
  readonly depth: number;
  readonly chain: number;
  /** Levels of the tree, whatever they weigh. */
  readonly level: number;
}

/**
 * Offset of the first construct that nests deeper than `MAX_NESTING`, or of a chain that is too
 * long; -1 when there is none. Past `MAX_LEVELS` it is the start of the script, as on a host whose stack
 * ended. Walks without recursion.
 */
export function findDeepNode(file: ts.SourceFile): number {
  let deepest = -1;
  const waiting: Waiting[] = [{ node: file, depth: 0, chain: 0, level: 0 }];
  for (let next = waiting.pop(); next !== undefined; next = waiting.pop()) {
    const { node, depth, chain, level } = next;
    if (level > MAX_LEVELS) return 0;
    if (depth > MAX_NESTING || chain > MAX_CHAIN) {
      const start = node.getStart(file);
      if (deepest < 0 || start < deepest) deepest = start;
      // A long chain ends the walk here; what nests is followed, to see how deep it goes.
      if (chain > MAX_CHAIN) continue;
    }
    const left = leftOperand(node);
    const inner = depth + weightOf(node);
    ts.forEachChild(node, (child) => {
      const goesOn = child === left;
      waiting.push({
        node: child,
        depth: goesOn ? depth : inner,
        chain: goesOn ? chain + 1 : 0,
        level: goesOn ? level : level + 1,
      });
    });
  }
  return deepest;
}
