import ts from "typescript";
import { blankSourceFile } from "ts-blank-space";

/** A script as a tree, its nodes with parents; types still in it. Throws `RangeError` when the parser runs out of stack. */
export function parseScript(text: string): ts.SourceFile {
  return ts.createSourceFile("script.ts", text, ts.ScriptTarget.ES2022, true, ts.ScriptKind.TS);
}

/** What the parser could not read. The compiler keeps these in a field that its types do not name. */
export function parserDiagnostics(file: ts.SourceFile): readonly ts.DiagnosticWithLocation[] {
  return (
    (file as unknown as { readonly parseDiagnostics?: readonly ts.DiagnosticWithLocation[] }).parseDiagnostics ?? []
  );
}

/** The text without types: blanks stand in their place, so that lines and columns stay exact. */
export function stripTypes(file: ts.SourceFile): string {
  return blankSourceFile(file, () => {
    // What can not be blanked (enum, namespace, parameter properties) is refused by the dialect check.
  });
}
