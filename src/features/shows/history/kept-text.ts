import type { RibbonCells } from "../../../../sandbox/timeline/ribbon.ts";

/** An earlier text of a show, as lists show it. */
export interface KeptText {
  readonly id: string;
  /** "Version 3", "Draft", "Put aside on this computer" */
  readonly title: string;
  /** "today 10:14" */
  readonly when: string;
  /** The same in milliseconds since 1970, to sort by. */
  readonly at: number;
  /** Who wrote it, where that is not clear from the show. */
  readonly by: string | null;
  /** Null where it did not run, or nobody has run it. */
  readonly ribbon: RibbonCells | null;
}

/** Several lists as one, newest first; of two with one id the first list's. */
export function joinKeptTexts(...lists: readonly (readonly KeptText[])[]): readonly KeptText[] {
  const byId = new Map<string, KeptText>();
  for (const text of lists.flat()) if (!byId.has(text.id)) byId.set(text.id, text);
  return [...byId.values()].sort((a, b) => b.at - a.at);
}

/** "Draft, today 10:14" */
export function presentKeptText({ title, when, by }: KeptText): string {
  return `${title}, ${when}${by ? `, ${by}` : ""}`;
}
