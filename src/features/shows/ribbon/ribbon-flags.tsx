import type { BeatMap } from "../../../../shared/contracts/songs.ts";
import { TICKS_PER_BEAT } from "../../../../shared/units.ts";
import { joinClasses } from "../../../components/class-names.ts";
import { fitFlag, toX, type RibbonScale } from "./ribbon-scale.ts";

/**
 * A narrower pennant is only drawn: a target has 24 px (WCAG 2.5.8) beside the playhead's grip, which can lie
 * over its start. The playhead goes there all the same.
 */
const MIN_TARGET = 40;

export interface RibbonFlagsProps {
  song: BeatMap;
  scale: RibbonScale;
  /** Index of the section that is playing, -1 between sections. */
  playing: number;
  onSeek: (tick: number) => void;
}

/** The sections of the song as pennants over the ribbon; a press goes there. */
export function RibbonFlags({ song, scale, playing, onSeek }: RibbonFlagsProps) {
  return (
    <div className="large-ribbon-flags" role="group" aria-label="Sections of the song">
      {song.sections.map((section, index) => {
        const start = Math.round(section.start * TICKS_PER_BEAT);
        const width = toX(scale, section.end * TICKS_PER_BEAT) - toX(scale, start) - 3;
        const fit = fitFlag(section.name, width);
        const bar = song.bars.findLast((candidate) => candidate.start <= section.start + 1e-6)?.number ?? 1;
        if (section.end * TICKS_PER_BEAT <= scale.startTick || start >= scale.endTick) return null;
        const place = { left: toX(scale, start), width: Math.max(0, width) };
        if (width < MIN_TARGET) {
          return (
            <span
              key={`${section.name}-${section.start}`}
              aria-hidden="true"
              className="large-ribbon-flag"
              style={place}
            />
          );
        }
        return (
          <button
            key={`${section.name}-${section.start}`}
            type="button"
            className={joinClasses("large-ribbon-flag", index === playing && "is-on", fit === "tight" && "is-tight")}
            style={place}
            aria-label={`Go to ${section.name}, bar ${bar}`}
            aria-current={index === playing ? "true" : undefined}
            onClick={() => onSeek(start)}
          >
            <span aria-hidden="true">{fit === "none" ? "" : section.name}</span>
          </button>
        );
      })}
    </div>
  );
}
