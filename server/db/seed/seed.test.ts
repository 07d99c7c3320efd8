import { pino } from "pino";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { createTestClock } from "../../../tests/support/test-clock.ts";
import { createTestDatabase, type TestDatabase } from "../../../tests/support/test-database.ts";
import { getProgramme } from "../../features/lineup/programme.service.ts";
import { getLineup } from "../../features/lineup/lineup.service.ts";
import { createSecretHasher } from "../../identity/secret-hasher.ts";
import { createRunPool, type RunPool } from "../../runs/run-pool.ts";
import type { Db } from "../connection.ts";
import { isEmptyDatabase } from "../is-empty-database.ts";
import {
  assignments,
  beatMaps,
  classes,
  forwards,
  lessonProgress,
  runs,
  schools,
  showAuthors,
  shows,
  showVersions,
  songFiles,
  squareLayouts,
  submissions,
  userRoles,
  users,
} from "../schema/index.ts";
import { seedDemoWorld } from "./index.ts";
import { DEMO_SCRIPTS } from "./world/scripts/index.ts";
import { demoStudent, STAFF, STUDENTS } from "./world/people.ts";

const clock = createTestClock();
let database: TestDatabase;
let pool: RunPool;
let db: Db;
let signIns: readonly string[];

beforeAll(async () => {
  database = createTestDatabase();
  db = database.connection.db;
  expect(isEmptyDatabase(db)).toBe(true);
  pool = createRunPool({ threads: 2, deadlineMs: 60_000 });
  signIns = await seedDemoWorld({ db, clock, runs: pool, log: pino({ level: "silent" }) });
}, 120_000);
afterAll(async () => {
  await pool.close();
  database.dispose();
});

const count = (table: Parameters<Db["$count"]>[0]) => db.$count(table);

describe("seedDemoWorld", () => {
  it("fills two schools, six classes, everybody with a role and a secret", async () => {
    expect(isEmptyDatabase(db)).toBe(false);
    expect(await count(schools)).toBe(2);
    expect(await count(classes)).toBe(6);
    expect(await count(users)).toBe(STUDENTS.length + STAFF.length);
    const roles = db.select().from(userRoles).all();
    const holders = (role: string) => roles.filter((row) => row.role === role).length;
    expect([holders("student"), holders("teacher"), holders("coordinator"), holders("admin")]).toEqual([
      STUDENTS.length,
      5,
      1,
      1,
    ]);
    expect(
      db
        .select()
        .from(users)
        .all()
        .every((row) => row.secretHash?.startsWith("$argon2id$")),
    ).toBe(true);
  });

  it("lets the people it prints sign in with the secrets it prints", async () => {
    const wren = demoStudent("7B-TARN/wren");
    expect(signIns.join("\n")).toContain(wren.passphrase.replaceAll("-", " "));
    const row = db
      .select()
      .from(users)
      .all()
      .find((one) => one.username === "wren");
    expect(await createSecretHasher().verify(row?.secretHash ?? null, wren.passphrase)).toBe(true);
  });

  it("keeps the square of 40 fronts, six songs with their files and beat maps", async () => {
    expect(db.select().from(squareLayouts).get()?.layout.fronts.length).toBeGreaterThanOrEqual(40);
    expect(await count(songFiles)).toBe(6);
    expect(await count(beatMaps)).toBe(6);
  });

  it("runs every version and draws every draft that runs", async () => {
    expect(await count(shows)).toBe(DEMO_SCRIPTS.length);
    expect(await count(assignments)).toBeGreaterThanOrEqual(8);
    expect(await count(runs)).toBe(await count(showVersions));
    const ran = db.select().from(runs).all();
    for (const run of ran) {
      expect(run.summary.description).not.toBe("");
      if (run.summary.isOk) expect(run.hash).toMatch(/^[0-9a-f]{64}$/);
    }
    expect(ran.some((run) => !run.summary.isOk)).toBe(true);
    expect(ran.some((run) => run.summary.findings.some((finding) => finding.severity === "stop"))).toBe(true);
    const ribbons = database.connection.sqlite
      .prepare("select count(*) from drafts where ribbon is not null")
      .pluck()
      .get();
    expect(ribbons).toBe(DEMO_SCRIPTS.filter((script) => script.expected.runs).length);
  });

  it("has work in every state and forwards in every state", () => {
    const states = new Set(
      db
        .select()
        .from(submissions)
        .all()
        .map((row) => row.state),
    );
    expect([...states].sort()).toEqual(["marked", "revise", "submitted"]);
    expect(db.select().from(shows).all().length).toBeGreaterThan(db.select().from(submissions).all().length);
    const forwardStates = new Set(
      db
        .select()
        .from(forwards)
        .all()
        .map((row) => row.state),
    );
    expect([...forwardStates].sort()).toEqual(["approved", "declined", "waiting"]);
  });

  it("gives one student work in many states, and leaves some with nothing", () => {
    const authors = new Set(
      db
        .select()
        .from(showAuthors)
        .all()
        .map((row) => row.userId),
    );
    const students = db
      .select()
      .from(users)
      .all()
      .filter((row) => row.username !== null);
    expect(students.some((row) => !authors.has(row.id))).toBe(true);
    const wren = students.find((row) => row.username === "wren")?.id;
    const own = db
      .select()
      .from(showAuthors)
      .all()
      .filter((row) => row.userId === wren)
      .map((row) => row.showId);
    const wrens = db
      .select()
      .from(submissions)
      .all()
      .filter((row) => own.includes(row.showId))
      .map((row) => row.state);
    expect(new Set(wrens)).toEqual(new Set(["marked", "revise", "submitted"]));
  });

  it("has published a season that goes on, with shows tonight and no stop", () => {
    const programme = getProgramme({ db, clock });
    expect(programme.publishedAt).toBe(clock.now());
    const tonight = programme.shows.filter((show) => show.date === programme.tonight);
    expect(tonight.length).toBeGreaterThan(2);
    expect(tonight.every((show) => show.ribbon !== null)).toBe(true);
    const lineup = getLineup({ db, clock });
    expect(lineup.changeCount).toBe(0);
    expect(lineup.findings.filter((finding) => finding.severity === "stop")).toEqual([]);
    expect(lineup.nights[0]?.date).toBe("2026-11-21");
    expect(lineup.nights.at(-1)?.date).toBe("2026-12-25");
  });

  it("has progress in the lessons", async () => {
    expect(await count(lessonProgress)).toBeGreaterThan(500);
  });

  it("leaves no row that points at nothing", () => {
    expect(database.connection.sqlite.pragma("foreign_key_check")).toEqual([]);
    expect(database.connection.sqlite.pragma("integrity_check", { simple: true })).toBe("ok");
    const loose = database.connection.sqlite
      .prepare(
        "select count(*) from forwards f left join submissions s on s.id = f.submission_id left join show_versions v on v.id = f.version_id where s.id is null or v.id is null",
      )
      .pluck()
      .get();
    expect(loose).toBe(0);
  });
});
