import type { Role } from "../../shared/roles.ts";

const MINUTE_MS = 60_000;
const HOUR_MS = 60 * MINUTE_MS;

/** How long a session lives: at the most, and when nothing is done. Milliseconds. */
export interface SessionLimits {
  readonly absoluteMs: number;
  readonly idleMs: number;
}

const LIMITS: Readonly<Record<Role, SessionLimits>> = {
  student: { absoluteMs: 8 * HOUR_MS, idleMs: 60 * MINUTE_MS },
  teacher: { absoluteMs: 12 * HOUR_MS, idleMs: 60 * MINUTE_MS },
  coordinator: { absoluteMs: 12 * HOUR_MS, idleMs: 60 * MINUTE_MS },
  admin: { absoluteMs: 4 * HOUR_MS, idleMs: 15 * MINUTE_MS },
};

/**
 * The limits of a person with these roles: of several, the shortest counts. Somebody without a role
 * gets the shortest of all. Source: OWASP ASVS 5.0 items 7.3.1 and 7.3.2 ask for both ends; the
 * lengths are ours.
 */
export function getSessionLimits(roles: readonly Role[]): SessionLimits {
  const limits = (roles.length > 0 ? roles : (["admin"] as const)).map((role) => LIMITS[role]);
  return {
    absoluteMs: Math.min(...limits.map((limit) => limit.absoluteMs)),
    idleMs: Math.min(...limits.map((limit) => limit.idleMs)),
  };
}
