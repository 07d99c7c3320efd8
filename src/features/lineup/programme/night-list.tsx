import type { ProgrammeShow } from "../../../../shared/contracts/lineup.ts";
import { PictureRibbon } from "../../../components/picture-ribbon.tsx";
import { Tag } from "../../../components/tag.tsx";
import { presentLength } from "../../../lib/zoned-time.ts";

export interface NightListProps {
  shows: readonly ProgrammeShow[];
  /** Slot that is on the square at this minute. */
  nowSlotId: string | null;
}

/** The shows of one night by start time, each with its ribbon and, for people who can not see it, its description. */
export function NightList({ shows, nowSlotId }: NightListProps) {
  return (
    <ol>
      {shows.map((show) => {
        const isNow = show.slotId === nowSlotId;
        return (
          <li
            key={show.slotId}
            aria-current={isNow ? "time" : undefined}
            className={`grid grid-cols-[4.5rem_1fr] gap-x-2 border-b border-line py-3.5 ${isNow ? "-ml-4 border-l-4 border-l-lamp-ink bg-lamp-tint pl-3" : ""}`}
          >
            <p className="font-head text-5 font-semibold tabular-nums">{show.startsAt}</p>
            <div className="min-w-0">
              <h3 className="flex flex-wrap items-center gap-2 text-5">
                {show.title}
                {isNow && (
                  <Tag state="note" icon="lamp">
                    On now
                  </Tag>
                )}
              </h3>
              <p className="text-soft">
                {show.publicName} · “{show.songTitle}” · {presentLength(show.seconds)}
              </p>
              <PictureRibbon
                className="mt-1.5"
                picture={show.ribbon}
                size="row"
                label={`${show.title}: ${show.description}`}
              />
            </div>
          </li>
        );
      })}
    </ol>
  );
}
