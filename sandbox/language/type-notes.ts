import ts from "typescript";
import type { Problem } from "../engine/model.ts";
import { compileScript } from "./compile.ts";
import { nameKind, nameWantedKind } from "./kind-words.ts";
import type { NameTable } from "./names.ts";
import { TYPE_NOTES, type TypeNoteCode } from "./problems/types.ts";
import { toExcerpt, toRange } from "./ranges.ts";
import { fillSentence, type SentenceValues } from "./sentence.ts";
import { SCRIPT_FILE, type ScriptService } from "./type-check.ts";

/** What the checker complains about where nothing is wrong for us: kinds left open (7000 to 7099). */
const isLeftOut = ({ code }: ts.Diagnostic): boolean => code >= 7000 && code < 7100;

interface Place {
  readonly checker: ts.TypeChecker;
  readonly file: ts.SourceFile;
  readonly node: ts.Node;
  readonly message: string;
}

interface Words {
  readonly code: TypeNoteCode;
  readonly values: SentenceValues;
}

type Explain = (place: Place) => Words;

/**
 * What the type checker notices in a script, in its order; empty when the script has a problem, which
 * comes first. Notes stop nothing: a kind that does not fit shows up in the run as well, with the
 * value that was really there.
 */
export function listTypeNotes(script: ScriptService, names: NameTable): readonly Problem[] {
  const compiled = compileScript(script.text, names);
  if (!compiled.ok) return [];
  // Positions must be those of the text that was asked about, not of its normalised form.
  const program = script.service.getProgram();
  const file = program?.getSourceFile(SCRIPT_FILE);
  if (!program || !file) return [];
  const checker = program.getTypeChecker();
  return script.service
    .getSemanticDiagnostics(SCRIPT_FILE)
    .filter((diagnostic) => !isLeftOut(diagnostic))
    .map((diagnostic) => explain(checker, file, diagnostic));
}

function explain(checker: ts.TypeChecker, file: ts.SourceFile, diagnostic: ts.Diagnostic): Problem {
  const start = diagnostic.start ?? 0;
  const end = start + (diagnostic.length ?? 0);
  const message = ts.flattenDiagnosticMessageText(diagnostic.messageText, " ");
  const node = findNode(file, start, end);
  const { code, values } = (EXPLAINERS[diagnostic.code] ?? notSure)({ checker, file, node, message });
  const entry = TYPE_NOTES[code];
  return {
    code,
    sentence: fillSentence(entry.sentence, values),
    hint: fillSentence(entry.hint, values),
    range: toRange(file, start, end),
    excerpt: toExcerpt(file.text, start, end),
    details: message,
  };
}

/** The largest node that covers just this stretch, or the smallest around it. */
function findNode(file: ts.SourceFile, start: number, end: number): ts.Node {
  let found: ts.Node = file;
  const visit = (node: ts.Node): void => {
    if (node.getStart(file) > start || node.end < end) return;
    if (found.getStart(file) !== start || found.end !== end) found = node;
    ts.forEachChild(node, visit);
  };
  ts.forEachChild(file, visit);
  return found;
}

const words = (code: TypeNoteCode, values: SentenceValues = {}): Words => ({ code, values });
const notSure: Explain = () => words("not-sure");
const kindOf = ({ checker }: Place, node: ts.Node): string => nameKind(checker, checker.getTypeAtLocation(node));

/** The name that is called: `fadeTo` of `square.all.fadeTo(1)`. */
function calledName(call: ts.CallLikeExpression): string | null {
  if (!ts.isCallExpression(call) && !ts.isNewExpression(call)) return null;
  const callee = call.expression;
  if (ts.isIdentifier(callee)) return callee.text;
  return ts.isPropertyAccessExpression(callee) ? callee.name.text : null;
}

function callAround(node: ts.Node): ts.CallExpression | ts.NewExpression | null {
  for (let at: ts.Node = node; !ts.isSourceFile(at); at = at.parent)
    if (ts.isCallExpression(at) || ts.isNewExpression(at)) return at;
  return null;
}

const wrongArgument: Explain = (place) => {
  const { checker, node } = place;
  const call = ts.isExpression(node) ? node.parent : null;
  const wanted = ts.isExpression(node) ? checker.getContextualType(node) : undefined;
  const name = call && (ts.isCallExpression(call) || ts.isNewExpression(call)) ? calledName(call) : null;
  if (!wanted || name === null) return notSure(place);
  return words("wrong-kind", { word: name, wanted: nameWantedKind(checker, wanted), got: kindOf(place, node) });
};

const wrongValue: Explain = (place) => {
  const { checker, node } = place;
  const { parent } = node;
  const isMade = ts.isVariableDeclaration(parent) && parent.name === node && parent.initializer !== undefined;
  const isSet = ts.isBinaryExpression(parent) && parent.left === node;
  const value = isMade ? parent.initializer : isSet ? parent.right : node;
  const wanted =
    isMade || isSet ? checker.getTypeAtLocation(node) : ts.isExpression(node) && checker.getContextualType(node);
  if (!value || !wanted) return notSure(place);
  return words("wrong-kind-here", { wanted: nameWantedKind(checker, wanted), got: kindOf(place, value) });
};

const wrongCount: Explain = (place) => {
  const call = callAround(place.node);
  const name = call && calledName(call);
  const signature = call && place.checker.getResolvedSignature(call);
  if (!call || name === null || !signature) return notSure(place);
  const got = call.arguments?.length ?? 0;
  const parameters = signature.getParameters();
  const least = parameters.filter((parameter) => {
    const declared = parameter.valueDeclaration;
    return (
      !declared ||
      !ts.isParameter(declared) ||
      !(declared.questionToken ?? declared.initializer ?? declared.dotDotDotToken)
    );
  }).length;
  const isShort = got < least;
  const count = isShort ? least : parameters.length;
  return words(isShort ? "too-few-things" : "too-many-things", {
    word: name,
    count,
    things: count === 1 ? "thing" : "things",
    got,
  });
};

const noSuchSkill: Explain = (place) => {
  const { node, message } = place;
  const access = ts.isPropertyAccessExpression(node.parent) ? node.parent : null;
  if (!access) return words("no-such-field", { name: node.getText(place.file) });
  const kind = kindOf(place, access.expression);
  const meant = /Did you mean '([^']+)'/.exec(message)?.[1];
  return words("no-such-skill", {
    owner: kind.startsWith("`") ? "This" : kind.charAt(0).toUpperCase() + kind.slice(1),
    name: node.getText(place.file),
    ...(meant !== undefined && { meant }),
  });
};

/** A function by its name alone, where what it gives was meant: `now < 20`. */
function uncalledName({ checker }: Place, node: ts.Node): string | null {
  const nodes = ts.isBinaryExpression(node) ? [node.left, node.right] : [node];
  const found = nodes.find(
    (one) => ts.isIdentifier(one) && checker.getTypeAtLocation(one).getCallSignatures().length > 0,
  );
  return found !== undefined && ts.isIdentifier(found) ? found.text : null;
}

const notASum: Explain = (place) => {
  const { node } = place;
  const name = uncalledName(place, node);
  if (name !== null) return words("needs-call", { name });
  return words("not-a-sum", { got: ts.isBinaryExpression(node) ? oddOne(place, node) : kindOf(place, node) });
};

const EXPLAINERS: { readonly [code: number]: Explain } = {
  2345: wrongArgument,
  2322: wrongValue,
  2559: wrongArgument,
  2554: wrongCount,
  2555: wrongCount,
  2575: wrongCount,
  2339: noSuchSkill,
  2551: noSuchSkill,
  2349: (place) => words("not-to-run", { got: kindOf(place, place.node) }),
  2348: (place) => words("not-to-run", { got: kindOf(place, place.node) }),
  2362: notASum,
  2363: notASum,
  2365: notASum,
  2356: (place) => words("not-a-sum", { got: kindOf(place, place.node) }),
  2367: () => words("never-the-same"),
  2678: () => words("never-the-same"),
  2531: () => words("maybe-nothing"),
  2532: () => words("maybe-nothing"),
  2533: () => words("maybe-nothing"),
  2721: () => words("maybe-nothing"),
  2722: () => words("maybe-nothing"),
  18047: () => words("maybe-nothing"),
  18048: () => words("maybe-nothing"),
  18049: () => words("maybe-nothing"),
  2454: ({ node, file }) => words("no-value-yet", { name: node.getText(file) }),
  2565: ({ node, file }) => words("no-value-yet", { name: node.getText(file) }),
  2540: () => words("only-to-read"),
  2542: () => words("only-to-read"),
  4104: () => words("only-to-read"),
  2461: (place) => words("wants-list-here", { got: kindOf(place, place.node) }),
  2488: (place) => words("wants-list-here", { got: kindOf(place, place.node) }),
  2495: (place) => words("wants-list-here", { got: kindOf(place, place.node) }),
  2548: (place) => words("wants-list-here", { got: kindOf(place, place.node) }),
  2549: (place) => words("wants-list-here", { got: kindOf(place, place.node) }),
  1345: () => words("no-answer-to-test"),
  2774: () => words("always-so"),
  2801: () => words("always-so"),
  2872: () => words("always-so"),
  2355: () => words("answer-missing"),
  2366: () => words("answer-missing"),
  2353: ({ node, file }) => words("no-such-field", { name: node.getText(file) }),
  2561: ({ node, file }) => words("no-such-field", { name: node.getText(file) }),
  2739: () => words("field-missing"),
  2740: () => words("field-missing"),
  2741: () => words("field-missing"),
};

/** The side of a sum that is no number. */
function oddOne(place: Place, { left, right }: ts.BinaryExpression): string {
  const kind = kindOf(place, left);
  return /^-?\d|^a number/.test(kind) ? kindOf(place, right) : kind;
}
