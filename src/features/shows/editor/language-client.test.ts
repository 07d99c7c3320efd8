import { describe, expect, it, vi } from "vitest";
import { LanguageClient } from "./language-client.ts";

const NAMES = { front: [], side: [], part: [], section: [], instrument: [], colour: [] };

/** A worker that answers every call of comlink's protocol with `answer`, or never when that is null. */
class FakeWorker extends EventTarget {
  readonly terminate = vi.fn();
  readonly #answer: unknown;

  constructor(answer: unknown) {
    super();
    this.#answer = answer;
  }

  postMessage(message: { id: string }): void {
    if (this.#answer === null) return;
    const data = { id: message.id, type: "RAW", value: this.#answer };
    queueMicrotask(() => this.dispatchEvent(new MessageEvent("message", { data })));
  }
}

describe("LanguageClient", () => {
  it("starts its worker with the first question, and only one", async () => {
    const make = vi.fn(() => new FakeWorker([]) as unknown as Worker);
    const client = new LanguageClient(NAMES, make);
    expect(make).not.toHaveBeenCalled();
    expect(await client.ask("listNotes", "wait(1);")).toEqual([]);
    expect(await client.ask("listNotes", "wait(2);")).toEqual([]);
    expect(make).toHaveBeenCalledTimes(1);
  });

  it("gives null in time when the worker is lost, ends it, and starts another", async () => {
    const workers = [new FakeWorker(null), new FakeWorker("yes")];
    const made = [...workers];
    const client = new LanguageClient(NAMES, () => made.shift() as unknown as Worker, 20);
    expect(await client.ask("findNameFault", "", "x")).toBeNull();
    expect(workers[0]?.terminate).toHaveBeenCalled();
    expect(await client.ask("findNameFault", "", "x")).toBe("yes");
  });

  it("answers nothing any more once it is disposed", async () => {
    const worker = new FakeWorker("yes");
    const client = new LanguageClient(NAMES, () => worker as unknown as Worker);
    await client.ask("findNameFault", "", "x");
    client.dispose();
    expect(worker.terminate).toHaveBeenCalled();
    expect(await client.ask("findNameFault", "", "x")).toBeNull();
  });
});
