import type { LayoutAnswer } from "../../../shared/contracts/square.ts";
import { LayoutIdSchema } from "../../../shared/ids.ts";
import type { Db } from "../../db/connection.ts";
import { isLayoutFrozen, type LayoutRow } from "../../event/square.queries.ts";

/** A layout for the wire; frozen once a version or a publication rests on it. */
export function presentLayout(db: Db, row: LayoutRow): LayoutAnswer {
  return {
    layoutId: LayoutIdSchema.parse(row.id),
    number: row.number,
    isFrozen: isLayoutFrozen(db, row.id),
    hash: row.hash,
    layout: row.layout,
  };
}
