import { startTransition, useEffect, useState } from "react";
import { useDisposable } from "../../../hooks/use-disposable.ts";
import { createDraftState, type DraftState, type ServerText } from "../drafts/draft-model.ts";
import { createIndexedDbStorage } from "../drafts/draft-storage.ts";
import { createBrowserDraftHost, DraftStore } from "../drafts/draft-store.ts";
import type { DraftTransport } from "../drafts/draft-transport.ts";

export interface DraftSource {
  readonly userId: string;
  readonly showId: string;
  /** What the server has; null when it does not answer. Read once: later it comes as the answer to a save. */
  readonly server: ServerText | null;
  /** What it said some time ago, when it does not answer. */
  readonly remembered: ServerText | null;
  /** When the server saved it, in milliseconds since 1970. */
  readonly savedAt: number | null;
  readonly transport: DraftTransport;
  /** Another value means that somebody signed in again: saves that were refused for that go on. */
  readonly signedInAt: number;
}

export interface OpenDraft {
  /** Null while this computer is being asked for kept text. */
  readonly store: DraftStore | null;
  readonly state: DraftState;
}

const storage = createIndexedDbStorage();
const WRITER_KEY = "duskbell-draft-writer";
const NOTHING = createDraftState({ revision: 0, source: "" });

/** The name under which this tab keeps drafts; a reload keeps it, a second tab has its own. */
function getWriter(): string {
  const known = sessionStorage.getItem(WRITER_KEY);
  if (known) return known;
  const writer = crypto.randomUUID();
  sessionStorage.setItem(WRITER_KEY, writer);
  return writer;
}

/** Opens a show's draft and keeps it saved as long as the caller is on screen. */
export function useDraft({
  userId,
  showId,
  server,
  remembered,
  savedAt,
  transport,
  signedInAt,
}: DraftSource): OpenDraft {
  const store = useDisposable(
    () =>
      new DraftStore({
        key: { userId, showId, writer: getWriter() },
        storage,
        transport,
        host: createBrowserDraftHost(),
      }),
    [userId, showId, transport],
  );
  const [state, setState] = useState(NOTHING);
  const [opened, setOpened] = useState<DraftStore | null>(null);
  useEffect(() => {
    if (!store) return;
    void store.open(server, savedAt, remembered).then(() => {
      setState(store.state);
      setOpened(store);
    });
    const keep = () => void store.flush();
    const resume = () => store.resume();
    document.addEventListener("visibilitychange", keep);
    window.addEventListener("online", resume);
    return () => {
      document.removeEventListener("visibilitychange", keep);
      window.removeEventListener("online", resume);
    };
    // eslint-disable-next-line react-hooks/exhaustive-deps -- what the server had is read once, at opening
  }, [store]);
  useEffect(() => store?.resume(), [store, signedInAt]);
  useEffect(() => {
    if (!store) return;
    const take = () => setState(store.state);
    // Every keystroke comes by here; what the page says about saving may follow a moment later.
    return store.subscribe(() => startTransition(take));
  }, [store]);
  return { store: opened === store ? opened : null, state };
}
