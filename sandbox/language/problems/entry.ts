/**
 * One problem or finding in words. `{name}` is filled in; a stretch between `[?` and `?]` is left out
 * when its value is not known. A sentence has 20 words or fewer; a hint is one thing to try.
 */
export interface Entry {
  readonly sentence: string;
  readonly hint: string;
}

/** Keeps the codes of a group as a type. */
export function defineEntries<Code extends string>(entries: { readonly [C in Code]: Entry }): {
  readonly [C in Code]: Entry;
} {
  return entries;
}
