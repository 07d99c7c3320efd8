import { createHash } from "node:crypto";
import { readFile } from "node:fs/promises";
import { createRequire } from "node:module";
import { newQuickJSWASMModuleFromVariant, newVariant } from "quickjs-emscripten-core";
import releaseVariant from "@jitl/quickjs-wasmfile-release-sync";
import type { EngineHost } from "../../sandbox/engine/engine.ts";
import { WASM_MEMORY_PAGES } from "../../sandbox/engine/limits.ts";

/** The bytes of the pinned QuickJS module. */
function readModule(): Promise<Buffer> {
  return readFile(createRequire(import.meta.url).resolve("@jitl/quickjs-wasmfile-release-sync/wasm"));
}

/** What Node lends the engine. The module is compiled once; every run gets an instance with a memory of its own. */
export async function createNodeHost(): Promise<EngineHost> {
  const wasmModule = await WebAssembly.compile(new Uint8Array(await readModule()));
  return {
    newModule: () => {
      const wasmMemory = new WebAssembly.Memory({ initial: WASM_MEMORY_PAGES, maximum: WASM_MEMORY_PAGES });
      return newQuickJSWASMModuleFromVariant(newVariant(releaseVariant, { wasmModule, wasmMemory }));
    },
    sha256: (bytes) => createHash("sha256").update(bytes).digest("hex"),
    encodeText: (text) => new TextEncoder().encode(text),
  };
}
