import * as Comlink from "comlink";
import { afterEach, describe, expect, it, vi } from "vitest";
import type { RunInput, RunOutcome } from "../../sandbox/engine/model.ts";
import type { Timeline } from "../../sandbox/timeline/model.ts";
import type { GuestTables } from "../../sandbox/engine/guest.ts";
import type { RuntimeResult } from "../../sandbox/engine/runtime.ts";
import type { RunWorker } from "../workers/run.worker.ts";
import type { RunSetting, ScriptWorker } from "../workers/script.worker.ts";
import { RunClient, RunReplacedError } from "./run-client.ts";

/** A worker whose answers may take their time. */
type Faked<W> = {
  [K in keyof W]: W[K] extends (...all: infer A) => infer R ? (...all: A) => R | Promise<Awaited<R>> : never;
};

const EMPTY = { notes: [], findings: [], fuel: 0, cueCount: 0 };

function outcomeOf(code: string): RunOutcome {
  const range = { line: 1, column: 1, endLine: 1, endColumn: 1 };
  return { ok: false, problem: { code, sentence: "", hint: "", range, excerpt: "" }, timeline: null, ...EMPTY };
}

const SETTING = { layout: {}, song: {}, songId: "tune" } as RunSetting;
const inputOf = (source: string): RunInput => ({ ...SETTING, source, seed: 1 });
const resultOf = (details: string): RuntimeResult => ({ end: "ended", details, report: null, buffer: null, fuel: 0 });

interface MadeWorker {
  isEnded: boolean;
  readonly heard: string[];
}

/**
 * Workers over message channels. In the engine "hang" never answers and "break" comes out as an engine
 * that failed; the reader never answers "lost", nor a timeline of the song "hang".
 */
class FakeWorkers {
  readonly engines: MadeWorker[] = [];
  readonly readers: MadeWorker[] = [];

  readonly makers = {
    engine: (): Worker =>
      this.#make(this.engines, (heard): RunWorker => ({
        open: (given) => {
          heard.push(`open ${given.lightCount}`);
          return Promise.resolve();
        },
        execute: ({ code }) => {
          heard.push(code);
          return code === "hang" ? new Promise(() => {}) : Promise.resolve(resultOf(code));
        },
      })),
    script: (): Worker =>
      this.#make(this.readers, (heard): Faked<ScriptWorker> => ({
        open: ({ songId }) => {
          heard.push(`open ${songId}`);
          return { lightCount: 3 } as GuestTables;
        },
        prepare: (code, seed) => {
          heard.push(code);
          if (code === "lost") return new Promise(() => {});
          if (code === "unready") return { outcome: outcomeOf("not-run") };
          return { work: { code, luck: { seed, streamOf: [], streams: [] } } };
        },
        finish: ({ details }) => Promise.resolve(outcomeOf(details === "break" ? "could-not-run" : details)),
        drawRibbon: (_timeline, _layout, { rows, columns }) => ({
          rows,
          columns,
          cells: new Uint8Array(rows * columns * 4),
        }),
        describe: ({ songId }) =>
          songId === "hang" ? new Promise(() => {}) : { summary: songId, steps: [], starts: [] },
      })),
  };

  #make(list: MadeWorker[], build: (heard: string[]) => object): Worker {
    const { port1, port2 } = new MessageChannel();
    const record: MadeWorker = { isEnded: false, heard: [] };
    list.push(record);
    Comlink.expose(build(record.heard), port2);
    port1.start();
    return Object.assign(port1, {
      terminate: () => {
        record.isEnded = true;
        port1.close();
      },
    }) as unknown as Worker;
  }
}

async function codeOf(run: Promise<RunOutcome>): Promise<string> {
  const outcome = await run;
  return outcome.ok ? "ok" : outcome.problem.code;
}

describe("RunClient", () => {
  let client: RunClient | null = null;
  afterEach(() => client?.dispose());

  it("opens both workers once, gives the outcome and keeps them for the next run", async () => {
    const workers = new FakeWorkers();
    client = new RunClient(workers.makers);
    expect(await codeOf(client.run(inputOf("a")))).toBe("a");
    expect(await codeOf(client.run(inputOf("b")))).toBe("b");
    expect(workers.readers.map(({ heard }) => heard)).toEqual([["open tune", "a", "b"]]);
    const heard = [["open 3", "a", "b"], ["open 3"]];
    await vi.waitFor(() => expect(workers.engines.map((engine) => engine.heard)).toEqual(heard));
  });

  it("opens them anew for another song", async () => {
    const workers = new FakeWorkers();
    client = new RunClient(workers.makers);
    await client.run(inputOf("a"));
    await client.run({ ...inputOf("b"), songId: "other" });
    expect(workers.readers[0]?.heard).toEqual(["open tune", "a", "open other", "b"]);
    const heard = [
      ["open 3", "a", "open 3", "b"],
      ["open 3", "open 3"],
    ];
    await vi.waitFor(() => expect(workers.engines.map((engine) => engine.heard)).toEqual(heard));
  });

  it("does not trouble the engine with a script that can not be run", async () => {
    const workers = new FakeWorkers();
    client = new RunClient(workers.makers);
    expect(await codeOf(client.run(inputOf("unready")))).toBe("not-run");
    expect(workers.engines[0]?.heard).toEqual(["open 3"]);
  });

  it("ends a run that hangs, answers with a problem, and runs the next on another worker", async () => {
    const workers = new FakeWorkers();
    client = new RunClient(workers.makers, 20);
    expect(await codeOf(client.run(inputOf("hang")))).toBe("too-much-work");
    expect(workers.engines[0]?.isEnded).toBe(true);
    expect(workers.readers[0]?.isEnded).toBe(false);
    expect(await codeOf(client.run(inputOf("a")))).toBe("a");
    expect(workers.engines[0]?.heard).toEqual(["open 3", "hang"]);
  });

  it("starts the reader anew when it loses its way", async () => {
    const workers = new FakeWorkers();
    client = new RunClient(workers.makers, 20);
    expect(await codeOf(client.run(inputOf("lost")))).toBe("too-much-work");
    expect(workers.readers[0]?.isEnded).toBe(true);
    expect(await codeOf(client.run(inputOf("a")))).toBe("a");
    expect(workers.readers[1]?.heard).toEqual(["open tune", "a"]);
  });

  it("lets the latest run win", async () => {
    const workers = new FakeWorkers();
    client = new RunClient(workers.makers);
    const first = client.run(inputOf("hang"));
    const refused = expect(first).rejects.toBeInstanceOf(RunReplacedError);
    await vi.waitFor(() => expect(workers.engines[0]?.heard).toContain("hang"));
    expect(await codeOf(client.run(inputOf("a")))).toBe("a");
    await refused;
    expect(workers.engines[0]?.isEnded).toBe(true);
  });

  it("keeps the engine of a run that was overtaken before it began", async () => {
    const workers = new FakeWorkers();
    client = new RunClient(workers.makers);
    const first = expect(client.run(inputOf("hang"))).rejects.toBeInstanceOf(RunReplacedError);
    expect(await codeOf(client.run(inputOf("a")))).toBe("a");
    await first;
    expect(workers.engines[0]).toEqual({ isEnded: false, heard: ["open 3", "a"] });
  });

  it("does not use a worker again whose engine failed", async () => {
    const workers = new FakeWorkers();
    client = new RunClient(workers.makers);
    expect(await codeOf(client.run(inputOf("break")))).toBe("could-not-run");
    expect(workers.engines[0]?.isEnded).toBe(true);
    expect(await codeOf(client.run(inputOf("a")))).toBe("a");
  });

  it("asks the next worker for the words when a run ended the one it had asked", async () => {
    const workers = new FakeWorkers();
    client = new RunClient(workers.makers, 20);
    const unanswered = client.describe({ songId: "hang" } as Timeline, SETTING);
    const isDone = vi.fn();
    unanswered.then(isDone, isDone);
    expect(await codeOf(client.run(inputOf("lost")))).toBe("too-much-work");
    expect((await client.describe({ songId: "tune" } as Timeline, SETTING)).summary).toBe("tune");
    expect(isDone).not.toHaveBeenCalled();
    client.dispose();
    await expect(unanswered).rejects.toBeInstanceOf(RunReplacedError);
  });

  it("ends its workers and refuses runs when it is disposed", async () => {
    const workers = new FakeWorkers();
    client = new RunClient(workers.makers);
    const running = expect(client.run(inputOf("hang"))).rejects.toBeInstanceOf(RunReplacedError);
    await vi.waitFor(() => expect(workers.engines[0]?.heard).toContain("hang"));
    client.dispose();
    await running;
    expect([...workers.engines, ...workers.readers].every((worker) => worker.isEnded)).toBe(true);
    await expect(client.run(inputOf("a"))).rejects.toBeInstanceOf(RunReplacedError);
  });
});
