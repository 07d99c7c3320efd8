import { openDB, type DBSchema, type IDBPDatabase } from "idb";
import { ApiProblem } from "./api-client.ts";

/** What was read of the server and is of use without it. One person's at a time. */
interface ShelfDatabase extends DBSchema {
  answers: { key: string; value: { readonly answer: unknown; readonly keptAt: number } };
}

let opened: Promise<IDBPDatabase<ShelfDatabase>> | null = null;

function openShelf(): Promise<IDBPDatabase<ShelfDatabase>> {
  opened ??= openDB<ShelfDatabase>("duskbell-shelf", 1, {
    upgrade: (database) => void database.createObjectStore("answers"),
  });
  opened.catch(() => (opened = null));
  return opened;
}

/** An answer, from the server or from the shelf. */
export type Shelved<T> = T & {
  /** Given when it comes from the shelf: when the server said so, in milliseconds since 1970. */
  readonly keptAt?: number;
};

/**
 * The server's answer, which is kept on this computer; without an answer what was kept last. Rejects
 * like `ask` for any other refusal, and when nothing was kept. `answer` is an object of JSON.
 */
export async function askOrRecall<T extends object>(key: string, ask: () => Promise<T>): Promise<Shelved<T>> {
  try {
    const answer = await ask();
    // Storage may be full or switched off: then there is only the network.
    void openShelf()
      .then((shelf) => shelf.put("answers", { answer, keptAt: Date.now() }, key))
      .catch(() => undefined);
    return answer;
  } catch (error) {
    if (!(error instanceof ApiProblem) || error.slug !== "offline") throw error;
    const kept = await openShelf()
      .then((shelf) => shelf.get("answers", key))
      .catch(() => undefined);
    if (!kept) throw error;
    return { ...(kept.answer as T), keptAt: kept.keptAt };
  }
}

/** Forgets everything: somebody signed out, or another person signed in. */
export async function clearShelf(): Promise<void> {
  await openShelf()
    .then((shelf) => shelf.clear("answers"))
    .catch(() => undefined);
}
