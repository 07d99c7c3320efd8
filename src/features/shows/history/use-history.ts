import { useCallback, useMemo, useState } from "react";
import { formatAgo } from "../../../lib/format.ts";
import type { AsideCopy } from "../drafts/draft-storage.ts";
import type { DraftStore } from "../drafts/draft-store.ts";
import { joinKeptTexts, type KeptText } from "./kept-text.ts";

/** Where earlier texts come from; the page that owns the API passes it in. */
export interface HistorySource {
  /** What was handed in. */
  readonly versions: readonly KeptText[];
  /** Earlier drafts that the server keeps. */
  readonly listDrafts: () => Promise<readonly KeptText[]>;
  /** The text of a version or an earlier draft. */
  readonly readText: (id: string) => Promise<string>;
}

export interface History {
  /** Versions, drafts, and what was put aside on this computer, newest first. */
  readonly texts: readonly KeptText[];
  /** The server did not answer: its earlier drafts are not in the list. */
  readonly isPartial: boolean;
  /** Reads the list anew. */
  readonly load: () => void;
  readonly readText: (id: string) => Promise<string>;
}

/** Every earlier text of a show that can be reached, from the server and from this computer. */
export function useHistory(store: DraftStore | null, { versions, listDrafts, readText }: HistorySource): History {
  const [drafts, setDrafts] = useState<readonly KeptText[]>([]);
  const [asides, setAsides] = useState<readonly KeptText[]>([]);
  const [copies, setCopies] = useState<ReadonlyMap<string, string>>(new Map());
  const [isPartial, setIsPartial] = useState(false);
  const load = useCallback(() => {
    void store?.listCopies().then(
      (found) => {
        setCopies(new Map(found.map((copy) => [copy.id, copy.source])));
        setAsides(found.map((copy) => presentAside(copy, Date.now())));
      },
      () => setAsides([]),
    );
    listDrafts().then(
      (found) => {
        setDrafts(found);
        setIsPartial(false);
      },
      () => setIsPartial(true),
    );
  }, [store, listDrafts]);
  return useMemo(
    () => ({
      texts: joinKeptTexts(versions, drafts, asides),
      isPartial,
      load,
      readText: (id) => {
        const copy = copies.get(id);
        return copy === undefined ? readText(id) : Promise.resolve(copy);
      },
    }),
    [versions, drafts, asides, copies, isPartial, load, readText],
  );
}

function presentAside({ id, keptAt }: AsideCopy, now: number): KeptText {
  return { id, title: "Put aside on this computer", when: formatAgo(keptAt, now), at: keptAt, by: null, ribbon: null };
}
