import { beforeAll, describe, expect, it } from "vitest";
import { checkExercise } from "../sandbox/course/check-exercise.ts";
import { createEngine } from "../sandbox/engine/engine.ts";
import type { Engine } from "../sandbox/engine/engine.ts";
import type { RunOutcome } from "../sandbox/engine/model.ts";
import { demoSong } from "../server/db/seed/world/songs/demo-songs.ts";
import { DEMO_SQUARE } from "../server/db/seed/world/square.ts";
import { createNodeHost } from "../server/runs/node-host.worker.ts";
import type { CheckResult } from "../shared/contracts/course.ts";
import { countText, readingGrade } from "../shared/reading-grade.ts";
import { LESSONS } from "./index.ts";
import type { LessonFile, LessonFileStep } from "./schema.ts";

let engine: Engine;
beforeAll(async () => {
  engine = createEngine(await createNodeHost());
});

function run(lesson: LessonFile, source: string): Promise<RunOutcome> {
  const song = demoSong(lesson.songId).beatMap;
  return engine.run({ source, songId: lesson.songId, song, layout: DEMO_SQUARE, seed: lesson.seed });
}

async function check(lesson: LessonFile, step: LessonFileStep, source: string): Promise<readonly CheckResult[]> {
  const aim = step.aim === null ? null : (await run(lesson, step.aim)).timeline;
  const outcome = await run(lesson, source);
  return checkExercise(step, { outcome, source, layout: DEMO_SQUARE, song: demoSong(lesson.songId).beatMap, aim });
}

const steps = LESSONS.flatMap((lesson) =>
  lesson.steps.map((step) => [`${lesson.id}/${step.id}`, lesson, step] as const),
);
const checked = steps.filter(([, , step]) => step.checks.length > 0);

describe("every exercise", () => {
  it.each(checked)("%s is passed by its solution", async (_, lesson, step) => {
    expect(step.solution).not.toBeNull();
    const results = await check(lesson, step, step.solution ?? "");
    expect(results.filter((result) => result.state !== "passed")).toEqual([]);
  });

  // A step of kind "run" is there to be run as it stands.
  it.each(checked.filter(([, , step]) => step.kind !== "run"))(
    "%s is not passed by its starter, and says what to try",
    async (_, lesson, step) => {
      const results = await check(lesson, step, step.starter ?? "");
      expect(results).toHaveLength(step.checks.length);
      expect(results.every((result) => result.state === "passed")).toBe(false);
      for (const result of results) if (result.state === "not-yet") expect(result.hint).not.toBeNull();
    },
  );

  it.each(checked)("%s is not passed by an empty script", async (_, lesson, step) => {
    const results = await check(lesson, step, "");
    expect(results.some((result) => result.state === "not-yet")).toBe(true);
  });

  it.each(steps.filter(([, , step]) => step.aim !== null))(
    "%s has an aim that runs and lights something",
    async (_, lesson, step) => {
      const outcome = await run(lesson, step.aim ?? "");
      expect(outcome.ok).toBe(true);
      expect(outcome.cueCount).toBeGreaterThan(0);
    },
  );
});

describe("questions", () => {
  // What happens when the script of a question is run, as its right answer says.
  it("first-light/without-wait: the bakery stays dark", async () => {
    const [lesson] = LESSONS;
    const step = lesson?.steps.find((one) => one.id === "without-wait");
    if (!lesson || !step) throw new Error("The step is gone.");
    const darkness = {
      ...step,
      checks: [0, 0.1, 1].map((atBeat, n) => ({
        id: `d${n}`,
        kind: "dark" as const,
        lights: { front: "bakery" },
        atBeat,
        text: "It is dark.",
        hint: "Nothing.",
      })),
    };
    expect((await check(lesson, darkness, step.starter ?? "")).map((result) => result.state)).toEqual([
      "passed",
      "passed",
      "passed",
    ]);
  });

  it("changing-colours/kept-answer: the note says 2", async () => {
    const lesson = LESSONS[1];
    const step = lesson?.steps.find((one) => one.id === "kept-answer");
    if (!lesson || !step) throw new Error("The step is gone.");
    expect((await run(lesson, step.starter ?? "")).notes.map((note) => note.text)).toEqual(["2"]);
  });

  it("for-each-front/four-lines: 41 pulses", async () => {
    const lesson = LESSONS[2];
    const step = lesson?.steps.find((one) => one.id === "four-lines");
    if (!lesson || !step) throw new Error("The step is gone.");
    expect((await run(lesson, step.starter ?? "")).cueCount).toBe(41);
  });
});

describe("steps that are to be mended or explained", () => {
  it.each([
    ["first-light/quotes", "needs-quotes"],
    ["for-each-front/missing-brace", "missing-bracket"],
    ["decisions/one-or-three", "one-equals"],
    ["functions/named-not-run", "not-run"],
    ["song-data/too-early", "ran-too-early"],
  ])("%s stops with %s", async (id, code) => {
    const [, lesson, step] = steps.find(([name]) => name === id) ?? [];
    if (!lesson || !step) throw new Error("The step is gone.");
    const outcome = await run(lesson, step.starter ?? "");
    expect(outcome.ok ? "it ran" : outcome.problem.code).toBe(code);
  });

  it("no other starter is stopped by a problem", async () => {
    const mended = [
      "first-light/quotes",
      "for-each-front/missing-brace",
      "decisions/one-or-three",
      "functions/named-not-run",
      "song-data/too-early",
    ];
    const stopped: string[] = [];
    for (const [id, lesson, step] of steps) {
      if (step.starter === null || mended.includes(id)) continue;
      const outcome = await run(lesson, step.starter);
      if (!outcome.ok) stopped.push(`${id}: ${outcome.problem.code}`);
    }
    expect(stopped).toEqual([]);
  }, 60_000);
});

describe("the course", () => {
  it("numbers its lessons from 1 and names every step once", () => {
    expect(LESSONS.map((lesson) => lesson.number)).toEqual(LESSONS.map((_, n) => n + 1));
    for (const lesson of LESSONS) {
      expect(new Set(lesson.steps.map((step) => step.id)).size).toBe(lesson.steps.length);
      for (const step of lesson.steps) expect(new Set(step.checks.map((one) => one.id)).size).toBe(step.checks.length);
    }
  });

  it("goes through predict, run, investigate, change and make in that order (Sentance's five stages)", () => {
    for (const lesson of LESSONS) {
      const kinds = lesson.steps.map((step) => ["predict", "run", "investigate", "change", "make"].indexOf(step.kind));
      expect(kinds).toEqual(kinds.toSorted((a, b) => a - b));
      expect(new Set(kinds).size).toBe(5);
    }
  });

  it("is written for readers of grade 5 or 6 (common practice for these classes, no source)", () => {
    for (const lesson of LESSONS) {
      const text = lesson.steps.flatMap((step) => [
        ...step.text,
        ...step.checks.flatMap((one) => [one.text, one.hint]),
        ...(step.question === null ? [] : [step.question.ask, ...step.question.choices.map((choice) => choice.answer)]),
      ]);
      for (const paragraph of text) expect(readingGrade(countText(paragraph)), paragraph).toBeLessThan(9);
      expect(readingGrade(countText(text.join(" "))), lesson.title).toBeLessThanOrEqual(6);
    }
  });
});
