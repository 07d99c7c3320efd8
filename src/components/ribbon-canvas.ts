import type { RibbonCells } from "../../sandbox/timeline/ribbon.ts";
import type { Theme } from "../lib/theme.ts";
import { weaveRibbon } from "./ribbon-pixels.ts";

const TOOTH_PX = 5;
const MAX_PIXEL_RATIO = 3;

export interface RibbonDrawing {
  /** CSS pixels. */
  width: number;
  height: number;
  theme: Theme;
  /** Straight ends, for a ribbon that runs under a stage from edge to edge. */
  isSquare: boolean;
}

/** Traces the outline of a strip with pinked ends. */
function tracePinked(pen: CanvasRenderingContext2D, width: number, height: number, tooth: number) {
  const teeth = Math.max(2, Math.round(height / (tooth * 2)));
  const step = height / teeth;
  pen.beginPath();
  pen.moveTo(0, 0);
  pen.lineTo(width, 0);
  for (let i = 0; i < teeth; i++) {
    pen.lineTo(width - tooth, (i + 0.5) * step);
    pen.lineTo(width, (i + 1) * step);
  }
  pen.lineTo(0, height);
  for (let i = teeth - 1; i >= 0; i--) {
    pen.lineTo(tooth, (i + 0.5) * step);
    pen.lineTo(0, i * step);
  }
  pen.closePath();
}

/** Draws a ribbon over the whole canvas at the screen's own resolution and cuts its ends. */
export function drawRibbon(
  canvas: HTMLCanvasElement,
  ribbon: RibbonCells | null,
  { width, height, theme, isSquare }: RibbonDrawing,
) {
  const ratio = Math.min(MAX_PIXEL_RATIO, window.devicePixelRatio || 1);
  canvas.width = Math.max(1, Math.round(width * ratio));
  canvas.height = Math.max(1, Math.round(height * ratio));
  const pen = canvas.getContext("2d");
  if (!pen) return;
  const pixels = weaveRibbon(ribbon, { width: canvas.width, height: canvas.height, ratio, theme });
  pen.putImageData(new ImageData(pixels, canvas.width, canvas.height), 0, 0);
  if (isSquare) return;
  tracePinked(pen, canvas.width, canvas.height, Math.min(TOOTH_PX * ratio, canvas.height / 6));
  pen.globalCompositeOperation = "destination-in";
  pen.fill();
}
