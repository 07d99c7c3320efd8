import { beforeAll, describe, expect, it } from "vitest";
import { bundleLibrary } from "../../tests/support/bundle-library.ts";
import { SMALL_LAYOUT, SMALL_SONG, runScript } from "../../tests/support/run-script.ts";
import { createNodeHost } from "../../server/runs/node-host.worker.ts";
import { compileScript } from "../language/compile.ts";
import type { EngineHost } from "./engine.ts";
import { explainFailure } from "./explain.ts";
import type { GuestLuck } from "./guest.ts";
import { LIBRARY } from "./library.generated.ts";
import { GuestRuntime, type RuntimeResult } from "./runtime.ts";
import { buildTables } from "./tables.ts";

/**
 * The walls of the guest without the dialect check in front of them: whatever a script could write if
 * that check missed it.
 */
const TABLES = buildTables(SMALL_LAYOUT, SMALL_SONG);
const LUCK: GuestLuck = { seed: 1, streamOf: [0], streams: [[1, 2, 3]] };

let host: EngineHost;
beforeAll(async () => {
  host = await createNodeHost();
});

async function runRaw(body: string): Promise<RuntimeResult> {
  return new GuestRuntime(await host.newModule(), TABLES).run({
    code: `(function(words, marks) { ${body}\n})`,
    luck: LUCK,
  });
}

async function say(expression: string): Promise<string | undefined> {
  const result = await runRaw(`words.console.log(${expression});`);
  return result.report?.notes[0]?.text ?? result.report?.failure?.message ?? result.details;
}

describe("the guest's realm", () => {
  it("has none of the globals that tell time, watch memory or reach outside", async () => {
    const names = [
      "Date",
      "Proxy",
      "Reflect",
      "Promise",
      "WeakRef",
      "WeakMap",
      "FinalizationRegistry",
      "Intl",
      "Symbol",
      "BigInt",
      "eval",
      "Function",
      "SharedArrayBuffer",
      "Atomics",
      "ArrayBuffer",
      "Uint8Array",
      "DataView",
      "setTimeout",
      "queueMicrotask",
      "performance",
      "console",
      "print",
      "std",
      "os",
      "require",
      "process",
      "WebAssembly",
      "escape",
      "encodeURIComponent",
    ];
    const kinds = names.map((name) => `["${name}", typeof ${name}]`).join(",");
    expect(await say(`[${kinds}].filter(entry => entry[1] !== "undefined").map(entry => entry[0]).join(" ")`)).toBe("");
  });

  it.each([
    ["a function's constructor", "(function () {}).constructor"],
    ["an arrow's constructor", "(() => 1).constructor"],
    ["an async function's constructor", "(async function () {}).constructor"],
    ["a generator's constructor", "(function* () {}).constructor"],
    ["an async generator's constructor", "(async function* () {}).constructor"],
    ["a class's constructor", "(class {}).constructor"],
    ["a word's constructor", "words.wait.constructor"],
    ["a method's constructor", "[].map.constructor"],
  ])("compiles no text through %s", async (_, expression) => {
    const got = await say(`typeof ${expression} === "function" ? ${expression}("return 1")() : "nothing"`);
    expect(got).toBe("nothing");
  });

  it.each([
    "Object.prototype.x = 1",
    "Array.prototype.push = 1",
    "String.prototype.x = 1",
    "Math.random = () => 0",
    "JSON.stringify = () => 0",
    "Object.getPrototypeOf([][Object.getOwnPropertyNames([])[0]] ?? []).x = 1",
    "words.wait = 1",
    "words.square.all = 1",
    "words.song.bars[0] = 5",
    "words.square.all.on = 1",
    "Object.getPrototypeOf(words.square.all).on = 1",
    "Object.setPrototypeOf(Array.prototype, {})",
    "globalThis.Math = 1",
    "globalThis.fresh = 1",
    "marks.none.push(1)",
    "Error.prototype.toString = 1",
    "Map.prototype.get = 1",
    "RegExp.prototype.exec = 1",
  ])("does not let %s change anything", async (statement) => {
    const result = await runRaw(`"use strict"; ${statement};`);
    expect(result.report?.failure).toMatchObject({ code: "engine", name: "TypeError" });
  });

  it("counts fuel through every kind of loop, and an interrupt can not be caught", async () => {
    const result = await runRaw("for (;;) { try { for (;;) {} } catch (e) {} finally {} }");
    expect(result.end).toBe("out-of-fuel");
  });

  it("uses the same fuel for the same work", async () => {
    const one = await runRaw("for (let i = 0; i < 500000; i++) {}");
    const two = await runRaw("for (let i = 0; i < 500000; i++) {}");
    expect(one.fuel).toBe(two.fuel);
    expect(one.fuel).toBeGreaterThan(50);
  });
});

describe("a report that is missing", () => {
  it.each([
    ["a name of five million letters", "square.front", "unknown-front"],
    ["a colour of five million letters", "square.all.colour", "unknown-colour"],
  ])("is no good end: %s is a problem", async (_, word, code) => {
    const outcome = await runScript(`const long = "x".repeat(5e6);\n${word}(long);`);
    expect(outcome).toMatchObject({ ok: false, problem: { code, range: { line: 2 } } });
    if (!outcome.ok) expect(outcome.problem.sentence.length).toBeLessThan(200);
  });

  it("is a problem even when nothing else tells", () => {
    const compiled = compileScript("wait(1);", null);
    if (!compiled.ok) throw new Error(compiled.problem.sentence);
    const silent = { end: "ended", details: "", report: null, buffer: new Uint8Array(20), fuel: 0 } as const;
    expect(explainFailure(compiled, silent)).toMatchObject({ code: "could-not-run" });
  });
});

describe("library.generated.ts", () => {
  it("is what the library's source bundles to", async () => {
    expect(await bundleLibrary()).toContain(JSON.stringify(LIBRARY));
  });
});
