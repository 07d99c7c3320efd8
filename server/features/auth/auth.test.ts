import { eq } from "drizzle-orm";
import { afterEach, beforeAll, beforeEach, describe, expect, it } from "vitest";
import { buildClass, buildSchool, buildUser } from "../../../tests/support/factories.ts";
import { createTestServer, type TestServer } from "../../../tests/support/test-server.ts";
import { authContract } from "../../../shared/contracts/auth.ts";
import { classesContract } from "../../../shared/contracts/classes.ts";
import { auditLog, userRoles, users } from "../../db/schema/index.ts";
import { createSecretHasher } from "../../identity/secret-hasher.ts";

const WORDS = "acorn-lantern-river-maple";
const PASSWORD = "seven grey geese over the ironmonger";
const MINUTE_MS = 60_000;

let wordsHash: string;
let passwordHash: string;
beforeAll(async () => {
  const hasher = createSecretHasher();
  wordsHash = await hasher.hash(WORDS);
  passwordHash = await hasher.hash(PASSWORD);
});

let server: TestServer;
beforeEach(() => {
  server = createTestServer();
});
afterEach(() => {
  server.dispose();
});

function buildPupil() {
  const { db } = server;
  const school = buildSchool(db, { name: "Tarn Road Middle School" });
  const pupil = buildUser(db, {
    schoolId: school.id,
    displayName: "Wren Aster",
    username: "wren.a",
    secretHash: wordsHash,
  });
  const teacher = buildUser(db, {
    roles: ["teacher"],
    schoolId: school.id,
    email: "ida@tarn-road.example",
    secretHash: passwordHash,
  });
  const group = buildClass(db, {
    schoolId: school.id,
    name: "7B",
    code: "7B-TARN",
    teacherIds: [teacher.id],
    studentIds: [pupil.id],
  });
  return { pupil, teacher, group };
}

const signInPupil = (changes: object = {}) =>
  server.call(authContract.studentSignIn, {
    body: { classCode: "7B-TARN", username: "wren.a", passphrase: WORDS, ...changes },
  });
const signInStaff = (changes: object = {}) =>
  server.call(authContract.staffSignIn, { body: { email: "ida@tarn-road.example", password: PASSWORD, ...changes } });
const cookieOf = (answer: { headers: Record<string, string> }) =>
  String(answer.headers["set-cookie"]).split(";")[0] ?? "";
const sessionWith = (cookie: string) => server.call(authContract.session, {}, { headers: { cookie } });

describe("POST /api/auth/student-sign-in", () => {
  it("signs in with class code, username and words, and sets an http-only cookie that closes with the browser", async () => {
    const { pupil, group } = buildPupil();
    const answer = await signInPupil();
    expect(answer.status).toBe(200);
    expect(answer.body.user).toMatchObject({
      id: pupil.id,
      displayName: "Wren Aster",
      roles: ["student"],
      schoolName: "Tarn Road Middle School",
    });
    expect(answer.body.user.classes).toEqual([{ id: group.id, name: "7B", code: "7B-TARN" }]);
    expect(answer.headers["set-cookie"]?.[0]).toMatch(
      /^duskbell-session=[a-z0-9]{40}; HttpOnly; Path=\/; SameSite=Lax$/,
    );
  });

  it("forgives capitals and spaces in every part", async () => {
    buildPupil();
    const answer = await signInPupil({
      classCode: " 7b tarn",
      username: "Wren.A ",
      passphrase: "Acorn  lantern River maple",
    });
    expect(answer.status).toBe(200);
  });

  it("gives one answer for wrong words, an unknown name, an unknown class and a disabled account", async () => {
    const { pupil } = buildPupil();
    const answers = [
      await signInPupil({ passphrase: "acorn-lantern-river-mople" }),
      await signInPupil({ username: "nobody" }),
      await signInPupil({ classCode: "9Z" }),
    ];
    server.db.update(users).set({ isDisabled: true }).where(eq(users.id, pupil.id)).run();
    answers.push(await signInPupil());
    for (const answer of answers) {
      expect(answer.status).toBe(401);
      expect({ ...answer.body, instance: "" }).toEqual({ ...answers[0]?.body, instance: "" });
      expect(answer.headers["set-cookie"]).toBeUndefined();
    }
  });

  it("lists every bad field", async () => {
    const answer = await signInPupil({ classCode: "", username: "" });
    expect(answer.status).toBe(422);
    expect(answer.body.errors.map((error: { pointer: string }) => error.pointer)).toEqual(["/classCode", "/username"]);
  });

  it("takes a student with the code of any class they are enrolled in", async () => {
    const { pupil } = buildPupil();
    buildClass(server.db, { code: "CLUB", studentIds: [pupil.id] });
    expect((await signInPupil({ classCode: "club" })).status).toBe(200);
  });

  it("makes wait 5, 10, 30, 60 and 60 s after the fifth wrong try, and a right try after that forgets", async () => {
    buildPupil();
    for (let i = 0; i < 5; i++) expect((await signInPupil({ passphrase: "wrong" })).status).toBe(401);
    for (const seconds of [5, 10, 30, 60, 60]) {
      const slowed = await signInPupil();
      expect(slowed.status).toBe(429);
      expect(slowed.headers["retry-after"]).toBe(String(seconds));
      server.clock.advance(seconds * 1000);
      expect((await signInPupil({ passphrase: "wrong" })).status).toBe(401);
    }
    server.clock.advance(60_000);
    expect((await signInPupil()).status).toBe(200);
    expect((await signInPupil({ passphrase: "wrong" })).status).toBe(401);
    expect((await signInPupil()).status).toBe(200);
  });

  it("locks after 50 wrong tries in a day, until a day has passed or the teacher resets", async () => {
    const { pupil, group, teacher } = buildPupil();
    for (let i = 0; i < 50; i++) {
      expect((await signInPupil({ passphrase: "wrong" })).status).toBe(401);
      server.clock.advance(60_000);
    }
    server.clock.advance(60 * MINUTE_MS);
    expect((await signInPupil()).status).toBe(429);
    const params = { classId: group.id, studentId: pupil.id };
    expect((await server.call(classesContract.resetSignIn, { params }, { as: teacher.id })).status).toBe(200);
    expect((await signInPupil()).status).toBe(200);
  }, 60_000);

  it("slows a name that does not exist in the same way", async () => {
    for (let i = 0; i < 5; i++) await signInPupil({ username: "nobody" });
    expect((await signInPupil({ username: "nobody" })).status).toBe(429);
  });

  it("counts tries sent at once, so that they can not slip under the limit", async () => {
    buildPupil();
    const answers = await Promise.all(Array.from({ length: 40 }, () => signInPupil({ passphrase: "wrong" })));
    expect(answers.filter((answer) => answer.status === 401)).toHaveLength(5);
    expect(answers.filter((answer) => answer.status === 429)).toHaveLength(35);
  });
});

describe("POST /api/auth/staff-sign-in", () => {
  it("signs in whatever the capitals of the e-mail", async () => {
    const { teacher } = buildPupil();
    const answer = await signInStaff({ email: "Ida@Tarn-Road.example" });
    expect(answer.status).toBe(200);
    expect(answer.body.user.id).toBe(teacher.id);
  });

  it("refuses a wrong password and an unknown e-mail alike", async () => {
    buildPupil();
    expect((await signInStaff({ password: "seven grey geese" })).body.type).toBe("/problems/wrong-sign-in");
    expect((await signInStaff({ email: "nobody@tarn-road.example" })).body.type).toBe("/problems/wrong-sign-in");
  });

  it("keeps argon2id hashes only", () => {
    expect(passwordHash).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
  });
});

describe("a session", () => {
  it("gives a new token at each sign-in and drops the one before", async () => {
    buildPupil();
    const first = cookieOf(await signInPupil());
    const second = cookieOf(
      await server.call(
        authContract.studentSignIn,
        { body: { classCode: "7B-TARN", username: "wren.a", passphrase: WORDS } },
        { headers: { cookie: first } },
      ),
    );
    expect(second).not.toBe(first);
    expect((await sessionWith(first)).body).toEqual({ session: null });
    expect((await sessionWith(second)).body.session.user.displayName).toBe("Wren Aster");
  });

  it("ends at sign-out, and the browser is told to forget it", async () => {
    buildPupil();
    const cookie = cookieOf(await signInPupil());
    const answer = await server.call(authContract.signOut, {}, { headers: { cookie } });
    expect(answer.status).toBe(204);
    expect(answer.headers["set-cookie"]?.[0]).toMatch(/^duskbell-session=;.*Max-Age=0/);
    expect((await sessionWith(cookie)).body).toEqual({ session: null });
  });

  it("ends everywhere with sign-out everywhere", async () => {
    buildPupil();
    const cookies = [cookieOf(await signInPupil()), cookieOf(await signInPupil())];
    await server.call(authContract.signOutEverywhere, {}, { headers: { cookie: cookies[0] ?? "" } });
    for (const cookie of cookies) expect((await sessionWith(cookie)).body).toEqual({ session: null });
  });

  it("has a __Host- and Secure cookie on https, and HSTS", async () => {
    server.dispose();
    server = createTestServer({ config: { secureCookies: true } });
    buildPupil();
    const answer = await signInPupil();
    expect(answer.headers["set-cookie"]?.[0]).toMatch(
      /^__Host-duskbell=[a-z0-9]{40}; HttpOnly; Path=\/; SameSite=Lax; Secure$/,
    );
    expect(answer.headers["strict-transport-security"]).toBe("max-age=31536000");
  });

  it("keeps at most 20 of one person; the oldest give way", async () => {
    const { pupil } = buildPupil();
    const first = await server.signIn(pupil.id);
    for (let i = 0; i < 20; i++) {
      server.clock.advance(1000);
      await server.signIn(pupil.id);
    }
    expect((await sessionWith(first)).body).toEqual({ session: null });
  });

  it.each([
    ["student", 8, 60],
    ["teacher", 12, 60],
    ["coordinator", 12, 60],
    ["admin", 4, 15],
  ] as const)("of a %s ends after %d h at most and after %d min without use", async (role, hours, minutes) => {
    const person = buildUser(server.db, { roles: [role] });
    const idle = await server.signIn(person.id);
    server.clock.advance(minutes * MINUTE_MS - 1000);
    expect((await sessionWith(idle)).body.session).not.toBeNull();
    server.clock.advance(1000);
    expect((await sessionWith(idle)).body.session).toBeNull();

    const busy = await server.signIn(person.id);
    const used = () => server.call(authContract.suggestPassphrases, {}, { headers: { cookie: busy } });
    for (let passed = 0; passed < hours * 60 - 10; passed += 10) {
      server.clock.advance(10 * MINUTE_MS);
      await used();
    }
    server.clock.advance(10 * MINUTE_MS - 1000);
    expect((await sessionWith(busy)).body.session).not.toBeNull();
    server.clock.advance(1000);
    expect((await sessionWith(busy)).body.session).toBeNull();
  });

  it("is not kept alive by asking for it", async () => {
    const person = buildUser(server.db);
    const cookie = await server.signIn(person.id);
    for (let i = 0; i < 3; i++) {
      server.clock.advance(20 * MINUTE_MS);
      if (i < 2) expect((await sessionWith(cookie)).body.session).not.toBeNull();
    }
    expect((await sessionWith(cookie)).body.session).toBeNull();
  });

  it("has the shortest ends of several roles, also of one given later", async () => {
    const person = buildUser(server.db, { roles: ["teacher"] });
    const cookie = await server.signIn(person.id);
    server.db.insert(userRoles).values({ userId: person.id, role: "admin" }).run();
    await server.call(authContract.suggestPassphrases, {}, { headers: { cookie } });
    const { session } = (await sessionWith(cookie)).body;
    expect(session.endsAt - server.clock.now()).toBe(4 * 60 * MINUTE_MS);
    expect(session.idleEndsAt - server.clock.now()).toBe(15 * MINUTE_MS);
  });

  it("loses a role, and ends when disabled, with the next request", async () => {
    const teacher = buildUser(server.db, { roles: ["teacher"] });
    const cookie = await server.signIn(teacher.id);
    const list = () => server.call(classesContract.list, {}, { headers: { cookie } });
    expect((await list()).status).toBe(200);
    server.db.delete(userRoles).where(eq(userRoles.userId, teacher.id)).run();
    expect((await list()).status).toBe(403);
    server.db.update(users).set({ isDisabled: true }).where(eq(users.id, teacher.id)).run();
    expect((await list()).status).toBe(401);
  });

  it("can not be opened with anything that stands in the database", async () => {
    buildPupil();
    const cookie = cookieOf(await signInPupil());
    await signInStaff();
    const { sqlite } = server.deps.connection;
    const tables = sqlite.prepare("select name from sqlite_master where type = 'table'").pluck().all() as string[];
    const texts = tables.flatMap((table) =>
      sqlite
        .prepare(`select * from "${table}"`)
        .raw()
        .all()
        .flatMap((row) => (row as unknown[]).filter((value) => typeof value === "string")),
    );
    expect(texts.length).toBeGreaterThan(20);
    expect(texts).not.toContain(cookie.slice(cookie.indexOf("=") + 1));
    for (const text of new Set(texts)) {
      const { body } = await sessionWith(`duskbell-session=${encodeURIComponent(text)}`);
      expect(body).toEqual({ session: null });
    }
    expect((await sessionWith(cookie)).body.session).not.toBeNull();
  });

  it("ignores a broken cookie of another program on the host", async () => {
    const person = buildUser(server.db);
    const cookie = await server.signIn(person.id);
    expect((await sessionWith(`other=%E0%A4%A; ${cookie}`)).body.session).not.toBeNull();
  });
});

describe("POST /api/auth/redeem-reset", () => {
  const redeem = (code: string, changes: object = {}) =>
    server.call(authContract.redeemReset, {
      body: { classCode: "7B-TARN", username: "wren.a", code, passphrase: "comet-drum-easy-finch", ...changes },
    });
  const makeCode = async () => {
    const { pupil, group, teacher } = buildPupil();
    const params = { classId: group.id, studentId: pupil.id };
    const answer = await server.call(classesContract.resetSignIn, { params }, { as: teacher.id });
    return String(answer.body.code);
  };

  it("sets new words, signs in and ends the sessions from before", async () => {
    const code = await makeCode();
    const old = cookieOf(await signInPupil());
    const answer = await redeem(`${code.slice(0, 4).toLowerCase()}-${code.slice(4)}`);
    expect(answer.status).toBe(200);
    expect((await sessionWith(old)).body).toEqual({ session: null });
    expect((await signInPupil()).status).toBe(401);
    expect((await signInPupil({ passphrase: "comet drum easy finch" })).status).toBe(200);
  });

  it("takes a code once", async () => {
    const code = await makeCode();
    expect((await redeem(code)).status).toBe(200);
    expect((await redeem(code)).status).toBe(401);
  });

  it("refuses a code after 60 minutes, and a wrong one", async () => {
    const code = await makeCode();
    expect((await redeem("AAAABBBB")).status).toBe(401);
    server.clock.advance(60 * MINUTE_MS);
    expect((await redeem(code)).status).toBe(401);
  });

  it("asks for four different words and leaves the code unspent", async () => {
    const code = await makeCode();
    for (const passphrase of ["comet-drum-easy", "comet-comet-drum-easy", "a-b-c-d"]) {
      const answer = await redeem(code, { passphrase });
      expect(answer.status).toBe(422);
      expect(answer.body.errors[0].pointer).toBe("/passphrase");
    }
    expect((await redeem(code)).status).toBe(200);
  });

  it("slows guessing of codes", async () => {
    await makeCode();
    for (let i = 0; i < 5; i++) expect((await redeem("AAAABBBB")).status).toBe(401);
    expect((await redeem("AAAABBBB")).status).toBe(429);
  });
});

describe("POST /api/auth/change-password", () => {
  const NEXT = "forty lamps above the tea room";

  it("sets the new password, keeps this session and ends the others", async () => {
    const { teacher } = buildPupil();
    const other = await server.signIn(teacher.id);
    const mine = cookieOf(await signInStaff());
    const answer = await server.call(
      authContract.changePassword,
      { body: { current: PASSWORD, next: NEXT } },
      { headers: { cookie: mine } },
    );
    expect(answer.status).toBe(204);
    expect((await sessionWith(other)).body).toEqual({ session: null });
    expect((await sessionWith(mine)).body.session).not.toBeNull();
    expect((await signInStaff()).status).toBe(401);
    expect((await signInStaff({ password: NEXT })).status).toBe(200);
  });

  it("refuses a wrong current password", async () => {
    const { teacher } = buildPupil();
    const answer = await server.call(
      authContract.changePassword,
      { body: { current: "not it", next: NEXT } },
      { as: teacher.id },
    );
    expect(answer.body.type).toBe("/problems/wrong-sign-in");
  });

  it.each([
    ["too short", "short"],
    ["on the list", "correct horse battery staple"],
    ["the place's words", "Duskbell Quillhaven 2026"],
    ["repeated", "abcabcabcabcabcabc"],
  ])("refuses a new password that is %s", async (_, next) => {
    const { teacher } = buildPupil();
    const answer = await server.call(
      authContract.changePassword,
      { body: { current: PASSWORD, next } },
      { as: teacher.id },
    );
    expect(answer.status).toBe(422);
    expect(answer.body.errors[0].pointer).toBe("/next");
  });
});

describe("GET /api/auth/passphrase-suggestions", () => {
  it("deals three passphrases of four different words", async () => {
    const { body } = await server.call(authContract.suggestPassphrases, {});
    for (const passphrase of body.passphrases as string[]) expect(new Set(passphrase.split("-")).size).toBe(4);
    expect(new Set(body.passphrases).size).toBe(3);
  });
});

describe("the audit log", () => {
  it("has one row for each event and no secret", async () => {
    buildPupil();
    const cookie = cookieOf(await signInPupil());
    await server.call(authContract.signOut, {}, { headers: { cookie } });
    const rows = server.db.select().from(auditLog).all();
    expect(rows.map((row) => row.event)).toEqual(["signed-in", "signed-out"]);
    expect(JSON.stringify(rows)).not.toContain("acorn");
  });
});
