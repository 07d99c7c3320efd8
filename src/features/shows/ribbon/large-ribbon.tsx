import { useEffect, useMemo, useRef, type PointerEvent } from "react";
import type { BeatMap } from "../../../../shared/contracts/songs.ts";
import { TICKS_PER_BEAT } from "../../../../shared/units.ts";
import type { RibbonCells } from "../../../../sandbox/timeline/ribbon.ts";
import { useElementSize } from "../../../hooks/use-element-size.ts";
import { useTheme } from "../../../hooks/use-theme.ts";
import { LoopEdge } from "./loop-edge.tsx";
import { Playhead } from "./playhead.tsx";
import { RibbonBars } from "./ribbon-bars.tsx";
import { RibbonFlags } from "./ribbon-flags.tsx";
import { toTick, toX, type RibbonScale } from "./ribbon-scale.ts";
import type { TickLoop } from "./song-place.ts";
import "./large-ribbon.css";
import { drawCloth } from "./weave-cloth.ts";

/** Width of the swallowtail at either end, in CSS pixels. */
const TAIL = 14;
const BAND_GAP = 3;

export interface LargeRibbonProps {
  song: BeatMap;
  /** A row a front; null while there is nothing to show. */
  cells: RibbonCells | null;
  /** Rows of each band with its name: the sides of the square, what stands free. */
  bands: readonly { readonly name: string; readonly rows: number }[];
  /** CSS pixels of a row. */
  thread: number;
  /** Where the script stopped, in ticks; the ribbon ends there and says so. Null: the run was whole. */
  stoppedAt: number | null;
  loop: TickLoop | null;
  isLooping: boolean;
  /** Calls back with the tick of every moment shown; gives back how to stop. */
  followTick: (show: (tick: number) => void) => () => void;
  onSeek: (tick: number) => void;
  onLoop: (loop: TickLoop) => void;
  /** Which section is playing, for its flag. */
  section: number;
}

/** The ribbon under the stage: the whole song as cloth, flags of its sections, bar numbers, the playhead's lantern. */
export function LargeRibbon(props: LargeRibbonProps) {
  const { song, cells, bands, thread, stoppedAt, loop, isLooping, followTick, onSeek, onLoop, section } = props;
  const clothRef = useRef<HTMLDivElement>(null);
  const canvasRef = useRef<HTMLCanvasElement>(null);
  const { width } = useElementSize(clothRef);
  const theme = useTheme();
  const rows = bands.reduce((sum, band) => sum + band.rows, 0);
  const gap = thread < 1.5 ? 0 : BAND_GAP;
  const height = Math.round(thread * rows + gap * (bands.length - 1));
  const endTick = (song.beats.length - 1) * TICKS_PER_BEAT;
  const scale = useMemo<RibbonScale>(() => ({ width, tail: TAIL, endTick }), [width, endTick]);

  useEffect(() => {
    const canvas = canvasRef.current;
    if (!canvas || width === 0) return;
    const ratio = Math.min(2, window.devicePixelRatio || 1);
    drawCloth(canvas, cells, {
      width: Math.round(width * ratio),
      height: Math.round(height * ratio),
      tail: TAIL * ratio,
      gap: gap * ratio,
      bands: bands.map((band) => band.rows),
      ratio,
      theme,
    });
  }, [cells, width, height, gap, bands, theme]);

  const handlePointer = (event: PointerEvent<HTMLDivElement>) => {
    if (event.target instanceof Element && event.target.closest("[role=slider]")) return;
    onSeek(toTick(scale, event.clientX - event.currentTarget.getBoundingClientRect().left));
  };
  const veil = isLooping && loop ? loop : null;

  return (
    <div className="large-ribbon">
      <RibbonFlags song={song} scale={scale} playing={section} onSeek={onSeek} />
      <div className="large-ribbon-names" aria-hidden="true">
        {bands.map((band) => (
          <span key={band.name} style={{ flexGrow: band.rows }}>
            {band.rows > 3 ? band.name : ""}
          </span>
        ))}
      </div>
      <div ref={clothRef} className="large-ribbon-cloth" onPointerDown={handlePointer}>
        <canvas
          ref={canvasRef}
          style={{ width, height }}
          role="img"
          aria-label={`Ribbon: ${rows} rows, one for each front, in the colours the lights have over ${song.bars.length} bars`}
        />
        {stoppedAt !== null && (
          <div className="large-ribbon-stopped" style={{ left: toX(scale, stoppedAt), right: TAIL }}>
            <span>not written yet</span>
          </div>
        )}
        {veil && (
          <>
            <div className="large-ribbon-veil" style={{ left: 0, width: toX(scale, veil.start) }} />
            <div className="large-ribbon-veil" style={{ left: toX(scale, veil.end), right: 0 }} />
            <LoopEdge end="start" song={song} scale={scale} loop={veil} onLoop={onLoop} />
            <LoopEdge end="end" song={song} scale={scale} loop={veil} onLoop={onLoop} />
          </>
        )}
        <Playhead song={song} scale={scale} followTick={followTick} onSeek={onSeek} />
      </div>
      <RibbonBars song={song} scale={scale} loop={veil} />
    </div>
  );
}
