import type { classesContract } from "../../../shared/contracts/classes.ts";
import type { Handlers } from "../../http/mount.ts";
import { getClassBoard, listOwnClasses, removeStudent } from "./classes.service.ts";
import { addStudents, type ClassesDeps, makeCards, resetSignIn } from "./sign-in-cards.service.ts";

/** The handlers of the classes contract. */
export function createClassesHandlers(deps: ClassesDeps): Handlers<typeof classesContract> {
  const { db, clock } = deps;
  return {
    list: ({ actor }) => ({ classes: listOwnClasses(db, actor) }),
    get: ({ actor, params }) => getClassBoard(db, actor, params.classId),
    addStudents: async ({ actor, params, body }) => ({ cards: await addStudents(deps, actor, { ...params, ...body }) }),
    makeCards: async ({ actor, params, body }) => ({ cards: await makeCards(deps, actor, { ...params, ...body }) }),
    resetSignIn: ({ actor, params }) => resetSignIn(deps, actor, params),
    removeStudent: ({ actor, params }) => removeStudent(db, clock, actor, params),
  };
}
