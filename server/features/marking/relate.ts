import type { Relation } from "../../../shared/roles.ts";
import type { Db } from "../../db/connection.ts";
import { type Actor, assertRelation } from "../../http/actor.ts";
import { isAuthor, listClassRelations } from "../../work/relations.queries.ts";
import { getSubmission, type SubmissionContext } from "./marking.queries.ts";

/** A submission that the caller may see, and how they stand to it. Throws `not-found`. */
export function getRelatedSubmission(
  db: Db,
  actor: Actor,
  submissionId: string,
): SubmissionContext & { relations: Relation[] } {
  const row = getSubmission(db, submissionId);
  const relations = listClassRelations(db, actor.userId, row.assignment.classId);
  if (isAuthor(db, actor.userId, row.show.id)) relations.push("author");
  assertRelation(actor, relations);
  return { ...row, relations };
}
