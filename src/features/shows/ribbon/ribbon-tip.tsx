import type { BeatMap } from "../../../../shared/contracts/songs.ts";
import { findSongPlace } from "./song-place.ts";

export interface TipPlace {
  /** Pixels from the left edge of the cloth. */
  readonly x: number;
  readonly row: number;
  readonly tick: number;
  readonly words: string | null;
}

export interface RibbonTipProps {
  place: TipPlace;
  song: BeatMap;
  width: number;
}

/** What lies under the pointer: the moment, the light and the line. The playhead and the stage say the same to the keyboard. */
export function RibbonTip({ place, song, width }: RibbonTipProps) {
  const { bar, beat } = findSongPlace(song, place.tick);
  return (
    <p
      className="large-ribbon-tip"
      aria-hidden="true"
      style={place.x > width / 2 ? { right: width - place.x + 10 } : { left: place.x + 10 }}
    >
      <b>
        bar {bar}, beat {beat}
      </b>
      {place.words && ` · ${place.words}`}
    </p>
  );
}
