import { useEffect, useMemo, useRef, useState, type PointerEvent, type RefObject } from "react";
import type { BeatMap } from "../../../../shared/contracts/songs.ts";
import type { RibbonCells } from "../../../../sandbox/timeline/ribbon.ts";
import { useElementSize } from "../../../hooks/use-element-size.ts";
import { useTheme } from "../../../hooks/use-theme.ts";
import { LoopEdge } from "./loop-edge.tsx";
import { Playhead } from "./playhead.tsx";
import { RibbonBars } from "./ribbon-bars.tsx";
import { RibbonFlags } from "./ribbon-flags.tsx";
import { keepInside, zoomView } from "./ribbon-view.ts";
import { RibbonTip, type TipPlace } from "./ribbon-tip.tsx";
import { RibbonZoom } from "./ribbon-zoom.tsx";
import { toTick, toX, type RibbonScale } from "./ribbon-scale.ts";
import { nearestBarLine, type TickLoop } from "./song-place.ts";
import "./large-ribbon.css";
import { drawCloth, listRowSpans } from "./weave-cloth.ts";

/** Width of the swallowtail at either end, in CSS pixels. */
const TAIL = 14;
const BAND_GAP = 3;
/** A press that moves less than this, in CSS pixels, goes to a moment; more marks a stretch. */
const LEAST_DRAG = 8;

export interface LargeRibbonProps {
  song: BeatMap;
  /** The stretch of the song that is shown. */
  view: TickLoop;
  onView: (view: TickLoop) => void;
  /** A row a front, columns over the view; null while there is nothing to show. */
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
  /** What a row shows at a moment, in a few words, for the pointer; null where all is dark. */
  describeAt: (row: number, tick: number) => string | null;
  /** Which section is playing, for its flag. */
  section: number;
}

/** The ribbon under the stage: the whole song as cloth, flags of its sections, bar numbers, the playhead's lantern. */
export function LargeRibbon(props: LargeRibbonProps) {
  const { song, view, onView, cells, bands, thread, stoppedAt, loop, isLooping, followTick, onSeek, onLoop, section } =
    props;
  const clothRef = useRef<HTMLDivElement>(null);
  const canvasRef = useRef<HTMLCanvasElement>(null);
  const { width } = useElementSize(clothRef);
  const theme = useTheme();
  const rows = bands.reduce((sum, band) => sum + band.rows, 0);
  const gap = thread < 1.5 ? 0 : BAND_GAP;
  const height = Math.round(thread * rows + gap * (bands.length - 1));
  const scale = useMemo<RibbonScale>(
    () => ({ width, tail: TAIL, startTick: view.start, endTick: view.end }),
    [width, view],
  );
  const [tip, setTip] = useState<TipPlace | null>(null);
  const [drag, setDrag] = useState<{ readonly from: number; readonly to: number } | null>(null);

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

  useWheel(clothRef, (event, x) => {
    if (event.ctrlKey) onView(zoomView(view, song, { way: event.deltaY < 0 ? "in" : "out", around: toTick(scale, x) }));
    else if (event.deltaX !== 0 || event.shiftKey) {
      const by = ((event.deltaX || event.deltaY) / Math.max(1, width)) * (view.end - view.start);
      onView(keepInside({ start: view.start + by, end: view.end + by }, song));
    } else return false;
    return true;
  });

  const placeOf = (event: { clientX: number; clientY: number; currentTarget: Element }) => {
    const box = event.currentTarget.getBoundingClientRect();
    return { x: event.clientX - box.left, y: event.clientY - box.top };
  };
  const handleDown = (event: PointerEvent<HTMLDivElement>) => {
    if (event.button !== 0 || (event.target instanceof Element && event.target.closest("[role=slider]"))) return;
    event.currentTarget.setPointerCapture(event.pointerId);
    const { x } = placeOf(event);
    setDrag({ from: x, to: x });
  };
  const handleMove = (event: PointerEvent<HTMLDivElement>) => {
    const { x, y } = placeOf(event);
    if (drag) setDrag({ ...drag, to: x });
    if (event.pointerType === "touch") return;
    const row = listRowSpans({ height, gap, bands: bands.map((band) => band.rows) }).findIndex(
      (span) => y >= span.top && y < span.bottom,
    );
    const tick = toTick(scale, x);
    setTip(row < 0 || drag ? null : { x, row, tick, words: props.describeAt(row, tick) });
  };
  const handleUp = (event: PointerEvent<HTMLDivElement>) => {
    if (!drag) return;
    setDrag(null);
    const { x } = placeOf(event);
    if (Math.abs(x - drag.from) < LEAST_DRAG) return onSeek(toTick(scale, x));
    const stretch = toStretch(song, scale, drag.from, x);
    if (stretch) onLoop(stretch);
  };
  const marked =
    drag && Math.abs(drag.to - drag.from) >= LEAST_DRAG ? toStretch(song, scale, drag.from, drag.to) : null;
  const veil = marked ?? (isLooping && loop ? loop : null);

  return (
    <div className="large-ribbon">
      <RibbonZoom song={song} view={view} onView={onView} followTick={followTick} />
      <RibbonFlags song={song} scale={scale} playing={section} onSeek={onSeek} />
      <div className="large-ribbon-names" aria-hidden="true">
        {bands.map((band) => (
          <span key={band.name} style={{ flexGrow: band.rows }}>
            {band.rows > 3 ? band.name : ""}
          </span>
        ))}
      </div>
      <div
        ref={clothRef}
        className="large-ribbon-cloth"
        onPointerDown={handleDown}
        onPointerMove={handleMove}
        onPointerUp={handleUp}
        onPointerCancel={() => setDrag(null)}
        onPointerLeave={() => setTip(null)}
      >
        <canvas
          ref={canvasRef}
          style={{ width, height }}
          role="img"
          aria-label={`Ribbon: ${rows} rows, one for each front, in the colours the lights have over the song. Drag over it to loop a stretch; with Control the wheel zooms.`}
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
        {tip && <RibbonTip place={tip} song={song} width={width} />}
      </div>
      <RibbonBars song={song} scale={scale} loop={veil} />
    </div>
  );
}

/** The bars between two places, whole; null when that is less than one. */
function toStretch(song: BeatMap, scale: RibbonScale, from: number, to: number): TickLoop | null {
  const [start, end] = [Math.min(from, to), Math.max(from, to)].map((x) => nearestBarLine(song, toTick(scale, x)));
  return start !== undefined && end !== undefined && start < end ? { start, end } : null;
}

/** Hears the wheel over an element with the place in pixels from its left edge; what it answers with true is not done by the page as well. */
function useWheel(ref: RefObject<HTMLElement | null>, onWheel: (event: WheelEvent, x: number) => boolean): void {
  const handler = useRef(onWheel);
  useEffect(() => {
    handler.current = onWheel;
  });
  useEffect(() => {
    const element = ref.current;
    if (!element) return;
    const handleWheel = (event: WheelEvent) => {
      if (handler.current(event, event.clientX - element.getBoundingClientRect().left)) event.preventDefault();
    };
    // React's own listener is passive: the page would zoom too.
    element.addEventListener("wheel", handleWheel, { passive: false });
    return () => element.removeEventListener("wheel", handleWheel);
  }, [ref]);
}
