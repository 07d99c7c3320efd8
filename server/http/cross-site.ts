import type { Request, RequestHandler } from "express";
import { ProblemError } from "../../shared/problem.ts";

const SAFE_METHODS: ReadonlySet<string> = new Set(["GET", "HEAD", "OPTIONS"]);

/**
 * Refuses a changing request that another site made a browser send. `Sec-Fetch-Site` decides where it
 * is sent (`same-origin` and `none` pass); older browsers send `Origin`, which must be ours. With
 * neither the request is refused too: every browser we serve sends one of them.
 * Sources: Fetch Metadata Request Headers (W3C), OWASP ASVS 5.0 item 3.5.1.
 */
export function refuseCrossSite(options: { publicUrl: string | null }): RequestHandler {
  return (req, _res, next) => {
    if (SAFE_METHODS.has(req.method) || isSameSite(req, options.publicUrl)) next();
    else next(new ProblemError("cross-site", { detail: "Open the portal itself and try again there." }));
  };
}

function isSameSite(req: Request, publicUrl: string | null): boolean {
  const site = req.get("sec-fetch-site");
  if (site !== undefined) return site === "same-origin" || site === "none";
  const origin = req.get("origin");
  if (origin === undefined || !URL.canParse(origin)) return false;
  if (publicUrl !== null) return new URL(origin).origin === new URL(publicUrl).origin;
  return new URL(origin).host === req.get("host");
}
