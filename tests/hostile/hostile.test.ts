import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { createNodeHost } from "../../server/runs/node-host.worker.ts";
import { openChromiumLab, openEnginePage, type EnginePage } from "../engine-hosts/chromium-lab.ts";
import { KILLED, endOfOutcome, type RunEnd } from "../engine-hosts/ends.ts";
import { WAYS, type Lab, type Way } from "../engine-hosts/lab.ts";
import { openNodeLab } from "../engine-hosts/node-lab.ts";
import { runStraight } from "../engine-hosts/straight-run.ts";
import { runWell } from "../support/run-script.ts";
import { HONEST, toInput } from "./honest.ts";
import { keyOf, listJobs, runRound, type RoundResult } from "./round.ts";
import { HOSTILE_SCRIPTS } from "./scripts/index.ts";

/**
 * One shuffled round of the hostile scripts on both hosts, each whole and straight into the engine, two
 * at a time with honest runs between them. `HOSTILE_SEED` gives an order again.
 */
const SEED = Number(process.env["HOSTILE_SEED"] ?? Date.now() % 1_000_000);
const LANES = 2;
/** Far more than a busy machine needs. */
const ROUND_MS = 900_000;
const JOBS = listJobs(HOSTILE_SCRIPTS);

describe("hostile scripts", () => {
  let page: EnginePage;
  let labs: readonly Lab[] = [];
  let golden: Readonly<Record<Way, RunEnd>>;
  const rounds = new Map<string, ReadonlyMap<string, RoundResult>>();

  beforeAll(async () => {
    console.log(`Hostile scripts in the order of HOSTILE_SEED=${SEED}.`);
    golden = {
      whole: await endOfOutcome(await runWell(HONEST)),
      straight: await runStraight(await createNodeHost(), toInput(HONEST)),
    };
    page = await openEnginePage();
    labs = await Promise.all([openNodeLab(LANES), openChromiumLab(page)]);
    await Promise.all(
      labs.map(async (lab) => rounds.set(lab.name, await runRound(lab, JOBS, { lanes: LANES, seed: SEED }))),
    );
  }, ROUND_MS);
  afterAll(async () => {
    await Promise.all(labs.map((lab) => lab.close()));
    page.close();
  });

  const resultOf = (host: string, key: string): RoundResult => {
    const result = rounds.get(host)?.get(key);
    if (result === undefined) throw new Error(`${host} has no result of ${key}.`);
    return result;
  };

  it("are a hundred or more, and sixty or more reach the interpreter without the checks", () => {
    expect(new Set(HOSTILE_SCRIPTS.map(({ name }) => name)).size).toBe(HOSTILE_SCRIPTS.length);
    expect(HOSTILE_SCRIPTS.length).toBeGreaterThanOrEqual(100);
    const reaching = HOSTILE_SCRIPTS.filter(({ straight }) => straight !== null && straight !== "unreadable");
    expect(reaching.length).toBeGreaterThanOrEqual(60);
  });

  it.each(JOBS.map(({ way, script }) => [keyOf(way, script), way, script] as const))(
    "%s ends as expected, alike on both hosts, and harms no other run",
    (key, way, script) => {
      const node = resultOf("Node", key);
      const chromium = resultOf("Chromium", key);
      expect({ node: node.end.end, chromium: chromium.end.end }).toEqual({ node: script[way], chromium: script[way] });
      // Not only the same word: the same place, notes, cues and fuel.
      expect(chromium.end).toEqual(node.end);
      expect([node.honestAfter, chromium.honestAfter]).toEqual([golden[way], golden[way]]);
    },
  );

  it("end few runs from outside, and leave no more workers than run at once", async () => {
    const killed = JOBS.filter(({ way, script }) => script[way] === KILLED);
    expect(killed.length).toBeLessThan(JOBS.length / 10);
    for (const lab of labs) expect(await lab.countWorkers()).toBeLessThanOrEqual(LANES);
  });

  it("leave both hosts able to run what is honest", async () => {
    for (const lab of labs)
      for (const way of WAYS) expect(await lab[way](toInput(HONEST), ROUND_MS), lab.name).toEqual(golden[way]);
  });
});
