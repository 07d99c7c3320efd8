import type { z } from "zod";
import type { ProblemSlug } from "./problem.ts";
import type { Access } from "./roles.ts";

/**
 * One endpoint, declared once. The server mounts it, the client's fetcher is typed by it, the OpenAPI
 * document lists it and the role matrix test walks it.
 */
export interface Endpoint {
  readonly method: "GET" | "POST" | "PUT" | "PATCH" | "DELETE";
  /** Express path with `:name` parameters, e.g. `/api/shows/:showId`. */
  readonly path: string;
  readonly summary: string;
  readonly access: Access;
  readonly params?: z.ZodObject;
  readonly query?: z.ZodObject;
  readonly body?: z.ZodType;
  /** 200 unless said otherwise; 204 has no body and `response` is `z.void()`. */
  readonly status?: 200 | 201 | 204;
  readonly response: z.ZodType;
  /** What it may answer besides the problems every endpoint has (see `COMMON_PROBLEMS`). */
  readonly problems?: readonly ProblemSlug[];
  /** True: the caller sends an `Idempotency-Key`; a retry with the same key gets the same answer. */
  readonly isIdempotent?: boolean;
}

export type Contract = Readonly<Record<string, Endpoint>>;

/** Keeps the literal types of a feature's endpoints. */
export function defineContract<const C extends Contract>(contract: C): C {
  return contract;
}

type Parsed<S> = S extends z.ZodType ? z.output<S> : undefined;
type Sent<S> = S extends z.ZodType ? z.input<S> : undefined;

/** What a handler gets after validation. */
export interface EndpointInput<E extends Endpoint> {
  readonly params: Parsed<E["params"]>;
  readonly query: Parsed<E["query"]>;
  readonly body: Parsed<E["body"]>;
}

type Required_<K extends string, S> = S extends z.ZodType ? { readonly [P in K]: Sent<S> } : unknown;
type Optional_<K extends string, S> = S extends z.ZodType ? { readonly [P in K]?: Sent<S> } : unknown;

/** What a caller of the typed client passes: only the parts that the endpoint declares. */
export type EndpointCall<E extends Endpoint> = Required_<"params", E["params"]> &
  Optional_<"query", E["query"]> &
  Required_<"body", E["body"]> & { readonly idempotencyKey?: string };

export type EndpointResponse<E extends Endpoint> = z.output<E["response"]>;
/** What a handler returns: the response before defaults and transforms. */
export type EndpointResult<E extends Endpoint> = z.input<E["response"]>;

/** Problems that any endpoint may answer. */
export const COMMON_PROBLEMS = [
  "malformed-request",
  "slow-down",
  "internal",
  "busy",
] as const satisfies readonly ProblemSlug[];

/** Fills `:name` parameters and the query into an endpoint's path. */
export function buildPath(endpoint: Endpoint, input: { params?: object; query?: object }): string {
  const params = (input.params ?? {}) as Record<string, unknown>;
  const path = endpoint.path.replace(/:([A-Za-z]+)/g, (_, name: string) => encodeURIComponent(String(params[name])));
  const search = new Array<string>();
  for (const [key, value] of Object.entries(input.query ?? {})) {
    if (value !== undefined && value !== null)
      search.push(`${encodeURIComponent(key)}=${encodeURIComponent(String(value))}`);
  }
  return search.length > 0 ? `${path}?${search.join("&")}` : path;
}
