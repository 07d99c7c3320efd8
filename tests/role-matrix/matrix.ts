import type { Express } from "express";
import request, { type Response } from "supertest";
import { createApp } from "../../server/app.ts";
import type { AppDeps } from "../../server/deps.ts";
import { buildPath, type Endpoint } from "../../shared/contract.ts";
import { contracts } from "../../shared/contracts/index.ts";
import type { Access } from "../../shared/roles.ts";
import { createTestServer, SAME_ORIGIN, type TestServer } from "../support/test-server.ts";
import { type Call, FIXTURES } from "./fixtures.ts";
import { buildWorld, type Caller, CANARY, RELATIONS_OF, ROLE_OF, STRANGERS, type World } from "./world.ts";

export interface DeclaredEndpoint {
  /** `feature.name`. */
  readonly id: string;
  readonly feature: keyof typeof contracts;
  readonly name: string;
  readonly endpoint: Endpoint;
}

/** Every endpoint that the contracts declare. */
export const ENDPOINTS: readonly DeclaredEndpoint[] = Object.entries(contracts).flatMap(([feature, contract]) =>
  Object.entries(contract as Record<string, Endpoint>).map(([name, endpoint]) => ({
    id: `${feature}.${name}`,
    feature: feature as keyof typeof contracts,
    name,
    endpoint,
  })),
);

/** What must come out: the work done, or a refusal of this status. */
export type Expectation = "allowed" | 401 | 403 | 404;

/**
 * The oracle: what the pristine contract says of a caller. It knows roles and relations and nothing of
 * the server's code.
 */
export function expectAccess(access: Access, caller: Caller): Expectation {
  if (access === "anyone") return "allowed";
  if (caller === "signed-out") return 401;
  if (access === "signed-in") return "allowed";
  const grants = access.filter((grant) => grant.role === ROLE_OF[caller]);
  if (grants.length === 0) return 403;
  const fits = grants.some((grant) => grant.relation === undefined || RELATIONS_OF[caller].includes(grant.relation));
  return fits ? "allowed" : 404;
}

export interface Matrix {
  readonly server: TestServer;
  readonly world: World;
  readonly cookies: ReadonlyMap<Caller, string>;
}

/** One world, with a session for everybody. */
export async function buildMatrix(): Promise<Matrix> {
  const server = createTestServer();
  const world = await buildWorld(server.db, server.clock.now());
  server.deps.connection.sqlite
    .prepare("update users set email = 'staff@school.example' where id = ?")
    .run(world.people["teacher-own-class"]);
  const cookies = new Map<Caller, string>();
  for (const [caller, userId] of Object.entries(world.people))
    cookies.set(caller as Caller, await server.signIn(userId));
  return { server, world, cookies };
}

/** The application on the same database, with one endpoint's access replaced in memory. */
export function mountWithAccess(deps: AppDeps, { feature, name, endpoint }: DeclaredEndpoint, access: Access): Express {
  const changed = { ...contracts, [feature]: { ...contracts[feature], [name]: { ...endpoint, access } } };
  return createApp({ ...deps, contracts: changed });
}

/**
 * Calls the endpoint as this caller and gives what is wrong with the answer, or null. Whatever it
 * wrote is rolled back, so that rows do not meet each other.
 */
export async function findFault(
  app: Express,
  matrix: Matrix,
  declared: DeclaredEndpoint,
  caller: Caller,
): Promise<string | null> {
  const fixture = FIXTURES[declared.id];
  if (!fixture) throw new Error(`${declared.id} has no fixture in tests/role-matrix/fixtures.ts.`);
  const { sqlite } = matrix.server.deps.connection;
  const expected = expectAccess(declared.endpoint.access, caller);
  const countChanges = () => Number(sqlite.prepare("select total_changes()").pluck().get());

  sqlite.exec("begin immediate");
  try {
    const before = countChanges();
    const answer = await send(app, declared.endpoint, fixture.build(matrix.world, caller), matrix.cookies.get(caller));
    // A draft's ribbon is drawn behind its save; let it come to an end inside the transaction.
    await new Promise((resolve) => setImmediate(resolve));
    const wrote = countChanges() !== before;
    const isStranger = STRANGERS.has(caller) && fixture.provesIdentity !== true;
    if (isStranger && answer.text?.includes(CANARY))
      return `${caller} was shown the object: ${answer.text.slice(0, 200)}`;
    if (expected === "allowed")
      return answer.status < 300 ? null : `${caller} is allowed and got ${answer.status}: ${answer.text}`;
    if (answer.status !== expected) return `${caller} should get ${expected} and got ${answer.status}: ${answer.text}`;
    if (answer.text.includes(CANARY)) return `${caller} was refused and shown the object all the same.`;
    return wrote ? `${caller} was refused and something was written all the same.` : null;
  } finally {
    sqlite.exec("rollback");
  }
}

async function send(
  app: Express,
  endpoint: Endpoint,
  { params, query, body }: Call,
  cookie: string | undefined,
): Promise<Response> {
  const method = endpoint.method.toLowerCase() as "get" | "post" | "put" | "patch" | "delete";
  const path = buildPath(endpoint, { ...(params && { params }), ...(query && { query }) });
  const sent = request(app)[method](path).set(SAME_ORIGIN);
  if (endpoint.isIdempotent === true) void sent.set("idempotency-key", "matrix-row");
  if (cookie !== undefined) void sent.set("cookie", cookie);
  return body === undefined ? sent : sent.send(body);
}
