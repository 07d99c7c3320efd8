import { spawnSync } from "node:child_process";
import { existsSync } from "node:fs";

const PLACES = ["/usr/bin/chromium", "/usr/bin/chromium-browser", "/usr/bin/google-chrome"];
const APT_COMMAND = "apt-get update && apt-get install -y --no-install-recommends chromium";

/** The browser's program, from CHROMIUM_PATH or the usual places; null when there is none. */
export function findChromium(): string | null {
  const named = process.env["CHROMIUM_PATH"];
  if (named !== undefined && named !== "") return existsSync(named) ? named : null;
  return PLACES.find((place) => existsSync(place)) ?? null;
}

/**
 * Gives the browser's program; root gets it installed with apt-get. Throws an Error that names the
 * command for everybody else: browser checks are never skipped.
 */
export function ensureChromium(log: (line: string) => void): string {
  const found = findChromium();
  if (found !== null) return found;
  const needs = "The browser checks need Chromium.";
  if (process.getuid?.() !== 0)
    throw new Error(`${needs} Install it first:\n  sudo sh -c "${APT_COMMAND}"\nor set CHROMIUM_PATH.`);
  log(`${needs} Installing it with apt-get ...`);
  const installed = spawnSync("sh", ["-c", APT_COMMAND], { encoding: "utf8" });
  const path = findChromium();
  if (path === null) throw new Error(`${needs} This failed:\n  ${APT_COMMAND}\n${installed.stderr}`);
  return path;
}
