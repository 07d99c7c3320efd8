import { createHash } from "node:crypto";
import { existsSync, readdirSync, readFileSync, writeFileSync } from "node:fs";
import path from "node:path";
import { runQuietly } from "./run-quietly.ts";

const ROOT = path.resolve(import.meta.dirname, "../..");
const STAMP = path.join(ROOT, "dist/client/.inputs");
/** Whatever can change the built client. */
const INPUT_FILES = ["index.html", "vite.config.ts", "package-lock.json"];
const INPUT_FOLDERS = ["src", "shared", "sandbox"];

/** Hash of every input of the build, by path and content. */
function hashInputs(): string {
  const hash = createHash("sha256");
  const inFolders = INPUT_FOLDERS.flatMap((folder) =>
    readdirSync(path.join(ROOT, folder), { recursive: true, withFileTypes: true })
      .filter((entry) => entry.isFile())
      .map((entry) => path.join(entry.parentPath, entry.name)),
  );
  const files = [...INPUT_FILES.map((file) => path.join(ROOT, file)), ...inFolders].sort();
  for (const file of files) hash.update(path.relative(ROOT, file)).update("\0").update(readFileSync(file)).update("\0");
  return hash.digest("hex");
}

/**
 * Builds the client with Vite unless the built one is made from the same inputs.
 * Rejects with an Error with Vite's output when the build fails.
 */
export async function ensureClientBuild(log: (line: string) => void): Promise<void> {
  const inputs = hashInputs();
  if (existsSync(STAMP) && readFileSync(STAMP, "utf8") === inputs) return;
  log("Building the pages, once (under a minute) ...");
  const built = await runQuietly(
    process.execPath,
    ["node_modules/vite/bin/vite.js", "build", "--logLevel", "warn"],
    ROOT,
  );
  if (!built.isOk) throw new Error(`The pages could not be built:\n${built.output}`);
  writeFileSync(STAMP, inputs);
}
