import type { assignmentsContract } from "../../../shared/contracts/assignments.ts";
import type { FeatureDeps } from "../../deps.ts";
import type { Handlers } from "../../http/mount.ts";
import { changeAssignment, createAssignment, getAssignmentDetail, listOwnAssignments } from "./assignments.service.ts";
import { handIn } from "./hand-in.service.ts";

/** The handlers of the assignments contract. */
export function createAssignmentsHandlers(deps: FeatureDeps): Handlers<typeof assignmentsContract> {
  return {
    list: ({ actor }) => ({ assignments: listOwnAssignments(deps.db, actor) }),
    get: ({ actor, params }) => getAssignmentDetail(deps.db, actor, params.assignmentId),
    create: ({ actor, params, body }) => ({ assignment: createAssignment(deps, actor, params.classId, body) }),
    update: ({ actor, params, body }) => ({ assignment: changeAssignment(deps.db, actor, params.assignmentId, body) }),
    handIn: ({ actor, params, body }) => handIn(deps, actor, params.assignmentId, body),
  };
}
