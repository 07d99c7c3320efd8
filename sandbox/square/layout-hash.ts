import type { Layout } from "../../shared/contracts/square.ts";

type Json = string | number | boolean | null | readonly Json[] | { readonly [key: string]: Json | undefined };

/** JSON with the keys of every object in code-unit order and nothing left out but `undefined`. */
function stable(value: Json): string {
  if (value === null || typeof value !== "object") return JSON.stringify(value);
  if (Array.isArray(value)) return `[${value.map(stable).join(",")}]`;
  const fields = Object.entries(value as { readonly [key: string]: Json | undefined })
    .filter((entry): entry is [string, Json] => entry[1] !== undefined)
    .sort(([a], [b]) => (a < b ? -1 : a > b ? 1 : 0));
  return `{${fields.map(([key, field]) => `${JSON.stringify(key)}:${stable(field)}`).join(",")}}`;
}

/** A layout as text that depends on what it says, not on the order in which its keys were written. */
export function canonicalLayout(layout: Layout): string {
  return stable(layout);
}

/**
 * The name a timeline gives its layout: SHA-256 (hex) of the canonical text. Light indexes mean
 * nothing without it. The host passes in `sha256`, which hashes the UTF-8 bytes of a text; where its
 * answer is a promise, so is this one.
 */
export function layoutHash<Digest extends string | Promise<string>>(
  layout: Layout,
  sha256: (text: string) => Digest,
): Digest {
  return sha256(canonicalLayout(layout));
}
