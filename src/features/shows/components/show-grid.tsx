import type { ReactNode } from "react";
import type { ShowSummary } from "../../../../shared/contracts/shows.ts";
import { PictureRibbon } from "../../../components/picture-ribbon.tsx";
import { ShowCard } from "../../../components/show-card.tsx";
import { Skeleton, SkeletonGroup } from "../../../components/skeleton.tsx";
import { Tag } from "../../../components/tag.tsx";
import { formatAgo, formatNames } from "../../../lib/format.ts";
import { presentLength } from "../../../lib/zoned-time.ts";

const GRID = "grid grid-cols-[repeat(auto-fill,minmax(15.5rem,1fr))] gap-4";

export interface ShowGridProps {
  shows: readonly ShowSummary[];
  /** Display name of the reader, left out of "with". */
  reader: string;
  now: number;
  /** Further acts on a show, in the corner of its card. */
  actionsOf?: (show: ShowSummary) => ReactNode;
}

/** Shows as cards, each known by its ribbon. */
export function ShowGrid({ shows, reader, now, actionsOf }: ShowGridProps) {
  return (
    <ul className={GRID}>
      {shows.map((show) => (
        <li key={show.id} className="relative">
          <ShowCard
            to={`/shows/${show.id}`}
            title={show.title}
            line={line(show, reader, now)}
            tag={<ShowTag show={show} />}
            ribbon={<PictureRibbon picture={show.ribbon} label="" />}
          />
          {actionsOf && <div className="absolute right-2 bottom-2 z-1">{actionsOf(show)}</div>}
        </li>
      ))}
    </ul>
  );
}

function line(show: ShowSummary, reader: string, now: number): string {
  const others = show.authors.filter((author) => author !== reader);
  const who = others.length > 0 ? `with ${formatNames(others)}` : show.songTitle;
  return `${who} · ${presentLength(show.seconds)} · saved ${formatAgo(show.savedAt, now)}`;
}

/** The furthest a show has come: on the square, forwarded, or its work on the assignment. */
function ShowTag({ show }: { show: ShowSummary }) {
  if (show.forwardState === "scheduled") return <Tag state="scheduled">On the square</Tag>;
  if (show.forwardState !== null && show.forwardState !== "declined") return <Tag state={show.forwardState} />;
  if (show.workState !== null) return <Tag state={show.workState} />;
  return null;
}

/** The grid while the shows are on their way. */
export function ShowGridSkeleton() {
  return (
    <SkeletonGroup label="Loading your shows" className={GRID}>
      {["a", "b", "c"].map((key) => (
        <div key={key} className="rounded-sheet border border-line bg-card p-2.5 shadow-sheet-1">
          <Skeleton shape="ribbon" className="h-[58px]" />
          <Skeleton className="mt-4 w-2/3" />
          <Skeleton className="mt-3 w-2/5" />
        </div>
      ))}
    </SkeletonGroup>
  );
}
