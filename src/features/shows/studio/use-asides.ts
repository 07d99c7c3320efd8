import { useCallback, useMemo, useState } from "react";
import { formatAgo } from "../../../lib/format.ts";
import type { AsideCopy } from "../drafts/draft-storage.ts";
import type { DraftStore } from "../drafts/draft-store.ts";
import type { StudioVersion } from "./save-menu.tsx";

export interface Asides {
  readonly versions: readonly StudioVersion[];
  /** Reads the list anew; nothing is shown when this computer can not. */
  readonly load: () => void;
  /** The text of one of them, or else of a version that the server keeps. */
  readonly readSource: (id: string) => Promise<string>;
}

/** The texts of a draft that were put aside on this computer, to be looked at like versions. */
export function useAsides(store: DraftStore | null, readVersion: (versionId: string) => Promise<string>): Asides {
  const [copies, setCopies] = useState<readonly AsideCopy[]>([]);
  const [loadedAt, setLoadedAt] = useState(0);
  const load = useCallback(() => {
    setLoadedAt(Date.now());
    store?.listCopies().then(setCopies, () => setCopies([]));
  }, [store]);
  return useMemo(
    () => ({
      versions: copies.map((copy) => ({
        id: copy.id,
        title: "Put aside",
        when: formatAgo(copy.keptAt, loadedAt),
        ribbon: null,
      })),
      load,
      readSource: (id) => {
        const copy = copies.find((candidate) => candidate.id === id);
        return copy ? Promise.resolve(copy.source) : readVersion(id);
      },
    }),
    [copies, loadedAt, load, readVersion],
  );
}
