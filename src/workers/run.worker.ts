import * as Comlink from "comlink";
import { newQuickJSWASMModuleFromVariant, newVariant } from "quickjs-emscripten-core";
import releaseVariant from "@jitl/quickjs-wasmfile-release-sync";
import wasmUrl from "@jitl/quickjs-wasmfile-release-sync/wasm?url";
import { createEngine, type EngineHost } from "../../sandbox/engine/engine.ts";
import { WASM_MEMORY_PAGES } from "../../sandbox/engine/limits.ts";
import type { RunInput, RunOutcome } from "../../sandbox/engine/model.ts";
import { describeShow, type ShowDescription } from "../../sandbox/timeline/describe.ts";
import type { Timeline } from "../../sandbox/timeline/model.ts";
import { ribbonCells, type RibbonCells, type RibbonSize } from "../../sandbox/timeline/ribbon.ts";

/** What the page calls. The worker runs one script at a time and never ends itself: the page does that. */
export interface RunWorker {
  /** Loads and compiles the engine, so that the first run finds it warm. */
  warmUp(): Promise<void>;
  run(input: RunInput): Promise<RunOutcome>;
  /**
   * The ribbon of a timeline. A call of its own, after the answer of the run: the lights come first.
   */
  drawRibbon(timeline: Timeline, layout: RunInput["layout"], size: RibbonSize): Promise<RibbonCells>;
  /** A show in words. */
  describe(timeline: Timeline, layout: RunInput["layout"], song: RunInput["song"]): Promise<ShowDescription>;
}

let compiling: Promise<WebAssembly.Module> | null = null;

function compiledModule(): Promise<WebAssembly.Module> {
  // Not `compileStreaming`: a server that sends another content type would fail it.
  // eslint-disable-next-line no-restricted-globals -- an asset of the build, no endpoint
  compiling ??= fetch(wasmUrl)
    .then((response) => {
      if (!response.ok) throw new Error(`The engine did not load: ${response.status}.`);
      return response.arrayBuffer();
    })
    .then((bytes) => WebAssembly.compile(bytes));
  compiling.catch(() => {
    compiling = null;
  });
  return compiling;
}

const host: EngineHost = {
  newModule: async () => {
    const wasmModule = await compiledModule();
    const wasmMemory = new WebAssembly.Memory({ initial: WASM_MEMORY_PAGES, maximum: WASM_MEMORY_PAGES });
    return newQuickJSWASMModuleFromVariant(newVariant(releaseVariant, { wasmModule, wasmMemory }));
  },
  sha256: async (bytes) => {
    const digest = await crypto.subtle.digest("SHA-256", bytes.slice());
    return Array.from(new Uint8Array(digest), (byte) => byte.toString(16).padStart(2, "0")).join("");
  },
  encodeText: (text) => new TextEncoder().encode(text),
};

const engine = createEngine(host);

const worker: RunWorker = {
  warmUp: async () => {
    await compiledModule();
  },
  run: (input) => engine.run(input),
  drawRibbon: (timeline, layout, size) => Promise.resolve(ribbonCells(timeline, layout, size)),
  describe: (timeline, layout, song) => Promise.resolve(describeShow(timeline, layout, song)),
};

Comlink.expose(worker);
