import { z } from "zod";

/**
 * The registry of API problems (RFC 9457): the one table from which the server writes, the client
 * reads and the OpenAPI document lists. `type` on the wire is `/problems/<slug>`.
 */
export const PROBLEMS = {
  "invalid-request": { status: 422, title: "Some fields need another look." },
  "malformed-request": { status: 400, title: "The request could not be read." },
  "sign-in-needed": { status: 401, title: "Please sign in." },
  "wrong-sign-in": { status: 401, title: "These do not fit together." },
  "not-allowed": { status: 403, title: "Your account can not do this." },
  "cross-site": { status: 403, title: "This request came from another site." },
  "not-found": { status: 404, title: "There is nothing here." },
  "draft-conflict": { status: 409, title: "This draft was changed somewhere else." },
  "slot-taken": { status: 409, title: "That time is taken." },
  "already-done": { status: 409, title: "This was done already." },
  "wrong-state": { status: 409, title: "This can not be done now." },
  "newer-version": { status: 409, title: "A newer version was handed in." },
  "past-due": { status: 409, title: "The due date is over." },
  "blocked-by-stop": { status: 409, title: "A stop of the show check is open." },
  "lineup-has-stops": { status: 409, title: "The lineup has stops to clear." },
  "key-reused": { status: 422, title: "The idempotency key was used for something else." },
  "too-large": { status: 413, title: "This is too large." },
  "slow-down": { status: 429, title: "Too many tries. Please wait." },
  busy: { status: 503, title: "The server is busy. Your work is safe, please try again." },
  internal: { status: 500, title: "Something broke on our side." },
} as const satisfies Record<string, { status: number; title: string }>;

export type ProblemSlug = keyof typeof PROBLEMS;

export const FieldErrorSchema = z.object({
  /** JSON pointer into the body, or `/query/x`, `/params/x`. */
  pointer: z.string(),
  code: z.string(),
  detail: z.string(),
});
export type FieldError = z.infer<typeof FieldErrorSchema>;

/** An RFC 9457 document as this server writes it. Extension members differ by type and are kept. */
export const ProblemDocumentSchema = z.looseObject({
  type: z.string(),
  title: z.string(),
  status: z.int(),
  /** What happened this time, in words for the person. */
  detail: z.string().optional(),
  /** The request id: quote it to the admin. */
  instance: z.string().optional(),
  /** Every bad field, not only the first. */
  errors: z.array(FieldErrorSchema).optional(),
});
export type ProblemDocument = z.infer<typeof ProblemDocumentSchema>;

/** The slug of a document's `type`, or null when it is not one of ours. */
export function problemSlug(document: ProblemDocument): ProblemSlug | null {
  const slug = document.type.replace(/^\/problems\//, "");
  return slug in PROBLEMS ? (slug as ProblemSlug) : null;
}

/** An expected refusal, thrown by services; `detail` and `extensions` are safe to show. */
export class ProblemError extends Error {
  readonly slug: ProblemSlug;
  readonly detail: string | undefined;
  readonly errors: readonly FieldError[] | undefined;
  readonly extensions: Readonly<Record<string, unknown>>;

  constructor(
    slug: ProblemSlug,
    options: {
      detail?: string;
      errors?: readonly FieldError[];
      extensions?: Readonly<Record<string, unknown>>;
      cause?: unknown;
    } = {},
  ) {
    super(options.detail ?? PROBLEMS[slug].title, { cause: options.cause });
    this.name = "ProblemError";
    this.slug = slug;
    this.detail = options.detail;
    this.errors = options.errors;
    this.extensions = options.extensions ?? {};
  }
}
