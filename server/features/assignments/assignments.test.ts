import { eq } from "drizzle-orm";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { contracts } from "../../../shared/contracts/index.ts";
import type { AssignmentFields } from "../../../shared/contracts/assignments.ts";
import type { ClassId } from "../../../shared/ids.ts";
import { assignments } from "../../db/schema/index.ts";
import {
  buildAssignment,
  buildClass,
  buildComment,
  buildMark,
  buildShow,
  buildSong,
  buildSquare,
  buildSubmission,
  buildUser,
} from "../../../tests/support/factories.ts";
import { createTestServer, type TestServer } from "../../../tests/support/test-server.ts";

let server: TestServer;
let wren: string;
let ash: string;
let teacher: string;
let classId: ClassId;
beforeEach(() => {
  server = createTestServer();
  buildSquare(server.db);
  wren = buildUser(server.db).id;
  ash = buildUser(server.db).id;
  teacher = buildUser(server.db, { roles: ["teacher"] }).id;
  classId = buildClass(server.db, { teacherIds: [teacher], studentIds: [wren, ash] }).id;
});
afterEach(() => server.dispose());

const idOf = (row: { id: string }) => ({ params: { assignmentId: row.id } });

function fields(overrides: Partial<AssignmentFields> = {}): AssignmentFields {
  return {
    title: "Bells",
    brief: "Light the bells.",
    songId: buildSong(server.db).id,
    dueAt: server.clock.now() + 86_400_000,
    lateRule: "accept-late",
    requirements: [{ kind: "loop", atLeast: 1 }],
    rubric: [
      {
        id: "timing",
        name: "Timing",
        levels: ["Not yet", "Nearly", "There", "Beyond"].map((name) => ({ name, text: name })),
      },
    ],
    ...overrides,
  };
}

describe("GET /api/assignments", () => {
  it("gives a student their own work: nothing, a show begun, comments and released points", async () => {
    const fresh = buildAssignment(server.db, { classId, dueAt: 1 });
    const begun = buildAssignment(server.db, { classId, dueAt: 2 });
    buildShow(server.db, { assignmentId: begun.id, authorIds: [wren] });
    const handedIn = buildAssignment(server.db, { classId, dueAt: 3 });
    const submission = buildSubmission(server.db, {
      assignmentId: handedIn.id,
      studentId: wren,
      classId,
      state: "marked",
    });
    buildComment(server.db, { submissionId: submission.id, versionId: submission.versionId, authorId: teacher });
    buildMark(server.db, { submissionId: submission.id, markedBy: teacher, releasedAt: 5 });
    buildAssignment(server.db);
    const { body } = await server.call(contracts.assignments.list, {}, { as: wren });
    expect(body.assignments.map((row: { id: string }) => row.id)).toEqual([fresh.id, begun.id, handedIn.id]);
    expect(body.assignments[0].mine).toBeNull();
    expect(body.assignments[1].mine).toMatchObject({ state: "working", submissionId: null, points: null });
    expect(body.assignments[2].mine).toMatchObject({
      state: "marked",
      submissionId: submission.id,
      commentCount: 1,
      points: { got: 3, of: 4 },
    });
    expect(body.assignments[2].counts).toBeNull();
  });

  it("keeps points from a student until they are released", async () => {
    const submission = buildSubmission(server.db, { studentId: wren, classId });
    buildMark(server.db, { submissionId: submission.id, markedBy: teacher });
    const { body } = await server.call(contracts.assignments.list, {}, { as: wren });
    expect(body.assignments[0].mine.points).toBeNull();
  });

  it("counts each student once for the teacher, by the work that got furthest", async () => {
    const assignment = buildAssignment(server.db, { classId });
    buildSubmission(server.db, { assignmentId: assignment.id, studentId: wren, classId, state: "revise" });
    buildShow(server.db, { assignmentId: assignment.id, authorIds: [wren] });
    buildShow(server.db, { assignmentId: assignment.id, authorIds: [ash] });
    const { body } = await server.call(contracts.assignments.list, {}, { as: teacher });
    expect(body.assignments[0]).toMatchObject({
      mine: null,
      counts: { students: 2, working: 1, submitted: 0, revise: 1, marked: 0 },
    });
  });
});

describe("GET /api/assignments/:assignmentId", () => {
  it("gives brief, requirements and rubric to the class, not-found to others", async () => {
    const assignment = buildAssignment(server.db, { classId, requirements: [{ kind: "list", atLeast: 2 }] });
    for (const as of [wren, teacher]) {
      const { status, body } = await server.call(contracts.assignments.get, idOf(assignment), { as });
      expect(status).toBe(200);
      expect(body).toMatchObject({ brief: assignment.brief, requirements: [{ kind: "list", atLeast: 2 }] });
      expect(body.rubric[0].id).toBe("timing");
    }
    for (const as of [buildUser(server.db).id, buildUser(server.db, { roles: ["teacher"] }).id]) {
      expect((await server.call(contracts.assignments.get, idOf(assignment), { as })).status).toBe(404);
    }
  });
});

describe("POST /api/classes/:classId/assignments", () => {
  const create = (body: AssignmentFields, as = teacher) =>
    server.call(contracts.assignments.create, { params: { classId }, body }, { as });

  it("sets an assignment for one's own class", async () => {
    const { status, body } = await create(fields());
    expect(status).toBe(201);
    expect(body.assignment).toMatchObject({ title: "Bells", classId, counts: { students: 2, working: 0 } });
  });

  it("names the field: unknown song, date that is over, the same criterion or requirement twice", async () => {
    const pointerOf = async (overrides: Partial<AssignmentFields>) => {
      const { status, body } = await create(fields(overrides));
      expect(status).toBe(422);
      return body.errors[0].pointer;
    };
    const [criterion] = fields().rubric;
    expect(await pointerOf({ songId: "nothing" })).toBe("/songId");
    expect(await pointerOf({ dueAt: server.clock.now() })).toBe("/dueAt");
    expect(await pointerOf({ rubric: [criterion!, criterion!] })).toBe("/rubric/1/id");
    expect(
      await pointerOf({
        requirements: [
          { kind: "loop", atLeast: 1 },
          { kind: "loop", atLeast: 2 },
        ],
      }),
    ).toBe("/requirements/1/kind");
  });

  it("answers not-found for a class of others and not-allowed to students", async () => {
    expect((await create(fields(), buildUser(server.db, { roles: ["teacher"] }).id)).status).toBe(404);
    expect((await create(fields(), wren)).status).toBe(403);
  });
});

describe("PATCH /api/assignments/:assignmentId", () => {
  const update = (row: { id: string }, body: Partial<AssignmentFields>, as = teacher) =>
    server.call(contracts.assignments.update, { ...idOf(row), body }, { as });

  it("changes what is named and leaves the rest", async () => {
    const assignment = buildAssignment(server.db, { classId });
    const { status, body } = await update(assignment, { title: "Second title", lateRule: "closed" });
    expect(status).toBe(200);
    expect(body.assignment).toMatchObject({ title: "Second title", lateRule: "closed", dueAt: assignment.dueAt });
    expect(server.db.select().from(assignments).where(eq(assignments.id, assignment.id)).get()?.brief).toBe(
      assignment.brief,
    );
  });

  it("fixes the rubric once something is marked with it; the very same rubric passes", async () => {
    const submission = buildSubmission(server.db, { studentId: wren, classId });
    buildMark(server.db, { submissionId: submission.id, markedBy: teacher });
    const row = server.db.select().from(assignments).where(eq(assignments.id, submission.assignmentId)).get()!;
    const [criterion] = row.rubric;
    expect((await update(row, { rubric: [{ ...criterion!, name: "Other" }] })).body.type).toBe("/problems/wrong-state");
    expect((await update(row, { rubric: row.rubric })).status).toBe(200);
  });

  it("fixes the song once a show was begun with it", async () => {
    const assignment = buildAssignment(server.db, { classId });
    buildShow(server.db, { assignmentId: assignment.id, authorIds: [wren] });
    expect((await update(assignment, { songId: buildSong(server.db).id })).status).toBe(409);
  });

  it("answers not-found to teachers of other classes, invalid-request for an unknown song", async () => {
    const assignment = buildAssignment(server.db, { classId });
    expect((await update(assignment, { title: "Mine" }, buildUser(server.db, { roles: ["teacher"] }).id)).status).toBe(
      404,
    );
    expect((await update(assignment, { songId: "nothing" })).status).toBe(422);
  });
});
