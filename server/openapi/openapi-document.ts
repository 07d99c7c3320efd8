import { z } from "zod";
import { COMMON_PROBLEMS, type Contract, type Endpoint } from "../../shared/contract.ts";
import { ProblemDocumentSchema, PROBLEMS, type ProblemSlug } from "../../shared/problem.ts";
import type { Access } from "../../shared/roles.ts";

type JsonObject = Record<string, unknown>;

/**
 * The OpenAPI 3.1 document of the given contracts, by feature; nothing of it is written by hand.
 * Who may call an endpoint stands under `x-access`. Source: OpenAPI Specification 3.1.1; its schemas
 * are JSON Schema 2020-12, which zod writes.
 */
export function buildOpenApi(contracts: Readonly<Record<string, Contract>>): JsonObject {
  const paths: Record<string, JsonObject> = {};
  for (const [feature, contract] of Object.entries(contracts)) {
    for (const [name, endpoint] of Object.entries(contract)) {
      const path = endpoint.path.replace(/:([A-Za-z]+)/g, "{$1}");
      paths[path] = { ...paths[path], [endpoint.method.toLowerCase()]: presentOperation(feature, name, endpoint) };
    }
  }
  return {
    openapi: "3.1.1",
    info: {
      title: "Duskbell",
      version: "1",
      description: "The API of the Duskbell portal. Changing requests must come from the portal's own pages.",
    },
    servers: [{ url: "/" }],
    tags: Object.keys(contracts).map((name) => ({ name })),
    paths,
    components: {
      schemas: { Problem: toSchema(ProblemDocumentSchema, "output") },
      securitySchemes: { session: { type: "apiKey", in: "cookie", name: "duskbell-session" } },
    },
  };
}

function presentOperation(feature: string, name: string, endpoint: Endpoint): JsonObject {
  return {
    operationId: `${feature}.${name}`,
    tags: [feature],
    summary: endpoint.summary,
    "x-access": presentAccess(endpoint.access),
    security: endpoint.access === "anyone" ? [] : [{ session: [] }],
    parameters: listParameters(endpoint),
    ...(endpoint.body && {
      requestBody: { required: true, content: { "application/json": { schema: toSchema(endpoint.body, "input") } } },
    }),
    responses: { ...presentSuccess(endpoint), ...presentProblems(endpoint) },
  };
}

function presentAccess(access: Access): unknown {
  return typeof access === "string"
    ? access
    : access.map((grant) => (grant.relation ? `${grant.role} (${grant.relation})` : grant.role));
}

function listParameters(endpoint: Endpoint): JsonObject[] {
  const idempotencyKey = {
    name: "Idempotency-Key",
    in: "header",
    required: true,
    description: "A retry with the same key gets the first answer.",
    schema: { type: "string", pattern: "^[A-Za-z0-9_-]{8,80}$" },
  };
  return [
    ...presentFields(endpoint.params, "path"),
    ...presentFields(endpoint.query, "query"),
    ...(endpoint.isIdempotent === true ? [idempotencyKey] : []),
  ];
}

function presentFields(schema: z.ZodObject | undefined, place: "path" | "query"): JsonObject[] {
  if (!schema) return [];
  const { properties = {}, required = [] } = toSchema(schema, "input") as {
    properties?: JsonObject;
    required?: string[];
  };
  return Object.entries(properties).map(([name, property]) => ({
    name,
    in: place,
    required: place === "path" || required.includes(name),
    schema: property,
  }));
}

function presentSuccess(endpoint: Endpoint): JsonObject {
  const status = String(endpoint.status ?? 200);
  if (status === "204") return { [status]: { description: "Done; no body." } };
  return {
    [status]: {
      description: "Done.",
      content: { "application/json": { schema: toSchema(endpoint.response, "output") } },
    },
  };
}

/** One response a status; problems that share one are named together. */
function presentProblems(endpoint: Endpoint): JsonObject {
  const signedOut: ProblemSlug[] = endpoint.access === "anyone" ? [] : ["sign-in-needed"];
  const notAllowed: ProblemSlug[] = typeof endpoint.access === "string" ? [] : ["not-allowed"];
  const crossSite: ProblemSlug[] = endpoint.method === "GET" ? [] : ["cross-site"];
  const slugs = new Set<ProblemSlug>([
    ...COMMON_PROBLEMS,
    ...signedOut,
    ...notAllowed,
    ...crossSite,
    ...(endpoint.problems ?? []),
  ]);
  const byStatus = new Map<number, ProblemSlug[]>();
  for (const slug of slugs) {
    const { status } = PROBLEMS[slug];
    byStatus.set(status, [...(byStatus.get(status) ?? []), slug]);
  }
  const content = { "application/problem+json": { schema: { $ref: "#/components/schemas/Problem" } } };
  return Object.fromEntries(
    [...byStatus].map(([status, names]) => [
      status,
      { description: names.map((slug) => `${slug}: ${PROBLEMS[slug].title}`).join(" "), content },
    ]),
  );
}

function toSchema(schema: z.ZodType, io: "input" | "output"): JsonObject {
  // `$schema` belongs to a document of its own; here OpenAPI's dialect counts.
  const { $schema: _, ...rest } = z.toJSONSchema(schema, { target: "draft-2020-12", io, unrepresentable: "any" });
  return rest;
}
