import type { BeatMap } from "../../../../shared/contracts/songs.ts";
import { TICKS_PER_BEAT } from "../../../../shared/units.ts";
import { findBarStep, isInView, toX, type RibbonScale } from "./ribbon-scale.ts";

/** Numbers keep at least this far apart, in pixels. */
const NUMBER_ROOM = 46;
/** A loop narrower than this has no room for its word. */
const WORD_ROOM = 130;

export interface RibbonBarsProps {
  song: BeatMap;
  scale: RibbonScale;
  loop: { readonly start: number; readonly end: number } | null;
}

/** Bar lines and numbers under the ribbon. The playhead says them aloud, so they are hidden here. */
export function RibbonBars({ song, scale, loop }: RibbonBarsProps) {
  const shown = song.bars.filter((bar) => isInView(scale, bar.start * TICKS_PER_BEAT));
  const step = findBarStep(scale, shown.length, NUMBER_ROOM);
  const right = loop ? toX(scale, loop.end) : 0;
  return (
    <div className="large-ribbon-bars" aria-hidden="true">
      {shown.map((bar) => {
        const isNumbered = bar.number > 0 && (bar.number - 1) % step === 0;
        return (
          <span
            key={bar.number}
            className={isNumbered ? "is-numbered" : undefined}
            style={{ left: toX(scale, bar.start * TICKS_PER_BEAT) }}
          >
            {isNumbered ? bar.number : ""}
          </span>
        );
      })}
      {loop && right - toX(scale, loop.start) > WORD_ROOM && (
        <em style={{ left: right }}>
          <b>loop</b>
        </em>
      )}
    </div>
  );
}
