import { useEffect, useRef } from "react";
import type { RibbonCells } from "../../sandbox/timeline/ribbon.ts";
import { useElementSize } from "../hooks/use-element-size.ts";
import { useTheme } from "../hooks/use-theme.ts";
import { joinClasses } from "./class-names.ts";
import { queueDrawing } from "./draw-queue.ts";
import { drawRibbon } from "./ribbon-canvas.ts";

export type RibbonSize = "queue" | "row" | "strip" | "card" | "marking" | "reading";

export interface RibbonProps {
  /** From `decodeRibbon` of the picture the server sends; keep it stable (useMemo). Null while there is no timeline: the bare weave is drawn. */
  ribbon: RibbonCells | null;
  /** Title, length and the generated sentence: "Nine Foxes, 2:24, starts dark, busiest in the second chorus". Empty where the same words stand beside it. */
  label: string;
  /** By height: queue 14, row 16, strip 44, card 58, marking 62, reading 120. */
  size?: RibbonSize;
  /** Straight ends, for a ribbon from edge to edge under a stage. */
  isSquare?: boolean;
  /** The moment on screen, 0 to 1 of the song: a line over the cloth. */
  now?: number | null;
  className?: string;
}

const HEIGHTS: Record<RibbonSize, string> = {
  queue: "h-3.5",
  row: "h-4",
  strip: "h-11",
  card: "h-[58px]",
  marking: "h-[62px]",
  reading: "h-[120px]",
};

/** The face of a show: woven cloth in the colours of its lights, fronts as threads, the song from left to right. For reading only. */
export function Ribbon({ ribbon, label, size = "card", isSquare = false, now = null, className }: RibbonProps) {
  const canvasRef = useRef<HTMLCanvasElement>(null);
  const { width, height } = useElementSize(canvasRef);
  const theme = useTheme();

  useEffect(() => {
    const canvas = canvasRef.current;
    if (!canvas || width === 0 || height === 0) return;
    return queueDrawing(() => drawRibbon(canvas, ribbon, { width, height, theme, isSquare }));
  }, [ribbon, width, height, theme, isSquare]);

  return (
    <div className={joinClasses("relative", HEIGHTS[size], className)}>
      <canvas
        ref={canvasRef}
        className="block size-full"
        role={label ? "img" : undefined}
        aria-label={label || undefined}
        aria-hidden={label ? undefined : true}
      />
      {now !== null && (
        <span
          aria-hidden="true"
          className="pointer-events-none absolute inset-y-0 w-0.5 -translate-x-1/2 bg-[#fff7e6] shadow-[0_0_0_1.5px_rgb(10_12_24/0.55)]"
          style={{ left: `${now * 100}%` }}
        />
      )}
    </div>
  );
}
