import { useEffect, useRef, type KeyboardEvent } from "react";
import type { BeatMap } from "../../../../shared/contracts/songs.ts";
import { TICKS_PER_BEAT } from "../../../../shared/units.ts";
import { findSongPlace } from "./song-place.ts";
import { isInView, toTick, toX, type RibbonScale } from "./ribbon-scale.ts";
import { useDragX } from "./use-drag-x.ts";

export interface PlayheadProps {
  song: BeatMap;
  scale: RibbonScale;
  followTick: (show: (tick: number) => void) => () => void;
  onSeek: (tick: number) => void;
}

/** The moment on stage: a thread over the cloth with a small lantern. Arrow keys go by beats, page keys by bars. */
export function Playhead({ song, scale, followTick, onSeek }: PlayheadProps) {
  const ref = useRef<HTMLDivElement>(null);
  const tickRef = useRef(0);
  const drag = useDragX((x) => onSeek(toTick(scale, x)));
  const lastBar = song.bars.at(-1)?.number ?? 1;

  useEffect(
    () =>
      followTick((tick) => {
        const head = ref.current;
        if (!head) return;
        tickRef.current = tick;
        head.classList.toggle("is-outside", !isInView(scale, tick));
        head.style.transform = `translateX(${toX(scale, tick).toFixed(1)}px)`;
        const { bar, beat } = findSongPlace(song, tick);
        const text = `bar ${bar}, beat ${beat}`;
        if (head.getAttribute("aria-valuetext") === text) return;
        head.setAttribute("aria-valuetext", text);
        head.setAttribute("aria-valuenow", String(bar));
      }),
    [followTick, scale, song],
  );

  const handleKey = (event: KeyboardEvent) => {
    const perBar = song.beatsPerBar;
    const steps: Record<string, number> = {
      ArrowRight: 1,
      ArrowUp: 1,
      ArrowLeft: -1,
      ArrowDown: -1,
      PageUp: -perBar,
      PageDown: perBar,
    };
    const step = steps[event.key];
    if (event.key === "Home") onSeek(0);
    else if (event.key === "End") onSeek((song.beats.length - 2) * TICKS_PER_BEAT);
    else if (step !== undefined) onSeek(Math.round(tickRef.current / TICKS_PER_BEAT + step) * TICKS_PER_BEAT);
    else return;
    event.preventDefault();
  };

  return (
    <div
      ref={ref}
      className="large-ribbon-head"
      role="slider"
      tabIndex={0}
      aria-label="Playhead"
      aria-valuemin={song.bars[0]?.number ?? 1}
      aria-valuemax={lastBar}
      aria-valuenow={1}
      aria-valuetext="bar 1, beat 1"
      onKeyDown={handleKey}
      {...drag}
    >
      <svg width="18" height="22" viewBox="0 0 18 22" aria-hidden="true">
        <path d="M9 1.5 14.8 7v9.2L12.2 20H5.8L3.2 16.2V7Z" />
        <path className="large-ribbon-head-bars" d="M3.6 7.4h10.8M5.2 16.4h7.6" />
      </svg>
    </div>
  );
}
