import { openDB, type DBSchema, type IDBPDatabase } from "idb";
import type { SaveRequest, ServerText } from "./draft-model.ts";

/** Whose draft of what. `writer` is one browser tab: two tabs never write over each other. */
export interface DraftKey {
  readonly userId: string;
  readonly showId: string;
  readonly writer: string;
}

/** What this computer keeps of a draft, saved or not. */
export interface KeptDraft extends DraftKey {
  readonly source: string;
  readonly base: ServerText;
  /** A save whose answer never came; it is repeated first. */
  readonly request: SaveRequest | null;
  readonly keptAt: number;
}

/** A text that was put aside when another one was chosen, so that no choice is final. */
export interface AsideCopy {
  readonly id: string;
  readonly userId: string;
  readonly showId: string;
  readonly source: string;
  readonly keptAt: number;
}

/** Where drafts are kept on this computer. Every call may fail: storage can be full or switched off. */
export interface DraftStorage {
  putDraft(draft: KeptDraft): Promise<void>;
  deleteDraft(key: DraftKey): Promise<void>;
  listDrafts(userId: string, showId: string): Promise<KeptDraft[]>;
  putCopy(copy: AsideCopy): Promise<void>;
  listCopies(userId: string, showId: string): Promise<AsideCopy[]>;
  deleteCopy(id: string): Promise<void>;
}

interface DraftDatabase extends DBSchema {
  drafts: { key: [string, string, string]; value: KeptDraft; indexes: { show: [string, string] } };
  copies: { key: string; value: AsideCopy; indexes: { show: [string, string] } };
}

/** The storage in IndexedDB; the database is opened at the first use and shared by all drafts. */
export function createIndexedDbStorage(name = "duskbell-drafts"): DraftStorage {
  let opened: Promise<IDBPDatabase<DraftDatabase>> | null = null;
  const open = () => {
    opened ??= openDraftDatabase(name).catch((error: unknown) => {
      opened = null;
      throw error;
    });
    return opened;
  };
  return {
    putDraft: async (draft) => void (await (await open()).put("drafts", draft)),
    deleteDraft: async ({ userId, showId, writer }) => (await open()).delete("drafts", [userId, showId, writer]),
    listDrafts: async (userId, showId) => (await open()).getAllFromIndex("drafts", "show", [userId, showId]),
    putCopy: async (copy) => void (await (await open()).put("copies", copy)),
    listCopies: async (userId, showId) => (await open()).getAllFromIndex("copies", "show", [userId, showId]),
    deleteCopy: async (id) => (await open()).delete("copies", id),
  };
}

function openDraftDatabase(name: string): Promise<IDBPDatabase<DraftDatabase>> {
  return openDB<DraftDatabase>(name, 1, {
    upgrade(database) {
      const drafts = database.createObjectStore("drafts", { keyPath: ["userId", "showId", "writer"] });
      drafts.createIndex("show", ["userId", "showId"]);
      const copies = database.createObjectStore("copies", { keyPath: "id" });
      copies.createIndex("show", ["userId", "showId"]);
    },
  });
}
