import { beforeAll, describe, expect, it } from "vitest";
import { checkShow, hasStop } from "../../../../../sandbox/checks/index.ts";
import { createEngine } from "../../../../../sandbox/engine/engine.ts";
import type { Engine } from "../../../../../sandbox/engine/engine.ts";
import type { RunOutcome } from "../../../../../sandbox/engine/model.ts";
import { createNodeHost } from "../../../../runs/node-host.worker.ts";
import { demoStudent } from "../people.ts";
import { demoSong } from "../songs/demo-songs.ts";
import { DEMO_SQUARE } from "../square.ts";
import type { DemoScript } from "./demo-script.ts";
import { demoScript, DEMO_SCRIPTS } from "./index.ts";

let engine: Engine;
beforeAll(async () => {
  engine = createEngine(await createNodeHost());
});

function run(script: DemoScript): Promise<RunOutcome> {
  return engine.run({
    source: script.source,
    songId: script.songId,
    song: demoSong(script.songId).beatMap,
    layout: DEMO_SQUARE,
    seed: script.seed,
  });
}

const rows = DEMO_SCRIPTS.map((script) => [script.title, script] as const);

describe("the shows of the demo world", () => {
  it("are about sixty, each with an id, a title and authors of its own", () => {
    expect(DEMO_SCRIPTS.length).toBeGreaterThanOrEqual(60);
    expect(new Set(DEMO_SCRIPTS.map((script) => script.id)).size).toBe(DEMO_SCRIPTS.length);
    expect(new Set(DEMO_SCRIPTS.map((script) => script.title)).size).toBe(DEMO_SCRIPTS.length);
    for (const script of DEMO_SCRIPTS)
      expect(script.authors.map((key) => demoStudent(key).key)).toEqual([...script.authors]);
  });

  it.each(rows.filter(([, script]) => script.expected.runs))("%s runs", async (_, script) => {
    const outcome = await run(script);
    expect(
      outcome.ok ? null : `${outcome.problem.code}: ${outcome.problem.sentence} (line ${outcome.problem.range.line})`,
    ).toBeNull();
    if (script.id !== "empty-page") expect(outcome.cueCount).toBeGreaterThan(0);
  });

  it.each(rows.filter(([, script]) => !script.expected.runs))("%s is stopped by its own problem", async (_, script) => {
    const outcome = await run(script);
    expect(outcome.ok ? "it ran" : outcome.problem.code).toBe(script.expected.runs ? "" : script.expected.problem);
  });
});

describe("findings that the demo shows", () => {
  const rules = async (id: string): Promise<string[]> =>
    (await run(demoScript(id))).findings.map((finding) => finding.rule);

  it.each([
    ["too-bright", "level-clamped"],
    ["much-too-long", "after-the-end"],
    ["stairs", "level-clamped"],
  ])("%s has %s", async (id, rule) => {
    expect(await rules(id)).toContain(rule);
  });
});

describe("the show check of the demo's shows", () => {
  async function stops(script: DemoScript): Promise<string[]> {
    const outcome = await run(script);
    if (!outcome.ok) return ["does-not-run"];
    const findings = checkShow({
      timeline: outcome.timeline,
      layout: DEMO_SQUARE,
      song: demoSong(script.songId).beatMap,
    });
    return hasStop(findings)
      ? findings.filter((finding) => finding.severity === "stop").map((finding) => finding.rule)
      : [];
  }

  const STOPPED: { readonly [id: string]: string } = { lightning: "street-flash", "empty-page": "nothing-lit" };

  it.each(rows.filter(([, script]) => script.expected.runs))("%s", async (_, script) => {
    const wanted = STOPPED[script.id];
    expect([...new Set(await stops(script))]).toEqual(wanted === undefined ? [] : [wanted]);
  });
});
