import type { SaveRequest, ServerText } from "./draft-model.ts";

/** The server's answer to one save. A lost answer is a rejected promise. */
export type SaveAnswer =
  | { readonly kind: "saved"; readonly revision: number }
  | { readonly kind: "conflict"; readonly theirs: ServerText }
  | { readonly kind: "signed-out" }
  /** For good: too long, no longer yours. `reason` is a sentence for the author. */
  | { readonly kind: "refused"; readonly reason: string };

/** How a draft reaches the server. The page that owns the API passes it in. */
export interface DraftTransport {
  saveDraft(request: SaveRequest & { readonly showId: string }): Promise<SaveAnswer>;
}
