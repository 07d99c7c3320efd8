import type { KeyboardEvent } from "react";
import type { BeatMap } from "../../../../shared/contracts/songs.ts";
import { TICKS_PER_BEAT } from "../../../../shared/units.ts";
import { isInView, toTick, toX, type RibbonScale } from "./ribbon-scale.ts";
import { nearestBarLine, type TickLoop } from "./song-place.ts";
import { useDragX } from "./use-drag-x.ts";

export interface LoopEdgeProps {
  end: "start" | "end";
  song: BeatMap;
  scale: RibbonScale;
  loop: TickLoop;
  onLoop: (loop: TickLoop) => void;
}

/** One end of the loop, on a bar line; dragged, or moved bar by bar with the arrow keys. */
export function LoopEdge({ end, song, scale, loop, onLoop }: LoopEdgeProps) {
  const lines = [...song.bars.map((bar) => bar.start), song.beats.length - 1].map((beat) =>
    Math.round(beat * TICKS_PER_BEAT),
  );
  const at = end === "start" ? loop.start : loop.end;
  const index = lines.indexOf(nearestBarLine(song, at));
  const place = (tick: number | undefined) => {
    if (tick === undefined) return;
    const next = end === "start" ? { ...loop, start: tick } : { ...loop, end: tick };
    if (next.start < next.end && tick !== at) onLoop(next);
  };
  const drag = useDragX((x) => place(nearestBarLine(song, toTick(scale, x))));
  const handleKey = (event: KeyboardEvent) => {
    const step =
      event.key === "ArrowRight" || event.key === "ArrowUp"
        ? 1
        : event.key === "ArrowLeft" || event.key === "ArrowDown"
          ? -1
          : 0;
    if (step === 0) return;
    place(lines[index + step]);
    event.preventDefault();
  };
  if (!isInView(scale, at)) return null;
  const bar = end === "start" ? (song.bars[index]?.number ?? 1) : (song.bars[index - 1]?.number ?? 1);
  return (
    <div
      className={`large-ribbon-edge is-${end}`}
      role="slider"
      tabIndex={0}
      aria-label={end === "start" ? "Loop starts at bar" : "Loop ends after bar"}
      aria-valuemin={song.bars[0]?.number ?? 1}
      aria-valuemax={song.bars.at(-1)?.number ?? 1}
      aria-valuenow={bar}
      style={{ left: toX(scale, at) }}
      onKeyDown={handleKey}
      {...drag}
    />
  );
}
