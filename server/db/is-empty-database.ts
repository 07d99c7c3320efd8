import type { Db } from "./connection.ts";
import { schools, squares, users } from "./schema/index.ts";

/** True when nobody has put anything in: no school, no person, no square. */
export function isEmptyDatabase(db: Db): boolean {
  return [schools, users, squares].every(
    (table) => db.select({ id: table.id }).from(table).limit(1).get() === undefined,
  );
}
