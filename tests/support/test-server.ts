import { pino } from "pino";
import request, { type Response } from "supertest";
import { createApp } from "../../server/app.ts";
import { type Config, parseConfig } from "../../server/config.ts";
import type { Db } from "../../server/db/connection.ts";
import type { AppDeps } from "../../server/deps.ts";
import { createSessions } from "../../server/identity/sessions.ts";
import { buildPath, type Endpoint, type EndpointCall } from "../../shared/contract.ts";
import { createFakeRuns } from "./fake-runs.ts";
import { createTestClock, type TestClock } from "./test-clock.ts";
import { createTestDatabase } from "./test-database.ts";

/** What a browser on the portal's own page sends with a changing request. */
export const SAME_ORIGIN = { "sec-fetch-site": "same-origin" } as const;

export interface CallOptions {
  /** Who calls: a user id, or nobody. */
  readonly as?: string | null;
  readonly headers?: Readonly<Record<string, string>>;
}

export interface TestServer {
  readonly app: ReturnType<typeof createApp>;
  readonly db: Db;
  readonly deps: AppDeps;
  readonly clock: TestClock;
  readonly folder: string;
  /** Calls an endpoint as the typed client would; idempotent ones get a fresh key unless named. */
  call<const E extends Endpoint>(endpoint: E, call: EndpointCall<E>, options?: CallOptions): Promise<Response>;
  /** `Cookie` header of a session opened for this person, without their password. */
  signIn(userId: string): Promise<string>;
  dispose(): void;
}

/** The whole application on a database of its own, with a clock that stands still. */
export function createTestServer(
  overrides: Partial<Omit<AppDeps, "clock" | "config">> & { clock?: TestClock; config?: Partial<Config> } = {},
): TestServer {
  const database = createTestDatabase();
  const clock = overrides.clock ?? createTestClock();
  const deps: AppDeps = {
    connection: database.connection,
    runs: createFakeRuns(),
    log: pino({ level: "silent" }),
    clientDir: null,
    checkResponses: true,
    ...overrides,
    clock,
    config: { ...parseConfig({ DATA_DIR: database.folder }), ...overrides.config },
  };
  const { db } = deps.connection;
  const app = createApp(deps);
  const cookies = new Map<string, string>();
  let keyCount = 0;

  const signIn = async (userId: string) => {
    const { cookie } = await createSessions(db, clock, { isSecure: deps.config.secureCookies }).open(userId);
    return cookie.slice(0, cookie.indexOf(";"));
  };

  const call: TestServer["call"] = async (endpoint, call, { as = null, headers = {} } = {}) => {
    const { params, query, body, idempotencyKey } = call as {
      params?: object;
      query?: object;
      body?: object;
      idempotencyKey?: string;
    };
    const method = endpoint.method.toLowerCase() as "get" | "post" | "put" | "patch" | "delete";
    const sent = request(app)
      [method](buildPath(endpoint, { ...(params && { params }), ...(query && { query }) }))
      .set(SAME_ORIGIN);
    if (endpoint.isIdempotent === true) void sent.set("idempotency-key", idempotencyKey ?? `test-key-${++keyCount}`);
    if (as !== null) {
      const cookie = cookies.get(as) ?? (await signIn(as));
      cookies.set(as, cookie);
      void sent.set("cookie", cookie);
    }
    void sent.set(headers);
    return body === undefined ? sent : sent.send(body);
  };

  return { app, db, deps, clock, folder: database.folder, call, signIn, dispose: () => database.dispose() };
}
