import type { Rubric } from "../../../shared/contracts/assignments.ts";
import type { Comment, Mark } from "../../../shared/contracts/marking.ts";
import { CommentIdSchema } from "../../../shared/ids.ts";
import { countPoints } from "../../work/points.ts";
import type { CommentWithAuthor, MarkRow } from "./marking.queries.ts";

export function presentMark(rubric: Rubric, mark: MarkRow): Mark {
  return {
    levels: mark.levels,
    note: mark.note,
    ...countPoints(rubric, mark.levels),
    isReleased: mark.releasedAt !== null,
  };
}

export function presentComment(
  userId: string,
  { comment, authorName, isTeacher, versionNumber }: CommentWithAuthor,
): Comment {
  return {
    id: CommentIdSchema.parse(comment.id),
    authorName,
    isMine: comment.authorId === userId,
    isTeacher,
    versionNumber,
    anchor: comment.anchor,
    body: comment.body,
    createdAt: comment.createdAt,
  };
}
