import { IconButton } from "../../../components/icon-button.tsx";
import type { PlacedComment } from "../model/comment-place.ts";

export interface CommentNoteProps {
  placed: PlacedComment;
  isHere: boolean;
  onDelete: () => void;
}

/** One comment below its line: number, author, words, place. */
export function CommentNote({ placed, isHere, onDelete }: CommentNoteProps) {
  const { comment, number, place } = placed;
  return (
    <div
      id={`comment-${comment.id}`}
      tabIndex={-1}
      data-here={isHere || undefined}
      className="grid grid-cols-[auto_minmax(0,1fr)_auto] items-start gap-x-2 rounded-r-cut border-l-[3px] border-blue-ink bg-blue-tint py-1.5 pr-1.5 pl-2.5 font-text text-2 leading-[1.4] whitespace-normal data-here:border-lamp-ink data-here:bg-lamp-tint"
    >
      <span className="mt-px min-w-[18px] rounded-[2px] bg-blue-ink px-1 text-center text-1 leading-[18px] font-[650] text-card">
        {number}
      </span>
      <p className="whitespace-pre-wrap wrap-anywhere">
        <b className="whitespace-nowrap">{comment.isMine ? "You" : comment.authorName}</b> {comment.body}
      </p>
      <span className="flex items-center gap-1 text-meta text-slate">
        {place}
        {comment.isMine && (
          <IconButton
            icon="trash"
            size="small"
            label={`Take comment ${number} back`}
            onPress={onDelete}
            className="size-6 min-h-0! min-w-0! [&_svg]:size-4"
          />
        )}
      </span>
    </div>
  );
}
