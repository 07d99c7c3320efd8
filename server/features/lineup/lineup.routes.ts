import type { lineupContract } from "../../../shared/contracts/lineup.ts";
import type { FeatureDeps } from "../../deps.ts";
import type { Handlers } from "../../http/mount.ts";
import {
  approveForward,
  declineForward,
  forwardSubmission,
  getForwardDetail,
  listOwnForwards,
} from "./forwards.service.ts";
import { getLineup, moveSlot, placeShow, publishLineup, removeSlot, setNight } from "./lineup.service.ts";
import { getProgramme } from "./programme.service.ts";

/** The handlers of the lineup contract. */
export function createLineupHandlers(deps: FeatureDeps): Handlers<typeof lineupContract> {
  return {
    forward: ({ actor, params, body }) => ({ forward: forwardSubmission(deps, actor, params.submissionId, body.note) }),
    forwards: ({ actor }) => ({ forwards: listOwnForwards(deps.db, actor) }),
    forwardDetail: ({ actor, params }) => getForwardDetail(deps.db, actor, params.forwardId),
    approve: ({ actor, params, body }) => ({ forward: approveForward(deps, actor, params.forwardId, body.note) }),
    decline: ({ actor, params, body }) => ({ forward: declineForward(deps, actor, params.forwardId, body.note) }),
    lineup: () => getLineup(deps),
    place: ({ body }) => placeShow(deps, body),
    move: ({ params, body }) => moveSlot(deps, params.slotId, body),
    remove: ({ params }) => removeSlot(deps, params.slotId),
    setNight: ({ params, body }) => setNight(deps, params.nightId, body),
    publish: ({ actor }) => publishLineup(deps, actor),
    programme: () => getProgramme(deps),
  };
}
