import type { showsContract } from "../../../shared/contracts/shows.ts";
import type { FeatureDeps } from "../../deps.ts";
import type { Handlers } from "../../http/mount.ts";
import { createDraftRibbons } from "../../show-runs/draft-ribbons.ts";
import { getEarlierDraft, listHistory } from "./draft-history.service.ts";
import {
  answerInvitation,
  askPartner,
  getPartners,
  leaveShow,
  listInvitations,
  withdrawPartner,
} from "./partners.service.ts";
import {
  changeShow,
  createShow,
  duplicateShow,
  getShowDetail,
  getVersionDetail,
  listOwnShows,
  saveDraft,
} from "./shows.service.ts";

/** The handlers of the shows contract. A save answers at once; its ribbon follows in the background. */
export function createShowsHandlers(deps: FeatureDeps): Handlers<typeof showsContract> {
  const ribbons = createDraftRibbons(deps);
  return {
    list: ({ actor, query }) => ({ shows: listOwnShows(deps.db, actor, query.archived === "yes") }),
    create: ({ actor, body, commit }) => {
      const created = commit(() => ({ show: createShow(deps, actor, body) }));
      ribbons.refresh(created.show.id);
      return created;
    },
    get: ({ actor, params }) => getShowDetail(deps.db, actor, params.showId),
    update: ({ actor, params, body }) => {
      const changed = changeShow(deps.db, actor, params.showId, body);
      if (body.seed !== undefined) ribbons.refresh(params.showId);
      return changed;
    },
    duplicate: ({ actor, params }) => ({ show: duplicateShow(deps, actor, params.showId) }),
    saveDraft: ({ actor, params, body, commit }) => {
      const saved = commit(() => saveDraft(deps, actor, params.showId, body));
      ribbons.refresh(params.showId);
      return saved;
    },
    history: ({ actor, params }) => ({ drafts: listHistory(deps.db, actor, params.showId) }),
    earlierDraft: ({ actor, params }) => getEarlierDraft(deps.db, actor, params.showId, params.revision),
    partners: ({ actor, params }) => getPartners(deps.db, actor, params.showId),
    askPartner: ({ actor, params, body }) => askPartner(deps, actor, params.showId, body.userId),
    withdrawPartner: ({ actor, params }) => withdrawPartner(deps.db, actor, params.showId, params.userId),
    leave: ({ actor, params }) => ({ copyId: leaveShow(deps, actor, params.showId) }),
    invitations: ({ actor }) => ({ invitations: listInvitations(deps.db, actor) }),
    answerInvitation: ({ actor, params, body }) => ({
      isAuthor: answerInvitation(deps.db, actor, params.showId, body.answer),
    }),
    version: ({ actor, params }) => getVersionDetail(deps.db, actor, params.versionId),
  };
}
