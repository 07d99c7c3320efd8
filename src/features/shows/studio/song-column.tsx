import { useCallback, useEffect, useMemo, useState } from "react";
import type { Layout } from "../../../../shared/contracts/square.ts";
import { SIDES } from "../../../../shared/sides.ts";
import type { BeatMap } from "../../../../shared/contracts/songs.ts";
import { TICKS_PER_BEAT } from "../../../../shared/units.ts";
import { listFronts, listLights } from "../../../../sandbox/square/lights.ts";
import type { Timeline } from "../../../../sandbox/timeline/model.ts";
import { useMediaQuery } from "../../../hooks/use-media-query.ts";
import { LargeRibbon } from "../ribbon/large-ribbon.tsx";
import { followTickInView, wholeSong } from "../ribbon/ribbon-view.ts";
import { findSongPlace, nearestBarLine, type TickLoop } from "../ribbon/song-place.ts";
import { presentLitLight } from "./lit-light.ts";
import { findRibbonTimeline, type RunState } from "./run-model.ts";
import type { ShowPlayer } from "./show-player.ts";
import { useRibbonCells, type ShowPictures } from "./use-show-pictures.ts";
import { StageWindow, type StageWindowProps } from "./stage-window.tsx";
import { TransportBar } from "./transport-bar.tsx";
import { useTransport } from "./use-transport.ts";

/** Columns of the large ribbon: about one for two pixels on a laptop. */
const RIBBON_COLUMNS = 340;

export interface SongColumnProps extends StageWindowProps {
  song: BeatMap;
  run: RunState;
  drawRibbon: ShowPictures["drawRibbon"];
}

/** The stage, the transport and the ribbon, one under the other. */
export function SongColumn({ song, run, drawRibbon, ...stage }: SongColumnProps) {
  const { layout, player } = stage;
  const transport = useTransport(player);
  const timeline = findRibbonTimeline(run);
  const [view, setView] = useState<TickLoop>(() => wholeSong(song));
  // Wherever the playhead goes, by playing or by a key, the ribbon shows it.
  useEffect(() => {
    let seen = -1;
    return player.addView({
      showMoment: ({ tick }) => {
        if (tick !== seen) setView((shown) => followTickInView(shown, song, tick));
        seen = tick;
      },
    });
  }, [player, song]);
  const size = useMemo(() => ({ rows: layout.fronts.length, columns: RIBBON_COLUMNS, stretch: view }), [layout, view]);
  const cells = useRibbonCells(timeline, drawRibbon, size);
  const bands = useMemo(() => listBands(layout), [layout]);
  const section = usePlayingSection(player, song);
  const thread = useThread();
  const followTick = useCallback(
    (show: (tick: number) => void) => player.addView({ showMoment: ({ tick }) => show(tick) }),
    [player],
  );
  const fronts = useMemo(() => listFronts(layout), [layout]);
  const lights = useMemo(() => listLights(layout), [layout]);
  const describeAt = (row: number, tick: number): string | null => {
    const front = fronts[row];
    const lit =
      front &&
      player.readLight(
        front.lights.flatMap((index) => lights[index] ?? []),
        tick,
      );
    if (!front) return null;
    return lit
      ? `${front.front.name}, ${presentLitLight(lit)}${lit.line === null ? "" : ` · line ${lit.line}`}`
      : `${front.front.name}, dark`;
  };
  const toggleLoop = () => {
    const { loop, isLooping } = player.transport.state;
    player.transport.setLoop(loop ?? loopAround(song, player.tick), !isLooping);
  };
  return (
    <section className="studio-song" aria-label="Square and song">
      <StageWindow {...stage} />
      <TransportBar song={song} player={player} onToggle={() => player.transport.toggle()} onToggleLoop={toggleLoop} />
      <div className="studio-ribbon studio-card" role="group" aria-label="Ribbon of the show">
        <LargeRibbon
          song={song}
          view={view}
          onView={setView}
          describeAt={describeAt}
          cells={cells}
          bands={bands}
          thread={thread}
          stoppedAt={timeline && !timeline.isComplete ? findStop(timeline) : null}
          loop={transport.loop}
          isLooping={transport.isLooping}
          followTick={followTick}
          onSeek={(tick) => player.seekTick(tick)}
          onLoop={(loop) => player.transport.setLoop(loop, true)}
          section={section}
        />
      </div>
    </section>
  );
}

/** Index of the section that is playing; renders again only when it changes. */
function usePlayingSection(player: ShowPlayer, song: BeatMap): number {
  const [section, setSection] = useState(0);
  useEffect(
    () => player.addView({ showMoment: ({ tick }) => setSection(findSongPlace(song, tick).section) }),
    [player, song],
  );
  return section;
}

/** CSS pixels of a ribbon row, by the room there is. */
function useThread(): number {
  const isPhone = useMediaQuery("(max-width: 559px)");
  const isLow = useMediaQuery("(max-height: 640px)");
  const isTall = useMediaQuery("(min-height: 860px) and (min-width: 900px)");
  return isPhone ? 1.2 : isLow ? 2 : isTall ? 4 : 3;
}

function listBands(layout: Layout): { name: string; rows: number }[] {
  const rowsOf = (side: string | null) => layout.fronts.filter((front) => front.side === side).length;
  return [
    ...SIDES.map((side) => ({ name: side.charAt(0).toUpperCase() + side.slice(1), rows: rowsOf(side) })),
    { name: "Tree", rows: rowsOf(null) },
  ].filter((band) => band.rows > 0);
}

/** The section that plays at a tick, else the eight bars around it. */
function loopAround(song: BeatMap, tick: number): TickLoop {
  const section = song.sections[findSongPlace(song, tick).section];
  if (section)
    return { start: Math.round(section.start * TICKS_PER_BEAT), end: Math.round(section.end * TICKS_PER_BEAT) };
  const end = (song.beats.length - 1) * TICKS_PER_BEAT;
  const bars = 8 * song.beatsPerBar * TICKS_PER_BEAT;
  const start = nearestBarLine(song, Math.max(0, tick - bars / 2));
  return { start, end: nearestBarLine(song, Math.min(end, start + bars)) };
}

function findStop({ cues }: Timeline): number {
  return cues.count > 0 ? (cues.tick[cues.count - 1] ?? 0) : 0;
}
