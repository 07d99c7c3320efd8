import { describe, expect, it } from "vitest";
import {
  createDraftState,
  hasUnsavedText,
  reduceDraft,
  restoreDraftState,
  type DraftEvent,
  type DraftState,
  type SaveRequest,
} from "./draft-model.ts";
import { getRetryDelayMs } from "./retry-delay.ts";
import { presentSaveStatus } from "./save-status.ts";

const base = { revision: 4, source: "square.all.on();" };

function play(...events: DraftEvent[]): DraftState {
  return events.reduce(reduceDraft, createDraftState(base, 1000));
}

const edited = (source: string): DraftEvent => ({ type: "edited", source });
const sent = (idempotencyKey: string): DraftEvent => ({ type: "sent", idempotencyKey });

describe("reduceDraft", () => {
  it("sends the text of that moment on the revision it was made from", () => {
    const state = play(edited("a"), sent("k1"));
    expect(state.sync).toEqual({
      kind: "sending",
      attempt: 0,
      request: { idempotencyKey: "k1", baseRevision: 4, source: "a" },
    });
  });

  it("stays unsaved when the answer covers an older text", () => {
    const state = play(edited("a"), sent("k1"), edited("ab"), {
      type: "saved",
      idempotencyKey: "k1",
      revision: 5,
      at: 9,
    });
    expect(state.base).toEqual({ revision: 5, source: "a" });
    expect(state.source).toBe("ab");
    expect(hasUnsavedText(state)).toBe(true);
  });

  it("repeats an unanswered save unchanged, even after more typing", () => {
    const state = play(edited("a"), sent("k1"), { type: "unanswered", idempotencyKey: "k1" }, edited("ab"), {
      type: "retried",
      idempotencyKey: "k1",
    });
    expect(state.sync.kind === "sending" && state.sync.request.source).toBe("a");
    expect(state.source).toBe("ab");
  });

  it("ignores an answer to a save that is no longer under way", () => {
    const state = play(edited("a"), sent("k1"), { type: "saved", idempotencyKey: "k1", revision: 5, at: 9 });
    expect(reduceDraft(state, { type: "unanswered", idempotencyKey: "k1" })).toBe(state);
    expect(reduceDraft(state, { type: "saved", idempotencyKey: "k0", revision: 2, at: 9 })).toBe(state);
  });

  it("keeps both texts at a conflict and saves the chosen one on top of theirs", () => {
    const theirs = { revision: 7, source: "theirs" };
    const asked = play(edited("mine"), sent("k1"), { type: "conflicted", idempotencyKey: "k1", theirs });
    expect(asked.sync).toEqual({ kind: "two-versions", theirs });
    expect(asked.source).toBe("mine");
    const chosen = reduceDraft(asked, { type: "chose", source: "mine" });
    const again = reduceDraft(chosen, sent("k2"));
    expect(again.sync.kind === "sending" && again.sync.request.baseRevision).toBe(7);
  });

  it("sees no conflict when the other text is the same", () => {
    const state = play(edited("same"), sent("k1"), {
      type: "conflicted",
      idempotencyKey: "k1",
      theirs: { revision: 7, source: "same" },
    });
    expect(hasUnsavedText(state)).toBe(false);
    expect(state.base.revision).toBe(7);
  });

  it("holds the save while signed out and repeats it after signing in", () => {
    const out = play(edited("a"), sent("k1"), { type: "session-ended", idempotencyKey: "k1" });
    expect(reduceDraft(out, sent("k2"))).toBe(out);
    const back = reduceDraft(out, { type: "session-began" });
    expect(back.sync.kind === "waiting" && back.sync.request.idempotencyKey).toBe("k1");
  });

  it("tries again after a refusal only when the text changes", () => {
    const refused = play(edited("long"), sent("k1"), { type: "refused", idempotencyKey: "k1", reason: "Too long." });
    expect(reduceDraft(refused, sent("k2"))).toBe(refused);
    expect(reduceDraft(refused, edited("short")).sync.kind).toBe("resting");
  });
});

describe("restoreDraftState", () => {
  const request: SaveRequest = { idempotencyKey: "k1", baseRevision: 4, source: "sent" };

  it("goes on with the kept text when the server stands where it was left", () => {
    const state = restoreDraftState({ source: "kept", base, request: null }, base);
    expect(state).toMatchObject({ source: "kept", base, sync: { kind: "resting" } });
  });

  it("repeats an unanswered save before it believes in a conflict", () => {
    const state = restoreDraftState({ source: "kept", base, request }, { revision: 6, source: "other" });
    expect(state.sync).toEqual({ kind: "waiting", request, attempt: 0 });
  });

  it("knows its own unanswered save on the server by its text", () => {
    const server = { revision: 5, source: "sent" };
    expect(restoreDraftState({ source: "kept", base, request }, server)).toMatchObject({
      source: "kept",
      base: server,
      sync: { kind: "resting" },
    });
  });

  it("shows two versions when the server moved on without us", () => {
    const theirs = { revision: 5, source: "other" };
    expect(restoreDraftState({ source: "kept", base, request: null }, theirs).sync).toEqual({
      kind: "two-versions",
      theirs,
    });
  });

  it("opens the kept text when the server does not answer", () => {
    expect(restoreDraftState({ source: "kept", base, request: null }, null)).toMatchObject({ source: "kept", base });
  });
});

describe("getRetryDelayMs", () => {
  it("waits 1, 2, 4, 8, 15 and then always 30 seconds, a quarter more or less", () => {
    const middle = [1, 2, 3, 4, 5, 6, 7, 500].map((attempt) => getRetryDelayMs(attempt, () => 0.5));
    expect(middle).toEqual([1000, 2000, 4000, 8000, 15_000, 30_000, 30_000, 30_000]);
    expect([getRetryDelayMs(3, () => 0), getRetryDelayMs(3, () => 1)]).toEqual([3000, 5000]);
  });
});

describe("presentSaveStatus", () => {
  it.each<[string, string, DraftEvent[]]>([
    ["Saved", "20 seconds ago", []],
    ["Saving", "On its way", [edited("a")]],
    ["Saving", "On its way", [edited("a"), sent("k")]],
    ["Kept on this computer", "I keep trying", [edited("a"), sent("k"), { type: "unanswered", idempotencyKey: "k" }]],
    [
      "Kept on this computer",
      "Sign in again",
      [edited("a"), sent("k"), { type: "session-ended", idempotencyKey: "k" }],
    ],
    [
      "Kept on this computer",
      "Too long.",
      [edited("a"), sent("k"), { type: "refused", idempotencyKey: "k", reason: "Too long." }],
    ],
    ["Only in this tab", "Do not close", [edited("a"), { type: "keeping-failed" }]],
    [
      "Two versions",
      "Choose one",
      [edited("a"), sent("k"), { type: "conflicted", idempotencyKey: "k", theirs: { revision: 9, source: "b" } }],
    ],
  ])("says %s, %s", (label, detail, events) => {
    const status = presentSaveStatus(play(...events), 24_000);
    expect(status.label).toBe(label);
    expect(status.detail).toContain(detail);
  });
});
