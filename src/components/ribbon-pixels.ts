import type { RibbonCells } from "../../sandbox/timeline/ribbon.ts";
import type { Theme } from "../lib/theme.ts";

/** How a ribbon is woven into a picture of `width` by `height` device pixels. */
export interface RibbonLook {
  width: number;
  height: number;
  /** Device pixels per CSS pixel. */
  ratio: number;
  theme: Theme;
}

type Rgb = readonly [red: number, green: number, blue: number];
/** A stitch's mean colour, 0 to 255, and its strength, 0 to 1. */
export type Stitch = readonly [red: number, green: number, blue: number, strength: number];

const GROUND: Rgb = [21, 26, 46];
/** Bare threads: lying under and over their neighbours. The dark theme's are one step lighter, or they vanish on its cards. */
const BARE: Record<Theme, { under: Rgb; over: Rgb }> = {
  light: { under: [33, 41, 71], over: [38, 47, 82] },
  dark: { under: [38, 47, 83], over: [44, 54, 94] },
};
const UNDER_STRENGTH = 0.86;
const LIP_STRENGTH = 0.1;
const LIP_FROM_PX = 3;
const UNDER_INSET = 0.07;
/** Under this height a ribbon is a face, not a chart. */
const FACE_HEIGHT_PX = 34;
const FACE_STITCH_PX = 2.5;
const STITCH_PX = 4;
const MIN_STITCHES = 12;

/** How many threads a ribbon of this height (CSS pixels) shows; more fronts than threads are averaged. */
export function threadsFor(heightPx: number): number {
  if (heightPx < 22) return 4;
  if (heightPx < FACE_HEIGHT_PX) return 6;
  if (heightPx < 61) return 10;
  return heightPx < 110 ? 20 : 40;
}

/** The mean of the cells from one row and column up to another (cells partly covered count whole), colour weighted by strength. */
export function meanCell(
  ribbon: RibbonCells,
  from: { row: number; column: number },
  to: { row: number; column: number },
): Stitch {
  const top = Math.floor(from.row);
  const left = Math.floor(from.column);
  const bottom = Math.min(ribbon.rows, Math.max(top + 1, Math.ceil(to.row)));
  const right = Math.min(ribbon.columns, Math.max(left + 1, Math.ceil(to.column)));
  let [red, green, blue, weight] = [0, 0, 0, 0];
  for (let row = top; row < bottom; row++) {
    for (let at = (row * ribbon.columns + left) * 4, end = (row * ribbon.columns + right) * 4; at < end; at += 4) {
      const strength = ribbon.cells[at + 3] ?? 0;
      red += (ribbon.cells[at] ?? 0) * strength;
      green += (ribbon.cells[at + 1] ?? 0) * strength;
      blue += (ribbon.cells[at + 2] ?? 0) * strength;
      weight += strength;
    }
  }
  if (weight === 0) return [0, 0, 0, 0];
  return [red / weight, green / weight, blue / weight, weight / ((bottom - top) * (right - left) * 255)];
}

/** Colour `top` laid over `base` with the given strength. */
function layOver(base: Rgb, top: Rgb, strength: number): Rgb {
  const mix = (below: number, above: number) => below + (above - below) * strength;
  return [mix(base[0], top[0]), mix(base[1], top[1]), mix(base[2], top[2])];
}

/**
 * Weaves a ribbon into opaque pixels, four bytes each, fresh: bare threads where it is dark, every
 * second stitch lying over its neighbours (taller, with a light lip). Null weaves it all bare. Every edge
 * falls on a device pixel. Straight ends: the teeth are cut on the canvas. Written pixel by pixel,
 * since thousands of fill calls a ribbon cost ten times as much.
 */
export function weaveRibbon(
  ribbon: RibbonCells | null,
  { width, height, ratio, theme }: RibbonLook,
): Uint8ClampedArray<ArrayBuffer> {
  const pixels = new Uint8ClampedArray(width * height * 4);
  const heightPx = height / ratio;
  const threads = Math.min(threadsFor(heightPx), height);
  const stitchPx = heightPx < FACE_HEIGHT_PX ? FACE_STITCH_PX : STITCH_PX;
  const stitches = Math.min(width, Math.max(MIN_STITCHES, Math.round(width / ratio / stitchPx)));
  const bare = BARE[theme];
  const fill = (left: number, top: number, right: number, bottom: number, [red, green, blue]: Rgb) => {
    for (let y = top; y < bottom; y++) {
      for (let at = (y * width + left) * 4, end = (y * width + right) * 4; at < end; at += 4) {
        pixels[at] = red;
        pixels[at + 1] = green;
        pixels[at + 2] = blue;
        pixels[at + 3] = 255;
      }
    }
  };
  for (let thread = 0; thread < threads; thread++) {
    const top = Math.round((thread * height) / threads);
    const end = Math.round(((thread + 1) * height) / threads);
    const isThick = (end - top) / ratio > 4;
    const bottom = end - Math.max(1, Math.round(ratio * (isThick ? 1 : 0.5)));
    const inset = isThick ? Math.max(1, Math.round((bottom - top) * UNDER_INSET)) : 0;
    for (let stitch = 0; stitch < stitches; stitch++) {
      const left = Math.round((stitch * width) / stitches);
      const right = Math.round(((stitch + 1) * width) / stitches);
      const isOver = (thread + stitch) % 2 === 1;
      const bareThread = isOver ? bare.over : bare.under;
      const [red, green, blue, strength] = ribbon
        ? meanCell(
            ribbon,
            { row: (thread * ribbon.rows) / threads, column: (stitch * ribbon.columns) / stitches },
            { row: ((thread + 1) * ribbon.rows) / threads, column: ((stitch + 1) * ribbon.columns) / stitches },
          )
        : [0, 0, 0, 0];
      const lit = layOver(bareThread, [red, green, blue], isOver ? strength : strength * UNDER_STRENGTH);
      // The gap between two threads; where threads are thin it is half a pixel, so half its strength.
      fill(left, bottom, right, end, isThick || ratio > 1 ? GROUND : layOver(GROUND, lit, 0.5));
      fill(left, top, right, bottom, isOver ? lit : bareThread);
      if (!isOver) fill(left, top + inset, right, bottom - inset, lit);
      if (isOver && (bottom - top) / ratio > LIP_FROM_PX)
        fill(left, top, right, top + Math.max(1, Math.round(ratio)), layOver(lit, [255, 255, 255], LIP_STRENGTH));
    }
  }
  return pixels;
}
