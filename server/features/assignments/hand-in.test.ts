import { eq } from "drizzle-orm";
import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import { contracts } from "../../../shared/contracts/index.ts";
import { auditLog, drafts, runs, showVersions, submissionEvents, submissions } from "../../db/schema/index.ts";
import { runUnfinishedVersions } from "../../show-runs/run-version.ts";
import { buildAssignment, buildClass, buildShow, buildSquare, buildUser } from "../../../tests/support/factories.ts";
import { BROKEN_SOURCE } from "../../../tests/support/fake-runs.ts";
import { createTestServer, type TestServer } from "../../../tests/support/test-server.ts";

/** What the fake pool gives for every script that runs. */
const SERVER_HASH = "0".repeat(64);

let server: TestServer;
let wren: string;
let classId: string;
let assignment: ReturnType<typeof buildAssignment>;
let show: ReturnType<typeof buildShow>;
beforeEach(() => {
  server = createTestServer();
  buildSquare(server.db);
  wren = buildUser(server.db).id;
  classId = buildClass(server.db, { studentIds: [wren] }).id;
  assignment = buildAssignment(server.db, { classId });
  show = buildShow(server.db, {
    assignmentId: assignment.id,
    songId: assignment.songId,
    authorIds: [wren],
    revision: 3,
    source: "square.all.on();\n",
  });
});
afterEach(() => server.dispose());

function handIn(
  input: {
    showId?: string;
    revision?: number;
    hash?: string | null;
    assignmentId?: string;
    as?: string;
    key?: string;
  } = {},
) {
  const { showId = show.id, revision = 3, hash = SERVER_HASH, assignmentId = assignment.id, as = wren, key } = input;
  const call = {
    params: { assignmentId: assignmentId },
    body: { showId: showId, revision, hash },
  };
  return server.call(contracts.assignments.handIn, key === undefined ? call : { ...call, idempotencyKey: key }, { as });
}

function setDraft(source: string, revision: number) {
  server.db.update(drafts).set({ source, revision }).where(eq(drafts.showId, show.id)).run();
}
const setState = (state: "submitted" | "revise" | "marked") => server.db.update(submissions).set({ state }).run();

describe("POST /api/assignments/:assignmentId/submissions", () => {
  it("keeps version, run, submission and history, and agrees with the browser", async () => {
    const { status, body } = await handIn();
    expect(status).toBe(201);
    expect(body).toMatchObject({
      state: "submitted",
      versionNumber: 1,
      isLate: false,
      hashesAgree: true,
      run: { isOk: true, hash: SERVER_HASH, seconds: 16 },
    });
    const version = server.db.select().from(showVersions).get();
    expect(version).toMatchObject({ showId: show.id, source: "square.all.on();\n", seed: show.seed, createdBy: wren });
    const run = server.db.select().from(runs).get();
    expect(run).toMatchObject({ versionId: version?.id, hash: SERVER_HASH });
    expect(run?.timeline).not.toBeNull();
    expect(run?.ribbon).not.toBeNull();
    expect(server.db.select().from(submissionEvents).all()).toEqual([
      expect.objectContaining({ state: "submitted", by: wren, versionId: version?.id }),
    ]);
  });

  it("takes a script that does not run, and says why", async () => {
    setDraft(BROKEN_SOURCE, 3);
    const { status, body } = await handIn({ hash: null });
    expect(status).toBe(201);
    expect(body).toMatchObject({
      hashesAgree: null,
      run: { isOk: false, hash: null, problem: { code: "unknown-word", range: { line: 1 } } },
    });
  });

  it("shows an empty timeline as a stop of the show check", async () => {
    const { body } = await handIn();
    expect(body.run.findings).toContainEqual(expect.objectContaining({ rule: "nothing-lit", severity: "stop" }));
  });

  it("counts the server's run when the browser disagrees, and leaves an alarm", async () => {
    const { status, body } = await handIn({ hash: "b".repeat(64) });
    expect(status).toBe(201);
    expect(body).toMatchObject({ hashesAgree: false, run: { hash: SERVER_HASH } });
    expect(server.db.select().from(submissions).get()?.hashesAgree).toBe(false);
    expect(
      server.db
        .select()
        .from(auditLog)
        .all()
        .map((row) => row.event),
    ).toContain("hash-mismatch");
  });

  it("makes a second version of changed work, one row of submission, and no version of the same work", async () => {
    await handIn();
    expect((await handIn({ key: "another-key" })).body.versionNumber).toBe(1);
    setDraft("square.all.off();\n", 4);
    expect((await handIn({ revision: 4 })).body.versionNumber).toBe(2);
    expect(server.db.select().from(submissions).all()).toHaveLength(1);
    expect(server.db.select().from(showVersions).all()).toHaveLength(2);
    expect(server.db.select().from(submissionEvents).all()).toHaveLength(2);
  });

  it("answers a retry with the same key with the very same answer", async () => {
    const first = await handIn({ key: "key-of-a-bell" });
    expect((await handIn({ key: "key-of-a-bell" })).body).toEqual(first.body);
    expect((await handIn({ key: "key-of-a-bell", hash: null })).body.type).toBe("/problems/key-reused");
  });

  it("answers draft-conflict with the saved draft when the revision is another", async () => {
    const { status, body } = await handIn({ revision: 2 });
    expect(status).toBe(409);
    expect(body).toMatchObject({
      type: "/problems/draft-conflict",
      draft: { revision: 3, source: "square.all.on();\n" },
    });
    expect(server.db.select().from(showVersions).all()).toEqual([]);
  });

  it("takes late work and says so, or refuses it, by the assignment's rule", async () => {
    const over = server.clock.now() - 1;
    const late = buildAssignment(server.db, {
      classId,
      dueAt: over,
      lateRule: "accept-late",
      songId: assignment.songId,
    });
    const lateShow = buildShow(server.db, { assignmentId: late.id, songId: late.songId, authorIds: [wren] });
    expect((await handIn({ assignmentId: late.id, showId: lateShow.id, revision: 1 })).body.isLate).toBe(true);
    const closed = buildAssignment(server.db, { classId, dueAt: over, lateRule: "closed", songId: assignment.songId });
    const closedShow = buildShow(server.db, { assignmentId: closed.id, songId: closed.songId, authorIds: [wren] });
    expect((await handIn({ assignmentId: closed.id, showId: closedShow.id, revision: 1 })).body.type).toBe(
      "/problems/past-due",
    );
  });

  it("takes work that was sent back even after a closed due date, and keeps it in time", async () => {
    const dueAt = server.clock.now() + 1000;
    const closed = buildAssignment(server.db, { classId, dueAt, lateRule: "closed", songId: assignment.songId });
    show = buildShow(server.db, { assignmentId: closed.id, songId: closed.songId, authorIds: [wren], revision: 3 });
    assignment = closed;
    await handIn();
    setState("revise");
    server.clock.advance(5000);
    const { status, body } = await handIn();
    expect(status).toBe(201);
    expect(body).toMatchObject({ state: "submitted", versionNumber: 2, isLate: false });
  });

  it("answers wrong-state for marked work, another assignment's show and a second show", async () => {
    await handIn();
    setState("marked");
    expect((await handIn({ key: "after-marking" })).body.type).toBe("/problems/wrong-state");
    const other = buildAssignment(server.db, { classId, songId: assignment.songId });
    expect((await handIn({ assignmentId: other.id })).body.type).toBe("/problems/wrong-state");
    const second = buildShow(server.db, { assignmentId: assignment.id, songId: assignment.songId, authorIds: [wren] });
    expect((await handIn({ showId: second.id, revision: 1 })).body.type).toBe("/problems/wrong-state");
  });

  it("takes a free show with the right song for the assignment", async () => {
    const free = buildShow(server.db, { songId: assignment.songId, authorIds: [wren] });
    expect((await handIn({ showId: free.id, revision: 1 })).status).toBe(201);
    const otherSong = buildShow(server.db, { authorIds: [wren] });
    const next = buildAssignment(server.db, { classId, songId: assignment.songId });
    expect((await handIn({ assignmentId: next.id, showId: otherSong.id, revision: 1 })).body.type).toBe(
      "/problems/wrong-state",
    );
  });

  it("answers not-found for another's show and for another class's assignment", async () => {
    const others = buildShow(server.db, { assignmentId: assignment.id, songId: assignment.songId });
    expect((await handIn({ showId: others.id, revision: 1 })).status).toBe(404);
    expect((await handIn({ as: buildUser(server.db).id })).status).toBe(404);
  });

  it("is safe once the version is kept: a run that got lost is made up for at start-up", async () => {
    const run = vi.spyOn(server.deps.runs, "judge").mockRejectedValueOnce(new Error("the pool is gone"));
    const { status, body } = await handIn();
    expect(status).toBe(201);
    expect(body).toMatchObject({ hashesAgree: null, run: { isOk: false, problem: null } });
    expect(server.db.select().from(runs).all()).toEqual([]);
    run.mockRestore();
    const { connection, clock, runs: pool, log } = server.deps;
    expect(await runUnfinishedVersions({ db: connection.db, clock, runs: pool, log })).toBe(1);
    expect(server.db.select().from(runs).get()?.summary.isOk).toBe(true);
    expect(await runUnfinishedVersions({ db: connection.db, clock, runs: pool, log })).toBe(0);
  });
});
