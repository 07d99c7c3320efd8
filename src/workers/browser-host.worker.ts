import { newQuickJSWASMModuleFromVariant, newVariant, type QuickJSWASMModule } from "quickjs-emscripten-core";
import releaseVariant from "@jitl/quickjs-wasmfile-release-sync";
import wasmUrl from "@jitl/quickjs-wasmfile-release-sync/wasm?url";
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

/** An instance of the engine with a memory of its own, for one run. */
export async function newBrowserModule(): Promise<QuickJSWASMModule> {
  const wasmModule = await loadEngineModule();
  const wasmMemory = new WebAssembly.Memory({ initial: WASM_MEMORY_PAGES, maximum: WASM_MEMORY_PAGES });
  const module = await newQuickJSWASMModuleFromVariant(newVariant(releaseVariant, { wasmModule, wasmMemory }));
  if (module.getWasmMemory() !== wasmMemory) throw new Error("The engine did not take the fixed memory.");
  return module;
}
