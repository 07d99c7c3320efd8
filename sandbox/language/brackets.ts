import ts from "typescript";

/** A bracket that something is wrong with. */
export interface BracketFault {
  readonly kind: "missing" | "extra";
  /** Offset of the bracket that is not closed, or that closes nothing. */
  readonly at: number;
  readonly open: string;
  readonly close: string;
  /** What the missing bracket would end, for the hint. */
  readonly what: string;
}

interface Opener {
  readonly at: number;
  readonly open: string;
  /** Whether it is the head of a `for`, in which `;` is at home. */
  readonly isForHead: boolean;
}

const CLOSERS: { readonly [open: string]: string } = { "(": ")", "[": "]", "{": "}" };
const OPENERS: { readonly [close: string]: string } = { ")": "(", "]": "[", "}": "{" };

interface Token {
  readonly text: string;
  readonly at: number;
  readonly end: number;
}

/** The tokens of a text that may be broken; templates are passed over as far as they can be read. */
function listTokens(text: string): Token[] {
  const tokens: Token[] = [];
  const scanner = ts.createScanner(ts.ScriptTarget.ES2022, true, ts.LanguageVariant.Standard, text);
  const templateDepths: number[] = [];
  let depth = 0;
  for (let kind = scanner.scan(); kind !== ts.SyntaxKind.EndOfFileToken; kind = scanner.scan()) {
    if (kind === ts.SyntaxKind.TemplateHead) {
      templateDepths.push(depth);
      continue;
    }
    if (kind === ts.SyntaxKind.OpenBraceToken) depth++;
    if (kind === ts.SyntaxKind.CloseBraceToken) {
      if (templateDepths.at(-1) === depth) {
        if (scanner.reScanTemplateToken(false) === ts.SyntaxKind.TemplateTail) templateDepths.pop();
        continue;
      }
      depth--;
    }
    tokens.push({ text: scanner.getTokenText(), at: scanner.getTokenStart(), end: scanner.getTokenEnd() });
  }
  return tokens;
}

function lineStart(text: string, at: number): number {
  return text.lastIndexOf("\n", at - 1) + 1;
}

function indentOf(text: string, at: number): number {
  const start = lineStart(text, at);
  return text.slice(start).search(/[^ \t]|$/);
}

function whatEnds(text: string, { at, open }: Opener): string {
  if (open === "[") return "the list";
  const before = text.slice(lineStart(text, at), at);
  if (open === "(") return /\b(if|while|for|switch)\s*$/.test(before) ? "the question" : "the call";
  if (/^\s*(for|while|do)\b/.test(before)) return "the loop";
  if (/\bif\b|\belse\b/.test(before)) return "the `if`";
  return /\bfunction\b|=>/.test(before) ? "the function" : "this part";
}

function missing(text: string, opener: Opener): BracketFault {
  return {
    kind: "missing",
    at: opener.at,
    open: opener.open,
    close: CLOSERS[opener.open] ?? "",
    what: whatEnds(text, opener),
  };
}

/** Of braces left open, the one whose lines step back without a `}`: that is the one that was forgotten. */
function forgottenBrace(text: string, tokens: readonly Token[]): Opener | null {
  const stack: Opener[] = [];
  let previousLine = -1;
  for (const token of tokens) {
    const line = lineStart(text, token.at);
    const isFirst = line !== previousLine;
    previousLine = line;
    if (isFirst && token.text !== "}" && token.text !== ")" && token.text !== "]") {
      const indent = indentOf(text, token.at);
      const stale = stack.findLast(
        (opener) => opener.open === "{" && indentOf(text, opener.at) >= indent && lineStart(text, opener.at) < line,
      );
      if (stale !== undefined) return stale;
    }
    if (token.text === "{") stack.push({ at: token.at, open: "{", isForHead: false });
    else if (token.text === "}") {
      const top = stack.at(-1);
      // A brace that closes further left than its opener stands belongs to an outer one.
      if (top !== undefined && isFirst && indentOf(text, token.at) < indentOf(text, top.at)) return top;
      stack.pop();
    }
  }
  return stack.at(-1) ?? null;
}

/** The first bracket that has no partner, or null when all have. Never throws; one pass. */
export function findBracketFault(text: string): BracketFault | null {
  const tokens = listTokens(text);
  const stack: Opener[] = [];
  let previous = "";
  for (const token of tokens) {
    const top = stack.at(-1);
    if (Object.hasOwn(CLOSERS, token.text))
      stack.push({ at: token.at, open: token.text, isForHead: token.text === "(" && previous === "for" });
    else if (token.text === ";" && top !== undefined && top.open !== "{" && !top.isForHead) return missing(text, top);
    else if (Object.hasOwn(OPENERS, token.text)) {
      if (top === undefined) return extra(token);
      if (top.open !== OPENERS[token.text])
        return missing(text, top.open === "{" ? (forgottenBrace(text, tokens) ?? top) : top);
      stack.pop();
    }
    previous = token.text;
  }
  const last = stack.at(-1);
  if (last === undefined) return null;
  return missing(text, stack.some((opener) => opener.open === "{") ? (forgottenBrace(text, tokens) ?? last) : last);
}

function extra(token: Token): BracketFault {
  return { kind: "extra", at: token.at, open: OPENERS[token.text] ?? "", close: token.text, what: "" };
}
