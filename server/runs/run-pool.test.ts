import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { judgeRun } from "../../sandbox/checks/judge-run.ts";
import type { RunInput, RunOutcome } from "../../sandbox/engine/model.ts";
import { SMALL_LAYOUT, SMALL_SONG, runScript, runWell } from "../../tests/support/run-script.ts";
import { FairQueue } from "./fair-queue.ts";
import { JudgingFailedError, RunPoolClosedError, RunQueueFullError, createRunPool, type RunPool } from "./run-pool.ts";
import { createStoppedAnswer } from "./stopped-answer.ts";

const HONEST =
  'for (const front of square.fronts) {\n  front.pulse(1, "gold");\n  wait(roll(3));\n}\nsquare.all.shuffled().off();';

/** A child process loads the compiler and the engine; on a busy machine that takes its time. */
const SLOW_MS = 90_000;

function inputOf(source: string): RunInput {
  return { source, songId: "small", song: SMALL_SONG, layout: SMALL_LAYOUT, seed: 7 };
}

describe("createRunPool", () => {
  let pool: RunPool;
  let golden: string;

  beforeAll(async () => {
    pool = createRunPool({ deadlineMs: 30_000 });
    golden = (await runWell(HONEST)).hash;
  });
  afterAll(() => pool.close());

  it("gives the hash of a direct run", { timeout: SLOW_MS }, async () => {
    const outcome = await pool.run(inputOf(HONEST));
    expect(outcome).toMatchObject({ ok: true, hash: golden });
    expect(outcome.engineMs).toBeGreaterThan(0);
  });

  it("judges a run as judging it here does", { timeout: SLOW_MS }, async () => {
    const input = inputOf(HONEST);
    const judged = await pool.judge(input);
    expect(judged).toEqual(judgeRun(await runWell(HONEST), input.layout, input.song));
    expect(judged).toMatchObject({ problem: null, hash: golden, ribbon: { rows: 4, columns: 320 } });
  });

  it("judges what a script wrote before its problem", { timeout: SLOW_MS }, async () => {
    const stopped = await pool.judge(inputOf("square.all.on();\nwait(1);\nwait(1 - 3);"));
    expect(stopped).toMatchObject({ problem: { code: "negative-time", range: { line: 3 } }, hash: null });
    expect(stopped.findings).toMatchObject([{ rule: "incomplete", severity: "stop" }]);
  });

  it("rejects a run that it can not judge, and judges the next", { timeout: SLOW_MS }, async () => {
    // A front without an outline can not be drawn; scripts do not ask for it.
    const fronts = SMALL_LAYOUT.fronts.map((front) => ({ ...front, silhouette: undefined }));
    const broken = { ...inputOf(HONEST), layout: { ...SMALL_LAYOUT, fronts } as unknown as RunInput["layout"] };
    await expect(pool.judge(broken)).rejects.toBeInstanceOf(JudgingFailedError);
    expect(await pool.judge(inputOf(HONEST))).toMatchObject({ hash: golden });
  });

  it("carries the timeline across as typed arrays", async () => {
    const outcome = await pool.run(inputOf("square.all.on(40);"));
    expect(outcome.timeline?.cues.tick).toBeInstanceOf(Uint32Array);
    expect(outcome.timeline?.selections[0]).toEqual(Uint16Array.from([0, 1, 2, 3, 4, 5, 6, 7, 8]));
  });

  it.each([
    ["lists", "const a = [];\nfor (;;) a.push(new Array(1000).fill(0));"],
    ["classes", "const a = [];\nfor (;;) a.push(class { x = 1; });"],
  ])(
    "ends a script that fills the memory with %s at the same step as a run here",
    { timeout: SLOW_MS },
    async (_, source) => {
      // A thread whose memory grows gets much further, and its problem is another one.
      const { problem, fuel } = (await runScript(source)) as Extract<RunOutcome, { ok: false }>;
      expect(await pool.run(inputOf(source))).toMatchObject({ ok: false, problem, fuel });
      expect(problem.code).toBe("too-big");
    },
  );

  it("answers an honest run of another class while thirty hostile ones wait", { timeout: SLOW_MS }, async () => {
    const order: string[] = [];
    const hostile = Array.from({ length: 30 }, () =>
      pool.run(inputOf("while (true) {}"), { classId: "loud" }).then(() => order.push("loud")),
    );
    const honest = pool.run(inputOf(HONEST), { classId: "quiet" }).then((outcome) => {
      order.push("quiet");
      return outcome;
    });
    expect(await honest).toMatchObject({ ok: true, hash: golden });
    await Promise.all(hostile);
    expect(order).toHaveLength(31);
    expect(order.indexOf("quiet")).toBeLessThanOrEqual(4);
  });

  it("serves classes in turn, however many runs each has asked for", { timeout: SLOW_MS }, async () => {
    const single = createRunPool({ threads: 1 });
    try {
      const order: string[] = [];
      const ask = (classId: string) => single.run(inputOf(HONEST), { classId }).then(() => order.push(classId));
      await Promise.all([..."aaaaaabbc"].map(ask));
      expect(order.join("")).toBe("abcabaaaa");
    } finally {
      await single.close();
    }
  });

  it("lets one class fill half of the queue and no more", { timeout: SLOW_MS }, async () => {
    const small = createRunPool({ threads: 1, maxWaiting: 4 });
    try {
      const ask = (classId: string) => small.run(inputOf(HONEST), { classId });
      const taken = [ask("loud"), ask("loud")];
      await expect(ask("loud")).rejects.toBeInstanceOf(RunQueueFullError);
      taken.push(ask("quiet"), ask("quiet"));
      await expect(ask("third")).rejects.toBeInstanceOf(RunQueueFullError);
      for (const outcome of await Promise.all(taken)) expect(outcome).toMatchObject({ ok: true, hash: golden });
    } finally {
      await small.close();
    }
  });

  it("refuses a run when too many wait, and takes the next one later", { timeout: SLOW_MS }, async () => {
    const small = createRunPool({ threads: 1, maxWaiting: 1 });
    try {
      const waiting = small.run(inputOf(HONEST));
      await expect(small.run(inputOf(HONEST))).rejects.toBeInstanceOf(RunQueueFullError);
      expect(await waiting).toMatchObject({ ok: true, hash: golden });
      expect(await small.run(inputOf(HONEST))).toMatchObject({ ok: true });
    } finally {
      await small.close();
    }
  });

  it("rejects what is under way when it is closed, and everything after", { timeout: SLOW_MS }, async () => {
    const short = createRunPool({ threads: 1 });
    const running = short.run(inputOf("while (true) {}"));
    const refused = expect(running).rejects.toBeInstanceOf(RunPoolClosedError);
    await short.close();
    await refused;
    await expect(short.run(inputOf(HONEST))).rejects.toBeInstanceOf(RunPoolClosedError);
  });
});

describe("createStoppedAnswer", () => {
  it("names the reason and keeps nothing, whatever was wanted", () => {
    const why = { code: "too-much-work", details: "Stopped after 5 ms.", engineMs: 5 } as const;
    const problem = { code: "too-much-work", details: "Stopped after 5 ms." };
    expect(createStoppedAnswer("run", inputOf(HONEST), why)).toMatchObject({
      outcome: { ok: false, problem, engineMs: 5 },
    });
    expect(createStoppedAnswer("judge", inputOf(HONEST), why)).toMatchObject({
      judged: { problem, hash: null, timeline: null, ribbon: null, findings: [], description: "Nothing lights up." },
    });
  });
});

describe("FairQueue", () => {
  it("serves groups in turn and each group in its order", () => {
    const queue = new FairQueue<string>();
    for (const item of ["a1", "a2", "a3"]) queue.add("a", item);
    queue.add("b", "b1");
    queue.add("b", "b2");
    expect([queue.take(), queue.take(), queue.take(), queue.take(), queue.take(), queue.take()]).toEqual([
      "a1",
      "b1",
      "a2",
      "b2",
      "a3",
      undefined,
    ]);
    expect(queue.size).toBe(0);
  });

  it("puts an item back at the very front", () => {
    const queue = new FairQueue<string>();
    queue.add("a", "a1");
    queue.add("b", "b1");
    queue.addFirst("b", "b0");
    expect([queue.take(), queue.take(), queue.take()]).toEqual(["b0", "a1", "b1"]);
  });
});
