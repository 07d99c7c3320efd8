import type { RibbonCells } from "../../sandbox/timeline/ribbon.ts";
import type { Theme } from "../lib/theme.ts";

export interface RibbonLook {
  /** Device pixels. */
  width: number;
  height: number;
  /** Device pixels per CSS pixel. */
  ratio: number;
  theme: Theme;
  /** Straight ends, for a ribbon that runs under a stage from edge to edge. */
  isSquare: boolean;
  /** Threads in the height; more detail than the size can show is averaged. */
  threads: number;
}

interface Weave {
  ground: string;
  under: string;
  over: string;
  lip: string;
}

const WEAVES: Record<Theme, Weave> = {
  light: { ground: "#151a2e", under: "#212947", over: "#262f52", lip: "rgb(255 255 255 / 0.08)" },
  dark: { ground: "#151a2e", under: "#262f53", over: "#2c365e", lip: "rgb(255 255 255 / 0.1)" },
};
/** Under this height a ribbon is a face, not a chart: thinner threads, no lip. */
const FACE_HEIGHT_PX = 34;
const FACE_STITCH_PX = 2.5;
const STITCH_PX = 4;
const TOOTH_PX = 5;
const MIN_STITCHES = 12;

/** How many threads a ribbon of this height (CSS pixels) shows. */
export function threadsFor(heightPx: number): number {
  if (heightPx < 22) return 4;
  if (heightPx < FACE_HEIGHT_PX) return 6;
  if (heightPx < 62) return 10;
  return heightPx < 110 ? 20 : 40;
}

/** One stitch: the mean of the cells it covers, colour weighted by strength. Strength 0 to 1. */
export function meanCell(ribbon: RibbonCells, rowFrom: number, rowTo: number, columnFrom: number, columnTo: number): [red: number, green: number, blue: number, strength: number] {
  const top = Math.floor(rowFrom);
  const bottom = Math.max(top + 1, Math.ceil(rowTo));
  const left = Math.floor(columnFrom);
  const right = Math.max(left + 1, Math.ceil(columnTo));
  let red = 0;
  let green = 0;
  let blue = 0;
  let weight = 0;
  let count = 0;
  for (let row = top; row < bottom && row < ribbon.rows; row++) {
    for (let column = left; column < right && column < ribbon.columns; column++) {
      const at = (row * ribbon.columns + column) * 4;
      const strength = ribbon.cells[at + 3] ?? 0;
      red += (ribbon.cells[at] ?? 0) * strength;
      green += (ribbon.cells[at + 1] ?? 0) * strength;
      blue += (ribbon.cells[at + 2] ?? 0) * strength;
      weight += strength;
      count += 1;
    }
  }
  if (weight === 0 || count === 0) return [0, 0, 0, 0];
  return [Math.round(red / weight), Math.round(green / weight), Math.round(blue / weight), weight / count / 255];
}

function tracePinkedEdge(pen: CanvasRenderingContext2D, width: number, height: number, tooth: number) {
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

/**
 * Draws a ribbon over the whole canvas: bare weave where it is dark, every second stitch lying over its
 * neighbours (taller, with a light lip). Null draws the bare weave. All edges fall on device pixels.
 * Cost: one fill or two a stitch, about 600 stitches on a card, 12,000 at the full reading size.
 */
export function drawRibbon(pen: CanvasRenderingContext2D, ribbon: RibbonCells | null, look: RibbonLook) {
  const { width, height, ratio, isSquare, threads } = look;
  const weave = WEAVES[look.theme];
  const isFace = height / ratio < FACE_HEIGHT_PX;
  const stitches = Math.max(MIN_STITCHES, Math.round(width / ratio / (isFace ? FACE_STITCH_PX : STITCH_PX)));
  const gap = Math.max(1, Math.round(ratio * (height / threads / ratio > 4 ? 1 : 0.5)));
  pen.save();
  pen.clearRect(0, 0, width, height);
  if (!isSquare) {
    tracePinkedEdge(pen, width, height, Math.min(TOOTH_PX * ratio, height / 6));
    pen.clip();
  }
  pen.fillStyle = weave.ground;
  pen.fillRect(0, 0, width, height);

  for (let thread = 0; thread < threads; thread++) {
    const top = Math.round((thread * height) / threads);
    const threadHeight = Math.round(((thread + 1) * height) / threads) - top - gap;
    const inset = threadHeight > 3 * ratio ? Math.max(1, Math.round(threadHeight * 0.08)) : 0;
    for (let stitch = 0; stitch < stitches; stitch++) {
      const left = Math.round((stitch * width) / stitches);
      const stitchWidth = Math.round(((stitch + 1) * width) / stitches) - left;
      const isOver = (thread + stitch) % 2 === 1;
      pen.fillStyle = isOver ? weave.over : weave.under;
      pen.fillRect(left, top, stitchWidth, threadHeight);
      if (ribbon) {
        const [red, green, blue, strength] = meanCell(
          ribbon,
          (thread * ribbon.rows) / threads,
          ((thread + 1) * ribbon.rows) / threads,
          (stitch * ribbon.columns) / stitches,
          ((stitch + 1) * ribbon.columns) / stitches,
        );
        if (strength > 0.02) {
          pen.globalAlpha = isOver ? strength : strength * 0.86;
          pen.fillStyle = `rgb(${red} ${green} ${blue})`;
          pen.fillRect(left, isOver ? top : top + inset, stitchWidth, isOver ? threadHeight : threadHeight - 2 * inset);
          pen.globalAlpha = 1;
        }
      }
      if (isOver && threadHeight > 3 * ratio) {
        pen.fillStyle = weave.lip;
        pen.fillRect(left, top, stitchWidth, Math.max(1, Math.round(ratio)));
      }
    }
  }
  pen.restore();
}
