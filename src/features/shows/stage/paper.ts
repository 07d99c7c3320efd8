import type { Side } from "../../../../shared/contracts/square.ts";
import { SIDES } from "../../../../shared/sides.ts";
import { numbersFrom } from "../../../../sandbox/square/stable-chance.ts";
import { createSurface, type Canvas2D, type Context2D } from "./surface.ts";

/** Red, green and blue, 0 to 255 (sRGB). */
export type Ink = readonly [number, number, number];

/** The sheets the houses are cut from: blues of the same hour. */
const SHEETS: readonly Ink[] = [
  [57, 68, 110],
  [47, 58, 99],
  [67, 75, 115],
  [51, 62, 105],
  [60, 74, 112],
  [71, 76, 114],
  [45, 57, 97],
  [64, 70, 108],
  [54, 68, 107],
  [74, 80, 120],
];
const NIGHT: Ink = [14, 18, 38];
const SKY: Ink = [190, 200, 235];

export const ROOM = "#171c33";

/** The sheet of the house at this place of a side, so that neighbours differ. */
export function sheetOf(side: Side | null, place: number): Ink {
  const turn = side === null ? 0 : SIDES.indexOf(side);
  return SHEETS[(place * 3 + turn * 2) % SHEETS.length] ?? [57, 68, 110];
}

export function mixInk(a: Ink, b: Ink, share: number): Ink {
  return [a[0] + (b[0] - a[0]) * share, a[1] + (b[1] - a[1]) * share, a[2] + (b[2] - a[2]) * share];
}

export function toCss(ink: Ink, alpha = 1): string {
  return `rgba(${Math.round(ink[0])},${Math.round(ink[1])},${Math.round(ink[2])},${alpha})`;
}

/** A sheet's colour turned to the night (below 0) or to the sky (above 0). */
export function shade(ink: Ink, share: number): string {
  return toCss(share < 0 ? mixInk(ink, NIGHT, -share) : mixInk(ink, SKY, share));
}

export interface CutOptions {
  readonly fill: string;
  /** Softness and drop of the shadow, in device pixels: shadows ignore the canvas's scale. */
  readonly blur: number;
  readonly drop: number;
  readonly alpha?: number;
  readonly rule?: CanvasFillRule;
}

/** One layer of cut paper: a filled outline with the shadow that it throws on what lies below. */
export function cutSheet(context: Context2D, path: Path2D, options: CutOptions): void {
  context.save();
  context.shadowColor = `rgba(8,10,26,${options.alpha ?? 0.5})`;
  context.shadowBlur = options.blur;
  context.shadowOffsetY = options.drop;
  context.shadowOffsetX = options.drop * 0.35;
  context.fillStyle = options.fill;
  context.fill(path, options.rule ?? "nonzero");
  context.restore();
}

const GRAIN_SIZE = 192;
let grain: Canvas2D | null = null;

/** The grain of the paper: a tile, made once. */
export function getGrain(): Canvas2D {
  if (grain) return grain;
  const { canvas, context } = createSurface(GRAIN_SIZE, GRAIN_SIZE);
  const next = numbersFrom(5);
  const image = context.createImageData(GRAIN_SIZE, GRAIN_SIZE);
  for (let i = 0; i < image.data.length; i += 4) {
    image.data.fill(next() < 0.5 ? 0 : 255, i, i + 3);
    image.data[i + 3] = 3 + next() * 11;
  }
  context.putImageData(image, 0, 0);
  context.lineWidth = 0.7;
  for (let fibre = 0; fibre < 90; fibre += 1) {
    const x = next() * GRAIN_SIZE;
    const y = next() * GRAIN_SIZE;
    const turn = next() * 2 * Math.PI;
    context.strokeStyle = next() < 0.5 ? "rgba(255,255,255,.05)" : "rgba(0,0,0,.07)";
    context.beginPath();
    context.moveTo(x, y);
    context.quadraticCurveTo(
      x + 5 * Math.cos(turn),
      y + 5 * Math.sin(turn),
      x + 9 * Math.cos(turn + 0.6),
      y + 9 * Math.sin(turn + 0.6),
    );
    context.stroke();
  }
  grain = canvas;
  return canvas;
}

/** Lays the grain over what is drawn so far. */
export function layGrain(
  context: Context2D,
  operation: GlobalCompositeOperation,
  alpha: number,
  box: { readonly x: number; readonly y: number; readonly width: number; readonly height: number },
): void {
  const pattern = context.createPattern(getGrain(), "repeat");
  if (!pattern) return;
  context.save();
  context.globalCompositeOperation = operation;
  context.globalAlpha = alpha;
  context.fillStyle = pattern;
  context.fillRect(box.x, box.y, box.width, box.height);
  context.restore();
}
