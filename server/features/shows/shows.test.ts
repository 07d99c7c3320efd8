import { eq } from "drizzle-orm";
import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import { contracts } from "../../../shared/contracts/index.ts";
import { drafts, showVersions } from "../../db/schema/index.ts";
import {
  buildAssignment,
  buildClass,
  buildForward,
  buildShow,
  buildSong,
  buildSquare,
  buildSubmission,
  buildUser,
  buildVersion,
} from "../../../tests/support/factories.ts";
import { BROKEN_SOURCE } from "../../../tests/support/fake-runs.ts";
import { createTestServer, type TestServer } from "../../../tests/support/test-server.ts";

let server: TestServer;
let wren: string;
let ash: string;
let teacher: string;
let otherTeacher: string;
let classId: string;
beforeEach(() => {
  server = createTestServer();
  const { db } = server;
  buildSquare(db);
  wren = buildUser(db).id;
  ash = buildUser(db).id;
  teacher = buildUser(db, { roles: ["teacher"] }).id;
  otherTeacher = buildUser(db, { roles: ["teacher"] }).id;
  classId = buildClass(db, { teacherIds: [teacher], studentIds: [wren, ash] }).id;
});
afterEach(() => server.dispose());

const ofShow = (id: string) => ({ params: { showId: id } });
const findDraft = (showId: string) => server.db.select().from(drafts).where(eq(drafts.showId, showId)).get();

describe("POST /api/shows", () => {
  it("starts a show with a first line, lists it and draws its ribbon in the background", async () => {
    const song = buildSong(server.db, { title: "Frost" });
    const { status, body } = await server.call(
      contracts.shows.create,
      { body: { title: "Lanterns", songId: song.id } },
      { as: wren },
    );
    expect(status).toBe(201);
    expect(body.show).toMatchObject({
      title: "Lanterns",
      songTitle: "Frost",
      seconds: 16,
      workState: null,
      forwardState: null,
      assignmentId: null,
    });
    expect(findDraft(body.show.id)?.source).toContain("square.all.pulse(");
    await vi.waitFor(() => expect(findDraft(body.show.id)?.ribbon).not.toBeNull());
    const list = await server.call(contracts.shows.list, { query: {} }, { as: wren });
    expect(list.body.shows[0].ribbon).toMatchObject({ columns: 96 });
    expect((await server.call(contracts.shows.list, { query: {} }, { as: ash })).body.shows).toEqual([]);
  });

  it("counts a show for an assignment as working", async () => {
    const assignment = buildAssignment(server.db, { classId });
    const body = {
      title: "For class",
      songId: assignment.songId,
      assignmentId: assignment.id,
    };
    const made = await server.call(contracts.shows.create, { body }, { as: wren });
    expect(made.body.show).toMatchObject({ workState: "working", assignmentTitle: assignment.title });
  });

  it("answers not-found for an assignment of another class", async () => {
    const foreign = buildAssignment(server.db);
    const body = { title: "Mine", songId: foreign.songId, assignmentId: foreign.id };
    expect((await server.call(contracts.shows.create, { body }, { as: wren })).status).toBe(404);
  });

  it("names the song when it is unknown or not the assignment's", async () => {
    const unknown = await server.call(
      contracts.shows.create,
      { body: { title: "Mine", songId: "nothing" } },
      { as: wren },
    );
    expect(unknown.status).toBe(422);
    expect(unknown.body.errors).toEqual([expect.objectContaining({ pointer: "/songId" })]);
    const assignment = buildAssignment(server.db, { classId });
    const body = {
      title: "Mine",
      songId: buildSong(server.db).id,
      assignmentId: assignment.id,
    };
    expect((await server.call(contracts.shows.create, { body }, { as: wren })).body.errors[0].pointer).toBe("/songId");
  });
});

describe("GET /api/shows/:showId", () => {
  it("gives draft and versions to the author and to the class's teacher, to nobody else", async () => {
    const show = buildShow(server.db, { authorIds: [wren], source: "square.all.on();\n", revision: 4 });
    buildVersion(server.db, { showId: show.id, number: 1 });
    for (const as of [wren, teacher]) {
      const { status, body } = await server.call(contracts.shows.get, ofShow(show.id), { as });
      expect(status).toBe(200);
      expect(body.draft).toMatchObject({ revision: 4, source: "square.all.on();\n" });
      expect(body.versions).toHaveLength(1);
    }
    for (const as of [ash, otherTeacher])
      expect((await server.call(contracts.shows.get, ofShow(show.id), { as })).status).toBe(404);
  });

  it("keeps a show for an assignment from teachers of the author's other classes", async () => {
    buildClass(server.db, { teacherIds: [otherTeacher], studentIds: [wren] });
    const assignment = buildAssignment(server.db, { classId });
    const show = buildShow(server.db, { authorIds: [wren], assignmentId: assignment.id });
    expect((await server.call(contracts.shows.get, ofShow(show.id), { as: otherTeacher })).status).toBe(404);
  });
});

describe("PATCH /api/shows/:showId", () => {
  it("renames, archives and deals new luck", async () => {
    const show = buildShow(server.db, { authorIds: [wren] });
    const { status, body } = await server.call(
      contracts.shows.update,
      { ...ofShow(show.id), body: { title: "New name", isArchived: true, seed: 9 } },
      { as: wren },
    );
    expect(status).toBe(200);
    expect(body).toMatchObject({ seed: 9, show: { title: "New name", isArchived: true } });
    expect(
      (await server.call(contracts.shows.list, { query: { archived: "yes" } }, { as: wren })).body.shows,
    ).toHaveLength(1);
    expect((await server.call(contracts.shows.list, { query: {} }, { as: wren })).body.shows).toHaveLength(0);
  });

  it("keeps the title of a show that is with the event", async () => {
    const submission = buildSubmission(server.db, { studentId: wren, classId, state: "marked" });
    buildForward(server.db, {
      submissionId: submission.id,
      versionId: submission.versionId,
      forwardedBy: teacher,
      state: "approved",
    });
    const refused = await server.call(
      contracts.shows.update,
      { ...ofShow(submission.showId), body: { title: "Something else" } },
      { as: wren },
    );
    expect(refused.status).toBe(422);
    expect(refused.body.errors[0].pointer).toBe("/title");
  });

  it("answers not-found for another's show and invalid-request for an empty title", async () => {
    const show = buildShow(server.db, { authorIds: [wren] });
    expect(
      (await server.call(contracts.shows.update, { ...ofShow(show.id), body: { title: "Taken" } }, { as: ash })).status,
    ).toBe(404);
    expect(
      (await server.call(contracts.shows.update, { ...ofShow(show.id), body: { title: " " } }, { as: wren })).status,
    ).toBe(422);
  });
});

describe("POST /api/shows/:showId/duplicate", () => {
  it("copies the draft into a free show and tells two copies apart", async () => {
    const assignment = buildAssignment(server.db, { classId });
    const show = buildShow(server.db, {
      authorIds: [wren],
      title: "Lanterns",
      source: "square.all.on();\n",
      assignmentId: assignment.id,
    });
    const first = await server.call(contracts.shows.duplicate, ofShow(show.id), { as: wren });
    const second = await server.call(contracts.shows.duplicate, ofShow(show.id), { as: wren });
    expect(first.status).toBe(201);
    expect([first.body.show.title, second.body.show.title]).toEqual(["Lanterns, copy", "Lanterns, copy 2"]);
    expect(first.body.show.assignmentId).toBeNull();
    expect(findDraft(first.body.show.id)?.source).toBe("square.all.on();\n");
  });

  it("answers not-found for another's show", async () => {
    const show = buildShow(server.db, { authorIds: [wren] });
    expect((await server.call(contracts.shows.duplicate, ofShow(show.id), { as: ash })).status).toBe(404);
  });
});

describe("PUT /api/shows/:showId/draft", () => {
  const save = (showId: string, baseRevision: number, source: string, as = wren, idempotencyKey?: string) =>
    server.call(
      contracts.shows.saveDraft,
      {
        ...ofShow(showId),
        body: { baseRevision, source },
        ...(idempotencyKey === undefined ? {} : { idempotencyKey }),
      },
      { as },
    );

  it("counts the revision up", async () => {
    const show = buildShow(server.db, { authorIds: [wren] });
    const { status, body } = await save(show.id, 1, "square.all.on();\n");
    expect(status).toBe(200);
    expect(body.revision).toBe(2);
    expect(findDraft(show.id)).toMatchObject({ revision: 2, source: "square.all.on();\n" });
  });

  it("answers draft-conflict with what the server holds, and leaves that as it is", async () => {
    const show = buildShow(server.db, { authorIds: [wren] });
    await save(show.id, 1, "first\n");
    const refused = await save(show.id, 1, "second\n");
    expect(refused.status).toBe(409);
    expect(refused.body).toMatchObject({ type: "/problems/draft-conflict", draft: { revision: 2, source: "first\n" } });
    expect(findDraft(show.id)?.source).toBe("first\n");
  });

  it("counts the very same text on the next revision as done, for the same person only", async () => {
    const show = buildShow(server.db, { authorIds: [wren, ash] });
    await save(show.id, 1, "same\n");
    const again = await save(show.id, 1, "same\n");
    expect(again.status).toBe(200);
    expect(again.body.revision).toBe(2);
    expect((await save(show.id, 1, "same\n", ash)).status).toBe(409);
  });

  it("lets one of many writers on one revision through", async () => {
    const show = buildShow(server.db, { authorIds: [wren] });
    const answers = await Promise.all(Array.from({ length: 8 }, (_, n) => save(show.id, 1, `text ${n}\n`)));
    expect(answers.filter((answer) => answer.status === 200)).toHaveLength(1);
    expect(findDraft(show.id)?.revision).toBe(2);
  });

  it("answers a retry with the same key again, and another request with it key-reused", async () => {
    const show = buildShow(server.db, { authorIds: [wren] });
    const first = await save(show.id, 1, "once\n", wren, "key-of-a-save");
    const retry = await save(show.id, 1, "once\n", wren, "key-of-a-save");
    expect(retry.body).toEqual(first.body);
    expect((await save(show.id, 2, "other\n", wren, "key-of-a-save")).body.type).toBe("/problems/key-reused");
  });

  it("refuses more than 64 KiB of bytes even when the characters are fewer", async () => {
    const show = buildShow(server.db, { authorIds: [wren] });
    const refused = await save(show.id, 1, "é".repeat(40_000));
    expect(refused.status).toBe(413);
    expect(findDraft(show.id)?.revision).toBe(1);
  });

  it("answers not-found for another's show", async () => {
    const show = buildShow(server.db, { authorIds: [wren] });
    expect((await save(show.id, 1, "mine now\n", ash)).status).toBe(404);
  });

  it("keeps the last good ribbon while the draft does not run", async () => {
    const show = buildShow(server.db, { authorIds: [wren] });
    await save(show.id, 1, "square.all.on();\n");
    await vi.waitFor(() => expect(findDraft(show.id)?.ribbon).not.toBeNull());
    const good = findDraft(show.id)?.ribbon;
    const run = vi.spyOn(server.deps.runs, "judge");
    await save(show.id, 2, BROKEN_SOURCE);
    await vi.waitFor(() => expect(run).toHaveBeenCalledOnce());
    await run.mock.results[0]?.value;
    expect(findDraft(show.id)?.ribbon).toEqual(good);
  });

  it("runs a show that is saved many times while it runs once more, not many times", async () => {
    const show = buildShow(server.db, { authorIds: [wren] });
    const { runs } = server.deps;
    const inner = runs.judge.bind(runs);
    let open = () => {};
    const gate = new Promise<void>((resolve) => (open = resolve));
    const run = vi.spyOn(runs, "judge").mockImplementation(async (...args) => {
      await gate;
      return inner(...args);
    });
    for (let revision = 1; revision <= 5; revision++)
      expect((await save(show.id, revision, `text ${revision}\n`)).status).toBe(200);
    expect(run).toHaveBeenCalledOnce();
    open();
    await vi.waitFor(() => expect(run).toHaveBeenCalledTimes(2));
    expect(run.mock.calls[1]?.[0].source).toBe("text 5\n");
  });
});

describe("GET /api/shows/:showId/history", () => {
  const save = (id: string, baseRevision: number, source: string, as = wren) =>
    server.call(contracts.shows.saveDraft, { ...ofShow(id), body: { baseRevision, source } }, { as });
  const list = (id: string, as = wren) => server.call(contracts.shows.history, ofShow(id), { as });
  const read = (id: string, revision: number, as = wren) =>
    server.call(contracts.shows.earlierDraft, { params: { showId: id, revision } }, { as });
  const body = "square.all.on();\nwait(4);\nsquare.all.off();\n";

  it("keeps a few minutes of one person's edits as one text, and the text they began with", async () => {
    const show = buildShow(server.db, { authorIds: [wren], source: body });
    await save(show.id, 1, `${body}// one\n`);
    await save(show.id, 2, `${body}// one two\n`);
    expect((await list(show.id)).body.drafts.map((draft: { revision: number }) => draft.revision)).toEqual([3, 1]);
    expect((await read(show.id, 1)).body.source).toBe(body);
    expect((await read(show.id, 2)).status).toBe(404);
    server.clock.advance(6 * 60_000);
    await save(show.id, 3, `${body}// later\n`);
    expect((await list(show.id)).body.drafts).toHaveLength(3);
    await vi.waitFor(async () => expect((await list(show.id)).body.drafts[0].ribbon).not.toBeNull());
  });

  it("keeps a script that was deleted, replaced, or written over by a partner, however soon", async () => {
    const show = buildShow(server.db, { authorIds: [wren, ash], source: "" });
    await save(show.id, 1, body);
    await save(show.id, 2, "");
    await save(show.id, 3, "song.end;\n");
    await save(show.id, 4, "song.end; // ash\n", ash);
    const { drafts: kept } = (await list(show.id)).body;
    const texts = await Promise.all(
      kept.map(async ({ revision }: { revision: number }) => (await read(show.id, revision)).body.source as string),
    );
    expect(texts).toEqual(["song.end; // ash\n", "song.end;\n", body, ""]);
    expect(new Set(kept.map(({ by }: { by: string | null }) => by)).size).toBe(3);
  });

  it("is for authors and their teacher only", async () => {
    const show = buildShow(server.db, { authorIds: [wren], source: body });
    await save(show.id, 1, "mine\n");
    expect((await list(show.id, teacher)).status).toBe(200);
    for (const as of [ash, otherTeacher]) expect((await read(show.id, 1, as)).status).toBe(404);
  });
});

describe("GET /api/versions/:versionId", () => {
  const get = (id: string, as: string) => server.call(contracts.shows.version, { params: { versionId: id } }, { as });

  it("gives the version to its author, their teacher and, once forwarded, the coordinator", async () => {
    const coordinator = buildUser(server.db, { roles: ["coordinator"], schoolId: null }).id;
    const submission = buildSubmission(server.db, { studentId: wren, classId, state: "marked" });
    const version = server.db.select().from(showVersions).where(eq(showVersions.id, submission.versionId)).get();
    for (const as of [wren, teacher]) {
      const { status, body } = await get(submission.versionId, as);
      expect(status).toBe(200);
      expect(body).toMatchObject({ source: version?.source, timeline: null, version: { run: { isOk: true } } });
    }
    expect((await get(submission.versionId, coordinator)).status).toBe(404);
    buildForward(server.db, { submissionId: submission.id, versionId: submission.versionId, forwardedBy: teacher });
    expect((await get(submission.versionId, coordinator)).status).toBe(200);
  });

  it("answers not-found to others", async () => {
    const submission = buildSubmission(server.db, { studentId: wren, classId });
    for (const as of [ash, otherTeacher]) expect((await get(submission.versionId, as)).status).toBe(404);
  });
});
