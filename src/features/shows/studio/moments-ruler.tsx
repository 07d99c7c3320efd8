import { useEffect, useState } from "react";
import type { BeatMap } from "../../../../shared/contracts/songs.ts";
import { TICKS_PER_BEAT } from "../../../../shared/units.ts";
import { findSongPlace } from "../ribbon/song-place.ts";
import { findBeatOfBar, listMomentCodes } from "./moment-code.ts";
import type { ShowPlayer } from "./show-player.ts";

export interface MomentsRulerProps {
  song: BeatMap;
  player: ShowPlayer;
  onInsert: (code: string) => void;
}

/** The song as a ruler of bars and beats: a press goes there, and the ways to write that moment stand below. */
export function MomentsRuler({ song, player, onInsert }: MomentsRulerProps) {
  const { bar, beat, beats } = usePlace(song, player);
  const goTo = (toBar: number, toBeat: number) => player.seekTick(findBeatOfBar(song, toBar, toBeat) * TICKS_PER_BEAT);
  return (
    <div className="studio-ruler">
      <div className="studio-ruler-bars" role="group" aria-label="Bars of the song">
        {listGroups(song).map((group) => (
          <div key={group.bars[0]} className="studio-ruler-group">
            <span aria-hidden="true">{group.name ?? "·"}</span>
            <div>
              {group.bars.map((number) => (
                <button
                  key={number}
                  type="button"
                  className="studio-ruler-bar"
                  aria-label={`Bar ${number}${group.name ? `, ${group.name}` : ""}`}
                  aria-pressed={number === bar}
                  onClick={() => goTo(number, 1)}
                >
                  {number}
                </button>
              ))}
            </div>
          </div>
        ))}
      </div>
      <p className="studio-ruler-beats" role="group" aria-label={`Beats of bar ${bar}`}>
        <span>
          <b>Bar {bar}</b>, beat
        </span>
        {Array.from({ length: beats }, (_, index) => (
          <button
            key={index}
            type="button"
            className="studio-chip"
            aria-label={`Beat ${index + 1} of bar ${bar}`}
            aria-pressed={index + 1 === beat}
            onClick={() => goTo(bar, index + 1)}
          >
            {index + 1}
          </button>
        ))}
      </p>
      <ul className="studio-names-list" aria-label="Ways to write this moment">
        {listMomentCodes(song, bar, beat).map(({ code, meaning }) => (
          <li key={code}>
            <button type="button" onClick={() => onInsert(code)}>
              <span className="sr-only">Put in </span>
              <code>{code.replace(/\s+\n?\}/, " ... }")}</code>
              <span>{meaning}</span>
            </button>
          </li>
        ))}
      </ul>
    </div>
  );
}

/** Bar and beat of the playhead; renders again when one of them changes. */
function usePlace(song: BeatMap, player: ShowPlayer) {
  const [place, setPlace] = useState(() => findSongPlace(song, player.tick));
  useEffect(
    () =>
      player.addView({
        showMoment: ({ tick }) => {
          const next = findSongPlace(song, tick);
          setPlace((shown) => (shown.bar === next.bar && shown.beat === next.beat ? shown : next));
        },
      }),
    [player, song],
  );
  return place;
}

interface BarGroup {
  readonly name: string | null;
  readonly bars: readonly number[];
}

/** Bars by the section in which they begin; those between sections by themselves. */
function listGroups(song: BeatMap): readonly BarGroup[] {
  const groups: { name: string | null; section: number; bars: number[] }[] = [];
  for (const { number, start } of song.bars) {
    const { section } = findSongPlace(song, Math.round(start * TICKS_PER_BEAT));
    const last = groups.at(-1);
    if (last?.section === section) last.bars.push(number);
    else groups.push({ name: song.sections[section]?.name ?? null, section, bars: [number] });
  }
  return groups;
}
