import type * as ts from "typescript";
import type { Problem } from "../engine/model.ts";
import { parserDiagnostics, parseScript } from "./parse.ts";
import type { ProblemCode } from "./problems/index.ts";
import { toRange } from "./ranges.ts";
import type { SentenceValues } from "./sentence.ts";

/** A stretch of the text that something else takes the place of. */
interface Change {
  readonly from: number;
  readonly to: number;
  readonly text: string;
}

/** What could not be read: the code of its problem, and where. */
interface Unread {
  readonly code: ProblemCode;
  readonly values: SentenceValues;
  readonly start: number;
  readonly end: number;
}

const put = (at: number, text: string): Change => ({ from: at, to: at, text });

function lineOf(text: string, at: number): { readonly start: number; readonly end: number } {
  const end = text.indexOf("\n", at);
  return { start: text.lastIndexOf("\n", at - 1) + 1, end: end < 0 ? text.length : end };
}

const indentAt = (text: string, start: number): string => /[ \t]*/.exec(text.slice(start))?.[0] ?? "";

/** Where the code of a line ends: before its semicolon, a comment and blanks. */
function endOfCode(line: string): number {
  return line.replace(/\s*(?:\/\/.*)?$/, "").replace(/;$/, "").length;
}

/** Before the line that steps back as far as the opener's, else at the end of the text. */
function closeBraces(text: string, start: number): Change[] {
  const head = lineOf(text, start);
  const indent = indentAt(text, head.start);
  const isCall = /\(.*=>\s*\{$/.test(text.slice(head.start, start + 1));
  const closers = isCall ? ["});", "}"] : ["}"];
  let at = head.end + 1;
  for (let line = lineOf(text, at); at < text.length; at = line.end + 1, line = lineOf(text, at)) {
    const words = text.slice(line.start, line.end);
    if (words.trim() !== "" && indentAt(text, line.start).length <= indent.length) {
      // A closer of an outer bracket takes it in front: `);` becomes `});`.
      if (/^\s*\)/.test(words)) return [put(line.start + indentAt(text, line.start).length, "}")];
      return closers.map((closer) => put(line.start, `${indent}${closer}\n`));
    }
  }
  const before = text.endsWith("\n") || text === "" ? "" : "\n";
  return closers.map((closer) => put(text.length, `${before}${indent}${closer}\n`));
}

/** In the line of the opener: before what acts on the thing in it, before a body, else at the end. */
function closeRound(text: string, start: number, close: string): Change[] {
  const { end } = lineOf(text, start);
  const rest = text.slice(start, end);
  const places: number[] = [];
  const acts = /^\(\s*(?:"[^"]*"|'[^']*')(?=\.)/.exec(rest);
  if (acts) places.push(acts[0].length);
  const body = /\s*\{\s*(?:\/\/.*)?$/.exec(rest);
  if (body) places.push(body.index);
  places.push(endOfCode(rest));
  return places.map((place) => put(start + place, close));
}

/** After the last word of the text that was begun, before the signs that end its line. */
function closeQuote(text: string, start: number, quote: string): Change[] {
  const { end } = lineOf(text, start);
  const rest = text.slice(start, end);
  const signs = /[\s;)\],]*$/.exec(rest)?.index ?? rest.length;
  const acts = /\)\.\w/.exec(rest)?.index;
  return [...(acts === undefined ? [] : [put(start + acts, quote)]), put(start + signs, quote)];
}

const listChanges: { readonly [Code in ProblemCode]?: (text: string, unread: Unread) => readonly Change[] } = {
  "missing-bracket": (text, { start, values }) =>
    values["open"] === "{" ? closeBraces(text, start) : closeRound(text, start, String(values["close"])),
  "extra-bracket": (_text, { start, end }) => [{ from: start, to: end, text: "" }],
  "missing-quote": (text, { start, values }) => closeQuote(text, start, String(values["quote"])),
  "curly-quotes": (text, { start }) => {
    const { start: from, end: to } = lineOf(text, start);
    return [
      {
        from,
        to,
        text: text
          .slice(from, to)
          .replace(/[“”„«»]/g, '"')
          .replace(/[‘’]/g, "'"),
      },
    ];
  },
  "missing-comma": (text, { start }) => [{ from: text.slice(0, start).trimEnd().length, to: start, text: ", " }],
  "unknown-word": (_text, { start, end, values }) =>
    values["meant"] === undefined ? [] : [{ from: start, to: end, text: String(values["meant"]) }],
};

const LABELS: { readonly [Code in ProblemCode]?: (values: SentenceValues) => string } = {
  "missing-bracket": ({ close }) => `Put the \`${close}\` in`,
  "extra-bracket": ({ close }) => `Take the \`${close}\` away`,
  "missing-quote": () => "Close the quote",
  "curly-quotes": () => "Use straight quotes",
  "missing-comma": () => "Put a comma in",
  "unknown-word": ({ meant }) => `Write \`${meant}\``,
};

/**
 * A change after which the text can be read, for what could not be read; null when there is none that
 * is certain. Costs one parse for each of at most three tries.
 */
export function findSyntaxFix(file: ts.SourceFile, unread: Unread): NonNullable<Problem["fix"]> | null {
  const { text } = file;
  const label = LABELS[unread.code]?.(unread.values);
  const change = listChanges[unread.code]?.(text, unread).find(({ from, to, text: put }) => {
    const changed = text.slice(0, from) + put + text.slice(to);
    return parserDiagnostics(parseScript(changed)).length === 0;
  });
  if (label === undefined || change === undefined) return null;
  return { range: toRange(file, change.from, change.to), text: change.text, label };
}
