import compression from "compression";
import express, { type Express, type RequestHandler } from "express";
import { contracts as allContracts } from "../shared/contracts/index.ts";
import type { AppDeps, FeatureDeps } from "./deps.ts";
import { createAdminHandlers } from "./features/admin/admin.routes.ts";
import { createAssignmentsHandlers } from "./features/assignments/assignments.routes.ts";
import { createAuthHandlers } from "./features/auth/auth.routes.ts";
import { createClassesHandlers } from "./features/classes/classes.routes.ts";
import { createCourseHandlers } from "./features/course/course.routes.ts";
import { createLineupHandlers } from "./features/lineup/lineup.routes.ts";
import { createMarkingHandlers } from "./features/marking/marking.routes.ts";
import { createShowsHandlers } from "./features/shows/shows.routes.ts";
import { createSongsHandlers } from "./features/songs/songs.routes.ts";
import { createSquareHandlers } from "./features/square/square.routes.ts";
import { createAnswerStore } from "./http/answer-store.ts";
import { refuseCrossSite } from "./http/cross-site.ts";
import { healthz, readyz } from "./http/health.ts";
import { jsonBody } from "./http/json-body.ts";
import { mountContract } from "./http/mount.ts";
import { problemHandler, unknownPath } from "./http/problem-handler.ts";
import { requestId } from "./http/request-id.ts";
import { requestLog } from "./http/request-log.ts";
import { securityHeaders } from "./http/security-headers.ts";
import { sessionOf } from "./http/session.ts";
import { staticClient } from "./http/static-client.ts";
import { createAddressFailures } from "./identity/address-failures.ts";
import { createSecretHasher } from "./identity/secret-hasher.ts";
import { createSessions } from "./identity/sessions.ts";
import { createSignInLimits } from "./identity/sign-in-limits.ts";
import { buildOpenApi } from "./openapi/openapi-document.ts";

/** Joins everything into one application. Opens nothing and listens to nothing: `main.ts` does. */
export function createApp(deps: AppDeps): Express {
  const { config, log, connection, clock } = deps;
  const app = express();
  app.disable("x-powered-by");
  app.enable("case sensitive routing");
  app.set("query parser", "simple");
  app.set("trust proxy", config.trustProxy === "" ? false : config.trustProxy.split(",").map((part) => part.trim()));

  const sessions = createSessions(connection.db, clock, { isSecure: config.secureCookies });
  app.use(requestId, requestLog(log), securityHeaders({ isSecure: config.secureCookies }), compression());
  app.get("/healthz", healthz);
  app.get("/readyz", readyz(deps));
  app.use("/api", neverStored, refuseCrossSite({ publicUrl: config.publicUrl }), jsonBody, sessionOf(sessions));
  app.get("/api/openapi.json", openApi(deps.contracts ?? allContracts));
  mountFeatures(app, deps, sessions);
  app.use("/api", unknownPath);
  if (deps.clientDir !== null) app.use(staticClient(deps.clientDir));
  app.use(unknownPath, problemHandler(log));
  return app;
}

/** Answers of the API are personal: no cache may keep them. */
const neverStored: RequestHandler = (_req, res, next) => {
  res.setHeader("Cache-Control", "no-store");
  next();
};

function openApi(contracts: typeof allContracts): RequestHandler {
  let document: object | null = null;
  return (_req, res) => {
    document ??= buildOpenApi(contracts);
    res.json(document);
  };
}

function mountFeatures(app: Express, deps: AppDeps, sessions: ReturnType<typeof createSessions>): void {
  const { clock, runs, log } = deps;
  const { db } = deps.connection;
  const base: FeatureDeps = { db, clock, runs, log };
  const hasher = createSecretHasher();
  const limits = createSignInLimits(db, clock, createAddressFailures(clock));
  const options = { answers: createAnswerStore(db, clock), checkResponses: deps.checkResponses ?? false };

  const contracts = deps.contracts ?? allContracts;
  mountContract(app, contracts.auth, createAuthHandlers({ ...base, sessions, hasher, limits }), options);
  mountContract(app, contracts.classes, createClassesHandlers({ ...base, hasher, limits }), options);
  mountContract(app, contracts.course, createCourseHandlers(base), options);
  mountContract(app, contracts.assignments, createAssignmentsHandlers(base), options);
  mountContract(app, contracts.shows, createShowsHandlers(base), options);
  mountContract(app, contracts.marking, createMarkingHandlers(base), options);
  mountContract(app, contracts.songs, createSongsHandlers(base), options);
  mountContract(app, contracts.square, createSquareHandlers(base), options);
  mountContract(app, contracts.lineup, createLineupHandlers(base), options);
  mountContract(app, contracts.admin, createAdminHandlers({ ...base, hasher }), options);
}
