import type { RequestHandler } from "express";
import helmet from "helmet";

const self = ["'self'"];
const none = ["'none'"];

/**
 * The content policy: everything from this origin, nothing inline, no code from strings. The sandbox
 * needs WebAssembly compiled ('wasm-unsafe-eval'), drawn pictures need `data:` and `blob:`, rendered
 * sound needs `blob:`. Source: CSP Level 3 (W3C).
 */
const CONTENT_POLICY = {
  "default-src": none,
  "script-src": [...self, "'wasm-unsafe-eval'"],
  "worker-src": self,
  "connect-src": self,
  "style-src": self,
  "img-src": [...self, "data:", "blob:"],
  "font-src": self,
  "media-src": [...self, "blob:"],
  "manifest-src": self,
  "base-uri": none,
  "form-action": self,
  "frame-ancestors": none,
};

const YEAR_SECONDS = 365 * 24 * 60 * 60;

/** Security headers of every answer. HSTS only where the server is reached by https. */
export function securityHeaders(options: { isSecure: boolean }): RequestHandler {
  return helmet({
    contentSecurityPolicy: { useDefaults: false, directives: CONTENT_POLICY },
    strictTransportSecurity: options.isSecure ? { maxAge: YEAR_SECONDS, includeSubDomains: false } : false,
    referrerPolicy: { policy: "same-origin" },
    xFrameOptions: { action: "deny" },
  });
}
