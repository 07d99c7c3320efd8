import { ApiProblem } from "./api-client.ts";

/** The message for one field of a refused form, by its JSON pointer; null when that field was right. */
export function findFieldError(error: Error | null, pointer: string): string | null {
  if (!(error instanceof ApiProblem)) return null;
  return error.errors.find((field) => field.pointer === pointer)?.detail ?? null;
}
