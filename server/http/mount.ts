import type { Request, RequestHandler, Response, Router } from "express";
import type { Contract, Endpoint, EndpointInput, EndpointResult } from "../../shared/contract.ts";
import { ProblemError } from "../../shared/problem.ts";
import { passesRoleGate } from "../../shared/roles.ts";
import type { Actor } from "./actor.ts";
import type { AnswerStore } from "./answer-store.ts";
import { type Answer, type Commit, createAnswerOnce } from "./idempotency.ts";
import { parseInput } from "./parse-input.ts";

/** What a handler is given. `actor` is null only where access is "anyone" and nobody is signed in. */
export interface HandlerInput<E extends Endpoint> extends EndpointInput<E> {
  readonly actor: E["access"] extends "anyone" ? Actor | null : Actor;
  /**
   * Runs the writes and gives what they return. For an idempotent endpoint the answer is kept for
   * retries in the same transaction, so that a retry after a crash finds either both or nothing.
   */
  readonly commit: (work: () => EndpointResult<E>) => EndpointResult<E>;
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
  const answerOnce = createAnswerOnce(options.answers);
  for (const [name, endpoint] of Object.entries(contract)) {
    const handler = handlers[name] as unknown as Handler<Endpoint>;
    const method = endpoint.method.toLowerCase() as "get" | "post" | "put" | "patch" | "delete";
    router[method](endpoint.path, handleEndpoint(endpoint, handler, answerOnce, options));
  }
}

function handleEndpoint(
  endpoint: Endpoint,
  handler: Handler<Endpoint>,
  answerOnce: ReturnType<typeof createAnswerOnce>,
  { answers, checkResponses }: MountOptions,
): RequestHandler {
  const toAnswer = (result: unknown): Answer => {
    if (checkResponses) assertResponse(endpoint, result);
    return { status: endpoint.status ?? 200, body: result === undefined ? "" : JSON.stringify(result) };
  };
  const justCommit: Commit = (work) => answers.transact(work);

  return async (req, res) => {
    const actor = gate(endpoint, req);
    const input = parseInput(endpoint, req);
    const answer = async (commitWith: Commit) => {
      const commit = (work: () => unknown) => commitWith(work, toAnswer);
      return toAnswer(await handler({ ...input, actor: actor as Actor, commit, req, res }));
    };
    const isOnce = endpoint.isIdempotent === true && actor !== null;
    const { status, body } = isOnce ? await answerOnce(req, actor, answer) : await answer(justCommit);
    res.status(status);
    if (status === 204) res.end();
    else res.type("application/json").send(body);
  };
}

/** 401 when nobody is signed in, 403 when no role of the person fits. */
function gate(endpoint: Endpoint, req: Request): Actor | null {
  const person = req.person ?? null;
  if (!passesRoleGate(endpoint.access, person?.roles ?? null)) {
    throw new ProblemError(person === null ? "sign-in-needed" : "not-allowed");
  }
  if (person === null) return null;
  const { userId, roles, schoolId, displayName } = person;
  return { userId, roles, schoolId, displayName, access: endpoint.access };
}

function assertResponse(endpoint: Endpoint, result: unknown): void {
  const parsed = endpoint.response.safeParse(result);
  if (!parsed.success) {
    throw new Error(`${endpoint.method} ${endpoint.path} answered outside its contract: ${parsed.error.message}`);
  }
}
