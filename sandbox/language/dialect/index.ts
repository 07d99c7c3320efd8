import type ts from "typescript";
import type { Problem } from "../../engine/model.ts";
import type { NameTable } from "../names.ts";
import { readScopes } from "../scope.ts";
import { checkForbidden } from "./forbidden.ts";
import { checkMembers } from "./members.ts";
import { checkNames } from "./name-literals.ts";
import { runChecks } from "./report.ts";
import { checkSlips } from "./statements.ts";
import { checkVariables } from "./variables.ts";

/**
 * The first problem that the text of a script gives away, or null: TypeScript that the language does
 * without, words that are not known, and slips that would run and do nothing.
 */
export function checkDialect(file: ts.SourceFile, names: NameTable | null): Problem | null {
  return runChecks(file, readScopes(file), names, [
    checkForbidden,
    checkVariables,
    checkMembers,
    checkNames,
    checkSlips,
  ]);
}
