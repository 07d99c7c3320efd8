import "fake-indexeddb/auto";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { createIndexedDbStorage, type AsideCopy, type DraftStorage, type KeptDraft } from "./draft-storage.ts";
import { DraftStore, type DraftHost } from "./draft-store.ts";
import type { DraftTransport, SaveAnswer } from "./draft-transport.ts";

/** A clock that moves only when told; promises in between are given their turns. */
class HandClock {
  now = 0;
  #timers: { at: number; run: () => void }[] = [];
  #keys = 0;

  readonly host: DraftHost = {
    now: () => this.now,
    random: () => 0.5,
    createKey: () => `key-${(this.#keys += 1)}`,
    setTimer: (run, ms) => {
      const timer = { at: this.now + ms, run };
      this.#timers.push(timer);
      return () => void (this.#timers = this.#timers.filter((other) => other !== timer));
    },
  };

  async pass(ms: number): Promise<void> {
    const end = this.now + ms;
    for (;;) {
      await settle();
      const [next] = this.#timers.filter((timer) => timer.at <= end).sort((a, b) => a.at - b.at);
      if (!next) break;
      this.#timers = this.#timers.filter((timer) => timer !== next);
      this.now = Math.max(this.now, next.at);
      next.run();
    }
    this.now = end;
  }
}

async function settle(): Promise<void> {
  for (let turn = 0; turn < 12; turn += 1) await Promise.resolve();
}

function createMemoryStorage(): DraftStorage & { drafts: Map<string, KeptDraft>; copies: Map<string, AsideCopy> } {
  const drafts = new Map<string, KeptDraft>();
  const copies = new Map<string, AsideCopy>();
  return {
    drafts,
    copies,
    putDraft: (draft) => Promise.resolve(void drafts.set(draft.writer, draft)),
    deleteDraft: (key) => Promise.resolve(void drafts.delete(key.writer)),
    listDrafts: () => Promise.resolve([...drafts.values()]),
    putCopy: (copy) => Promise.resolve(void copies.set(copy.id, copy)),
    listCopies: () => Promise.resolve([...copies.values()]),
    deleteCopy: (id) => Promise.resolve(void copies.delete(id)),
  };
}

type Weather = "good" | "lost-before" | "lost-after" | "signed-out";

/** A server that keeps the rules: a revision moves by one, a stale base is refused, a key is answered once, every text is kept. */
class RuledServer implements DraftTransport {
  revision = 0;
  source = "";
  weather: Weather = "good";
  readonly history: string[] = [""];
  readonly #answered = new Map<string, SaveAnswer>();

  saveDraft(request: Parameters<DraftTransport["saveDraft"]>[0]): Promise<SaveAnswer> {
    if (this.weather === "lost-before") return Promise.reject(new Error("no network"));
    if (this.weather === "signed-out") return Promise.resolve({ kind: "signed-out" });
    const answer = this.#answered.get(request.idempotencyKey) ?? this.#save(request.baseRevision, request.source);
    this.#answered.set(request.idempotencyKey, answer);
    return this.weather === "lost-after" ? Promise.reject(new Error("answer lost")) : Promise.resolve(answer);
  }

  write(source: string): void {
    this.#save(this.revision, source);
  }

  #save(baseRevision: number, source: string): SaveAnswer {
    if (baseRevision !== this.revision)
      return { kind: "conflict", theirs: { revision: this.revision, source: this.source } };
    this.revision += 1;
    this.source = source;
    this.history.push(source);
    return { kind: "saved", revision: this.revision };
  }
}

function setUp(storage: DraftStorage = createMemoryStorage(), server = new RuledServer(), clock = new HandClock()) {
  let tab = 0;
  const openTab = () =>
    new DraftStore({
      key: { userId: "u1", showId: "s1", writer: `tab-${(tab += 1)}` },
      storage,
      transport: server,
      host: clock.host,
    });
  const open = async (isOnline = true) => {
    const store = openTab();
    await store.open(isOnline ? { revision: server.revision, source: server.source } : null);
    return store;
  };
  return { storage, server, clock, open };
}

describe("DraftStore", () => {
  it("keeps an edit on this computer within 300 ms and on the server soon after", async () => {
    const storage = createMemoryStorage();
    const { server, clock, open } = setUp(storage);
    const store = await open();
    store.edit("wait(1);");
    await clock.pass(300);
    expect([...storage.drafts.values()].map((draft) => draft.source)).toEqual(["wait(1);"]);
    expect(server.source).toBe("");
    await clock.pass(2000);
    expect(server).toMatchObject({ source: "wait(1);", revision: 1 });
    await clock.pass(300);
    expect([...storage.drafts.values()]).toMatchObject([{ source: "wait(1);", base: { revision: 1 }, request: null }]);
  });

  it("opens the saved text when there is no network", async () => {
    const { server, clock, open } = setUp();
    const first = await open();
    first.edit("saved");
    await clock.pass(3000);
    first.dispose();
    expect((await open(false)).state.source).toBe("saved");
    server.write("changed elsewhere");
    const later = await open();
    expect(later.state).toMatchObject({ source: "changed elsewhere", sync: { kind: "resting" } });
  });

  it("brings unsaved text back after a crash and saves it without a false conflict", async () => {
    const { server, clock, open } = setUp();
    const first = await open();
    server.weather = "lost-after";
    first.edit("one");
    await clock.pass(4000);
    first.edit("one two");
    await clock.pass(300);
    first.dispose();
    server.weather = "good";
    const second = await open();
    expect(second.state.source).toBe("one two");
    await clock.pass(60_000);
    expect(second.state.sync.kind).toBe("resting");
    expect(server.source).toBe("one two");
  });

  it("puts the text not chosen aside, where it can be found again", async () => {
    const { server, clock, open } = setUp();
    const store = await open();
    store.edit("mine");
    server.write("theirs");
    await clock.pass(3000);
    expect(store.state.sync.kind).toBe("two-versions");
    await clock.pass(60_000);
    expect(server.source).toBe("theirs");
    await store.choose("theirs");
    await clock.pass(3000);
    expect(server.source).toBe("theirs");
    expect((await store.listCopies()).map((copy) => copy.source)).toEqual(["mine"]);
  });

  it("says so when this computer can not keep the text, and still saves to the server", async () => {
    const storage: DraftStorage = { ...createMemoryStorage(), putDraft: () => Promise.reject(new Error("full")) };
    const { server, clock, open } = setUp(storage);
    const store = await open();
    store.edit("a");
    await clock.pass(300);
    expect(store.state.isKeepingBroken).toBe(true);
    await clock.pass(3000);
    expect(server.source).toBe("a");
  });

  it("never lets one tab write over another tab's kept text", async () => {
    const { server, clock, open } = setUp();
    server.weather = "lost-before";
    const first = await open();
    const second = await open();
    first.edit("from the first tab");
    await clock.pass(250);
    second.edit("from the second tab");
    await clock.pass(250);
    first.dispose();
    second.dispose();
    const third = await open(false);
    const texts = [third.state.source, ...(await third.listCopies()).map((copy) => copy.source)];
    expect([...new Set(texts)].sort()).toEqual(["from the first tab", "from the second tab"]);
  });
});

type Step =
  | { kind: "type"; text: string }
  | { kind: "pass"; ms: number }
  | { kind: "weather"; weather: Weather }
  | { kind: "crash" }
  | { kind: "signIn" };

const steps = fc.array(
  fc.oneof<fc.Arbitrary<Step>[]>(
    fc.record({ kind: fc.constant("type" as const), text: fc.stringMatching(/^[a-d]{0,4}$/) }),
    fc.record({ kind: fc.constant("pass" as const), ms: fc.integer({ min: 1, max: 40_000 }) }),
    fc.record({
      kind: fc.constant("weather" as const),
      weather: fc.constantFrom<Weather>("good", "lost-before", "lost-after", "signed-out"),
    }),
    fc.record({ kind: fc.constant("crash" as const) }),
    fc.record({ kind: fc.constant("signIn" as const) }),
  ),
  { maxLength: 24 },
);

describe("DraftStore, whatever happens", () => {
  it("loses no kept text, sees no conflict that is none, and ends saved once all is well", async () => {
    await fc.assert(
      fc.asyncProperty(steps, async (list) => {
        const { server, clock, open } = setUp();
        let store = await open();
        let written = "";
        for (const step of list) {
          if (step.kind === "type") store.edit((written = step.text));
          else if (step.kind === "pass") await clock.pass(step.ms);
          else if (step.kind === "weather") server.weather = step.weather;
          else if (step.kind === "signIn") store.resume();
          else {
            await clock.pass(300);
            store.dispose();
            store = await open(server.weather === "good");
          }
          expect(store.state.source).toBe(written);
          expect(store.state.sync.kind).not.toBe("two-versions");
        }
        server.weather = "good";
        store.resume();
        await clock.pass(120_000);
        expect(store.state.sync.kind).toBe("resting");
        expect(server.source).toBe(written);
      }),
      { numRuns: 300 },
    );
  });
});

type TabStep =
  | { kind: "type"; tab: number; text: string }
  | { kind: "pass"; ms: number }
  | { kind: "weather"; weather: Weather }
  | { kind: "open"; tab: number }
  /** The tab is closed, or the browser dies: nothing is written any more. */
  | { kind: "close"; tab: number }
  | { kind: "choose"; tab: number; isMine: boolean }
  | { kind: "elsewhere"; text: string };

const TABS = 3;
const tab = fc.integer({ min: 0, max: TABS - 1 });
const text = fc.stringMatching(/^[a-d]{1,4}$/);
const tabSteps = fc.array(
  fc.oneof<fc.Arbitrary<TabStep>[]>(
    fc.record({ kind: fc.constant("type" as const), tab, text }),
    fc.record({ kind: fc.constant("type" as const), tab, text }),
    fc.record({ kind: fc.constant("pass" as const), ms: fc.integer({ min: 1, max: 30 * 60_000 }) }),
    fc.record({
      kind: fc.constant("weather" as const),
      weather: fc.constantFrom<Weather>("good", "lost-before", "lost-after", "signed-out"),
    }),
    fc.record({ kind: fc.constant("open" as const), tab }),
    fc.record({ kind: fc.constant("close" as const), tab }),
    fc.record({ kind: fc.constant("choose" as const), tab, isMine: fc.boolean() }),
    fc.record({ kind: fc.constant("elsewhere" as const), text }),
  ),
  { maxLength: 30 },
);

describe("DraftStore in several tabs, with a partner, without a network for long", () => {
  it("leaves no text unreachable that was on screen for 300 ms when its tab was closed or another text was taken", async () => {
    await fc.assert(
      fc.asyncProperty(tabSteps, async (list) => {
        const storage = createMemoryStorage();
        const { server, clock, open } = setUp(storage);
        const tabs: (DraftStore | null)[] = Array.from({ length: TABS }, () => null);
        /** Texts that somebody left behind, and that therefore have to be found again. */
        const owed = new Set<string>();
        const openTab = async (index: number) => {
          tabs[index] ??= await open(server.weather === "good");
        };
        for (const step of list) {
          if (step.kind === "pass") await clock.pass(step.ms);
          else if (step.kind === "weather") server.weather = step.weather;
          else if (step.kind === "elsewhere") server.write(step.text);
          else if (step.kind === "open") await openTab(step.tab);
          else if (step.kind === "type") {
            await openTab(step.tab);
            // Who has a text before them and writes over it has done so on purpose.
            owed.delete(tabs[step.tab]?.state.source ?? "");
            tabs[step.tab]?.edit(step.text);
          } else if (step.kind === "close") {
            await clock.pass(300);
            const left = tabs[step.tab]?.state.source;
            if (left !== undefined) owed.add(left);
            tabs[step.tab]?.dispose();
            tabs[step.tab] = null;
          } else {
            const store = tabs[step.tab];
            if (store?.state.sync.kind !== "two-versions") continue;
            await clock.pass(300);
            for (const each of [store.state.source, store.state.sync.theirs.source]) owed.add(each);
            await store.choose(step.isMine ? store.state.source : store.state.sync.theirs.source);
          }
        }
        await clock.pass(300);
        const reachable = new Set([
          ...tabs.flatMap((store) => store?.state.source ?? []),
          ...[...storage.drafts.values()].map((draft) => draft.source),
          ...[...storage.copies.values()].map((copy) => copy.source),
          ...server.history,
        ]);
        for (const left of owed) expect([...reachable]).toContain(left);
      }),
      { numRuns: 300 },
    );
  });

  it("ends saved in one open tab once all is well", async () => {
    await fc.assert(
      fc.asyncProperty(tabSteps, async (list) => {
        const { server, clock, open } = setUp();
        const store = await open();
        for (const step of list) {
          if (step.kind === "pass") await clock.pass(step.ms);
          else if (step.kind === "weather") server.weather = step.weather;
          else if (step.kind === "type") store.edit(step.text);
        }
        server.weather = "good";
        store.resume();
        await clock.pass(120_000);
        expect(server.source).toBe(store.state.source);
        store.dispose();
      }),
      { numRuns: 100 },
    );
  });
});

describe("createIndexedDbStorage", () => {
  it("gives back what was kept, to its owner only", async () => {
    const storage = createIndexedDbStorage("owner-test");
    const draft: KeptDraft = {
      userId: "u1",
      showId: "s1",
      writer: "t1",
      source: "wait(2);",
      base: { revision: 3, source: "" },
      request: { idempotencyKey: "k", baseRevision: 3, source: "wait(1);" },
      keptAt: 12,
    };
    await storage.putDraft(draft);
    await storage.putCopy({ id: "c1", userId: "u1", showId: "s1", source: "old", keptAt: 1 });
    expect(await storage.listDrafts("u1", "s1")).toEqual([draft]);
    expect(await storage.listDrafts("u2", "s1")).toEqual([]);
    expect(await storage.listCopies("u2", "s1")).toEqual([]);
    await storage.deleteDraft(draft);
    await storage.deleteCopy("c1");
    expect(await storage.listDrafts("u1", "s1")).toEqual([]);
    expect(await storage.listCopies("u1", "s1")).toEqual([]);
  });
});
