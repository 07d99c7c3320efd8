import type { Role } from "../../../../shared/roles.ts";

/** Where a person starts: the first of their roles that has a home. */
export function homeOf(roles: readonly Role[]): string {
  if (roles.includes("student")) return "/home";
  if (roles.includes("teacher")) return "/classes";
  if (roles.includes("coordinator")) return "/lineup";
  if (roles.includes("admin")) return "/admin";
  return "/";
}

/** The page asked for before sign-in, if it is one of ours; never another origin. */
export function nextPath(search: URLSearchParams, roles: readonly Role[]): string {
  const next = search.get("next");
  return next !== null && /^\/(?![/\\])/.test(next) ? next : homeOf(roles);
}
