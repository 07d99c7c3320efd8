import { useEffect, useRef } from "react";
import type { BeatMap } from "../../../../shared/contracts/songs.ts";
import { Icon } from "../../../components/icon.tsx";
import { findSongPlace, presentClock } from "../ribbon/song-place.ts";
import type { ShowPlayer } from "./show-player.ts";
import { SoundPanel } from "./sound-panel.tsx";
import { SpeedChoice } from "./speed-choice.tsx";
import { useTransport } from "./use-transport.ts";

export interface TransportBarProps {
  song: BeatMap;
  player: ShowPlayer;
  onToggle: () => void;
  onToggleLoop: () => void;
}

/** Play, where the song is, loop, speed and volume. */
export function TransportBar({ song, player, onToggle, onToggleLoop }: TransportBarProps) {
  const state = useTransport(player);
  const isOn = state.isPlaying || state.isStarting;
  const goBack = () => player.seekTick(state.isLooping && state.loop ? state.loop.start : 0);
  return (
    <div className="studio-transport-frame">
      <div className="studio-transport studio-card" role="group" aria-label="Play the show">
        <button
          type="button"
          className="studio-quiet-icon studio-back"
          aria-label={state.isLooping ? "Back to the start of the loop" : "Back to the start"}
          onClick={goBack}
        >
          <Icon name="to-start" />
        </button>
        <button
          type="button"
          className="studio-play"
          aria-label={isOn ? "Pause" : "Play"}
          aria-keyshortcuts="Space"
          onClick={onToggle}
        >
          <Icon name={isOn ? "pause" : "play"} className="size-6" />
        </button>
        <SongClock song={song} player={player} />
        <button type="button" className="studio-toggle" aria-pressed={state.isLooping} onClick={onToggleLoop}>
          <Icon name="loop" />
          <span className="studio-toggle-word">Loop</span> <b>{state.isLooping ? "on" : "off"}</b>
        </button>
        <SpeedChoice rate={state.rate} onRate={(rate) => player.transport.setRate(rate)} />
        <SoundPanel transport={player.transport} state={state} />
      </div>
    </div>
  );
}

/** Bar, beat, section and clock; written straight into the page, many times a second. */
function SongClock({ song, player }: { song: BeatMap; player: ShowPlayer }) {
  const ref = useRef<HTMLDivElement>(null);
  useEffect(() => {
    const root = ref.current;
    if (!root) return;
    const slot = (name: string) => root.querySelector<HTMLElement>(`[data-slot=${name}]`);
    const [bar, beat, beads, section, clock] = ["bar", "beat", "beads", "section", "clock"].map(slot);
    const write = (element: HTMLElement | null | undefined, text: string) => {
      if (element && element.textContent !== text) element.textContent = text;
    };
    return player.addView({
      showMoment: ({ tick, seconds, countIn }) => {
        const place = findSongPlace(song, tick);
        write(bar, String(place.bar));
        write(beat, String(place.beat));
        write(section, countIn > 0 ? `count-in ${countIn}` : (song.sections[place.section]?.name ?? "song"));
        write(clock, presentClock(seconds));
        [...(beads?.children ?? [])].forEach((bead, index) => {
          bead.classList.toggle("is-on", index + 1 === place.beat);
          bead.toggleAttribute("hidden", index >= place.beats);
        });
      },
    });
  }, [player, song]);
  const most = Math.min(8, Math.max(...song.bars.map((bar) => bar.beats)));
  return (
    <div ref={ref} className="studio-clock">
      <div className="studio-clock-bar">
        <span>Bar</span> <b data-slot="bar">1</b>
        <span data-slot="beads" className="studio-beads" aria-hidden="true">
          {Array.from({ length: most }, (_, index) => (
            <i key={index} />
          ))}
        </span>
        <span>beat</span> <b data-slot="beat">1</b>
      </div>
      <div className="studio-clock-time">
        <span data-slot="section" /> · <span data-slot="clock">0:00</span> of {presentClock(player.tempo.endSeconds)}
      </div>
    </div>
  );
}
