import { eq } from "drizzle-orm";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { contracts } from "../../../shared/contracts/index.ts";
import { consents, lineupPublications, runs, slots } from "../../db/schema/index.ts";
import {
  buildClass,
  buildForward,
  buildNight,
  buildRun,
  buildSchool,
  buildSeason,
  buildSlot,
  buildSquare,
  buildSubmission,
  buildUser,
} from "../../../tests/support/factories.ts";
import { createTestServer, type TestServer } from "../../../tests/support/test-server.ts";
import { findVersion } from "../../show-runs/runs.queries.ts";

let server: TestServer;
let wren: string;
let teacher: string;
let otherTeacher: string;
let coordinator: string;
let classId: string;
let friday: ReturnType<typeof buildNight>;
let saturday: ReturnType<typeof buildNight>;

beforeEach(() => {
  // The clock stands at 11:00 of 2026-12-01 in New York.
  server = createTestServer();
  const { db } = server;
  buildSquare(db);
  const schoolId = buildSchool(db, { shortName: "Tarn Road" }).id;
  wren = buildUser(db, { displayName: "Wren", schoolId }).id;
  teacher = buildUser(db, { roles: ["teacher"], schoolId }).id;
  otherTeacher = buildUser(db, { roles: ["teacher"] }).id;
  coordinator = buildUser(db, { roles: ["coordinator"], schoolId: null }).id;
  classId = buildClass(db, { name: "7B", schoolId, teacherIds: [teacher], studentIds: [wren] }).id;
  const season = buildSeason(db);
  friday = buildNight(db, { seasonId: season.id, date: "2026-12-04" });
  saturday = buildNight(db, { seasonId: season.id, date: "2026-12-05" });
});
afterEach(() => server.dispose());

const marked = () => buildSubmission(server.db, { studentId: wren, classId, state: "marked" });
function forwarded(state: "waiting" | "approved" | "declined" = "approved") {
  const submission = marked();
  return buildForward(server.db, {
    submissionId: submission.id,
    versionId: submission.versionId,
    forwardedBy: teacher,
    state,
  });
}
function addStop(versionId: string) {
  const version = findVersion(server.db, versionId)!;
  const stop = {
    rule: "street-flash",
    severity: "stop" as const,
    sentence: "Too many flashes.",
    moments: [0],
    lights: [],
    lines: [1],
  };
  const { summary } = server.db.select().from(runs).where(eq(runs.versionId, versionId)).get()!;
  buildRun(server.db, version, { summary: { ...summary, findings: [stop] }, createdAt: Date.UTC(2026, 10, 3) });
}
const agree = () => server.db.insert(consents).values({ userId: wren, isNamePublic: true, recordedAt: 0 }).run();

const forward = (id: string, as = teacher) =>
  server.call(contracts.lineup.forward, { params: { submissionId: id }, body: { note: "Lovely bells." } }, { as });
const idOf = (row: { id: string }) => ({ params: { forwardId: row.id } });
const place = (row: { id: string }, startsAt: string, night: { id: string } = friday) =>
  server.call(
    contracts.lineup.place,
    { body: { forwardId: row.id, nightId: night.id, startsAt } },
    { as: coordinator },
  );
const move = (slotId: string, body: object) =>
  server.call(contracts.lineup.move, { params: { slotId: slotId }, body }, { as: coordinator });
const publish = () => server.call(contracts.lineup.publish, {}, { as: coordinator });
const getLineup = async () => (await server.call(contracts.lineup.lineup, {}, { as: coordinator })).body;

describe("POST /api/submissions/:submissionId/forward", () => {
  it("forwards marked work under the class's name, or the child's when the family agreed", async () => {
    const first = await forward(marked().id);
    expect(first.status).toBe(201);
    expect(first.body.forward).toMatchObject({
      state: "waiting",
      publicName: "class 7B, Tarn Road",
      authors: ["Wren"],
      note: "Lovely bells.",
      slotCount: 0,
    });
    agree();
    expect((await forward(marked().id)).body.forward.publicName).toBe("Wren, Tarn Road");
  });

  it("refuses work that is not marked, does not run or has a stop", async () => {
    const open = buildSubmission(server.db, { studentId: wren, classId });
    expect((await forward(open.id)).body.type).toBe("/problems/wrong-state");
    const stopped = marked();
    addStop(stopped.versionId);
    const refused = await forward(stopped.id);
    expect(refused.body).toMatchObject({ type: "/problems/blocked-by-stop", findings: [{ rule: "street-flash" }] });
    const broken = marked();
    const version = findVersion(server.db, broken.versionId)!;
    const { summary } = server.db.select().from(runs).where(eq(runs.versionId, version.id)).get()!;
    buildRun(server.db, version, { summary: { ...summary, isOk: false }, createdAt: Date.UTC(2026, 10, 3) });
    expect((await forward(broken.id)).body.type).toBe("/problems/wrong-state");
  });

  it("answers already-done while it is with the event, and takes it again after a decline", async () => {
    const submission = marked();
    const first = await forward(submission.id);
    expect((await forward(submission.id)).body.type).toBe("/problems/already-done");
    await server.call(
      contracts.lineup.decline,
      { ...idOf(first.body.forward), body: { note: "Too long." } },
      { as: coordinator },
    );
    expect((await forward(submission.id)).status).toBe(201);
  });

  it("answers not-found to other teachers", async () => {
    expect((await forward(marked().id, otherTeacher)).status).toBe(404);
  });
});

describe("GET /api/forwards", () => {
  it("lists all for the coordinator, without names that are not public, and their own for a teacher", async () => {
    forwarded("waiting");
    buildForward(server.db, { forwardedBy: otherTeacher });
    const all = (await server.call(contracts.lineup.forwards, {}, { as: coordinator })).body.forwards;
    expect(all).toHaveLength(2);
    expect(all.every((row: { authors: string[] }) => row.authors.length === 0)).toBe(true);
    const own = (await server.call(contracts.lineup.forwards, {}, { as: teacher })).body.forwards;
    expect(own).toEqual([expect.objectContaining({ authors: ["Wren"] })]);
  });
});

describe("GET /api/forwards/:forwardId", () => {
  it("gives the check to coordinator and the class's teacher, not-found to other teachers", async () => {
    const row = forwarded("waiting");
    for (const as of [coordinator, teacher]) {
      const { status, body } = await server.call(contracts.lineup.forwardDetail, idOf(row), { as });
      expect(status).toBe(200);
      expect(body).toMatchObject({ run: { isOk: true }, findings: [] });
    }
    expect((await server.call(contracts.lineup.forwardDetail, idOf(row), { as: otherTeacher })).status).toBe(404);
  });
});

describe("POST /api/forwards/:forwardId/approve", () => {
  const approve = (row: { id: string }) =>
    server.call(contracts.lineup.approve, { ...idOf(row), body: {} }, { as: coordinator });

  it("approves a waiting show once", async () => {
    const row = forwarded("waiting");
    expect((await approve(row)).body.forward.state).toBe("approved");
    expect((await approve(row)).body.type).toBe("/problems/wrong-state");
    expect((await approve({ id: "nothing" })).status).toBe(404);
  });

  it("is refused while a stop stands", async () => {
    const row = forwarded("waiting");
    addStop(row.versionId);
    expect((await approve(row)).body.type).toBe("/problems/blocked-by-stop");
  });
});

describe("POST /api/forwards/:forwardId/decline", () => {
  const decline = (row: { id: string }, note: string) =>
    server.call(contracts.lineup.decline, { ...idOf(row), body: { note } }, { as: coordinator });

  it("always takes a note and frees the slots", async () => {
    const row = forwarded();
    buildSlot(server.db, { forwardId: row.id, nightId: friday.id });
    expect((await decline(row, " ")).status).toBe(422);
    expect((await decline(row, "The song is over before the show.")).body.forward).toMatchObject({
      state: "declined",
      answer: "The song is over before the show.",
      slotCount: 0,
    });
    expect(server.db.select().from(slots).all()).toEqual([]);
    expect((await decline(row, "Again.")).body.type).toBe("/problems/wrong-state");
    expect((await decline({ id: "nothing" }, "Why.")).status).toBe(404);
  });
});

describe("POST /api/lineup/slots", () => {
  it("places an approved show, which is then scheduled", async () => {
    const { status, body } = await place(forwarded(), "18:00");
    expect(status).toBe(201);
    expect(body.slots).toEqual([expect.objectContaining({ startsAt: "18:00", nightId: friday.id })]);
    expect(body.shows[0]).toMatchObject({ state: "scheduled", slotCount: 1 });
    expect(body).toMatchObject({ changeCount: 1, tonight: "2026-12-01", publication: null });
  });

  it("answers slot-taken, and the database refuses double booking by itself", async () => {
    const row = forwarded();
    await place(row, "18:00");
    expect((await place(forwarded(), "18:00")).body.type).toBe("/problems/slot-taken");
    expect(() => buildSlot(server.db, { forwardId: row.id, nightId: friday.id, startsAt: "18:00" })).toThrow(/UNIQUE/);
  });

  it("refuses a waiting show, a closed night, a night that is over and a time off the board", async () => {
    expect((await place(forwarded("waiting"), "18:00")).body.type).toBe("/problems/wrong-state");
    const closed = buildNight(server.db, { seasonId: friday.seasonId, date: "2026-12-06", closedReason: "Market day" });
    expect((await place(forwarded(), "18:00", closed)).body).toMatchObject({
      type: "/problems/wrong-state",
      detail: "This night is closed: Market day.",
    });
    const over = buildNight(server.db, { seasonId: friday.seasonId, date: "2026-11-30" });
    expect((await place(forwarded(), "18:00", over)).body.type).toBe("/problems/wrong-state");
    expect((await place(forwarded(), "18:07")).body.errors[0].pointer).toBe("/startsAt");
    expect((await place({ id: "nothing" }, "18:00")).status).toBe(404);
  });
});

describe("PATCH /api/lineup/slots/:slotId", () => {
  it("moves to another night and swaps two only when asked to", async () => {
    const one = buildSlot(server.db, { forwardId: forwarded().id, nightId: friday.id, startsAt: "18:00" });
    const two = buildSlot(server.db, { forwardId: forwarded().id, nightId: saturday.id, startsAt: "18:20" });
    expect((await move(one.id, { nightId: saturday.id, startsAt: "18:20" })).body).toMatchObject({
      type: "/problems/slot-taken",
      slotId: two.id,
    });
    const { body } = await move(one.id, { nightId: saturday.id, startsAt: "18:20", swap: true });
    expect(body.slots).toEqual([
      expect.objectContaining({ id: two.id, nightId: friday.id, startsAt: "18:00" }),
      expect.objectContaining({ id: one.id, nightId: saturday.id, startsAt: "18:20" }),
    ]);
  });

  it("holds a pinned slot until it is unpinned", async () => {
    const row = buildSlot(server.db, { forwardId: forwarded().id, nightId: friday.id });
    expect((await move(row.id, { isPinned: true })).body.slots[0].isPinned).toBe(true);
    expect((await move(row.id, { startsAt: "18:20" })).body.type).toBe("/problems/wrong-state");
    const other = buildSlot(server.db, { forwardId: forwarded().id, nightId: friday.id, startsAt: "18:40" });
    expect((await move(other.id, { startsAt: "18:00", swap: true })).body.type).toBe("/problems/wrong-state");
    expect((await move(row.id, { startsAt: "18:20", isPinned: false })).status).toBe(200);
  });

  it("answers not-found and invalid-request", async () => {
    expect((await move("nothing", { isPinned: true })).status).toBe(404);
    const row = buildSlot(server.db, { forwardId: forwarded().id, nightId: friday.id });
    expect((await move(row.id, { startsAt: "18:07" })).status).toBe(422);
  });
});

describe("DELETE /api/lineup/slots/:slotId", () => {
  it("puts the show back into the tray", async () => {
    const row = buildSlot(server.db, { forwardId: forwarded().id, nightId: friday.id });
    const remove = () => server.call(contracts.lineup.remove, { params: { slotId: row.id } }, { as: coordinator });
    const { body } = await remove();
    expect(body.slots).toEqual([]);
    expect(body.findings).toEqual([expect.objectContaining({ rule: "not-placed" })]);
    expect((await remove()).status).toBe(404);
  });
});

describe("PATCH /api/lineup/nights/:nightId", () => {
  const setNight = (body: object, id = friday.id) =>
    server.call(contracts.lineup.setNight, { params: { nightId: id }, body }, { as: coordinator });

  it("closes a night with a reason, which stops what is placed there, and opens it again", async () => {
    buildSlot(server.db, { forwardId: forwarded().id, nightId: friday.id });
    const closed = await setNight({ closedReason: "Market day" });
    expect(closed.body.findings).toEqual([expect.objectContaining({ rule: "closed-night", severity: "stop" })]);
    expect((await setNight({ closedReason: null })).body.findings).toEqual([]);
  });

  it("refuses hours that end before they begin, an empty reason and an unknown night", async () => {
    expect((await setNight({ closesAt: "17:00" })).body.errors[0].pointer).toBe("/closesAt");
    expect((await setNight({ closedReason: "" })).body.errors[0].pointer).toBe("/closedReason");
    expect((await setNight({ closesAt: "20:00" }, "nothing")).status).toBe(404);
  });
});

describe("POST /api/lineup/publish and GET /api/programme", () => {
  const programme = async () => (await server.call(contracts.lineup.programme, {})).body;

  it("shows families the last publication, and nothing that was changed since", async () => {
    agree();
    const row = forwarded();
    await place(row, "18:20");
    expect(await programme()).toMatchObject({
      eventName: "Quillhaven Winter Lights",
      publishedAt: null,
      nights: [],
      shows: [],
    });
    expect((await publish()).body).toEqual({ number: 1, publishedAt: server.clock.now() });
    const first = await programme();
    expect(first.shows).toEqual([
      expect.objectContaining({
        date: "2026-12-04",
        startsAt: "18:20",
        publicName: "Wren, Tarn Road",
        description: "The square lights up.",
      }),
    ]);
    const { slots: placed } = await getLineup();
    await move(placed[0].id, { startsAt: "18:40" });
    expect((await getLineup()).changeCount).toBe(1);
    expect(await programme()).toEqual(first);
    expect((await publish()).body.number).toBe(2);
    expect((await programme()).shows[0].startsAt).toBe("18:40");
    expect((await getLineup()).changeCount).toBe(0);
  });

  it("is refused while a stop stands, with the stops", async () => {
    const row = forwarded();
    await place(row, "18:00");
    addStop(row.versionId);
    expect((await publish()).body).toMatchObject({
      type: "/problems/lineup-has-stops",
      findings: [{ rule: "show-has-stop" }],
    });
  });

  it("answers already-done when nothing changed; a closed night is a change", async () => {
    await publish();
    expect((await publish()).body.type).toBe("/problems/already-done");
    await server.call(
      contracts.lineup.setNight,
      { params: { nightId: saturday.id }, body: { closedReason: "Storm" } },
      { as: coordinator },
    );
    expect((await publish()).body.number).toBe(2);
    expect((await programme()).nights).toContainEqual({ date: "2026-12-05", closedReason: "Storm" });
  });

  it("keeps every publication as it was", async () => {
    await publish();
    expect(() => server.db.update(lineupPublications).set({ number: 9 }).run()).toThrow(/insert-only/);
  });

  it("rolls tonight over at 04:00 of the event's zone", async () => {
    server.clock.advance(Date.UTC(2026, 11, 5, 8, 59) - server.clock.now());
    expect((await programme()).tonight).toBe("2026-12-04");
    server.clock.advance(60_000);
    expect((await programme()).tonight).toBe("2026-12-05");
  });

  it("answers everybody in a database without a season", async () => {
    const empty = createTestServer();
    const { status, body } = await empty.call(contracts.lineup.programme, {});
    expect(status).toBe(200);
    expect(body.shows).toEqual([]);
    empty.dispose();
  });
});

describe("GET /api/lineup", () => {
  it("is for the coordinator alone", async () => {
    expect((await server.call(contracts.lineup.lineup, {}, { as: teacher })).status).toBe(403);
    expect((await server.call(contracts.lineup.lineup, {})).status).toBe(401);
  });

  it("answers not-found before a season is set up", async () => {
    const empty = createTestServer();
    const as = buildUser(empty.db, { roles: ["coordinator"], schoolId: null }).id;
    expect((await empty.call(contracts.lineup.lineup, {}, { as })).body).toMatchObject({
      status: 404,
      detail: "No season is set up yet.",
    });
    empty.dispose();
  });
});
