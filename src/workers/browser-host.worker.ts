import { newQuickJSWASMModuleFromVariant, newVariant } from "quickjs-emscripten-core";
import releaseVariant from "@jitl/quickjs-wasmfile-release-sync";
import wasmUrl from "@jitl/quickjs-wasmfile-release-sync/wasm?url";
import type { EngineHost } from "../../sandbox/engine/engine.ts";
import { WASM_MEMORY_PAGES } from "../../sandbox/engine/limits.ts";

let compiling: Promise<WebAssembly.Module> | null = null;

/** Fetches and compiles the pinned QuickJS module, once; a failed try is tried again at the next call. */
export function loadEngineModule(): Promise<WebAssembly.Module> {
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

/** What a browser lends the engine. Every run gets an instance with a memory of its own. */
export function createBrowserHost(): EngineHost {
  return {
    newModule: async () => {
      const wasmModule = await loadEngineModule();
      const wasmMemory = new WebAssembly.Memory({ initial: WASM_MEMORY_PAGES, maximum: WASM_MEMORY_PAGES });
      const module = await newQuickJSWASMModuleFromVariant(newVariant(releaseVariant, { wasmModule, wasmMemory }));
      if (module.getWasmMemory() !== wasmMemory) throw new Error("The engine did not take the fixed memory.");
      return module;
    },
    sha256: async (bytes) => {
      const digest = await crypto.subtle.digest("SHA-256", bytes.slice());
      return Array.from(new Uint8Array(digest), (byte) => byte.toString(16).padStart(2, "0")).join("");
    },
    encodeText: (text) => new TextEncoder().encode(text),
  };
}
