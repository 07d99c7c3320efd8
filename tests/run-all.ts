import { spawn, spawnSync } from "node:child_process";
import { mkdtempSync, readFileSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { ensureClientBuild } from "../server/cli/client-build.ts";
import { ensureNativeModule } from "../server/cli/native-module.ts";
import { STATIC_CHECKS, type StaticCheck } from "./support/static-checks.ts";
import { ensureChromium } from "./support/chromium.ts";
import { ensureFfmpeg } from "./support/ffmpeg.ts";

/**
 * `npm test`: every check, all of them even when one fails. The static checks run two at a time, the
 * test runner and the browser alone. A check outside the test runner counts as one test. Ends with
 * the names of all that failed and `N passed, N failed` on a line of its own.
 */

const LANES = 2;

interface Outcome {
  readonly name: string;
  readonly passed: number;
  /** What failed, one name each. */
  readonly failed: readonly string[];
  readonly seconds: number;
}

const say = (line: string) => console.log(line);
const outcomes: Outcome[] = [];

/** Runs one static check to its end; its output is printed in one piece, so that two do not mix. */
async function runStaticCheck({ name, args }: StaticCheck): Promise<void> {
  const start = performance.now();
  const child = spawn(process.execPath, args, { stdio: ["ignore", "pipe", "pipe"] });
  let printed = "";
  child.stdout.on("data", (chunk: Buffer) => (printed += chunk.toString()));
  child.stderr.on("data", (chunk: Buffer) => (printed += chunk.toString()));
  const isOk = await new Promise<boolean>((resolve) => child.once("close", (code) => resolve(code === 0)));
  say(`\n== ${name}: ${isOk ? "ok" : "FAILED"}\n${printed.trimEnd()}`);
  outcomes.push({
    name,
    passed: isOk ? 1 : 0,
    failed: isOk ? [] : [name],
    seconds: (performance.now() - start) / 1000,
  });
}

async function runStaticChecks(): Promise<void> {
  const waiting = [...STATIC_CHECKS];
  const lane = async () => {
    for (let next = waiting.shift(); next !== undefined; next = waiting.shift()) await runStaticCheck(next);
  };
  await Promise.all(Array.from({ length: LANES }, lane));
}

interface VitestReport {
  readonly numPassedTests: number;
  readonly success: boolean;
  readonly testResults: readonly {
    readonly name: string;
    readonly status: string;
    readonly assertionResults: readonly { readonly fullName: string; readonly status: string }[];
  }[];
}

/** Names of what did not pass: a skipped test and a file that does not load count as failed. */
function listFailures(report: VitestReport): string[] {
  return report.testResults.flatMap((file) => {
    const where = path.relative(process.cwd(), file.name);
    const broken = file.assertionResults.filter(({ status }) => status !== "passed");
    if (broken.length === 0 && file.status !== "passed") return [`${where} did not load`];
    return broken.map(({ fullName, status }) => `${where}: ${fullName}${status === "failed" ? "" : ` (${status})`}`);
  });
}

/** Runs vitest projects; an empty run counts as a failure. */
function runVitest(name: string, args: readonly string[]): void {
  say(`\n== ${name}`);
  const start = performance.now();
  const folder = mkdtempSync(path.join(tmpdir(), "duskbell-test-"));
  const file = path.join(folder, "report.json");
  const vitest = ["node_modules/vitest/vitest.mjs", "run", "--reporter=default", "--reporter=json"];
  const isOk =
    spawnSync(process.execPath, [...vitest, `--outputFile.json=${file}`, ...args], { stdio: "inherit" }).status === 0;
  const seconds = (performance.now() - start) / 1000;
  try {
    const report = JSON.parse(readFileSync(file, "utf8")) as VitestReport;
    const failed = listFailures(report);
    if (failed.length === 0 && (!isOk || report.numPassedTests === 0)) failed.push(`${name}: the run itself`);
    outcomes.push({ name, passed: report.numPassedTests, failed, seconds });
  } catch {
    outcomes.push({ name, passed: 0, failed: [`${name}: no report was written`], seconds });
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

try {
  ensureChromium(say);
  ensureFfmpeg(say);
  await Promise.all([ensureNativeModule(say), ensureClientBuild(say)]);
} catch (error) {
  console.error(error instanceof Error ? error.message : error);
  console.log("0 passed, 1 failed");
  process.exit(1);
}

await runStaticChecks();
const SIDES = ["sandbox", "shared", "server", "src", "tests"];
runVitest(
  "unit, property and HTTP tests",
  SIDES.map((side) => `--project=${side}`),
);
runVitest("browser journeys", ["--project=journeys"]);

say("");
for (const { name, passed, failed, seconds } of outcomes) {
  const word = failed.length === 0 ? "ok  " : "FAIL";
  say(`${word} ${name}: ${passed} passed, ${failed.length} failed, ${seconds.toFixed(0)} s`);
}
const failures = outcomes.flatMap(({ failed }) => failed);
for (const failure of failures) say(`failed: ${failure}`);
const passed = outcomes.reduce((sum, outcome) => sum + outcome.passed, 0);
say(`${passed} passed, ${failures.length} failed`);
process.exit(failures.length === 0 ? 0 : 1);
