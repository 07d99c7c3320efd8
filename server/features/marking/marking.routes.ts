import type { markingContract } from "../../../shared/contracts/marking.ts";
import type { FeatureDeps } from "../../deps.ts";
import type { Handlers } from "../../http/mount.ts";
import { createComment, deleteComment } from "./comments.service.ts";
import { getQueue, getSubmissionDetail, listInbox } from "./marking.service.ts";
import { releaseMark, reopenSubmission, saveMark, sendBack } from "./marks.service.ts";

/** The handlers of the marking contract. */
export function createMarkingHandlers(deps: FeatureDeps): Handlers<typeof markingContract> {
  return {
    inbox: ({ actor }) => ({ assignments: listInbox(deps.db, actor) }),
    queue: ({ actor, params }) => getQueue(deps.db, actor, params.assignmentId),
    submission: ({ actor, params }) => getSubmissionDetail(deps.db, actor, params.submissionId),
    comment: ({ actor, params, body, commit }) =>
      commit(() => ({ comment: createComment(deps, actor, params.submissionId, body) })),
    deleteComment: ({ actor, params }) => deleteComment(deps, actor, params.commentId),
    saveMark: ({ actor, params, body }) => ({ mark: saveMark(deps, actor, params.submissionId, body) }),
    sendBack: ({ actor, params, body }) => ({ state: sendBack(deps, actor, params.submissionId, body) }),
    release: ({ actor, params, body }) => releaseMark(deps, actor, params.submissionId, body.versionId),
    reopen: ({ actor, params }) => ({ state: reopenSubmission(deps, actor, params.submissionId) }),
  };
}
