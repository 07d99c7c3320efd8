import { fileURLToPath } from "node:url";
import { build } from "esbuild";

const ENTRY = new URL("./run.worker.ts", import.meta.url);

/**
 * A worker, the pool's own by default, as one piece of plain JavaScript (CommonJS), its packages left
 * to `require`. A worker thread that loaded TypeScript through the loader of this process could hang for good when another
 * was ended while it loaded; a text needs no loader.
 */
export async function bundleWorker(entry: URL = ENTRY): Promise<string> {
  const { outputFiles } = await build({
    entryPoints: [fileURLToPath(entry)],
    bundle: true,
    write: false,
    platform: "node",
    format: "cjs",
    target: "node20",
    packages: "external",
    define: { "import.meta.url": JSON.stringify(entry.href) },
  });
  const [file] = outputFiles;
  if (file === undefined) throw new Error("The worker bundle is empty.");
  // A text has no folder of its own: packages are looked for from the worker's source.
  return `((require) => {${file.text}\n})(require("node:module").createRequire(${JSON.stringify(entry.href)}));`;
}
