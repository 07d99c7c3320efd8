import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { FIXTURES } from "./fixtures.ts";
import { buildMatrix, ENDPOINTS, expectAccess, findFault, type Matrix, mountWithAccess } from "./matrix.ts";
import { CALLERS } from "./world.ts";

/**
 * Every declared endpoint, called by everybody, in every relation to the object. Source of the list of
 * checks: OWASP ASVS 5.0, chapter V8 (function, object and tenant access).
 */

let matrix: Matrix;
beforeAll(async () => {
  matrix = await buildMatrix();
}, 60_000);
afterAll(() => matrix.server.dispose());

const LONG = 120_000;

describe("fixtures", () => {
  it("are there for each declared endpoint and for nothing else", () => {
    expect(Object.keys(FIXTURES).sort()).toEqual(ENDPOINTS.map((declared) => declared.id).sort());
  });
});

describe.each(ENDPOINTS.map((declared) => [declared.id, declared] as const))("%s", (_, declared) => {
  const allowed = CALLERS.filter((caller) => expectAccess(declared.endpoint.access, caller) === "allowed");
  const refused = CALLERS.filter((caller) => !allowed.includes(caller));

  it(
    `is open to ${allowed.join(", ")} and to nobody else`,
    async () => {
      const faults: string[] = [];
      for (const caller of CALLERS) {
        const fault = await findFault(matrix.server.app, matrix, declared, caller);
        if (fault !== null) faults.push(fault);
      }
      expect(faults).toEqual([]);
    },
    LONG,
  );

  it(
    "would fail here for each allowed caller if its grants were dropped",
    async () => {
      const app = mountWithAccess(matrix.server.deps, declared, []);
      for (const caller of allowed) expect(await findFault(app, matrix, declared, caller), caller).not.toBeNull();
    },
    LONG,
  );

  if (refused.length > 0) {
    it(
      "would fail here for each refused caller if everybody were let in",
      async () => {
        const app = mountWithAccess(matrix.server.deps, declared, "anyone");
        for (const caller of refused) expect(await findFault(app, matrix, declared, caller), caller).not.toBeNull();
      },
      LONG,
    );
  }
});
