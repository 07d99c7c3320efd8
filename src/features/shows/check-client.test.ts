import * as Comlink from "comlink";
import { describe, expect, it, vi } from "vitest";
import type { CheckInput } from "../../../sandbox/checks/context.ts";
import { WorkerEndedError } from "../../lib/worker-seat.ts";
import { CheckClient } from "./check-client.ts";

/** A check worker that answers with no findings, or never. */
function makeWorker(isLost: boolean) {
  const { port1, port2 } = new MessageChannel();
  Comlink.expose({ check: () => (isLost ? new Promise(() => {}) : []) }, port2);
  port1.start();
  return Object.assign(port1, { terminate: vi.fn(() => port1.close()) });
}

describe("CheckClient", () => {
  it("ends a check that does not come to its end; the next one finds a new worker", async () => {
    const workers = [makeWorker(true), makeWorker(false)];
    const made = [...workers];
    const client = new CheckClient(() => made.shift() as unknown as Worker, 20);
    await expect(client.check({} as CheckInput)).rejects.toBeInstanceOf(WorkerEndedError);
    expect(workers[0]?.terminate).toHaveBeenCalledOnce();
    expect(await client.check({} as CheckInput)).toEqual([]);
    client.dispose();
    expect(workers[1]?.terminate).toHaveBeenCalledOnce();
  });

  it("rejects when its worker does not start", async () => {
    const worker = Object.assign(new EventTarget(), { postMessage: vi.fn(), terminate: vi.fn() });
    const client = new CheckClient(() => worker as unknown as Worker);
    const checked = expect(client.check({} as CheckInput)).rejects.toThrow("did not start");
    worker.dispatchEvent(Object.assign(new Event("error"), { message: "" }));
    await checked;
  });
});
