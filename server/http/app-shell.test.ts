import { afterEach, beforeEach, describe, expect, it } from "vitest";
import request from "supertest";
import { createTestServer, SAME_ORIGIN, type TestServer } from "../../tests/support/test-server.ts";

let server: TestServer;
beforeEach(() => {
  server = createTestServer();
});
afterEach(() => {
  server.dispose();
});

describe("an unknown path of the API", () => {
  it("is a not-found problem with the request id", async () => {
    const answer = await request(server.app).get("/api/nowhere");
    expect(answer.status).toBe(404);
    expect(answer.type).toBe("application/problem+json");
    expect(answer.body).toEqual({
      type: "/problems/not-found",
      title: "There is nothing here.",
      status: 404,
      instance: answer.headers["x-request-id"],
    });
  });
});

describe("a body", () => {
  const post = () => request(server.app).post("/api/auth/staff-sign-in").set(SAME_ORIGIN);

  it("that is no JSON is a malformed-request problem", async () => {
    const answer = await post().type("application/json").send('{"email": ');
    expect(answer.status).toBe(400);
    expect(answer.body.type).toBe("/problems/malformed-request");
  });

  it("of a form is refused, since another site can send one without asking", async () => {
    const answer = await post().type("form").send("email=a");
    expect(answer.status).toBe(400);
    expect(answer.body.detail).toContain("application/json");
  });

  it("over the limit is a too-large problem", async () => {
    const answer = await post().send({ email: "x".repeat(200_000) });
    expect(answer.status).toBe(413);
    expect(answer.body.type).toBe("/problems/too-large");
  });
});
