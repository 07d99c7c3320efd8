import type ts from "typescript";
import type { Problem } from "../../engine/model.ts";
import type { NameTable } from "../names.ts";

/** The first problem that the text alone gives away, or null. */
export function checkDialect(_file: ts.SourceFile, _names: NameTable | null): Problem | null {
  return null;
}
