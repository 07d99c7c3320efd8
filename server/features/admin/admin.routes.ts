import type { adminContract } from "../../../shared/contracts/admin.ts";
import type { Handlers } from "../../http/mount.ts";
import { addStaff, type AdminDeps, getAuditPage, getOverview, setDisabled } from "./admin.service.ts";

/** The handlers of the admin contract. */
export function createAdminHandlers(deps: AdminDeps): Handlers<typeof adminContract> {
  const { db } = deps;
  return {
    overview: () => getOverview(db),
    addStaff: async ({ actor, body }) => ({ staff: await addStaff(deps, actor.userId, body) }),
    setDisabled: ({ actor, params, body }) => ({ staff: setDisabled(deps, actor.userId, { ...params, ...body }) }),
    audit: ({ query }) => getAuditPage(db, query.before),
  };
}
