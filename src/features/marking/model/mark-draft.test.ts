import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import type { Mark } from "../../../../shared/contracts/marking.ts";
import { MarkDraft, type MarkText } from "./mark-draft.ts";

const EMPTY: MarkText = { levels: {}, note: "" };
const KEY = "mark";

class Refusal extends Error {
  readonly status = 409;
}

const accept = () => Promise.resolve();

function buildStorage(): Pick<Storage, "getItem" | "setItem" | "removeItem"> {
  const kept = new Map<string, string>();
  return {
    getItem: (key) => kept.get(key) ?? null,
    setItem: (key, value) => void kept.set(key, value),
    removeItem: (key) => void kept.delete(key),
  };
}

function buildDraft(send: (text: MarkText) => Promise<void>, saved = EMPTY, storage = buildStorage()) {
  const onSaved = vi.fn();
  const sent: MarkText[] = [];
  const draft = new MarkDraft(saved, {
    storage,
    storageKey: KEY,
    onSaved,
    send: async (text): Promise<Mark> => {
      sent.push(text);
      await send(text);
      return { levels: { ...text.levels }, note: text.note, got: 0, of: 4, isReleased: false };
    },
  });
  return { draft, sent, storage, onSaved };
}

describe("MarkDraft", () => {
  beforeEach(() => {
    vi.useFakeTimers();
  });
  afterEach(() => {
    vi.useRealTimers();
  });

  it("sends once when the typing rests, and then says saved", async () => {
    const { draft, sent, onSaved, storage } = buildDraft(accept);
    draft.setLevel("song", 3);
    draft.setNote("The foxes run.");
    expect(draft.getState().save.kind).toBe("waiting");
    expect(storage.getItem(KEY)).toContain("The foxes run.");
    await vi.advanceTimersByTimeAsync(700);
    expect(sent).toEqual([{ levels: { song: 3 }, note: "The foxes run." }]);
    expect(draft.getState().save.kind).toBe("saved");
    expect(onSaved).toHaveBeenCalledTimes(1);
    expect(storage.getItem(KEY)).toBeNull();
  });

  it("keeps the text on this computer and tries again while the server does not answer", async () => {
    let isDown = true;
    const { draft, sent, storage } = buildDraft(() => (isDown ? Promise.reject(new Error("offline")) : accept()));
    draft.setLevel("song", 2);
    await vi.advanceTimersByTimeAsync(700);
    expect(draft.getState().save.kind).toBe("retrying");
    expect(storage.getItem(KEY)).not.toBeNull();
    isDown = false;
    await vi.advanceTimersByTimeAsync(2_500);
    expect(sent).toHaveLength(2);
    expect(draft.getState().save.kind).toBe("saved");
  });

  it("says why when the server refuses, and does not ask again", async () => {
    const { draft, sent } = buildDraft(() => Promise.reject(new Refusal("The mark is released.")));
    draft.setLevel("song", 2);
    await vi.advanceTimersByTimeAsync(60_000);
    expect(sent).toHaveLength(1);
    expect(draft.getState().save).toEqual({ kind: "refused", reason: "The mark is released." });
  });

  it("sends what was typed while an older text was on its way", async () => {
    let finish = () => {};
    const { draft, sent } = buildDraft(() => new Promise<void>((resolve) => (finish = resolve)));
    draft.setNote("a");
    await vi.advanceTimersByTimeAsync(700);
    draft.setNote("ab");
    finish();
    await vi.advanceTimersByTimeAsync(700);
    finish();
    await vi.advanceTimersByTimeAsync(0);
    expect(sent.map((text) => text.note)).toEqual(["a", "ab"]);
    expect(draft.getState()).toMatchObject({ text: { note: "ab" }, save: { kind: "saved" } });
  });

  it("takes up text that was never sent", async () => {
    const storage = buildStorage();
    storage.setItem(KEY, JSON.stringify({ levels: { song: 4 }, note: "late" }));
    const { draft, sent } = buildDraft(accept, EMPTY, storage);
    expect(draft.getState().text.note).toBe("late");
    await vi.advanceTimersByTimeAsync(10);
    expect(sent).toHaveLength(1);
  });

  it("flushes at once and tells whether all is saved", async () => {
    const { draft } = buildDraft(accept);
    draft.setNote("now");
    await expect(draft.flush()).resolves.toBe(true);
    const down = buildDraft(() => Promise.reject(new Error("offline")));
    down.draft.setNote("now");
    await expect(down.draft.flush()).resolves.toBe(false);
  });

  it("adopts the server's mark only while nothing is unsent", () => {
    const { draft } = buildDraft(accept);
    draft.adopt({ levels: { song: 1 }, note: "" });
    expect(draft.getState().text.levels).toEqual({ song: 1 });
    draft.setNote("mine");
    draft.adopt({ levels: { song: 4 }, note: "theirs" });
    expect(draft.getState().text).toEqual({ levels: { song: 1 }, note: "mine" });
  });
});
