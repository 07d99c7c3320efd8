import type { Request } from "express";
import type { z } from "zod";
import type { Endpoint, EndpointInput } from "../../shared/contract.ts";
import { type FieldError, ProblemError } from "../../shared/problem.ts";

/**
 * Validates params, query and body together. Throws `invalid-request` with every bad field as a JSON
 * pointer into the body (RFC 6901), or `/query/x`; an id of the wrong form names nothing, so it is
 * `not-found` as an unknown one is.
 */
export function parseInput(endpoint: Endpoint, req: Request): EndpointInput<Endpoint> {
  const params = endpoint.params?.safeParse(req.params);
  if (params && !params.success) throw new ProblemError("not-found");
  const query = endpoint.query?.safeParse(req.query);
  const body = endpoint.body?.safeParse((req.body as unknown) ?? {});
  const errors = [...fieldErrors("/query", query), ...fieldErrors("", body)];
  if (errors.length > 0) throw new ProblemError("invalid-request", { errors, detail: errors[0]?.detail });
  return { params: params?.data, query: query?.data, body: body?.data };
}

function fieldErrors(prefix: string, parsed: z.ZodSafeParseResult<unknown> | undefined): FieldError[] {
  if (!parsed || parsed.success) return [];
  return parsed.error.issues.map((issue) => ({
    pointer: prefix + issue.path.map((part) => `/${escapePointer(String(part))}`).join(""),
    code: issue.code,
    detail: issue.message,
  }));
}

function escapePointer(part: string): string {
  return part.replaceAll("~", "~0").replaceAll("/", "~1");
}
