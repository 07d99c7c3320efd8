import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { contracts } from "../../../shared/contracts/index.ts";
import { buildSquare, buildUser, buildVersion } from "../../../tests/support/factories.ts";
import { createTestServer, type TestServer } from "../../../tests/support/test-server.ts";

let server: TestServer;
let userId: string;
beforeEach(() => {
  server = createTestServer();
  userId = buildUser(server.db).id;
});
afterEach(() => server.dispose());

describe("GET /api/square", () => {
  it("gives the current layout, not frozen before anything rests on it", async () => {
    const layout = buildSquare(server.db);
    const { status, body } = await server.call(contracts.square.current, {}, { as: userId });
    expect(status).toBe(200);
    expect(body).toMatchObject({ layoutId: layout.id, number: 1, isFrozen: false, hash: layout.hash });
    expect(body.layout.fronts).toHaveLength(2);
  });

  it("says that a layout is frozen once a version was made on it", async () => {
    buildSquare(server.db);
    buildVersion(server.db);
    const { body } = await server.call(contracts.square.current, {}, { as: userId });
    expect(body.isFrozen).toBe(true);
  });

  it("answers not-found before a square is described", async () => {
    expect((await server.call(contracts.square.current, {}, { as: userId })).status).toBe(404);
  });
});

describe("GET /api/square/layouts/:layoutId", () => {
  it("gives a layout by its id and not-found for another", async () => {
    const layout = buildSquare(server.db);
    const found = await server.call(contracts.square.layout, { params: { layoutId: layout.id } }, { as: userId });
    expect(found.body.hash).toBe(layout.hash);
    const missing = await server.call(contracts.square.layout, { params: { layoutId: "nothing" } }, { as: userId });
    expect(missing.status).toBe(404);
  });
});
