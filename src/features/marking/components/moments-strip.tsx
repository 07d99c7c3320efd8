import { useEffect, useRef } from "react";
import type { RibbonPicture } from "../../../../shared/contracts/common.ts";
import { joinClasses } from "../../../components/class-names.ts";
import { PictureRibbon } from "../../../components/picture-ribbon.tsx";
import type { PlacedComment } from "../model/comment-place.ts";
import type { DeskPlayback } from "../playback.ts";

export interface MomentsStripProps {
  picture: RibbonPicture | null;
  /** Title, length and the generated sentence. */
  label: string;
  comments: readonly PlacedComment[];
  /** Null while there is nothing to play: the cloth stands still. */
  playback: DeskPlayback | null;
  hereId: string | null;
  onSelect: (placed: PlacedComment) => void;
}

/** The ribbon at 62 px with the play line and the numbered flags of the comments. */
export function MomentsStrip({ picture, label, comments, playback, hereId, onSelect }: MomentsStripProps) {
  const lineRef = useRef<HTMLSpanElement>(null);
  // Moved by hand: a render for every frame of the show would be too dear.
  useEffect(
    () =>
      playback?.subscribe((share) => {
        if (lineRef.current) lineRef.current.style.left = `${share * 100}%`;
      }),
    [playback],
  );
  const flags = playback ? comments.filter((placed) => placed.tick !== null) : [];
  return (
    <div className="relative on-dusk bg-transport pb-[22px]">
      {/* The pointer's way only: the transport below has the same as a slider for every other way. */}
      {/* eslint-disable-next-line jsx-a11y/click-events-have-key-events, jsx-a11y/no-static-element-interactions */}
      <div
        className="relative"
        onClick={(event) => {
          const box = event.currentTarget.getBoundingClientRect();
          playback?.seekTick(((event.clientX - box.left) / box.width) * playback.endTick);
        }}
      >
        <PictureRibbon picture={picture} size="marking" isSquare label={label} />
        {playback && (
          <span
            ref={lineRef}
            aria-hidden="true"
            className="pointer-events-none absolute inset-y-0 left-0 w-0.5 -translate-x-1/2 bg-[#fff7e6] shadow-[0_0_0_1.5px_rgb(10_12_24/0.55)]"
          />
        )}
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
            style={{
              left: `clamp(12px, ${((placed.tick ?? 0) / (playback?.endTick ?? 1)) * 100}%, calc(100% - 12px))`,
            }}
            className="absolute top-[60px] grid h-6 min-w-6 -translate-x-1/2 place-items-center text-1 font-semibold before:absolute before:bottom-full before:left-1/2 before:h-[60px] before:border-l-[1.5px] before:border-dashed before:border-on-dusk"
          >
            <span
              className={joinClasses(
                "z-1 grid h-[18px] min-w-[19px] place-items-center rounded-[2px] text-on-lamp",
                isHere ? "bg-lamp" : "bg-on-dusk",
              )}
            >
              {placed.number}
            </span>
          </button>
        );
      })}
    </div>
  );
}
