import type * as ts from "typescript";
import type { Problem } from "../engine/model.ts";
import { findBracketFault } from "./brackets.ts";
import { near } from "./near-name.ts";
import { createProblem } from "./problem.ts";
import type { ProblemCode } from "./problems/index.ts";
import { toExcerpt, toRange } from "./ranges.ts";
import type { SentenceValues } from "./sentence.ts";
import { findSyntaxFix } from "./syntax-fixes.ts";
import { NAME_PARAMETERS } from "./words.ts";

/** Codes of the compiler's parser that have words of their own here. */
const UNTERMINATED_TEXT = 1002;
const IDENTIFIER_EXPECTED = 1003;
const SIGN_EXPECTED = 1005;
const INVALID_CHARACTER = 1127;
const STATEMENT_EXPECTED = 1128;
const UNTERMINATED_TEMPLATE = 1160;
const NAME_AFTER_NUMBER = 1351;
const RESERVED_WORD = 1359;
const RESERVED_VARIABLE = 1389;
const UNEXPECTED_WORD = 1434;
const UNKNOWN_KEYWORD = 1435;

const KEYWORDS = [
  "let",
  "const",
  "function",
  "for",
  "if",
  "else",
  "while",
  "return",
  "switch",
  "case",
  "break",
  "class",
  "new",
  "throw",
  "continue",
  "default",
];

/** Words that stand before a bracket and a body. */
const HEADS = ["for", "while", "switch", "if"];

/** Words of TypeScript that can not be names. */
const RESERVED: ReadonlySet<string> = new Set(
  "break case catch class const continue debugger default delete do else enum export extends false finally for function if import in instanceof new null return super switch this throw true try typeof var void while with".split(
    " ",
  ),
);

interface Explanation {
  readonly code: ProblemCode;
  readonly values: SentenceValues;
  readonly start: number;
  readonly end: number;
}

interface Fault {
  readonly text: string;
  readonly code: number;
  /** The parser's words; only its first sign is looked at, to tell one missing sign from another. */
  readonly message: string;
  readonly start: number;
  readonly end: number;
  /** The word or sign at the place. */
  readonly token: string;
  /** The line up to the place, and from it on. */
  readonly before: string;
  readonly after: string;
}

type Explain = (fault: Fault) => Explanation | null;

function here(fault: Fault, code: ProblemCode, values: SentenceValues = {}): Explanation {
  return { code, values, start: fault.start, end: fault.end };
}

const curlyQuotes: Explain = (fault) =>
  fault.code === INVALID_CHARACTER && /^[“”‘’„«»`]/.test(fault.after) ? here(fault, "curly-quotes") : null;

const missingQuote: Explain = (fault) => {
  if (fault.code !== UNTERMINATED_TEXT && fault.code !== UNTERMINATED_TEMPLATE) return null;
  // The parser stops where the text would have to end; the text starts at the last quote before.
  const lineStart = fault.text.lastIndexOf("\n", fault.start - 1) + 1;
  const line = fault.text.slice(lineStart, fault.start);
  if (fault.code === UNTERMINATED_TEMPLATE) {
    const start = fault.text.lastIndexOf("`", fault.start - 1);
    return { code: "missing-quote", values: { quote: "`" }, start: Math.max(0, start), end: fault.start };
  }
  const quoteAt = Math.max(openQuote(line), 0);
  return {
    code: "missing-quote",
    values: { quote: line.charAt(quoteAt) || '"' },
    start: lineStart + quoteAt,
    end: fault.start,
  };
};

/** Offset of the quote that is still open at the end of a line, or -1. */
function openQuote(line: string): number {
  let open = -1;
  for (let i = 0; i < line.length; i++) {
    const char = line.charAt(i);
    if (char === "\\") i++;
    else if (open < 0 && (char === '"' || char === "'")) open = i;
    else if (open >= 0 && char === line.charAt(open)) open = -1;
  }
  return open;
}

const elseAlone: Explain = (fault) =>
  fault.code === STATEMENT_EXPECTED && fault.token === "else" ? here(fault, "else-alone") : null;

const numberFirst: Explain = (fault) => {
  const made = madeName(fault);
  const name = /^\d\w*/.exec(made.text)?.[0];
  if (name !== undefined) return { code: "number-first", values: {}, start: made.at, end: made.at + name.length };
  return fault.code === NAME_AFTER_NUMBER ? here(fault, "number-first") : null;
};

/** What stands where a `let`, `const` or `function` has its name; the parser may point at either. */
function madeName({ before, after, start }: Fault): { readonly text: string; readonly at: number } {
  if (/\b(let|const|function)\s+$/.test(before)) return { text: after, at: start };
  const word = /^(?:let|const|function)\s+/.exec(after)?.[0].length;
  return word === undefined ? { text: "", at: start } : { text: after.slice(word), at: start + word };
}

const reservedName: Explain = (fault) => {
  if (fault.code === RESERVED_WORD || fault.code === RESERVED_VARIABLE)
    return here(fault, "taken-word", { name: fault.token });
  const made = madeName(fault);
  const name = /^\w+/.exec(made.text)?.[0] ?? "";
  return RESERVED.has(name)
    ? { code: "taken-word", values: { name }, start: made.at, end: made.at + name.length }
    : null;
};

const unquotedName: Explain = ({ text, start }) => {
  const lineStart = text.lastIndexOf("\n", start - 1) + 1;
  const [line = ""] = text.slice(lineStart).split("\n");
  for (const found of line.matchAll(/\.(\w+)\(\s*([a-z][\w'-]*(?: [\w'-]+)+)\s*[,)]/gi)) {
    const [whole, word = "", name = ""] = found;
    const parameter = Object.hasOwn(NAME_PARAMETERS, word) ? NAME_PARAMETERS[word] : undefined;
    if (parameter === undefined || parameter.argument !== 0) continue;
    const at = lineStart + found.index + whole.indexOf(name, word.length);
    return { code: "needs-quotes", values: { kind: parameter.kind, name }, start: at, end: at + name.length };
  }
  return null;
};

const splitName: Explain = (fault) => {
  if (fault.code !== SIGN_EXPECTED) return null;
  const made = /\b(?:let|const|function)\s+([\w$]+)\s*$/.exec(fault.before);
  return made !== null && /^[-\w]/.test(fault.after)
    ? { ...here(fault, "name-with-space"), start: fault.start - (made[0].length - made[0].indexOf(made[1] ?? "")) }
    : null;
};

const misspeltKeyword: Explain = (fault) => {
  if (fault.code !== UNEXPECTED_WORD && fault.code !== UNKNOWN_KEYWORD && fault.code !== SIGN_EXPECTED) return null;
  const word = /([A-Za-z]+)\s*$/.exec(fault.before)?.[1];
  const isHere = fault.code !== SIGN_EXPECTED && /^[A-Za-z]/.test(fault.token);
  for (const candidate of isHere ? [fault.token, word] : [word]) {
    if (candidate === undefined || KEYWORDS.includes(candidate)) continue;
    const meant = near(candidate, KEYWORDS);
    if (meant === null) continue;
    const start =
      candidate === fault.token ? fault.start : fault.start - (/([A-Za-z]+)\s*$/.exec(fault.before)?.[0].length ?? 0);
    return { code: "unknown-word", values: { name: candidate, meant }, start, end: start + candidate.length };
  }
  return null;
};

/** `fro (let i = 0; ...) {`: the parser stumbles inside of the brackets, over what is right there. */
const misspeltHead: Explain = ({ text, start }) => {
  const lineStart = text.lastIndexOf("\n", start - 1) + 1;
  const [line = ""] = text.slice(lineStart).split("\n");
  const [, indent = "", word = ""] = /^(\s*)([A-Za-z]+)\s*\(.*\{\s*(?:\/\/.*)?$/.exec(line) ?? [];
  const meant = word === "" || KEYWORDS.includes(word) ? null : near(word, HEADS);
  const at = lineStart + indent.length;
  return meant === null
    ? null
    : { code: "unknown-word", values: { name: word, meant }, start: at, end: at + word.length };
};

const missingName: Explain = (fault) =>
  fault.code === IDENTIFIER_EXPECTED && /\b(let|const|function|class)\s*$|\.\s*$/.test(fault.before)
    ? here(fault, "missing-name")
    : null;

const twoSteps: Explain = (fault) =>
  fault.code === SIGN_EXPECTED && fault.message.startsWith("';'") && fault.before.trim() !== ""
    ? here(fault, "two-steps")
    : null;

const missingComma: Explain = (fault) =>
  fault.code === SIGN_EXPECTED && /^["'`\w]/.test(fault.after) && /["'\w)\]}]\s*$/.test(fault.before)
    ? here(fault, "missing-comma")
    : null;

const EXPLAINERS: readonly Explain[] = [
  curlyQuotes,
  missingQuote,
  elseAlone,
  numberFirst,
  reservedName,
  unquotedName,
  misspeltHead,
];
const AFTER_BRACKETS: readonly Explain[] = [splitName, misspeltKeyword, missingName, twoSteps, missingComma];

/** The first explanation that fits; brackets come between, since a missing one makes the parser stumble anywhere. */
function explain(fault: Fault): Explanation {
  for (const attempt of EXPLAINERS) {
    const found = attempt(fault);
    if (found !== null) return found;
  }
  const bracket = findBracketFault(fault.text);
  if (bracket !== null) {
    const { open, close, what, at } = bracket;
    const line = fault.text.slice(0, at).split("\n").length;
    return {
      code: bracket.kind === "missing" ? "missing-bracket" : "extra-bracket",
      values: { open, close, what, line },
      start: at,
      end: at + 1,
    };
  }
  for (const attempt of AFTER_BRACKETS) {
    const found = attempt(fault);
    if (found !== null) return found;
  }
  return here(fault, "unreadable");
}

/** The first thing that could not be read, in words. `diagnostics` are the parser's, at least one. */
export function explainSyntax(file: ts.SourceFile, diagnostics: readonly ts.DiagnosticWithLocation[]): Problem {
  const { text } = file;
  const first = diagnostics.reduce((a, b) => (b.start < a.start ? b : a));
  const lineStart = text.lastIndexOf("\n", first.start - 1) + 1;
  const [after = ""] = text.slice(first.start).split("\n");
  const details = typeof first.messageText === "string" ? first.messageText : first.messageText.messageText;
  const found = explain({
    text,
    code: first.code,
    message: details,
    start: first.start,
    end: first.start + first.length,
    token: /^(?:\w+|\S)/.exec(after)?.[0] ?? "",
    before: text.slice(lineStart, first.start),
    after,
  });
  const fix = findSyntaxFix(file, found);
  return createProblem(found.code, found.values, {
    range: toRange(file, found.start, found.end),
    excerpt: toExcerpt(text, found.start, found.end),
    details,
    ...(fix && { fix }),
  });
}
