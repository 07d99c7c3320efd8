import compression from "compression";
import express, { type Express, type RequestHandler } from "express";
import { contracts as allContracts } from "../shared/contracts/index.ts";
import type { AppDeps, FeatureDeps } from "./deps.ts";
import { createAnswerStore } from "./http/answer-store.ts";
import { refuseCrossSite } from "./http/cross-site.ts";
import { jsonBody } from "./http/json-body.ts";
import { mountContract, type MountOptions } from "./http/mount.ts";
import { problemHandler, unknownPath } from "./http/problem-handler.ts";
import { requestId } from "./http/request-id.ts";
import { requestLog } from "./http/request-log.ts";
import { securityHeaders } from "./http/security-headers.ts";
import { sessionOf } from "./http/session.ts";
import { createSessions } from "./identity/sessions.ts";

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
  app.use("/api", neverStored, refuseCrossSite({ publicUrl: config.publicUrl }), jsonBody, sessionOf(sessions));
  mountFeatures(app, deps);
  app.use("/api", unknownPath);
  app.use(problemHandler(log));
  return app;
}

/** Answers of the API are personal: no cache may keep them. */
const neverStored: RequestHandler = (_req, res, next) => {
  res.setHeader("Cache-Control", "no-store");
  next();
};

function mountFeatures(app: Express, deps: AppDeps): void {
  const { db } = deps.connection;
  const contracts = deps.contracts ?? allContracts;
  const features: FeatureDeps = { db, clock: deps.clock, runs: deps.runs, log: deps.log };
  const options: MountOptions = {
    answers: createAnswerStore(db, deps.clock),
    checkResponses: deps.checkResponses ?? false,
  };
}
