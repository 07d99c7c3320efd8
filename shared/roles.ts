import { z } from "zod";

/** What a person does here. One person can hold several roles. */
export const ROLES = ["student", "teacher", "coordinator", "admin"] as const;
export const RoleSchema = z.enum(ROLES);
export type Role = z.infer<typeof RoleSchema>;

/**
 * How a signed-in person stands to the object that a request names. A service works the set out from
 * the loaded row; a grant asks for one of them.
 *
 * - `author`: wrote the show (or handed in the submission).
 * - `asked`: was asked by an author to write the show together, and has not answered yet.
 * - `class-member`: is enrolled in the class that the object belongs to.
 * - `class-teacher`: teaches that class.
 * - `forwarded`: the object was forwarded to the event, so the coordinator may see it.
 */
export const RELATIONS = ["author", "asked", "class-member", "class-teacher", "forwarded"] as const;
export type Relation = (typeof RELATIONS)[number];

/** One way to be allowed: a role, and (if the endpoint names one object) a relation to it. */
export interface Grant {
  readonly role: Role;
  readonly relation?: Relation;
}

/** Who may call an endpoint: everybody, everybody signed in, or whoever one of the grants fits. */
export type Access = "anyone" | "signed-in" | readonly Grant[];

/**
 * Tells whether a person with these roles passes the role gate, before any object is loaded.
 * False means 403 (or 401 when nobody is signed in).
 */
export function passesRoleGate(access: Access, roles: readonly Role[] | null): boolean {
  if (access === "anyone") return true;
  if (roles === null) return false;
  if (access === "signed-in") return true;
  return access.some((grant) => roles.includes(grant.role));
}

/**
 * Tells whether a person who stands in these relations to the loaded object may go on.
 * False means 404: a foreign object does not show that it exists.
 */
export function hasAccess(access: Access, roles: readonly Role[] | null, relations: readonly Relation[]): boolean {
  if (!passesRoleGate(access, roles)) return false;
  if (access === "anyone" || access === "signed-in") return true;
  return access.some(
    (grant) =>
      (roles ?? []).includes(grant.role) && (grant.relation === undefined || relations.includes(grant.relation)),
  );
}
