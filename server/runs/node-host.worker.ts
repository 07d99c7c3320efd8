import { createHash } from "node:crypto";
import { readFile } from "node:fs/promises";
import { createRequire } from "node:module";
import { newQuickJSWASMModuleFromVariant, newVariant } from "quickjs-emscripten-core";
import releaseVariant from "@jitl/quickjs-wasmfile-release-sync";
import type { EngineHost } from "../../sandbox/engine/engine.ts";
import { WASM_MEMORY_PAGES } from "../../sandbox/engine/limits.ts";

/**
 * The one pinned variant. Bundled to CommonJS, as the pool's threads are, the package's default is the
 * package itself; the library takes that too, but drops our module and memory without a word.
 */
const variant: typeof releaseVariant = "default" in releaseVariant ? (releaseVariant.default as never) : releaseVariant;

/** The bytes of the pinned QuickJS module. */
function readModule(): Promise<Buffer> {
  return readFile(createRequire(import.meta.url).resolve("@jitl/quickjs-wasmfile-release-sync/wasm"));
}

/** What Node lends the engine. The module is compiled once; every run gets an instance with a memory of its own. */
export async function createNodeHost(): Promise<EngineHost> {
  const wasmModule = await WebAssembly.compile(new Uint8Array(await readModule()));
  return {
    newModule: async () => {
      const wasmMemory = new WebAssembly.Memory({ initial: WASM_MEMORY_PAGES, maximum: WASM_MEMORY_PAGES });
      const module = await newQuickJSWASMModuleFromVariant(newVariant(variant, { wasmModule, wasmMemory }));
      if (module.getWasmMemory() !== wasmMemory) throw new Error("The engine did not take the fixed memory.");
      return module;
    },
    sha256: (bytes) => createHash("sha256").update(bytes).digest("hex"),
    encodeText: (text) => new TextEncoder().encode(text),
  };
}
