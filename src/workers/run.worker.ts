import * as Comlink from "comlink";
import type { GuestTables, GuestWork } from "../../sandbox/engine/guest.ts";
import { brokenResult, GuestRuntime, type RuntimeResult } from "../../sandbox/engine/runtime.ts";
import { loadEngineModule, newBrowserModule } from "./browser-host.worker.ts";

let tables: GuestTables | null = null;
/** An engine with its tables that no script has touched yet: a run finds it open. */
let ready: Promise<GuestRuntime> | null = null;

// On its way while the other worker still reads the square and the song.
loadEngineModule().catch(() => {});

async function openEngine(given: GuestTables): Promise<GuestRuntime> {
  return new GuestRuntime(await newBrowserModule(), given);
}

/**
 * The engine alone, without the compiler: small, so that a new worker is there at once when one had to be
 * ended. It runs one script at a time and never ends itself: the page does that.
 */
const runWorker = {
  /** Takes the tables of a square and a song; settles when an engine is open for them. */
  open: async (given: GuestTables): Promise<void> => {
    tables = given;
    ready = openEngine(given);
    await ready;
  },
  /** Runs a script in the open engine, which is used up by it; the next is opened after the answer. */
  execute: async (work: GuestWork): Promise<RuntimeResult> => {
    if (!tables) throw new Error("A run needs the tables of a square and a song.");
    const engine = await (ready ?? openEngine(tables));
    ready = null;
    setTimeout(() => {
      if (tables) ready ??= openEngine(tables);
      // Whoever runs next hears of it.
      ready?.catch(() => {});
    });
    const result = runGuarded(engine, work);
    return result.buffer ? Comlink.transfer(result, [result.buffer.buffer]) : result;
  },
};

function runGuarded(engine: GuestRuntime, work: GuestWork): RuntimeResult {
  try {
    return engine.run(work);
  } catch (error) {
    return brokenResult(error);
  }
}

export type RunWorker = typeof runWorker;

Comlink.expose(runWorker);
