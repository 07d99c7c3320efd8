import type { Request, RequestHandler, Response } from "express";
import type { Logger } from "pino";
import { pinoHttp } from "pino-http";
import { toLogId } from "../log.ts";

/**
 * Logs one line a request when it is answered: id, method, route pattern, status, milliseconds and
 * the caller's log id. Never the address as typed (it holds ids), headers, query or body.
 */
export function requestLog(log: Logger): RequestHandler {
  return pinoHttp<Request, Response>({
    logger: log,
    genReqId: (req) => req.requestId,
    wrapSerializers: false,
    quietReqLogger: true,
    autoLogging: { ignore: (req) => req.path === "/healthz" || req.path === "/readyz" },
    customAttributeKeys: { reqId: "requestId", responseTime: "ms" },
    // pino-http attaches the response; its own description of it would list the headers.
    serializers: { req: () => undefined, res: () => undefined, err: () => undefined },
    customSuccessObject: (req, res, val: object) => ({ ...val, ...presentRequest(req, res) }),
    customErrorObject: (req, res, _error, val: object) => ({ ...val, ...presentRequest(req, res) }),
    customSuccessMessage: () => "answered",
    customErrorMessage: () => "answered",
    customLogLevel: (_req, res) => (res.statusCode >= 500 ? "error" : "info"),
  });
}

function presentRequest(req: Request, res: Response): object {
  const route: unknown = (req.route as { path?: unknown } | undefined)?.path;
  return {
    method: req.method,
    route: typeof route === "string" ? route : "(none)",
    status: res.statusCode,
    ...(req.person && { person: toLogId(req.person.userId) }),
  };
}
