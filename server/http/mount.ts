import { createHash } from "node:crypto";
import type { Request, RequestHandler, Response, Router } from "express";
import type { z } from "zod";
import { type Contract, type Endpoint, type EndpointInput, type EndpointResult } from "../../shared/contract.ts";
import { type FieldError, ProblemError } from "../../shared/problem.ts";
import { passesRoleGate } from "../../shared/roles.ts";
import type { Actor } from "./actor.ts";
import type { AnswerStore } from "./answer-store.ts";

/** What a handler is given. `actor` is null only where access is "anyone" and nobody is signed in. */
export interface HandlerInput<E extends Endpoint> extends EndpointInput<E> {
  readonly actor: E["access"] extends "anyone" ? Actor | null : Actor;
  readonly req: Request;
  readonly res: Response;
}

export type Handler<E extends Endpoint> = (input: HandlerInput<E>) => EndpointResult<E> | Promise<EndpointResult<E>>;

export type Handlers<C extends Contract> = { readonly [K in keyof C]: Handler<C[K]> };

export interface MountOptions {
  readonly answers: AnswerStore;
  /** Test and development: check what handlers return against the contract. */
  readonly checkResponses: boolean;
}

/**
 * Mounts every endpoint of a contract: role gate, validation, idempotency, handler, response.
 * A contract without a handler (or the other way round) does not type-check.
 */
export function mountContract<const C extends Contract>(
  router: Router,
  contract: C,
  handlers: Handlers<C>,
  options: MountOptions,
): void {
  for (const name of Object.keys(contract)) {
    const endpoint = contract[name] as Endpoint;
    const handler = handlers[name] as unknown as Handler<Endpoint>;
    const method = endpoint.method.toLowerCase() as "get" | "post" | "put" | "patch" | "delete";
    router[method](endpoint.path, handleEndpoint(endpoint, handler, options));
  }
}

function handleEndpoint(endpoint: Endpoint, handler: Handler<Endpoint>, options: MountOptions): RequestHandler {
  return async (req, res) => {
    const actor = gate(endpoint, req);
    const input = parseInput(endpoint, req);
    const answer = async () => {
      const result = await handler({ ...input, actor: actor as Actor, req, res });
      if (options.checkResponses) assertResponse(endpoint, result);
      return { status: endpoint.status ?? 200, body: result === undefined ? "" : JSON.stringify(result) };
    };
    const sent =
      endpoint.isIdempotent === true && actor !== null ? await answerOnce(req, actor, answer, options) : await answer();
    if (res.headersSent) return;
    res.status(sent.status);
    if (sent.status === 204) res.end();
    else res.type("application/json").send(sent.body);
  };
}

/** 401 when nobody is signed in, 403 when no role of the person fits. */
function gate(endpoint: Endpoint, req: Request): Actor | null {
  const person = req.person ?? null;
  if (passesRoleGate(endpoint.access, person?.roles ?? null)) {
    return person === null ? null : { ...person, access: endpoint.access };
  }
  throw new ProblemError(person === null ? "sign-in-needed" : "not-allowed");
}

/** Validates params, query and body together and lists every bad field. */
function parseInput(endpoint: Endpoint, req: Request): EndpointInput<Endpoint> {
  const params = endpoint.params?.safeParse(req.params);
  // An id of the wrong form names nothing: 404, as for an unknown one.
  if (params && !params.success) throw new ProblemError("not-found");
  const query = endpoint.query?.safeParse(req.query);
  const body = endpoint.body?.safeParse(req.body ?? {});
  const errors = [...fieldErrors("/query", query), ...fieldErrors("", body)];
  if (errors.length > 0) throw new ProblemError("invalid-request", { errors, detail: errors[0]?.detail });
  return { params: params?.data, query: query?.data, body: body?.data } as EndpointInput<Endpoint>;
}

function fieldErrors(prefix: string, parsed: z.ZodSafeParseResult<unknown> | undefined): FieldError[] {
  if (!parsed || parsed.success) return [];
  return parsed.error.issues.map((issue) => ({
    pointer: `${prefix}/${issue.path.map(String).join("/")}`,
    code: issue.code,
    detail: issue.message,
  }));
}

function assertResponse(endpoint: Endpoint, result: unknown): void {
  const parsed = endpoint.response.safeParse(result);
  if (!parsed.success) {
    throw new Error(`${endpoint.method} ${endpoint.path} answered outside its contract: ${parsed.error.message}`);
  }
}

const KEY_PATTERN = /^[A-Za-z0-9_-]{8,80}$/;

/** A retry with the same key and request gets the first answer; the same key for another request is refused. */
async function answerOnce(
  req: Request,
  actor: Actor,
  answer: () => Promise<{ status: number; body: string }>,
  { answers }: MountOptions,
): Promise<{ status: number; body: string }> {
  const key = req.get("idempotency-key");
  if (key === undefined || !KEY_PATTERN.test(key)) {
    throw new ProblemError("malformed-request", { detail: "Send an Idempotency-Key of 8 to 80 letters and numbers." });
  }
  const requestHash = createHash("sha256")
    .update(`${req.method} ${req.path}\n${JSON.stringify(req.body ?? null)}`)
    .digest("hex");
  const kept = answers.find(actor.userId, key);
  if (kept) {
    if (kept.requestHash !== requestHash) throw new ProblemError("key-reused");
    return kept;
  }
  const made = await answer();
  answers.keep(actor.userId, key, { ...made, requestHash });
  return made;
}
