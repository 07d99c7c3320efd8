import { createHash } from "node:crypto";

/**
 * SHA-256 in hex of a session token or one-time code: what the database keeps in place of the secret.
 * Tokens carry 200 random bits, so a fast hash is enough for them.
 */
export function hashToken(token: string): string {
  return createHash("sha256").update(token).digest("hex");
}
