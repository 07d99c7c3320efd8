import express, { type RequestHandler, Router } from "express";
import expressStaticGzip from "express-static-gzip";
import { join } from "node:path";
import { ProblemError } from "../../shared/problem.ts";

const YEAR_MS = 365 * 24 * 60 * 60 * 1000;

/**
 * Serves the built client. Files under `/assets/` carry their hash in the name and never change, and were
 * compressed by the build; all
 * others are asked for again each time. Every other page address gets `index.html`, since the client
 * knows the routes; anything that is not a page navigation and has no file is `not-found`.
 */
export function staticClient(clientDir: string): Router {
  const router = Router();
  router.use(
    "/assets",
    expressStaticGzip(join(clientDir, "assets"), {
      enableBrotli: true,
      orderPreference: ["br", "gzip"],
      index: false,
      serveStatic: { immutable: true, maxAge: YEAR_MS, redirect: false },
    }),
  );
  router.use("/assets", missing);
  router.use(
    express.static(clientDir, {
      index: false,
      redirect: false,
      setHeaders: (res) => res.setHeader("Cache-Control", "no-cache"),
    }),
  );
  router.use((req, res, next) => {
    if ((req.method !== "GET" && req.method !== "HEAD") || req.accepts("html") !== "html" || isFileName(req.path)) {
      missing(req, res, next);
      return;
    }
    res.setHeader("Cache-Control", "no-cache");
    res.sendFile(join(clientDir, "index.html"), (error?: Error) => {
      if (error) next(error);
    });
  });
  return router;
}

const missing: RequestHandler = (_req, _res, next) => {
  next(new ProblemError("not-found"));
};

/** `/mark.svg` names a file; a page for it would hide that it is missing. */
function isFileName(path: string): boolean {
  return /\.[a-z0-9]{2,11}$/i.test(path);
}
