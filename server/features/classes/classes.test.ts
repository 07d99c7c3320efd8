import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { buildClass, buildUser } from "../../../tests/support/factories.ts";
import { createTestServer, type TestServer } from "../../../tests/support/test-server.ts";
import { authContract } from "../../../shared/contracts/auth.ts";
import { classesContract } from "../../../shared/contracts/classes.ts";
import type { ClassId, UserId } from "../../../shared/ids.ts";
import { verifyAuditChain } from "../../identity/audit-log.ts";

let server: TestServer;
let teacher: string;
let pupil: string;
let classId: ClassId;
beforeEach(() => {
  server = createTestServer();
  teacher = buildUser(server.db, { roles: ["teacher"] }).id;
  pupil = buildUser(server.db, { displayName: "Wren Aster", username: "wren.a" }).id;
  classId = buildClass(server.db, { code: "7B-TARN", teacherIds: [teacher], studentIds: [pupil] }).id;
});
afterEach(() => server.dispose());

const signIn = (card: { classCode: string; username: string; passphrase: string }) =>
  server.call(authContract.studentSignIn, {
    body: { classCode: card.classCode, username: card.username, passphrase: card.passphrase },
  });
const add = (displayNames: string[], id = classId) =>
  server.call(classesContract.addStudents, { params: { classId: id }, body: { displayNames } }, { as: teacher });

describe("POST /api/classes/:classId/students", () => {
  it("gives cards that sign in, with usernames of their own", async () => {
    const { status, body } = await add(["Wren Alder", "Zoë Quill", "李"]);
    expect(status).toBe(201);
    expect(body.cards.map((card: { username: string }) => card.username)).toEqual(["wren.a2", "zoe.q", "student"]);
    for (const card of body.cards) expect((await signIn(card)).status).toBe(200);
    expect(verifyAuditChain(server.db)).toEqual({ isWhole: true, firstBrokenId: null });
  });

  it("asks for at least one name and at most 40", async () => {
    expect((await add([])).status).toBe(422);
    expect((await add(Array.from({ length: 41 }, (_, n) => `Pupil ${n}`))).status).toBe(422);
  });

  it("is not-found for a class of another teacher", async () => {
    expect((await add(["Ada"], buildClass(server.db).id)).status).toBe(404);
  });
});

describe("POST /api/classes/:classId/sign-in-cards", () => {
  const make = (studentIds: string[]) =>
    server.call(classesContract.makeCards, { params: { classId }, body: { studentIds: studentIds } }, { as: teacher });

  it("deals new words and ends the words and sessions from before", async () => {
    const first = (await make([pupil])).body.cards[0];
    const cookie = await server.signIn(pupil);
    const second = (await make([pupil])).body.cards[0];
    expect((await signIn(first)).status).toBe(401);
    expect((await signIn(second)).status).toBe(200);
    expect((await server.call(authContract.session, {}, { headers: { cookie } })).body.session).toBeNull();
  });

  it("changes nothing when one of the students is not in the class", async () => {
    const card = (await make([pupil])).body.cards[0];
    expect((await make([pupil, buildUser(server.db).id])).status).toBe(404);
    expect((await signIn(card)).status).toBe(200);
  });
});

describe("DELETE /api/classes/:classId/students/:studentId", () => {
  it("takes the student out, so that the class code signs them in no more", async () => {
    const [card] = (await add(["Ada Quill"])).body.cards;
    const params = { classId, studentId: card.studentId as UserId };
    expect((await server.call(classesContract.removeStudent, { params }, { as: teacher })).status).toBe(204);
    expect((await signIn(card)).status).toBe(401);
    expect((await server.call(classesContract.removeStudent, { params }, { as: teacher })).status).toBe(404);
  });
});

describe("GET /api/classes/:classId", () => {
  it("lists students with their steps of every lesson", async () => {
    const { body } = await server.call(classesContract.get, { params: { classId } }, { as: teacher });
    expect(body.class).toMatchObject({ code: "7B-TARN", studentCount: 1, toMarkCount: 0 });
    expect(body.students[0]).toMatchObject({ id: pupil, displayName: "Wren Aster", showCount: 0 });
    expect(body.students[0].lessons).toHaveLength(body.lessons.length);
  });
});
