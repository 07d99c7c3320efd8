import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { contracts } from "../../../shared/contracts/index.ts";
import {
  buildAssignment,
  buildClass,
  buildShow,
  buildSquare,
  buildSubmission,
  buildUser,
} from "../../../tests/support/factories.ts";
import { createTestServer, type TestServer } from "../../../tests/support/test-server.ts";

let server: TestServer;
let wren: string;
let ash: string;
let june: string;
let stranger: string;
let classId: string;
let assignmentId: string;
let showId: string;

beforeEach(() => {
  server = createTestServer();
  buildSquare(server.db);
  wren = buildUser(server.db, { displayName: "Wren" }).id;
  ash = buildUser(server.db, { displayName: "Ash" }).id;
  june = buildUser(server.db, { displayName: "June" }).id;
  stranger = buildUser(server.db).id;
  classId = buildClass(server.db, { studentIds: [wren, ash, june] }).id;
  assignmentId = buildAssignment(server.db, { classId }).id;
  showId = buildShow(server.db, { assignmentId, authorIds: [wren], title: "Nine Foxes", source: "wait(1);\n" }).id;
});
afterEach(() => server.dispose());

const partners = (as = wren) => server.call(contracts.shows.partners, { params: { showId } }, { as });
const ask = (userId: string, as = wren) =>
  server.call(contracts.shows.askPartner, { params: { showId }, body: { userId } }, { as });
const answer = (word: "join" | "decline", as = ash) =>
  server.call(contracts.shows.answerInvitation, { params: { showId }, body: { answer: word } }, { as });
const invitations = async (as: string) =>
  (await server.call(contracts.shows.invitations, {}, { as })).body.invitations as { title: string; by: string }[];
const leave = (as: string) => server.call(contracts.shows.leave, { params: { showId } }, { as });
const namesOf = (people: { name: string }[]) => people.map((person) => person.name);

describe("asking a classmate", () => {
  it("offers the class but for oneself, and shows who was asked until they answer", async () => {
    expect(namesOf((await partners()).body.classmates)).toEqual(["Ash", "June"]);
    const { status, body } = await ask(ash);
    expect(status).toBe(201);
    expect(namesOf(body.asked)).toEqual(["Ash"]);
    expect(namesOf(body.classmates)).toEqual(["June"]);
    expect(await invitations(ash)).toMatchObject([{ title: "Nine Foxes", by: "Wren" }]);
    expect((await ask(ash)).status).toBe(201);
    expect(await invitations(ash)).toHaveLength(1);
  });

  it("refuses strangers to the class, and classmates with a show of their own for the assignment", async () => {
    buildShow(server.db, { assignmentId, authorIds: [june] });
    expect(namesOf((await partners()).body.classmates)).toEqual(["Ash"]);
    for (const userId of [june, stranger]) {
      const { status, body } = await ask(userId);
      expect(status).toBe(422);
      expect(body.errors).toMatchObject([{ pointer: "/userId" }]);
    }
  });

  it("is taken back, once", async () => {
    await ask(ash);
    const withdraw = () =>
      server.call(contracts.shows.withdrawPartner, { params: { showId, userId: ash } }, { as: wren });
    expect((await withdraw()).body.asked).toEqual([]);
    expect((await withdraw()).status).toBe(404);
    expect((await answer("join")).status).toBe(404);
  });

  it("waits while the work is handed in", async () => {
    buildSubmission(server.db, { assignmentId, showId, studentId: wren, classId });
    expect((await partners()).body.obstacle).toContain("handed in");
    expect((await ask(ash)).body.type).toBe("/problems/wrong-state");
  });
});

describe("answering", () => {
  it("makes an author who writes on the same draft, or leaves all as it was", async () => {
    await ask(ash);
    expect((await answer("join")).body).toEqual({ isAuthor: true });
    expect((await partners(ash)).body.authors).toMatchObject([
      { name: "Ash", isMe: true },
      { name: "Wren", isMe: false },
    ]);
    const save = await server.call(
      contracts.shows.saveDraft,
      { params: { showId }, body: { baseRevision: 1, source: "wait(2);\n" } },
      { as: ash },
    );
    expect(save.status).toBe(200);
    await ask(june);
    expect((await answer("decline", june)).body).toEqual({ isAuthor: false });
    expect(await invitations(june)).toEqual([]);
    expect((await partners(june)).status).toBe(404);
  });

  it("does not join two pieces of work for one assignment", async () => {
    await ask(ash);
    buildShow(server.db, { assignmentId, authorIds: [ash] });
    expect((await answer("join")).body).toMatchObject({
      type: "/problems/wrong-state",
      detail: "You have begun a show of your own for this assignment. Archive it first, then join.",
    });
    expect(await invitations(ash)).toHaveLength(1);
  });

  it("stops at three authors", async () => {
    const fourth = buildUser(server.db).id;
    showId = buildShow(server.db, { authorIds: [wren, ash, june] }).id;
    expect((await partners()).body.obstacle).toBe("A show has at most 3 authors.");
    expect((await ask(fourth)).body.type).toBe("/problems/wrong-state");
  });
});

describe("leaving", () => {
  it("leaves the show to the others and keeps a copy of the script", async () => {
    await ask(ash);
    await answer("join");
    const { body } = await leave(wren);
    expect(namesOf((await partners(ash)).body.authors)).toEqual(["Ash"]);
    expect((await partners(wren)).status).toBe(404);
    const copy = await server.call(contracts.shows.get, { params: { showId: body.copyId } }, { as: wren });
    expect(copy.body).toMatchObject({ show: { title: "Nine Foxes, copy" }, draft: { source: "wait(1);\n" } });
  });

  it("is refused to the only author, and while the work is handed in", async () => {
    expect((await leave(wren)).body.type).toBe("/problems/wrong-state");
    await ask(ash);
    await answer("join");
    buildSubmission(server.db, { assignmentId, showId, studentId: wren, classId });
    expect((await leave(ash)).body.type).toBe("/problems/wrong-state");
  });
});
