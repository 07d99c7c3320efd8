import { DraftSchema, showsContract } from "../../../shared/contracts/shows.ts";
import type { ShowId } from "../../../shared/ids.ts";
import { ApiProblem, callApi } from "../../lib/api-client.ts";
import type { ServerText } from "./drafts/draft-model.ts";
import type { DraftTransport, SaveAnswer } from "./drafts/draft-transport.ts";

/** How long a hand-in waits for the newest text to be saved. */
const SAVE_WAIT_MS = 20_000;

/** The text that was to be handed in could not be saved in time. */
export class NotSavedError extends Error {
  override readonly name = "NotSavedError";
}

/** Saves drafts of one show over the API, and knows which revision a text was saved as. */
export class DraftSaver implements DraftTransport {
  readonly #showId: ShowId;
  readonly #waiting = new Set<() => void>();
  #saved: ServerText;

  constructor(showId: ShowId, saved: ServerText) {
    this.#showId = showId;
    this.#saved = saved;
  }

  async saveDraft({
    baseRevision,
    source,
    idempotencyKey,
  }: Parameters<DraftTransport["saveDraft"]>[0]): Promise<SaveAnswer> {
    try {
      const { revision } = await callApi(showsContract.saveDraft, {
        params: { showId: this.#showId },
        body: { baseRevision, source },
        idempotencyKey,
      });
      this.#keep({ revision, source });
      return { kind: "saved", revision };
    } catch (error) {
      return toAnswer(error);
    }
  }

  /** The revision that this very text was saved as. Rejects with `NotSavedError` when it is not saved in time. */
  async revisionOf(source: string): Promise<number> {
    const end = Date.now() + SAVE_WAIT_MS;
    while (this.#saved.source !== source) {
      const left = end - Date.now();
      if (left <= 0) throw new NotSavedError("The script is not saved on the server yet.");
      await this.#nextSave(left);
    }
    return this.#saved.revision;
  }

  #nextSave(limitMs: number): Promise<void> {
    return new Promise((resolve) => {
      const done = () => {
        clearTimeout(timer);
        this.#waiting.delete(done);
        resolve();
      };
      const timer = setTimeout(done, limitMs);
      this.#waiting.add(done);
    });
  }

  #keep(saved: ServerText): void {
    this.#saved = saved;
    for (const done of [...this.#waiting]) done();
  }
}

/** A refusal as the draft model understands it; anything that another try may mend is thrown on. */
function toAnswer(error: unknown): SaveAnswer {
  if (!(error instanceof ApiProblem)) throw error;
  if (error.slug === "sign-in-needed") return { kind: "signed-out" };
  if (error.slug === "draft-conflict") {
    const theirs = DraftSchema.parse(error.document?.["draft"]);
    return { kind: "conflict", theirs: { revision: theirs.revision, source: theirs.source } };
  }
  const isForGood = error.status >= 400 && error.status < 500 && error.status !== 429;
  if (isForGood) return { kind: "refused", reason: error.message };
  throw error;
}
