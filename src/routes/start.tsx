import { redirect } from "react-router";
import { sessionQuery } from "../features/auth/api.ts";
import { homeOf } from "../features/auth/model/home-of.ts";
import { queryClient } from "../lib/query-client.ts";

/** The bare address: one's own start page, or tonight's programme for everybody else. */
export async function loader() {
  const session = await queryClient.ensureQueryData(sessionQuery).catch(() => null);
  throw redirect(session === null ? "/programme" : homeOf(session.user.roles));
}

/** Never drawn: the loader always leads on. */
export function Component() {
  return null;
}
