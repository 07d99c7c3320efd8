import {
  createDraftState,
  isReadyToSend,
  reduceDraft,
  restoreDraftState,
  type DraftEvent,
  type DraftState,
  type SaveRequest,
  type ServerText,
} from "./draft-model.ts";
import type { AsideCopy, DraftKey, DraftStorage, KeptDraft } from "./draft-storage.ts";
import type { DraftTransport } from "./draft-transport.ts";
import { getRetryDelayMs } from "./retry-delay.ts";

/** An edit is on this computer at most this long after it was made. */
const KEEP_DELAY_MS = 200;
/** Edits are gathered this long before they go to the server. */
const SEND_DELAY_MS = 1500;
/** Texts put aside for one show; the oldest go first. */
const MOST_COPIES = 20;

/** What the store needs from its host; tests pass a clock of their own. */
export interface DraftHost {
  readonly now: () => number;
  readonly random: () => number;
  readonly createKey: () => string;
  readonly setTimer: (run: () => void, ms: number) => () => void;
}

export interface DraftStoreOptions {
  readonly key: DraftKey;
  readonly storage: DraftStorage;
  readonly transport: DraftTransport;
  readonly host: DraftHost;
}

/**
 * Keeps one draft: on this computer first, then on the server, for as long as it takes.
 * Call `open` once, `edit` at every change of the text, `dispose` at the end. Listeners hear every
 * change of the state.
 */
export class DraftStore {
  readonly #options: DraftStoreOptions;
  readonly #listeners = new Set<() => void>();
  readonly #timers = new Map<"keep" | "send" | "retry", () => void>();
  #state: DraftState;
  #isDisposed = false;
  /** Writes to this computer run one after another, so that an older one can not land last. */
  #keeping: Promise<void> = Promise.resolve();

  constructor(options: DraftStoreOptions) {
    this.#options = options;
    this.#state = createDraftState({ revision: 0, source: "" });
  }

  get state(): DraftState {
    return this.#state;
  }

  /**
   * Takes up what the server has and what this computer held back; gives back the text to edit. Without
   * an answer of the server, `remembered` is what it said some time ago: used when nothing was held back.
   */
  async open(
    server: ServerText | null,
    savedAt: number | null = null,
    remembered: ServerText | null = null,
  ): Promise<string> {
    const { key, storage } = this.#options;
    this.#state = createDraftState(server ?? remembered ?? { revision: 0, source: "" }, savedAt);
    try {
      const kept = await storage.listDrafts(key.userId, key.showId);
      kept.sort((a, b) => Number(isUnsaved(b)) - Number(isUnsaved(a)) || b.keptAt - a.keptAt);
      const [latest] = kept;
      if (latest) this.#state = { ...restoreDraftState(latest, server), savedAt };
      if (latest || server) await this.#keepNow();
      // Each text is safe in its new place before its old one is given up. That goes for the one taken up
      // as well: its tab may still be open, and what is typed here is not meant to write over it.
      const others = kept.filter((draft) => draft.writer !== key.writer);
      for (const source of new Set(others.filter(isUnsaved).map((draft) => draft.source))) await this.#putAside(source);
      for (const draft of others) await storage.deleteDraft(draft);
    } catch {
      this.#dispatch({ type: "keeping-failed" });
    }
    this.#notify();
    this.#follow();
    return this.#state.source;
  }

  edit(source: string): void {
    this.#dispatch({ type: "edited", source });
  }

  /** Call after a sign-in, and when the browser says that it is online again. */
  resume(): void {
    this.#dispatch({ type: "session-began" });
    const { sync } = this.#state;
    if (sync.kind === "waiting") this.#retry(sync.request);
  }

  /** Ends "Two versions" with the chosen or merged text; the texts not chosen are put aside. */
  async choose(source: string): Promise<void> {
    const { sync, source: mine } = this.#state;
    if (sync.kind !== "two-versions") return;
    for (const text of [mine, sync.theirs.source]) if (text !== source) await this.#putAside(text);
    this.#dispatch({ type: "chose", source });
  }

  /** Texts that were put aside, newest first. */
  async listCopies(): Promise<AsideCopy[]> {
    const { key, storage } = this.#options;
    const copies = await storage.listCopies(key.userId, key.showId);
    return copies.sort((a, b) => b.keptAt - a.keptAt);
  }

  /** Writes what is still unwritten to this computer; call it when the page is hidden. */
  async flush(): Promise<void> {
    this.#cancel("keep");
    await this.#keepNow();
  }

  subscribe(listener: () => void): () => void {
    this.#listeners.add(listener);
    return () => this.#listeners.delete(listener);
  }

  /** Stops all timers; unwritten text is written first. */
  dispose(): void {
    if (this.#timers.has("keep")) void this.#keepNow();
    this.#isDisposed = true;
    for (const name of [...this.#timers.keys()]) this.#cancel(name);
    this.#listeners.clear();
  }

  #dispatch(event: DraftEvent): void {
    const next = reduceDraft(this.#state, event);
    if (next === this.#state) return;
    const before = this.#state;
    this.#state = next;
    this.#notify();
    const isTextMoved = next.source !== before.source || next.base !== before.base || next.sync !== before.sync;
    if (isTextMoved && !this.#isDisposed) this.#start("keep", KEEP_DELAY_MS, () => void this.#keepNow());
    this.#follow();
  }

  /** Does what the state asks for. */
  #follow(): void {
    if (this.#isDisposed) return;
    const { sync } = this.#state;
    if (isReadyToSend(this.#state)) this.#start("send", SEND_DELAY_MS, () => this.#send());
    if (sync.kind === "waiting")
      this.#start("retry", getRetryDelayMs(sync.attempt, this.#options.host.random), () => this.#retry(sync.request));
  }

  #send(): void {
    const idempotencyKey = this.#options.host.createKey();
    this.#dispatch({ type: "sent", idempotencyKey });
    const { sync } = this.#state;
    if (sync.kind === "sending" && sync.request.idempotencyKey === idempotencyKey) void this.#ask(sync.request);
  }

  #retry(request: SaveRequest): void {
    this.#cancel("retry");
    const before = this.#state;
    this.#dispatch({ type: "retried", idempotencyKey: request.idempotencyKey });
    if (this.#state !== before) void this.#ask(request);
  }

  async #ask(request: SaveRequest): Promise<void> {
    const { transport, key, host } = this.#options;
    const { idempotencyKey } = request;
    // The request is on this computer before it leaves: after a crash it can be repeated with its key.
    await this.#keepNow();
    try {
      const answer = await transport.saveDraft({ ...request, showId: key.showId });
      if (answer.kind === "saved")
        this.#dispatch({ type: "saved", idempotencyKey, revision: answer.revision, at: host.now() });
      else if (answer.kind === "conflict")
        this.#dispatch({ type: "conflicted", idempotencyKey, theirs: answer.theirs });
      else if (answer.kind === "signed-out") this.#dispatch({ type: "session-ended", idempotencyKey });
      else this.#dispatch({ type: "refused", idempotencyKey, reason: answer.reason });
    } catch {
      this.#dispatch({ type: "unanswered", idempotencyKey });
    }
  }

  #keepNow(): Promise<void> {
    this.#keeping = this.#keeping.then(() => this.#keepOnce());
    return this.#keeping;
  }

  async #keepOnce(): Promise<void> {
    const { key, storage, host } = this.#options;
    const { source, base, sync, edit } = this.#state;
    const request = "request" in sync ? sync.request : null;
    try {
      // Saved text stays here too: it is what the studio opens with when there is no network.
      await storage.putDraft({ ...key, source, base, request, keptAt: host.now() });
      this.#dispatch({ type: "kept", edit });
    } catch {
      this.#dispatch({ type: "keeping-failed" });
    }
  }

  async #putAside(source: string): Promise<void> {
    const { key, storage, host } = this.#options;
    const { userId, showId } = key;
    await storage.putCopy({ id: host.createKey(), userId, showId, source, keptAt: host.now() });
    for (const copy of (await this.listCopies()).slice(MOST_COPIES)) await storage.deleteCopy(copy.id);
  }

  #start(name: "keep" | "send" | "retry", ms: number, run: () => void): void {
    if (this.#timers.has(name)) return;
    const stop = this.#options.host.setTimer(() => {
      this.#timers.delete(name);
      if (!this.#isDisposed) run();
    }, ms);
    this.#timers.set(name, stop);
  }

  #cancel(name: "keep" | "send" | "retry"): void {
    this.#timers.get(name)?.();
    this.#timers.delete(name);
  }

  #notify(): void {
    for (const listener of this.#listeners) listener();
  }
}

function isUnsaved(draft: KeptDraft): boolean {
  return draft.request !== null || draft.source !== draft.base.source;
}

/** The browser as a host. */
export function createBrowserDraftHost(): DraftHost {
  return {
    now: () => Date.now(),
    random: () => Math.random(),
    createKey: () => crypto.randomUUID(),
    setTimer: (run, ms) => {
      const id = setTimeout(run, ms);
      return () => clearTimeout(id);
    },
  };
}
