import * as Comlink from "comlink";
import { afterEach, describe, expect, it, vi } from "vitest";
import type { RunInput, RunOutcome } from "../../sandbox/engine/model.ts";
import type { Timeline } from "../../sandbox/timeline/model.ts";
import type { RunWorker } from "../workers/run.worker.ts";
import { RunClient, RunReplacedError } from "./run-client.ts";

const EMPTY = { notes: [], findings: [], fuel: 0, cueCount: 0 };

function outcomeOf(code: string): RunOutcome {
  const range = { line: 1, column: 1, endLine: 1, endColumn: 1 };
  return { ok: false, problem: { code, sentence: "", hint: "", range, excerpt: "" }, timeline: null, ...EMPTY };
}

const inputOf = (source: string): RunInput => ({ source }) as RunInput;

/** Workers over a message channel: "hang" never answers, "break" comes out as an engine that failed. */
class FakeWorkers {
  readonly made: { isEnded: boolean; ran: string[] }[] = [];

  readonly make = (): Worker => {
    const { port1, port2 } = new MessageChannel();
    const record = { isEnded: false, ran: [] as string[] };
    this.made.push(record);
    const worker: RunWorker = {
      warmUp: () => Promise.resolve(),
      drawRibbon: (_timeline, _layout, { rows, columns }) =>
        Promise.resolve({ rows, columns, cells: new Uint8Array(rows * columns * 4) }),
      describe: (timeline) =>
        timeline.songId === "hang"
          ? new Promise(() => {})
          : Promise.resolve({ summary: timeline.songId, steps: [], starts: [] }),
      run: ({ source }) => {
        record.ran.push(source);
        return source === "hang"
          ? new Promise(() => {})
          : Promise.resolve(outcomeOf(source === "break" ? "could-not-run" : source));
      },
    };
    Comlink.expose(worker, port2);
    port1.start();
    return Object.assign(port1, {
      terminate: () => {
        record.isEnded = true;
        port1.close();
      },
    }) as unknown as Worker;
  };
}

async function codeOf(run: Promise<RunOutcome>): Promise<string> {
  const outcome = await run;
  return outcome.ok ? "ok" : outcome.problem.code;
}

describe("RunClient", () => {
  let client: RunClient | null = null;
  afterEach(() => client?.dispose());

  it("gives the outcome and keeps its worker for the next run", async () => {
    const workers = new FakeWorkers();
    client = new RunClient(workers.make);
    expect(await codeOf(client.run(inputOf("a")))).toBe("a");
    expect(await codeOf(client.run(inputOf("b")))).toBe("b");
    expect(workers.made[0]?.ran).toEqual(["a", "b"]);
    expect(workers.made.length).toBe(2);
  });

  it("ends a run that hangs, answers with a problem, and runs the next on another worker", async () => {
    const workers = new FakeWorkers();
    client = new RunClient(workers.make, 20);
    expect(await codeOf(client.run(inputOf("hang")))).toBe("too-much-work");
    expect(workers.made[0]?.isEnded).toBe(true);
    expect(await codeOf(client.run(inputOf("a")))).toBe("a");
    expect(workers.made[0]?.ran).toEqual(["hang"]);
  });

  it("lets the latest run win", async () => {
    const workers = new FakeWorkers();
    client = new RunClient(workers.make);
    const first = client.run(inputOf("hang"));
    const refused = expect(first).rejects.toBeInstanceOf(RunReplacedError);
    await vi.waitFor(() => expect(workers.made[0]?.ran).toEqual(["hang"]));
    expect(await codeOf(client.run(inputOf("a")))).toBe("a");
    await refused;
    expect(workers.made[0]?.isEnded).toBe(true);
  });

  it("does not use a worker again whose engine failed", async () => {
    const workers = new FakeWorkers();
    client = new RunClient(workers.make);
    expect(await codeOf(client.run(inputOf("break")))).toBe("could-not-run");
    expect(workers.made[0]?.isEnded).toBe(true);
    expect(await codeOf(client.run(inputOf("a")))).toBe("a");
  });

  it("asks the next worker for the words when a run ended the one it had asked", async () => {
    const workers = new FakeWorkers();
    client = new RunClient(workers.make);
    const setting = {} as Pick<RunInput, "layout" | "song">;
    const unanswered = client.describe({ songId: "hang" } as Timeline, setting);
    const isDone = vi.fn();
    unanswered.then(isDone, isDone);
    void client.run(inputOf("hang")).catch(() => undefined);
    await vi.waitFor(() => expect(workers.made[0]?.ran).toEqual(["hang"]));
    expect(await codeOf(client.run(inputOf("a")))).toBe("a");
    expect((await client.describe({ songId: "tune" } as Timeline, setting)).summary).toBe("tune");
    expect(isDone).not.toHaveBeenCalled();
    client.dispose();
    await expect(unanswered).rejects.toBeInstanceOf(RunReplacedError);
  });

  it("ends its workers and refuses runs when it is disposed", async () => {
    const workers = new FakeWorkers();
    client = new RunClient(workers.make);
    const running = expect(client.run(inputOf("hang"))).rejects.toBeInstanceOf(RunReplacedError);
    client.dispose();
    await running;
    expect(workers.made.every((worker) => worker.isEnded)).toBe(true);
    await expect(client.run(inputOf("a"))).rejects.toBeInstanceOf(RunReplacedError);
  });
});
