import type { RibbonCells } from "../../../../sandbox/timeline/ribbon.ts";
import type { Theme } from "../../../lib/theme.ts";

/** How the cloth is woven: sizes in device pixels. */
export interface ClothLook {
  readonly width: number;
  readonly height: number;
  /** Width of the cut ends. */
  readonly tail: number;
  /** Height of the gap between two bands (sides of the square). */
  readonly gap: number;
  /** Rows of each band, top to bottom; together the rows of the ribbon. */
  readonly bands: readonly number[];
  /** Device pixels of a CSS pixel: the weave has threads two CSS pixels wide. */
  readonly ratio: number;
  readonly theme: Theme;
}

/** A bare thread; one step lighter in the dark theme, or the cloth would vanish on its card. */
const THREADS = { light: [44, 52, 86], dark: [56, 66, 106] } as const;

/** Where each row of the cloth lies: its first and past-the-last device pixel. */
export function listRowSpans({
  height,
  gap,
  bands,
}: Pick<ClothLook, "height" | "gap" | "bands">): { top: number; bottom: number }[] {
  const rows = bands.reduce((sum, band) => sum + band, 0);
  const thread = (height - gap * (bands.length - 1)) / Math.max(1, rows);
  let row = 0;
  return bands.flatMap((band, index) =>
    Array.from({ length: band }, () => {
      const top = Math.round(row * thread + index * gap);
      row += 1;
      return { top, bottom: Math.round(row * thread + index * gap) };
    }),
  );
}

/**
 * Weaves a ribbon into pixels, four bytes each: a row a thread, every other warp thread passing over
 * it, lit colours mixed over the bare thread. Gaps between bands are transparent. Null is all bare.
 */
export function weaveCloth(ribbon: RibbonCells | null, look: ClothLook): Uint8ClampedArray<ArrayBuffer> {
  const { width, height, tail, ratio } = look;
  const thread = THREADS[look.theme];
  const pixels = new Uint8ClampedArray(width * height * 4);
  const inner = Math.max(1, width - 2 * tail);
  listRowSpans(look).forEach(({ top, bottom }, row) => {
    for (let x = 0; x < width; x += 1) {
      const share = (x - tail) / inner;
      const cell =
        ribbon && share >= 0 && share < 1 ? (row * ribbon.columns + Math.floor(share * ribbon.columns)) * 4 : -1;
      const strength = ribbon && cell >= 0 ? (ribbon.cells[cell + 3] ?? 0) / 255 : 0;
      const isOver = (Math.floor(x / (2 * ratio)) + row) % 2 === 1;
      for (let y = top; y < bottom; y += 1) {
        const light = (isOver ? 1 : 0.88) * threadLight(y, top, bottom);
        const at = (y * width + x) * 4;
        for (let channel = 0; channel < 3; channel += 1) {
          const bare = thread[channel] ?? 0;
          const lit = ribbon && cell >= 0 ? (ribbon.cells[cell + channel] ?? 0) : bare;
          pixels[at + channel] = (bare + (lit - bare) * strength) * light;
        }
        pixels[at + 3] = 255;
      }
    }
  });
  return pixels;
}

/** A thread is round: its upper edge catches light, its lower edge lies in shade. */
function threadLight(y: number, top: number, bottom: number): number {
  const thickness = bottom - top;
  if (thickness > 2) return y === top ? 1.07 : y === bottom - 1 ? 0.74 : 1;
  return thickness > 1 && y === bottom - 1 ? 0.86 : 1;
}

/** Draws the cloth on a canvas and cuts a swallowtail into its ends. */
export function drawCloth(canvas: HTMLCanvasElement, ribbon: RibbonCells | null, look: ClothLook): void {
  canvas.width = look.width;
  canvas.height = look.height;
  const context = canvas.getContext("2d");
  if (!context) return;
  context.putImageData(new ImageData(weaveCloth(ribbon, look), look.width, look.height), 0, 0);
  const notch = look.tail * 0.82;
  context.globalCompositeOperation = "destination-out";
  context.beginPath();
  context.moveTo(look.width, 0);
  context.lineTo(look.width - notch, look.height / 2);
  context.lineTo(look.width, look.height);
  context.moveTo(0, 0);
  context.lineTo(notch, look.height / 2);
  context.lineTo(0, look.height);
  context.fill();
}
