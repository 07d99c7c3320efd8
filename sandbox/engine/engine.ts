import type { QuickJSWASMModule } from "quickjs-emscripten-core";
import { finishRun, type HashHost } from "./finish.ts";
import type { GuestTables, GuestWork } from "./guest.ts";
import type { RunInput, RunOutcome } from "./model.ts";
import { brokenResult, GuestRuntime, type RuntimeResult } from "./runtime.ts";
import { prepareRun } from "./prepare.ts";
import { buildTables } from "./tables.ts";

/** What a host lends the engine: it has WebAssembly and cryptography, `sandbox/` has neither. */
export interface EngineHost extends HashHost {
  /**
   * A new instance of the one pinned QuickJS module, with a memory of its own of `WASM_MEMORY_PAGES`
   * pages, initial and maximum. It is used for one run and dropped.
   */
  newModule(): Promise<QuickJSWASMModule>;
}

export interface Engine {
  /** Runs a script. The outcome is a value for any input; it is rejected only when the host fails. */
  run(input: RunInput): Promise<RunOutcome>;
}

/**
 * Gives an engine on a host. Stateless: any number of runs, each in an instance of its own. A host with
 * several threads takes the same steps one by one: `prepareRun`, `GuestRuntime`, `finishRun`.
 */
export function createEngine(host: EngineHost): Engine {
  return {
    async run(input) {
      const prepared = prepareRun(input);
      if (!prepared.ok) return prepared;
      const module = await host.newModule();
      const result = runGuarded(module, buildTables(input.layout, input.song), prepared.work);
      return finishRun(host, input, prepared.compiled, result);
    },
  };
}

/** Runs in a fresh instance. */
function runGuarded(module: QuickJSWASMModule, tables: GuestTables, work: GuestWork): RuntimeResult {
  try {
    return new GuestRuntime(module, tables).run(work);
  } catch (error) {
    return brokenResult(error);
  }
}
