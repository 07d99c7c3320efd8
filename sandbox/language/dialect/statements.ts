import ts from "typescript";
import { ACT_WORDS, CHOOSE_WORDS, GLOBAL_FUNCTIONS, LIGHTS_MEMBERS, SONG_MEMBERS } from "../words.ts";
import type { DialectCheck, DialectContext } from "./report.ts";

/** Lists that are made anew and kept by nobody. */
const NEW_LISTS: ReadonlySet<string> = new Set<string>([
  ...CHOOSE_WORDS,
  "filter",
  "slice",
  "concat",
  "toSorted",
  "toReversed",
]);
/** Methods that were named and not run. */
const METHODS: ReadonlySet<string> = new Set<string>([
  ...LIGHTS_MEMBERS.filter((word) => !["lights", "name", "box", "length"].includes(word)),
  ...SONG_MEMBERS.filter((word) => ["bar", "section", "hits", "notes", "howLoud"].includes(word)),
  "front",
  "side",
  "parts",
  "log",
]);
const ACTS: ReadonlySet<string> = new Set<string>(ACT_WORDS);
/** Words that take steps to run, and at which argument. */
const TAKES_ACTION: { readonly [word: string]: number } = { at: 1, repeat: 1, inTurn: 1 };

/** Statements and conditions that run and do not do what they seem to. */
export const checkSlips: DialectCheck = (node, context) => {
  if (ts.isExpressionStatement(node)) return checkStatement(node.expression, context);
  if (ts.isIfStatement(node) || ts.isWhileStatement(node) || ts.isDoStatement(node)) {
    checkCondition(node.expression, context);
    if (!ts.isDoStatement(node))
      checkEmptyBody(node, ts.isIfStatement(node) ? node.thenStatement : node.statement, context);
  } else if (ts.isForStatement(node)) {
    if (node.condition !== undefined) checkCondition(node.condition, context);
    checkEmptyBody(node, node.statement, context);
  } else if (ts.isForOfStatement(node)) checkEmptyBody(node, node.statement, context);
  else if (ts.isConditionalExpression(node)) checkCondition(node.condition, context);
  else if (ts.isCallExpression(node)) checkCall(node, context);
};

function checkEmptyBody(node: ts.Node, body: ts.Statement, { report }: DialectContext): void {
  if (ts.isEmptyStatement(body)) report("empty-loop", body, { what: ts.isIfStatement(node) ? "`if`" : "loop" });
}

function checkStatement(expression: ts.Expression, context: DialectContext): void {
  const { file, report } = context;
  if (ts.isIdentifier(expression)) {
    const declaration = context.scopes.resolve(expression.text, expression);
    const value = declaration?.value;
    const isFunction =
      declaration === null ? GLOBAL_FUNCTIONS.has(expression.text) : value !== undefined && ts.isFunctionLike(value);
    if (isFunction)
      return report(
        "not-run",
        expression,
        { name: expression.text },
        { node: expression, at: "after", text: "()", label: "Add `()`" },
      );
    if (declaration !== null) report("unused-name", expression, { name: expression.text });
    return;
  }
  if (ts.isPropertyAccessExpression(expression)) {
    const name = expression.name.text;
    if (METHODS.has(name) && !context.ownFields.has(name))
      return report("not-run", expression, { name }, { node: expression, at: "after", text: "()", label: "Add `()`" });
    return;
  }
  if (ts.isCallExpression(expression) && ts.isPropertyAccessExpression(expression.expression)) {
    const name = expression.expression.name.text;
    if (NEW_LISTS.has(name) && !context.ownFields.has(name))
      report("unused-list", expression, { name, example: `const group = ${shorten(expression.getText(file))};` });
    return;
  }
  if (ts.isBinaryExpression(expression) && isCalculation(expression.operatorToken.kind)) {
    const target = ts.isIdentifier(expression.left) ? expression.left.text : "answer";
    report("unused-answer", expression, { example: `${target} = ${shorten(expression.getText(file))};` });
  }
}

const LONGEST_EXAMPLE = 40;

function shorten(text: string): string {
  const line = text.replace(/\s+/g, " ");
  return line.length > LONGEST_EXAMPLE ? `${line.slice(0, LONGEST_EXAMPLE)}...` : line;
}

function isCalculation(operator: ts.SyntaxKind): boolean {
  if (operator >= ts.SyntaxKind.FirstAssignment && operator <= ts.SyntaxKind.LastAssignment) return false;
  return (
    operator !== ts.SyntaxKind.AmpersandAmpersandToken &&
    operator !== ts.SyntaxKind.BarBarToken &&
    operator !== ts.SyntaxKind.QuestionQuestionToken &&
    operator !== ts.SyntaxKind.CommaToken
  );
}

/** `if (turn = 2)`: an assignment where an answer is wanted. */
function checkCondition(condition: ts.Expression, context: DialectContext): void {
  let inner = condition;
  while (ts.isParenthesizedExpression(inner)) inner = inner.expression;
  if (!ts.isBinaryExpression(inner)) return;
  const operator = inner.operatorToken.kind;
  if (operator === ts.SyntaxKind.EqualsToken)
    return context.report(
      "one-equals",
      inner,
      {},
      { node: inner.operatorToken, at: "instead", text: "===", label: "Write `===`" },
    );
  if (operator !== ts.SyntaxKind.AmpersandAmpersandToken && operator !== ts.SyntaxKind.BarBarToken) return;
  checkCondition(inner.left, context);
  checkCondition(inner.right, context);
}

function isGlobalCall(node: ts.CallExpression, word: string, context: DialectContext): boolean {
  return (
    ts.isIdentifier(node.expression) && node.expression.text === word && context.scopes.resolve(word, node) === null
  );
}

function checkCall(node: ts.CallExpression, context: DialectContext): void {
  const [first] = node.arguments;
  if (isGlobalCall(node, "wait", context) && first !== undefined && isPlace(first, context))
    context.report(
      "wait-for-place",
      node,
      {},
      { node: node.expression, at: "instead", text: "waitUntil", label: "Use `waitUntil`" },
    );
  const word = ts.isIdentifier(node.expression)
    ? node.expression.text
    : ts.isPropertyAccessExpression(node.expression)
      ? node.expression.name.text
      : "";
  const place = Object.hasOwn(TAKES_ACTION, word) ? TAKES_ACTION[word] : undefined;
  const action = place === undefined ? undefined : node.arguments[place];
  if (action !== undefined && runsNow(action)) {
    const when = word === "at" && first !== undefined && ts.isNumericLiteral(first) ? `at beat ${first.text}` : "later";
    context.report(
      "ran-too-early",
      action,
      { when },
      { node: action, at: "before", text: "() => ", label: "Put `() =>` in front" },
    );
  }
}

/** A moment of the song where a number of beats is wanted: `wait(chorus.start)`, `wait(song.bar(3))`. */
function isPlace(node: ts.Expression, { ownFields }: DialectContext): boolean {
  if (ts.isPropertyAccessExpression(node))
    return (node.name.text === "start" || node.name.text === "end") && !ownFields.has(node.name.text);
  if (!ts.isCallExpression(node) || !ts.isPropertyAccessExpression(node.expression)) return false;
  const { expression, name } = node.expression;
  return name.text === "bar" && ts.isIdentifier(expression) && expression.text === "song";
}

/** `at(8, all.off())`: an act in the place of steps has run before `at` hears of it. */
function runsNow(node: ts.Expression): boolean {
  if (!ts.isCallExpression(node)) return false;
  if (ts.isIdentifier(node.expression)) return node.expression.text === "wait" || node.expression.text === "waitUntil";
  return ts.isPropertyAccessExpression(node.expression) && ACTS.has(node.expression.name.text);
}
