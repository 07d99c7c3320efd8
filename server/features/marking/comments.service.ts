import type { Comment, CommentAnchor } from "../../../shared/contracts/marking.ts";
import { ProblemError } from "../../../shared/problem.ts";
import { TICKS_PER_BEAT } from "../../../shared/units.ts";
import type { Clock } from "../../clock.ts";
import { type Db, inTransaction } from "../../db/connection.ts";
import { newId } from "../../db/schema/columns.ts";
import { getBeatMap } from "../../event/song.queries.ts";
import type { Actor } from "../../http/actor.ts";
import { fieldProblem } from "../../work/field-problem.ts";
import { presentComment } from "./marking.presenter.ts";
import {
  getComment,
  insertComment,
  listComments,
  setCommentDeleted,
  type SubmissionContext,
} from "./marking.queries.ts";
import { getRelatedSubmission } from "./relate.ts";

interface CommentsDeps {
  readonly db: Db;
  readonly clock: Clock;
}

/**
 * Comments on the version that was handed in last. Throws `invalid-request` when the anchor lies
 * outside of its lines or after the end of its song, `not-found`.
 */
export function createComment(
  { db, clock }: CommentsDeps,
  actor: Actor,
  submissionId: string,
  input: { anchor: CommentAnchor; body: string },
): Comment {
  return inTransaction(db, (tx) => {
    const context = getRelatedSubmission(tx, actor, submissionId);
    assertAnchor(tx, context, input.anchor);
    const id = newId();
    insertComment(tx, {
      id,
      submissionId,
      versionId: context.version.id,
      authorId: actor.userId,
      anchor: input.anchor,
      body: input.body,
      createdAt: clock.now(),
    });
    const kept = listComments(tx, submissionId).find((row) => row.comment.id === id);
    if (!kept) throw new Error("A comment that was inserted is listed.");
    return presentComment(actor.userId, kept);
  });
}

/** Takes one's own comment back. Throws `not-allowed` for another's, `not-found` where it can not even be seen. */
export function deleteComment({ db, clock }: CommentsDeps, actor: Actor, commentId: string): void {
  inTransaction(db, (tx) => {
    const comment = getComment(tx, commentId);
    getRelatedSubmission(tx, actor, comment.submissionId);
    if (comment.authorId !== actor.userId)
      throw new ProblemError("not-allowed", { detail: "You can take back your own comments only." });
    setCommentDeleted(tx, commentId, clock.now());
  });
}

function assertAnchor(db: Db, { version }: SubmissionContext, anchor: CommentAnchor): void {
  if (anchor.kind === "lines") {
    const lineCount = version.source.split("\n").length;
    if (anchor.to < anchor.from) throw fieldProblem("/anchor/to", "The last line comes before the first.");
    if (anchor.to > lineCount) throw fieldProblem("/anchor/to", `The script has ${lineCount} lines.`);
  }
  if (anchor.kind === "moment") {
    const endTick = (getBeatMap(db, version.beatMapId).beats.length - 1) * TICKS_PER_BEAT;
    if (anchor.tick > endTick) throw fieldProblem("/anchor/tick", "The song is over by then.");
  }
}
