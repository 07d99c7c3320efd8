import { spawnSync } from "node:child_process";
import { mkdtempSync, readFileSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { ensureClientBuild } from "../server/cli/client-build.ts";
import { ensureNativeModule } from "../server/cli/native-module.ts";
import { ensureChromium } from "./support/chromium.ts";

/**
 * `npm test`: every check, one after the other, all of them even when one fails. A check outside the
 * test runner counts as one test. Ends with `N passed, N failed` on a line of its own.
 */

interface Outcome {
  readonly name: string;
  readonly passed: number;
  readonly failed: number;
  readonly seconds: number;
}

const say = (line: string) => console.log(line);
const outcomes: Outcome[] = [];

function node(args: readonly string[]): boolean {
  return spawnSync(process.execPath, args, { stdio: "inherit" }).status === 0;
}

function check(name: string, work: () => boolean): void {
  say(`\n== ${name}`);
  const start = performance.now();
  const isOk = work();
  outcomes.push({ name, passed: isOk ? 1 : 0, failed: isOk ? 0 : 1, seconds: (performance.now() - start) / 1000 });
}

interface VitestReport {
  readonly numPassedTests: number;
  readonly numFailedTests: number;
  readonly numPendingTests: number;
  readonly numTodoTests: number;
  readonly success: boolean;
}

/** Runs vitest projects; a file that fails to load, a skipped or an empty run counts as a failure. */
function vitest(name: string, args: readonly string[]): void {
  say(`\n== ${name}`);
  const start = performance.now();
  const folder = mkdtempSync(path.join(tmpdir(), "duskbell-test-"));
  const file = path.join(folder, "report.json");
  const isOk = node([
    "node_modules/vitest/vitest.mjs",
    "run",
    "--reporter=default",
    "--reporter=json",
    `--outputFile.json=${file}`,
    ...args,
  ]);
  const outcome = { name, passed: 0, failed: 1, seconds: (performance.now() - start) / 1000 };
  try {
    const report = JSON.parse(readFileSync(file, "utf8")) as VitestReport;
    const skipped = report.numPendingTests + report.numTodoTests;
    if (skipped > 0) say(`${skipped} tests were skipped: that counts as failed.`);
    const broken = report.numFailedTests + skipped;
    const isEmpty = report.numPassedTests === 0;
    outcomes.push({ ...outcome, passed: report.numPassedTests, failed: broken > 0 || (isOk && !isEmpty) ? broken : 1 });
  } catch {
    outcomes.push(outcome);
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

try {
  ensureChromium(say);
  await Promise.all([ensureNativeModule(say), ensureClientBuild(say)]);
} catch (error) {
  console.error(error instanceof Error ? error.message : error);
  console.log("0 passed, 1 failed");
  process.exit(1);
}

check("format", () => node(["node_modules/prettier/bin/prettier.cjs", "--check", "--log-level=warn", "."]));
for (const project of ["sandbox", "src", "server", "tests"]) {
  check(`types: ${project}`, () => node(["node_modules/typescript/bin/tsc", "-p", `tsconfig.${project}.json`]));
}
check("lint", () => node(["node_modules/eslint/bin/eslint.js", ".", "--max-warnings=0"]));
check("arrows", () =>
  node([
    "node_modules/dependency-cruiser/bin/dependency-cruise.mjs",
    "src",
    "server",
    "sandbox",
    "shared",
    "lessons",
    "--config",
    ".dependency-cruiser.mjs",
  ]),
);
check("unused code", () => node(["node_modules/knip/bin/knip.js"]));
check("migrations match the schema", () => node(["node_modules/drizzle-kit/bin.cjs", "check"]));
vitest("unit, property and HTTP tests", [
  "--project=sandbox",
  "--project=shared",
  "--project=server",
  "--project=src",
  "--project=tests",
]);
vitest("browser journeys", ["--project=journeys"]);

say("");
for (const { name, passed, failed, seconds } of outcomes) {
  say(`${failed === 0 ? "ok  " : "FAIL"} ${name}: ${passed} passed, ${failed} failed, ${seconds.toFixed(0)} s`);
}
const passed = outcomes.reduce((sum, outcome) => sum + outcome.passed, 0);
const failed = outcomes.reduce((sum, outcome) => sum + outcome.failed, 0);
say(`${passed} passed, ${failed} failed`);
process.exit(failed === 0 ? 0 : 1);
