import type { RibbonPicture } from "../../../../shared/contracts/common.ts";
import { joinClasses } from "../../../components/class-names.ts";
import { PictureRibbon } from "../../../components/picture-ribbon.tsx";
import type { PlacedComment } from "../model/comment-place.ts";

export interface MomentsStripProps {
  picture: RibbonPicture | null;
  /** Title, length and the generated sentence. */
  label: string;
  comments: readonly PlacedComment[];
  /** Part of the song, 0 to 1, of a tick. */
  toShare: (tick: number) => number;
  /** The moment on screen, 0 to 1. */
  now: number;
  hereId: string | null;
  onSelect: (placed: PlacedComment) => void;
  /** A press on the cloth goes there, 0 to 1. The transport's slider does the same by keyboard. */
  onSeek: (share: number) => void;
}

/** The ribbon at 62 px with the play line and the numbered flags of the comments. */
export function MomentsStrip({ picture, label, comments, toShare, now, hereId, onSelect, onSeek }: MomentsStripProps) {
  const flags = comments.filter((placed) => placed.tick !== null);
  return (
    <div className="relative on-dusk bg-transport pb-[22px]">
      {/* The pointer's way only: the transport below has the same as a slider for every other way. */}
      {/* eslint-disable-next-line jsx-a11y/click-events-have-key-events, jsx-a11y/no-static-element-interactions */}
      <div
        onClick={(event) => {
          const box = event.currentTarget.getBoundingClientRect();
          onSeek((event.clientX - box.left) / box.width);
        }}
      >
        <PictureRibbon picture={picture} size="marking" isSquare label={label} now={now} />
      </div>
      {flags.map((placed) => {
        const isHere = placed.comment.id === hereId;
        return (
          <button
            key={placed.comment.id}
            type="button"
            aria-pressed={isHere}
            aria-label={`Comment ${placed.number}, ${placed.place}`}
            onClick={() => onSelect(placed)}
            style={{ left: `clamp(12px, ${toShare(placed.tick ?? 0) * 100}%, calc(100% - 12px))` }}
            className="absolute top-[60px] grid h-6 min-w-6 -translate-x-1/2 place-items-center text-1 font-semibold before:absolute before:bottom-full before:left-1/2 before:h-[60px] before:border-l-[1.5px] before:border-dashed before:border-on-dusk"
          >
            <span className={joinClasses("z-1 grid h-[18px] min-w-[19px] place-items-center rounded-[2px] text-on-lamp", isHere ? "bg-lamp" : "bg-on-dusk")}>{placed.number}</span>
          </button>
        );
      })}
    </div>
  );
}
