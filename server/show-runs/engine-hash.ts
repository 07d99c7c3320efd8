import { createHash } from "node:crypto";
import { readFileSync } from "node:fs";
import { createRequire } from "node:module";
import { LIBRARY } from "../../sandbox/engine/library.generated.ts";

/** Goes up when a rule of the show check changes, so that a run says by which rules it was judged. */
export const CHECK_RULES_VERSION = 2;

let hash: string | null = null;

/** Names the engine that runs scripts here: SHA-256 over the pinned QuickJS module and the library that scripts see. */
export function engineHash(): string {
  hash ??= createHash("sha256")
    .update(readFileSync(createRequire(import.meta.url).resolve("@jitl/quickjs-wasmfile-release-sync/wasm")))
    .update(LIBRARY)
    .digest("hex");
  return hash;
}
