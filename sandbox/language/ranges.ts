import type * as ts from "typescript";
import type { SourceRange } from "../engine/model.ts";

/** Longest excerpt that still fits beside a sentence. */
const MAX_EXCERPT = 60;

/** Lines and columns (from 1) of a stretch of the script; `end` is exclusive. */
export function toRange(file: ts.SourceFile, start: number, end: number): SourceRange {
  const from = file.getLineAndCharacterOfPosition(start);
  const to = file.getLineAndCharacterOfPosition(Math.max(start, end));
  return { line: from.line + 1, column: from.character + 1, endLine: to.line + 1, endColumn: to.character + 1 };
}

/** The script's text of a stretch: its first line, cut when long. */
export function toExcerpt(text: string, start: number, end: number): string {
  const [line = ""] = text.slice(start, end).split("\n");
  return line.length > MAX_EXCERPT ? `${line.slice(0, MAX_EXCERPT)}...` : line;
}

/** Offset in a text of a line and column, both from 1; inside the text whatever is asked. */
export function toOffset(text: string, line: number, column: number): number {
  let start = 0;
  for (let i = 1; i < line; i++) {
    const next = text.indexOf("\n", start);
    if (next < 0) break;
    start = next + 1;
  }
  return Math.min(text.length, start + Math.max(0, column - 1));
}
