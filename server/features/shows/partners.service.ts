import { AUTHORS_MAX, type Invitation, type Partner, type Partners } from "../../../shared/contracts/partners.ts";
import { type ShowId, ShowIdSchema, UserIdSchema } from "../../../shared/ids.ts";
import { ProblemError } from "../../../shared/problem.ts";
import type { Clock } from "../../clock.ts";
import { type Db, inTransaction } from "../../db/connection.ts";
import { listSongFacts } from "../../event/song.queries.ts";
import type { Actor } from "../../http/actor.ts";
import { fieldProblem } from "../../work/field-problem.ts";
import { listShowClassIds } from "../../work/relations.queries.ts";
import { listAuthors, listSubmissionsByShow } from "../../work/work.queries.ts";
import {
  deleteAuthor,
  deleteInvitation,
  insertAuthor,
  insertInvitation,
  listAsked,
  listInvitationsOf,
  listStudents,
  listWithOwnWork,
  type PersonRow,
} from "./partners.queries.ts";
import type { ShowRow } from "./shows.queries.ts";
import { duplicateShow, getRelatedShow } from "./shows.service.ts";

interface PartnersDeps {
  readonly db: Db;
  readonly clock: Clock;
}

/** A show's authors, whom they asked, and the classmates they can ask. Throws `not-found`. */
export function getPartners(db: Db, actor: Actor, showId: string): Partners {
  return presentPartners(db, actor, getRelatedShow(db, actor, showId).show);
}

/**
 * Asks a classmate; asking again changes nothing. Throws `wrong-state` while the work is handed in or
 * the show has its authors, `invalid-request` for somebody who can not be asked, `not-found`.
 */
export function askPartner({ db, clock }: PartnersDeps, actor: Actor, showId: string, userId: string): Partners {
  return inTransaction(db, (tx) => {
    const { show } = getRelatedShow(tx, actor, showId);
    const partners = presentPartners(tx, actor, show);
    if (!partners.asked.some((person) => person.userId === userId)) {
      if (partners.obstacle !== null) throw new ProblemError("wrong-state", { detail: partners.obstacle });
      if (!partners.classmates.some((person) => person.userId === userId))
        throw fieldProblem("/userId", "Choose somebody of your class who has not begun a show for this assignment.");
      insertInvitation(tx, { showId, userId, askedBy: actor.userId, askedAt: clock.now() });
    }
    return presentPartners(tx, actor, show);
  });
}

/** Takes an unanswered question back. Throws `not-found` when there is none. */
export function withdrawPartner(db: Db, actor: Actor, showId: string, userId: string): Partners {
  return inTransaction(db, (tx) => {
    const { show } = getRelatedShow(tx, actor, showId);
    if (!deleteInvitation(tx, showId, userId)) throw new ProblemError("not-found");
    return presentPartners(tx, actor, show);
  });
}

/** What the caller was asked to join. */
export function listInvitations(db: Db, actor: Actor): Invitation[] {
  const songs = listSongFacts(db);
  return listInvitationsOf(db, actor.userId).map(({ songId, ...row }) => ({
    ...row,
    showId: ShowIdSchema.parse(row.showId),
    songTitle: songs.get(songId)?.title ?? "",
  }));
}

/**
 * Joins or declines; the question is gone either way. Throws `wrong-state` with the reason when
 * joining is no longer possible (and leaves the question), `not-found`.
 */
export function answerInvitation(db: Db, actor: Actor, showId: string, answer: "join" | "decline"): boolean {
  return inTransaction(db, (tx) => {
    const { show } = getRelatedShow(tx, actor, showId);
    if (answer === "join") {
      const hasOwn = show.assignmentId !== null && listWithOwnWork(tx, show.assignmentId, [actor.userId]).length > 0;
      const obstacle = hasOwn
        ? "You have begun a show of your own for this assignment. Archive it first, then join."
        : findObstacle(tx, show);
      if (obstacle !== null) throw new ProblemError("wrong-state", { detail: obstacle });
      insertAuthor(tx, showId, actor.userId);
    }
    deleteInvitation(tx, showId, actor.userId);
    return answer === "join";
  });
}

/**
 * Leaves the show to the others; the caller keeps a copy of the script. Throws `wrong-state` for the
 * only author and while the work is handed in, `not-found`.
 */
export function leaveShow(deps: PartnersDeps, actor: Actor, showId: string): ShowId {
  return inTransaction(deps.db, (tx) => {
    const { show } = getRelatedShow(tx, actor, showId);
    if (listAuthors(tx, [showId]).length < 2)
      throw new ProblemError("wrong-state", { detail: "You are its only author. Archive the show instead." });
    const handedIn = findHandedIn(tx, show);
    if (handedIn !== null) throw new ProblemError("wrong-state", { detail: handedIn });
    const copy = duplicateShow({ ...deps, db: tx }, actor, showId);
    deleteAuthor(tx, showId, actor.userId);
    return copy.id;
  });
}

function presentPartners(db: Db, actor: Actor, show: ShowRow): Partners {
  const authors = listAuthors(db, [show.id]);
  const asked = listAsked(db, show.id);
  const taken = [...authors, ...asked].map((person) => person.userId);
  const students = listStudents(db, listShowClassIds(db, show), taken);
  const busy = new Set(
    show.assignmentId === null
      ? []
      : listWithOwnWork(
          db,
          show.assignmentId,
          students.map((student) => student.userId),
        ),
  );
  return {
    authors: authors.map(({ userId, displayName }) => ({
      ...presentPartner({ userId, name: displayName }),
      isMe: userId === actor.userId,
    })),
    asked: asked.map(presentPartner),
    classmates: students.filter((student) => !busy.has(student.userId)).map(presentPartner),
    obstacle: findObstacle(db, show),
  };
}

function presentPartner({ userId, name }: PersonRow): Partner {
  return { userId: UserIdSchema.parse(userId), name };
}

/** Why nobody can join now; null when somebody can. */
function findObstacle(db: Db, show: ShowRow): string | null {
  if (listAuthors(db, [show.id]).length >= AUTHORS_MAX) return `A show has at most ${AUTHORS_MAX} authors.`;
  return findHandedIn(db, show);
}

/** The mark of handed-in work goes to the authors of that moment, so they stay until it comes back. */
function findHandedIn(db: Db, show: ShowRow): string | null {
  const state = listSubmissionsByShow(db, [show.id]).get(show.id)?.state;
  if (state === "submitted") return "It is handed in. The authors stay as they are until it comes back.";
  return state === "marked" ? "It is marked. The authors stay as they are." : null;
}
