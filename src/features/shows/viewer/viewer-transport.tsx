import { useEffect, useRef } from "react";
import type { BeatMap } from "../../../../shared/contracts/songs.ts";
import { IconButton } from "../../../components/icon-button.tsx";
import { findSongPlace, presentClock } from "../ribbon/song-place.ts";
import type { ShowPlayer } from "../studio/show-player.ts";
import { useTransport } from "../studio/use-transport.ts";

export interface ViewerTransportProps {
  player: ShowPlayer;
  song: BeatMap;
  songTitle: string;
}

/** Play, the place in the song with a slider, and the song's name, on dusk below a stage. */
export function ViewerTransport({ player, song, songTitle }: ViewerTransportProps) {
  const state = useTransport(player);
  const sliderRef = useRef<HTMLInputElement>(null);
  const clockRef = useRef<HTMLSpanElement>(null);
  const isOn = state.isPlaying || state.isStarting;

  useEffect(
    () =>
      player.addView({
        showMoment: ({ tick, seconds }) => {
          const { bar } = findSongPlace(song, tick);
          const text = `bar ${bar} · ${presentClock(seconds)} of ${presentClock(player.tempo.endSeconds)}`;
          const slider = sliderRef.current;
          if (clockRef.current && clockRef.current.textContent !== text) clockRef.current.textContent = text;
          if (!slider) return;
          slider.value = String(Math.round(tick));
          if (slider.getAttribute("aria-valuetext") !== text) slider.setAttribute("aria-valuetext", text);
        },
      }),
    [player, song],
  );
  return (
    <div
      role="group"
      aria-label="Play the show"
      className="flex items-center gap-3 on-dusk bg-transport px-3 py-1.5 text-[#d5daee]"
    >
      <IconButton
        look="lamp"
        icon={isOn ? "pause" : "play"}
        label={isOn ? "Pause" : "Play"}
        aria-keyshortcuts="Space"
        onPress={() => player.transport.toggle()}
      />
      <span ref={clockRef} className="min-w-40 whitespace-nowrap tabular-nums" />
      <input
        ref={sliderRef}
        type="range"
        aria-label="Place in the song"
        min={0}
        max={Math.round(player.tempo.endTick)}
        step={song.beatsPerBar * 960}
        defaultValue={0}
        onChange={(event) => player.seekTick(Number(event.target.value))}
        className="min-w-16 flex-1 accent-lamp"
      />
      <span className="max-w-56 truncate text-[#b9c1dd] max-wide:hidden">{songTitle}</span>
      {!state.hasSound && <span role="status">No sound here</span>}
    </div>
  );
}
