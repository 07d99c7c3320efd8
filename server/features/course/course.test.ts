import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { contracts } from "../../../shared/contracts/index.ts";
import { LESSONS } from "../../../lessons/index.ts";
import { exerciseAttempts } from "../../db/schema/index.ts";
import { buildClass, buildSong, buildSquare, buildUser } from "../../../tests/support/factories.ts";
import { BROKEN_SOURCE } from "../../../tests/support/fake-runs.ts";
import { createTestServer, type TestServer } from "../../../tests/support/test-server.ts";

const [lesson] = LESSONS;
const predict = lesson?.steps.find((step) => step.kind === "predict" && step.question);
const investigate = lesson?.steps.find((step) => step.kind === "investigate" && step.question);
const checked = lesson?.steps.find((step) => step.checks.length > 0);
if (!lesson || !predict || !investigate || !checked)
  throw new Error("Lesson 1 has a prediction, a question and a check.");
const lessonId = lesson.id;

let server: TestServer;
let wren: string;
let teacher: string;
beforeEach(() => {
  server = createTestServer();
  buildSquare(server.db);
  buildSong(server.db, { id: lesson.songId });
  wren = buildUser(server.db).id;
  teacher = buildUser(server.db, { roles: ["teacher"] }).id;
  buildClass(server.db, { teacherIds: [teacher], studentIds: [wren] });
});
afterEach(() => server.dispose());

const answer = (stepId: string, choice: number, as = wren) =>
  server.call(contracts.course.answer, { params: { lessonId, stepId }, body: { choice } }, { as });
const attempt = (stepId: string, source: string, as = wren) =>
  server.call(contracts.course.attempt, { params: { lessonId, stepId }, body: { source } }, { as });
const wrongChoice = investigate.question?.choices.findIndex((choice) => !choice.isRight) ?? -1;
const rightChoice = investigate.question?.choices.findIndex((choice) => choice.isRight) ?? -1;

describe("GET /api/lessons and /api/lessons/:lessonId", () => {
  it("lists the course with one's own progress and gives notes to teachers alone", async () => {
    await answer(predict.id, 0);
    const { body } = await server.call(contracts.course.lessons, {}, { as: wren });
    expect(body.lessons).toHaveLength(LESSONS.length);
    expect(body.lessons[0].steps.find((step: { id: string }) => step.id === predict.id).isDone).toBe(true);
    const open = (as: string) => server.call(contracts.course.lesson, { params: { lessonId } }, { as });
    expect((await open(wren)).body.teacherNotes).toEqual([]);
    expect((await open(teacher)).body.teacherNotes.length).toBeGreaterThan(0);
    expect(JSON.stringify((await open(wren)).body)).not.toContain('"solution"');
    expect(
      (await server.call(contracts.course.lesson, { params: { lessonId: "no-lesson" } }, { as: wren })).status,
    ).toBe(404);
  });
});

describe("PUT /api/lessons/:lessonId/steps/:stepId/answer", () => {
  it("finishes a prediction with any answer, a question with the right one, and stays done", async () => {
    expect((await answer(predict.id, 1)).body.progress).toMatchObject({ isDone: true, answer: 1 });
    expect((await answer(investigate.id, wrongChoice)).body.progress.isDone).toBe(false);
    expect((await answer(investigate.id, rightChoice)).body.progress.isDone).toBe(true);
    expect((await answer(investigate.id, wrongChoice)).body.progress).toMatchObject({
      isDone: true,
      answer: wrongChoice,
    });
  });

  it("refuses a choice that is not there, a step without a question, and an unknown step", async () => {
    expect((await answer(predict.id, 9)).body.errors[0].pointer).toBe("/choice");
    expect((await answer(checked.id, 0)).status).toBe(422);
    expect((await answer("no-step", 0)).status).toBe(404);
    expect((await answer(predict.id, 0, teacher)).status).toBe(403);
  });
});

describe("POST /api/lessons/:lessonId/steps/:stepId/attempts", () => {
  it("keeps script and try, and is not done while a check is not passed", async () => {
    const { status, body } = await attempt(checked.id, "// nothing yet\n");
    expect(status).toBe(200);
    expect(body.results.some((result: { state: string }) => result.state === "not-yet")).toBe(true);
    expect(body.progress).toMatchObject({ isDone: false, attempts: 1, source: "// nothing yet\n" });
    expect((await attempt(checked.id, "// again\n")).body.progress.attempts).toBe(2);
    expect(server.db.select().from(exerciseAttempts).all()).toHaveLength(2);
  });

  it("leaves the checks of a script that does not run waiting, and says why", async () => {
    const { body } = await attempt(checked.id, BROKEN_SOURCE);
    expect(body).toMatchObject({ hash: null, problem: { code: "unknown-word" }, progress: { isDone: false } });
    expect(body.results.every((result: { state: string }) => result.state === "waiting")).toBe(true);
  });

  it("refuses too many bytes and an unknown step", async () => {
    expect((await attempt(checked.id, "é".repeat(40_000))).status).toBe(413);
    expect((await attempt("no-step", "")).status).toBe(404);
  });
});
