import { randomBytes } from "node:crypto";
import { integer, text } from "drizzle-orm/sqlite-core";

/** A new row id: 16 random bytes as 22 URL-safe characters. */
export function newId(): string {
  return randomBytes(16).toString("base64url");
}

/** Primary key column of random ids. */
export const id = () => text("id").primaryKey().$defaultFn(newId);

/** UTC milliseconds; the value comes from the injected clock, never from SQL. */
export const instant = (name: string) => integer(name);
