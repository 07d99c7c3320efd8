import type { Mark } from "../../../../shared/contracts/marking.ts";
import type { Levels } from "./rubric.ts";

export interface MarkText {
  readonly levels: Levels;
  readonly note: string;
}

/** saved: the server holds it. waiting: about to be sent. retrying: kept on this computer, sent again soon. refused: the server said no. */
export type MarkSave =
  | { readonly kind: "saved" | "waiting" | "sending" | "retrying" }
  | { readonly kind: "refused"; readonly reason: string };

export interface MarkDraftState {
  readonly text: MarkText;
  readonly save: MarkSave;
}

export interface MarkDraftDeps {
  /** Sends the text; rejects with an error whose `status` is 400 to 499 when the server refuses it. */
  readonly send: (text: MarkText) => Promise<Mark>;
  readonly onSaved: (mark: Mark) => void;
  /** Where unsent text outlives the tab. */
  readonly storage: Pick<Storage, "getItem" | "setItem" | "removeItem">;
  readonly storageKey: string;
}

const REST_MS = 600;
const RETRY_MS = [2_000, 5_000, 15_000, 30_000];

/**
 * The mark that a teacher is writing for one submission. Every change is kept on this computer at
 * once and sent when the typing rests; it lives outside the page, so that going to the next show
 * never loses one. Text that was not sent when the tab died is taken up at the next opening.
 */
export class MarkDraft {
  #deps: MarkDraftDeps;
  #state: MarkDraftState;
  #listeners = new Set<() => void>();
  #timer: ReturnType<typeof setTimeout> | undefined;
  #failures = 0;
  #sending: Promise<void> | null = null;

  constructor(saved: MarkText, deps: MarkDraftDeps) {
    this.#deps = deps;
    const kept = readKept(deps);
    this.#state =
      kept && !isSame(kept, saved)
        ? { text: kept, save: { kind: "waiting" } }
        : { text: saved, save: { kind: "saved" } };
    if (this.#state.save.kind === "waiting") this.#sendAfter(0);
    else this.#forget();
  }

  readonly getState = (): MarkDraftState => this.#state;

  readonly subscribe = (listener: () => void): (() => void) => {
    this.#listeners.add(listener);
    return () => this.#listeners.delete(listener);
  };

  setLevel(criterionId: string, level: number): void {
    this.#write({ ...this.#state.text, levels: { ...this.#state.text.levels, [criterionId]: level } });
  }

  setNote(note: string): void {
    this.#write({ ...this.#state.text, note });
  }

  /** Takes over what the server holds now, unless there is unsent text. */
  adopt(saved: MarkText): void {
    if (this.#state.save.kind === "saved" && !isSame(saved, this.#state.text))
      this.#set({ text: saved, save: { kind: "saved" } });
  }

  /** Sends at once what is not sent; resolves to whether the server holds everything. */
  async flush(): Promise<boolean> {
    if (this.#state.save.kind !== "saved") await this.#send();
    return this.getState().save.kind === "saved";
  }

  #write(text: MarkText): void {
    this.#set({ text, save: { kind: "waiting" } });
    try {
      this.#deps.storage.setItem(this.#deps.storageKey, JSON.stringify(text));
    } catch {
      // A full or forbidden storage only costs the copy on this computer; the server still gets the text.
    }
    this.#failures = 0;
    this.#sendAfter(REST_MS);
  }

  #sendAfter(delayMs: number): void {
    clearTimeout(this.#timer);
    this.#timer = setTimeout(() => void this.#send(), delayMs);
  }

  async #send(): Promise<void> {
    clearTimeout(this.#timer);
    // One at a time, so that an older text can not arrive after a newer one.
    if (this.#sending) await this.#sending;
    if (this.#state.save.kind === "saved") return;
    this.#sending = this.#sendOnce().finally(() => {
      this.#sending = null;
    });
    await this.#sending;
  }

  async #sendOnce(): Promise<void> {
    const { text } = this.#state;
    this.#set({ text, save: { kind: "sending" } });
    try {
      const mark = await this.#deps.send(text);
      this.#failures = 0;
      this.#deps.onSaved(mark);
      if (this.#state.text === text) {
        this.#forget();
        this.#set({ text, save: { kind: "saved" } });
      }
    } catch (error) {
      const refusal = readRefusal(error);
      if (this.#state.text !== text) return;
      if (refusal !== null) {
        this.#set({ text, save: { kind: "refused", reason: refusal } });
        return;
      }
      this.#set({ text, save: { kind: "retrying" } });
      this.#sendAfter(RETRY_MS[Math.min(this.#failures, RETRY_MS.length - 1)] ?? 0);
      this.#failures += 1;
    }
  }

  #forget(): void {
    try {
      this.#deps.storage.removeItem(this.#deps.storageKey);
    } catch {
      // See #write.
    }
  }

  #set(state: MarkDraftState): void {
    this.#state = state;
    for (const listener of this.#listeners) listener();
  }
}

function isSame(a: MarkText, b: MarkText): boolean {
  const levels = new Set([...Object.keys(a.levels), ...Object.keys(b.levels)]);
  return a.note === b.note && [...levels].every((id) => a.levels[id] === b.levels[id]);
}

function readKept({ storage, storageKey }: MarkDraftDeps): MarkText | null {
  try {
    const kept: unknown = JSON.parse(storage.getItem(storageKey) ?? "null");
    return isMarkText(kept) ? kept : null;
  } catch {
    return null;
  }
}

function isMarkText(value: unknown): value is MarkText {
  if (typeof value !== "object" || value === null || !("note" in value) || !("levels" in value)) return false;
  const { note, levels } = value;
  return (
    typeof note === "string" &&
    typeof levels === "object" &&
    levels !== null &&
    Object.values(levels).every((level) => typeof level === "number")
  );
}

/** The server's reason when it refused (a retry would be refused again); null when it was not reached or broke. */
function readRefusal(error: unknown): string | null {
  const status = error instanceof Error && "status" in error ? error.status : null;
  return typeof status === "number" && status >= 400 && status < 500 && status !== 401 && status !== 429
    ? (error as Error).message
    : null;
}

/** The save state in words, always shown. */
export function presentSave(save: MarkSave): { readonly text: string; readonly isCareful: boolean } {
  switch (save.kind) {
    case "saved":
      return { text: "Saved. Only you see it.", isCareful: false };
    case "waiting":
    case "sending":
      return { text: "Saving", isCareful: false };
    case "retrying":
      return {
        text: "Only on this computer. The server does not answer; it is sent again by itself.",
        isCareful: true,
      };
    case "refused":
      return { text: `Not saved: ${save.reason}`, isCareful: true };
  }
}
