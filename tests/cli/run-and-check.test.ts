import { spawnSync } from "node:child_process";
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { describe, expect, it } from "vitest";

/** A command loads the compiler and the engine; on a busy machine that takes its time. */
const SLOW_MS = 120_000;
const ROOT = path.resolve(import.meta.dirname, "../..");

function duskbell(...args: readonly string[]) {
  const { status, stdout, stderr } = spawnSync(process.execPath, ["--import", "tsx", "server/cli/main.ts", ...args], {
    cwd: ROOT,
    encoding: "utf8",
  });
  return { status, stdout, stderr };
}

interface Sidecar {
  readonly song: string;
  readonly seed: number;
  readonly hash: string;
}

describe("duskbell run", () => {
  it("comes to the hash that is kept beside the sample", { timeout: SLOW_MS }, () => {
    const kept = JSON.parse(readFileSync(path.join(ROOT, "tests/samples/melody.json"), "utf8")) as Sidecar;
    const { status, stdout } = duskbell(
      "run",
      "tests/samples/melody.ts",
      "--song",
      kept.song,
      "--seed",
      String(kept.seed),
      "--json",
    );
    expect(status).toBe(0);
    const outcome = JSON.parse(stdout) as { ok: boolean; hash: string };
    expect(outcome.ok).toBe(true);
    // The song's name in the database is part of the hash; here it is the demo song's own id, as in the sidecar.
    expect(outcome.hash).toBe(kept.hash);
  });

  it("names the option and the fix, and exits with 2", { timeout: SLOW_MS }, () => {
    const { status, stderr } = duskbell("run", "tests/samples/melody.ts", "--song", "no-such-song");
    expect(status).toBe(2);
    expect(stderr).toContain("--song takes frost-fair");
  });
});

describe("duskbell check", () => {
  it("names values of the wrong kind in the editor's words", { timeout: SLOW_MS }, () => {
    const folder = mkdtempSync(path.join(tmpdir(), "duskbell-check-"));
    try {
      const file = path.join(folder, "kinds.ts");
      writeFileSync(
        file,
        "function later(level: string) {\n  return level;\n}\nif (now() > 4) later(3);\nsquare.all.on();\n",
      );
      const { status, stdout } = duskbell("check", file, "--song", "frost-fair");
      expect(status).toBe(0);
      expect(stdout).toContain("  kind: `later` needs a text here, but this is 3. (line 4)");
    } finally {
      rmSync(folder, { recursive: true, force: true });
    }
  });

  it("says why a script does not run, with its line, and exits with 1", { timeout: SLOW_MS }, () => {
    // The waltz asks for bar 0, which only a song with a pick-up has.
    const { status, stdout } = duskbell("check", "tests/samples/waltz.ts", "--song", "frost-fair");
    expect(status).toBe(1);
    expect(stdout).toContain("tests/samples/waltz.ts: does not run. Line 1:");
  });
});
