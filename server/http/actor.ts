import { type Access, hasAccess, type Relation, type Role } from "../../shared/roles.ts";
import type { SchoolId, UserId } from "../../shared/ids.ts";
import { ProblemError } from "../../shared/problem.ts";

/**
 * The person a request acts for, with the access rule of the endpoint that was called: services work
 * out relations and ask the actor; they know no HTTP.
 */
export interface Actor {
  readonly userId: UserId;
  readonly roles: readonly Role[];
  readonly schoolId: SchoolId | null;
  readonly displayName: string;
  readonly access: Access;
}

/**
 * Passes when one of the endpoint's grants fits; else throws `not-found`, so that a foreign object
 * does not show that it exists. Call it on the loaded row, before anything of the row is used.
 */
export function assertRelation(actor: Actor, relations: readonly Relation[]): void {
  if (!hasAccess(actor.access, actor.roles, relations)) throw new ProblemError("not-found");
}
