import { useEffect, useRef } from "react";
import type { BeatMap } from "../../../../shared/contracts/songs.ts";
import { Icon } from "../../../components/icon.tsx";
import { wholeSong, zoomView } from "./ribbon-view.ts";
import type { TickLoop } from "./song-place.ts";

export interface RibbonZoomProps {
  song: BeatMap;
  view: TickLoop;
  onView: (view: TickLoop) => void;
  followTick: (show: (tick: number) => void) => () => void;
}

/** Closer to the playhead, and further away. */
export function RibbonZoom({ song, view, onView, followTick }: RibbonZoomProps) {
  const tickRef = useRef(0);
  useEffect(() => followTick((tick) => void (tickRef.current = tick)), [followTick]);
  const whole = wholeSong(song);
  const zoom = (way: "in" | "out") => onView(zoomView(view, song, { way, around: tickRef.current }));
  const closest = zoomView(view, song, { way: "in", around: view.start });
  const isWhole = view.start <= whole.start && view.end >= whole.end;
  const isClosest = closest.end - closest.start >= view.end - view.start - 1;
  return (
    <div className="large-ribbon-zoom" role="group" aria-label="Zoom of the ribbon">
      <button type="button" aria-label="Show more of the song" aria-disabled={isWhole} onClick={() => zoom("out")}>
        <Icon name="minus" className="size-4" />
      </button>
      <button type="button" aria-label="Show less, closer" aria-disabled={isClosest} onClick={() => zoom("in")}>
        <Icon name="plus" className="size-4" />
      </button>
    </div>
  );
}
