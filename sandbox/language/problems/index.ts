import type { Entry } from "./entry.ts";
import { DIALECT_PROBLEMS } from "./dialect.ts";
import { NAME_PROBLEMS } from "./names.ts";
import { SYNTAX_PROBLEMS } from "./syntax.ts";
import { TIME_PROBLEMS } from "./time.ts";
import { VALUE_PROBLEMS } from "./values.ts";

const ALL = { ...NAME_PROBLEMS, ...VALUE_PROBLEMS, ...TIME_PROBLEMS, ...SYNTAX_PROBLEMS, ...DIALECT_PROBLEMS };

/** A stable code of a problem. */
export type ProblemCode = keyof typeof ALL;

/** Every problem that stops a script, by its code. */
export const PROBLEMS: { readonly [C in ProblemCode]: Entry } = ALL;
