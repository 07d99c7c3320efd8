import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { buildUser } from "../../../tests/support/factories.ts";
import { createTestServer, type TestServer } from "../../../tests/support/test-server.ts";
import { adminContract } from "../../../shared/contracts/admin.ts";
import { authContract } from "../../../shared/contracts/auth.ts";

let server: TestServer;
let admin: string;
beforeEach(() => {
  server = createTestServer();
  admin = buildUser(server.db, { roles: ["admin"], schoolId: null }).id;
});
afterEach(() => server.dispose());

const PASSWORD = "seven grey geese at dusk";
const add = (changes: object = {}) =>
  server.call(
    adminContract.addStaff,
    {
      body: {
        displayName: "Ida Fenn",
        email: "ida@school.example",
        roles: ["coordinator"],
        schoolId: null,
        password: PASSWORD,
        ...changes,
      },
    },
    { as: admin },
  );
const disable = (userId: string, isDisabled = true) =>
  server.call(adminContract.setDisabled, { params: { userId: userId }, body: { isDisabled } }, { as: admin });

describe("POST /api/admin/staff", () => {
  it("adds an account that signs in", async () => {
    expect((await add()).status).toBe(201);
    const signedIn = await server.call(authContract.staffSignIn, {
      body: { email: "ida@school.example", password: PASSWORD },
    });
    expect(signedIn.body.user.roles).toEqual(["coordinator"]);
  });

  it("refuses an e-mail that is taken, whatever its capitals", async () => {
    await add();
    expect((await add({ email: "IDA@school.example" })).body.type).toBe("/problems/already-done");
  });

  it("refuses a password made of the person's own names", async () => {
    const { body } = await add({ displayName: "Marigold Fennimore", password: "marigold fennimore" });
    expect(body.errors[0].pointer).toBe("/password");
  });

  it("asks for the school of a teacher", async () => {
    expect((await add({ roles: ["teacher"] })).body.errors[0].pointer).toBe("/schoolId");
  });
});

describe("PUT /api/admin/staff/:userId/disabled", () => {
  it("ends the person's sessions at once, and lets them in again when enabled", async () => {
    const teacher = buildUser(server.db, { roles: ["teacher"] }).id;
    const cookie = await server.signIn(teacher);
    expect((await disable(teacher)).body.staff.isDisabled).toBe(true);
    expect((await server.call(authContract.session, {}, { headers: { cookie } })).body.session).toBeNull();
    expect((await disable(teacher, false)).body.staff.isDisabled).toBe(false);
  });

  it("refuses one's own account, and does not know students", async () => {
    expect((await disable(admin)).body.type).toBe("/problems/wrong-state");
    expect((await disable(buildUser(server.db).id)).status).toBe(404);
  });
});

describe("GET /api/admin/audit", () => {
  it("lists events newest first, and shows when a byte was changed", async () => {
    await add();
    const list = async () => (await server.call(adminContract.audit, {}, { as: admin })).body;
    expect(await list()).toMatchObject({
      isChainWhole: true,
      hasMore: false,
      rows: [{ event: "Added a staff account" }],
    });
    const { sqlite } = server.deps.connection;
    sqlite.exec("drop trigger audit_log_no_update; update audit_log set subject = 'x'");
    expect((await list()).isChainWhole).toBe(false);
  });
});
