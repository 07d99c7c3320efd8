import type { NameKind } from "./words.ts";

/** The names that a layout, a song and the colours have; in the order in which completion offers them. */
export type NameTable = { readonly [K in NameKind]: readonly string[] };
