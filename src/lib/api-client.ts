import { buildPath, type Endpoint, type EndpointCall, type EndpointResponse } from "../../shared/contract.ts";
import {
  type FieldError,
  type ProblemDocument,
  ProblemDocumentSchema,
  type ProblemSlug,
  problemSlug,
} from "../../shared/problem.ts";

/** A refusal of the API, or no answer at all (`slug` is "offline"). Shows nothing by itself. */
export class ApiProblem extends Error {
  readonly slug: ProblemSlug | "offline" | "unknown";
  readonly status: number;
  readonly document: ProblemDocument | null;

  constructor(slug: ApiProblem["slug"], status: number, document: ProblemDocument | null, cause?: unknown) {
    super(
      document?.detail ??
        document?.title ??
        (slug === "offline" ? "The server can not be reached." : "Something went wrong."),
      { cause },
    );
    this.name = "ApiProblem";
    this.slug = slug;
    this.status = status;
    this.document = document;
  }

  /** Bad fields with JSON pointers, for forms. */
  get errors(): readonly FieldError[] {
    return this.document?.errors ?? [];
  }

  /** Quote it to the admin. */
  get requestId(): string | null {
    return this.document?.instance ?? null;
  }
}

/** Listeners are told of every 401 "sign-in-needed": the session ended while the page was open. */
const signInNeeded = new Set<() => void>();
export function onSignInNeeded(listener: () => void): () => void {
  signInNeeded.add(listener);
  return () => signInNeeded.delete(listener);
}

/**
 * Calls an endpoint and gives its parsed response. Rejects with `ApiProblem` only.
 * Idempotent endpoints get a random key unless the caller keeps one for its retries.
 */
export async function callApi<const E extends Endpoint>(
  endpoint: E,
  call: EndpointCall<E>,
  signal?: AbortSignal,
): Promise<EndpointResponse<E>> {
  const { params, query, body, idempotencyKey } = call as {
    params?: object;
    query?: object;
    body?: unknown;
    idempotencyKey?: string;
  };
  const headers: Record<string, string> = { accept: "application/json" };
  if (body !== undefined) headers["content-type"] = "application/json";
  if (endpoint.isIdempotent) headers["idempotency-key"] = idempotencyKey ?? crypto.randomUUID();

  let response: Response;
  try {
    response = await fetch(buildPath(endpoint, { ...(params && { params }), ...(query && { query }) }), {
      method: endpoint.method,
      headers,
      credentials: "same-origin",
      ...(body !== undefined && { body: JSON.stringify(body) }),
      ...(signal && { signal }),
    });
  } catch (cause) {
    if (signal?.aborted) throw cause;
    throw new ApiProblem("offline", 0, null, cause);
  }
  if (!response.ok) throw await readProblem(response);
  if (response.status === 204) return undefined as EndpointResponse<E>;
  return endpoint.response.parse(await response.json()) as EndpointResponse<E>;
}

async function readProblem(response: Response): Promise<ApiProblem> {
  const parsed = ProblemDocumentSchema.safeParse(await response.json().catch(() => null));
  if (!parsed.success) {
    // A proxy or a server that is going down answers without a document: the work is safe, try again.
    return new ApiProblem(response.status >= 502 ? "offline" : "unknown", response.status, null);
  }
  const slug = problemSlug(parsed.data) ?? "unknown";
  if (slug === "sign-in-needed") for (const listener of signInNeeded) listener();
  return new ApiProblem(slug, response.status, parsed.data);
}
