import { spawnSync } from "node:child_process";
import { createRequire } from "node:module";
import { runQuietly } from "./run-quietly.ts";

const COMPILERS = ["python3", "make", "g++"] as const;
const APT_PACKAGES = "python3 make g++";

/** True when the database driver's compiled part is there and loads in this Node. */
function loads(): boolean {
  const check = 'const D = require("better-sqlite3"); new D(":memory:").close();';
  return spawnSync(process.execPath, ["-e", check], { stdio: "ignore" }).status === 0;
}

function isOnPath(program: string): boolean {
  return spawnSync(program, ["--version"], { stdio: "ignore" }).status === 0;
}

/**
 * Makes sure that better-sqlite3 is compiled for this machine. `npm ci` runs no install scripts here
 * (.npmrc), so that the compilers can be looked for first: without them, root installs them with
 * apt-get, anybody else is told the command. Rejects with an Error that names what to do.
 */
export async function ensureNativeModule(log: (line: string) => void): Promise<void> {
  createRequire(import.meta.url).resolve("better-sqlite3/package.json");
  if (loads()) return;
  const missing = COMPILERS.filter((program) => !isOnPath(program));
  if (missing.length > 0) installCompilers(missing, log);
  log("Compiling the database driver, once (about a minute) ...");
  const built = await runQuietly("npm", ["rebuild", "better-sqlite3", "--ignore-scripts=false"]);
  if (!built.isOk || !loads()) {
    throw new Error(`The database driver (better-sqlite3) could not be compiled:\n${built.output}`);
  }
}

function installCompilers(missing: readonly string[], log: (line: string) => void): void {
  const command = `apt-get update && apt-get install -y ${APT_PACKAGES}`;
  const needs = `The database driver is compiled on this machine and needs ${missing.join(", ")}.`;
  if (process.getuid?.() !== 0 || !isOnPath("apt-get"))
    throw new Error(`${needs} Install them first:\n  sudo sh -c "${command}"`);
  log(`${needs} Installing them with apt-get ...`);
  const installed = spawnSync("sh", ["-c", command], { encoding: "utf8" });
  if (installed.status !== 0) throw new Error(`${needs} This failed:\n  ${command}\n${installed.stderr}`);
}
