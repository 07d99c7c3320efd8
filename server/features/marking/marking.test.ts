import { eq } from "drizzle-orm";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { contracts } from "../../../shared/contracts/index.ts";
import { auditLog, comments, submissionEvents, submissions } from "../../db/schema/index.ts";
import {
  buildAssignment,
  buildClass,
  buildComment,
  buildForward,
  buildMark,
  buildSquare,
  buildSubmission,
  buildUser,
  buildVersion,
} from "../../../tests/support/factories.ts";
import { createTestServer, type TestServer } from "../../../tests/support/test-server.ts";

let server: TestServer;
let wren: string;
let ash: string;
let teacher: string;
let otherTeacher: string;
let classId: string;
let assignment: ReturnType<typeof buildAssignment>;
let submission: ReturnType<typeof buildSubmission>;

const criterion = (id: string, name: string) => ({
  id,
  name,
  levels: ["Not yet", "Nearly", "There", "Beyond"].map((level) => ({ name: level, text: level })),
});

beforeEach(() => {
  server = createTestServer();
  buildSquare(server.db);
  wren = buildUser(server.db, { displayName: "Wren" }).id;
  ash = buildUser(server.db).id;
  teacher = buildUser(server.db, { roles: ["teacher"], displayName: "Ms Marlow" }).id;
  otherTeacher = buildUser(server.db, { roles: ["teacher"] }).id;
  classId = buildClass(server.db, { teacherIds: [teacher], studentIds: [wren, ash] }).id;
  assignment = buildAssignment(server.db, {
    classId,
    rubric: [criterion("timing", "Timing"), criterion("code", "Code")],
  });
  submission = buildSubmission(server.db, { assignmentId: assignment.id, studentId: wren, classId });
});
afterEach(() => server.dispose());

const of = (id: string = submission.id) => ({ params: { submissionId: id } });
const ofVersion = () => ({ ...of(), body: { versionId: submission.versionId } });
const stateNow = () => server.db.select().from(submissions).where(eq(submissions.id, submission.id)).get()?.state;
/** The author hands in another version of the same show. */
function handInAgain(): void {
  const next = buildVersion(server.db, { showId: submission.showId, number: 2 });
  server.db.update(submissions).set({ versionId: next.id }).where(eq(submissions.id, submission.id)).run();
  submission = { ...submission, versionId: next.id };
}
const detail = (as: string) => server.call(contracts.marking.submission, of(), { as });

describe("GET /api/marking", () => {
  it("counts what waits, what was sent back and what is marked, for one's own classes", async () => {
    buildSubmission(server.db, {
      assignmentId: assignment.id,
      studentId: ash,
      classId,
      state: "revise",
      handedInAt: 1,
    });
    buildSubmission(server.db, {
      assignmentId: assignment.id,
      studentId: buildUser(server.db).id,
      classId,
      state: "submitted",
      handedInAt: 2,
    });
    const { body } = await server.call(contracts.marking.inbox, {}, { as: teacher });
    expect(body.assignments).toHaveLength(1);
    expect(body.assignments[0]).toMatchObject({ toMark: 2, sentBack: 1, marked: 0 });
    expect(body.assignments[0].firstSubmissionId).not.toBe(submission.id);
    expect((await server.call(contracts.marking.inbox, {}, { as: otherTeacher })).body.assignments).toEqual([]);
  });
});

describe("GET /api/assignments/:assignmentId/submissions", () => {
  it("lists to mark first by time, then sent back, then marked", async () => {
    const add = (state: "submitted" | "revise" | "marked", handedInAt: number) =>
      buildSubmission(server.db, {
        assignmentId: assignment.id,
        studentId: buildUser(server.db).id,
        classId,
        state,
        handedInAt,
      }).id;
    const marked = add("marked", 1);
    const back = add("revise", 2);
    const early = add("submitted", 3);
    const call = { params: { assignmentId: assignment.id } };
    const { status, body } = await server.call(contracts.marking.queue, call, { as: teacher });
    expect(status).toBe(200);
    expect(body.rows.map((row: { submissionId: string }) => row.submissionId)).toEqual([
      early,
      submission.id,
      back,
      marked,
    ]);
    expect(body.rows[1]).toMatchObject({
      authors: ["Wren"],
      isOk: true,
      stopCount: 0,
      points: null,
      forwardState: null,
    });
    expect((await server.call(contracts.marking.queue, call, { as: otherTeacher })).status).toBe(404);
  });
});

describe("GET /api/submissions/:submissionId", () => {
  it("gives the mark to the teacher at once, to the author once released, and evidence to neither other", async () => {
    buildMark(server.db, { submissionId: submission.id, markedBy: teacher, levels: { timing: 3, code: 2 } });
    expect((await detail(teacher)).body.mark).toMatchObject({ got: 5, of: 8, isReleased: false });
    const before = await detail(wren);
    expect(before.status).toBe(200);
    expect(before.body.mark).toBeNull();
    expect(before.body.evidence).toEqual({});
    await server.call(contracts.marking.release, ofVersion(), { as: teacher });
    expect((await detail(wren)).body.mark).toMatchObject({ got: 5, isReleased: true });
  });

  it("keeps the words between teacher and coordinator from the author", async () => {
    buildForward(server.db, {
      submissionId: submission.id,
      versionId: submission.versionId,
      forwardedBy: teacher,
      state: "declined",
      answer: "Too short.",
    });
    expect((await detail(teacher)).body.forward).toEqual({
      state: "declined",
      note: "Please have a look.",
      answer: "Too short.",
    });
    expect((await detail(wren)).body.forward).toEqual({ state: "declined", note: "", answer: null });
  });

  it("answers not-found to classmates and to teachers of other classes", async () => {
    for (const as of [ash, otherTeacher]) expect((await detail(as)).status).toBe(404);
  });
});

describe("POST /api/submissions/:submissionId/comments", () => {
  const comment = (anchor: object, as = teacher) =>
    server.call(
      contracts.marking.comment,
      { ...of(), body: { anchor: anchor as { kind: "whole" }, body: "Look here." } },
      { as },
    );

  it("keeps comments on the whole, on lines and on a moment, by teacher and author", async () => {
    expect((await comment({ kind: "whole" })).body.comment).toMatchObject({
      authorName: "Ms Marlow",
      isMine: true,
      isTeacher: true,
    });
    expect((await comment({ kind: "lines", from: 1, to: 2 })).status).toBe(201);
    expect((await comment({ kind: "moment", tick: 32 * 960 }, wren)).body.comment).toMatchObject({
      isTeacher: false,
      anchor: { kind: "moment", tick: 30_720 },
    });
    expect((await detail(wren)).body.comments).toHaveLength(3);
  });

  it("refuses lines that the script has not, turned lines and moments after the song", async () => {
    const pointerOf = async (anchor: object) => {
      const { status, body } = await comment(anchor);
      expect(status).toBe(422);
      return body.errors[0].pointer;
    };
    // The script has one line and the empty one after it.
    expect(await pointerOf({ kind: "lines", from: 1, to: 3 })).toBe("/anchor/to");
    expect(await pointerOf({ kind: "lines", from: 2, to: 1 })).toBe("/anchor/to");
    // The song has 32 beats of 960 ticks.
    expect(await pointerOf({ kind: "moment", tick: 32 * 960 + 1 })).toBe("/anchor/tick");
  });

  it("answers not-found to others", async () => {
    expect((await comment({ kind: "whole" }, ash)).status).toBe(404);
  });
});

describe("DELETE /api/comments/:commentId", () => {
  const remove = (id: string, as: string) =>
    server.call(contracts.marking.deleteComment, { params: { commentId: id } }, { as });

  it("takes one's own back, once", async () => {
    const own = buildComment(server.db, {
      submissionId: submission.id,
      versionId: submission.versionId,
      authorId: wren,
    });
    expect((await remove(own.id, wren)).status).toBe(204);
    expect((await detail(teacher)).body.comments).toEqual([]);
    expect((await remove(own.id, wren)).status).toBe(404);
  });

  it("answers not-allowed for another's that one can see, not-found for one that one can not", async () => {
    const others = buildComment(server.db, {
      submissionId: submission.id,
      versionId: submission.versionId,
      authorId: teacher,
    });
    expect((await remove(others.id, wren)).status).toBe(403);
    expect((await remove(others.id, ash)).status).toBe(404);
    expect(server.db.select().from(comments).get()?.deletedAt).toBeNull();
  });
});

describe("PUT /api/submissions/:submissionId/mark", () => {
  const save = (levels: Record<string, number>, as = teacher) =>
    server.call(contracts.marking.saveMark, { ...of(), body: { levels, note: "Good rhythm." } }, { as });

  it("counts points and saves over an earlier mark", async () => {
    expect((await save({ timing: 2 })).body.mark).toMatchObject({ got: 2, of: 8, isReleased: false });
    expect((await save({ timing: 4, code: 3 })).body.mark).toMatchObject({ levels: { timing: 4, code: 3 }, got: 7 });
  });

  it("names every level of no criterion", async () => {
    const { status, body } = await save({ timing: 2, colour: 1, charm: 4 });
    expect(status).toBe(422);
    expect(body.errors.map((error: { pointer: string }) => error.pointer)).toEqual(["/levels/colour", "/levels/charm"]);
  });

  it("refuses a released mark, other teachers and students", async () => {
    expect((await save({ timing: 2 }, otherTeacher)).status).toBe(404);
    expect((await save({ timing: 2 }, wren)).status).toBe(403);
    await save({ timing: 2, code: 2 });
    await server.call(contracts.marking.release, ofVersion(), { as: teacher });
    expect((await save({ timing: 4, code: 4 })).body.type).toBe("/problems/wrong-state");
  });
});

describe("POST /api/submissions/:submissionId/send-back", () => {
  const sendBack = (as = teacher, versionId = submission.versionId) =>
    server.call(contracts.marking.sendBack, { ...of(), body: { note: "Let the roof breathe.", versionId } }, { as });

  it("asks for another pass with the note among the comments, and keeps history", async () => {
    expect((await sendBack()).body).toEqual({ state: "revise" });
    const seen = (await detail(wren)).body;
    expect(seen.comments[0]).toMatchObject({ body: "Let the roof breathe.", anchor: { kind: "whole" } });
    expect(seen.history.map((step: { state: string }) => step.state)).toEqual(["submitted", "revise"]);
    expect((await sendBack()).body.type).toBe("/problems/wrong-state");
  });

  it("answers not-found to other teachers", async () => {
    expect((await sendBack(otherTeacher)).status).toBe(404);
  });

  it("does not answer a version that was handed in meanwhile", async () => {
    const seen = submission.versionId;
    handInAgain();
    expect((await sendBack(teacher, seen)).body.type).toBe("/problems/newer-version");
    expect(stateNow()).toBe("submitted");
  });
});

describe("POST /api/submissions/:submissionId/release", () => {
  const release = (as = teacher, versionId = submission.versionId) =>
    server.call(contracts.marking.release, { ...of(), body: { versionId } }, { as });

  it("names every criterion without a level", async () => {
    buildMark(server.db, { submissionId: submission.id, markedBy: teacher, levels: { timing: 3 } });
    const { status, body } = await release();
    expect(status).toBe(422);
    expect(body.errors).toEqual([
      expect.objectContaining({ pointer: "/levels/code", detail: 'Choose a level for "Code".' }),
    ]);
    expect(stateNow()).toBe("submitted");
  });

  it("marks the work, once, and leaves a line in the log", async () => {
    buildMark(server.db, { submissionId: submission.id, markedBy: teacher, levels: { timing: 3, code: 4 } });
    expect((await release()).body).toMatchObject({ state: "marked", mark: { got: 7, isReleased: true } });
    expect((await release()).body.type).toBe("/problems/wrong-state");
    expect(
      server.db
        .select()
        .from(auditLog)
        .all()
        .map((row) => row.event),
    ).toContain("mark-released");
  });

  it("answers not-found to other teachers", async () => {
    expect((await release(otherTeacher)).status).toBe(404);
  });

  it("does not mark a version that was handed in meanwhile", async () => {
    buildMark(server.db, { submissionId: submission.id, markedBy: teacher, levels: { timing: 3, code: 4 } });
    const seen = submission.versionId;
    handInAgain();
    expect((await release(teacher, seen)).body.type).toBe("/problems/newer-version");
    expect(stateNow()).toBe("submitted");
    expect((await release()).body).toMatchObject({ state: "marked" });
  });
});

describe("POST /api/submissions/:submissionId/reopen", () => {
  const reopen = (as = teacher) => server.call(contracts.marking.reopen, of(), { as });

  it("takes a released mark from the author's sight and work sent back to submitted", async () => {
    buildMark(server.db, { submissionId: submission.id, markedBy: teacher, levels: { timing: 3, code: 4 } });
    await server.call(contracts.marking.release, ofVersion(), { as: teacher });
    expect((await reopen()).body).toEqual({ state: "submitted" });
    expect((await detail(wren)).body.mark).toBeNull();
    expect((await detail(teacher)).body.mark).toMatchObject({ got: 7, isReleased: false });
    expect(
      server.db
        .select()
        .from(submissionEvents)
        .all()
        .map((event) => event.state),
    ).toEqual(["submitted", "marked", "submitted"]);
  });

  it("answers wrong-state for work that waits already, not-found to others", async () => {
    expect((await reopen()).body.type).toBe("/problems/wrong-state");
    expect((await reopen(otherTeacher)).status).toBe(404);
  });
});
