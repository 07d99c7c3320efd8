import type * as ts from "typescript";
import type { Problem } from "../engine/model.ts";
import { createProblem } from "./problem.ts";
import { toExcerpt, toRange } from "./ranges.ts";

/** The first thing that could not be read, in words. */
export function explainSyntax(file: ts.SourceFile, diagnostics: readonly ts.DiagnosticWithLocation[]): Problem {
  const first = diagnostics[0];
  const start = first?.start ?? 0;
  const end = start + (first?.length ?? 0);
  const details = typeof first?.messageText === "string" ? first.messageText : first?.messageText.messageText;
  return createProblem("unreadable", {}, { range: toRange(file, start, end), excerpt: toExcerpt(file.text, start, end), details });
}
