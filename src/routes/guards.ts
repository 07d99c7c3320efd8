import { redirect } from "react-router";
import type { Session } from "../../shared/contracts/auth.ts";
import type { Role } from "../../shared/roles.ts";
import { sessionQuery } from "../features/auth/api.ts";
import { queryClient } from "../lib/query-client.ts";

/**
 * Loader guard: gives the session, or sends to the sign-in page and back afterwards. A role that the
 * page is not for sees the not-found page: there is nothing here for them.
 */
export async function requireSession(request: Request, ...roles: readonly Role[]): Promise<Session> {
  const session = await queryClient.ensureQueryData(sessionQuery);
  if (session === null) {
    const url = new URL(request.url);
    throw redirect(`/sign-in?next=${encodeURIComponent(url.pathname + url.search)}`);
  }
  if (roles.length > 0 && !roles.some((role) => session.user.roles.includes(role))) {
    throw new Response(null, { status: 404 });
  }
  return session;
}
