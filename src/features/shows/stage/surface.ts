/** A canvas of the page, or one that a worker holds. */
export type Canvas2D = HTMLCanvasElement | OffscreenCanvas;
export type Context2D = CanvasRenderingContext2D | OffscreenCanvasRenderingContext2D;

/** A canvas that is never shown, with its drawing context. */
export interface Surface {
  readonly canvas: OffscreenCanvas;
  readonly context: OffscreenCanvasRenderingContext2D;
}

/** A fresh, transparent surface of at least one pixel each way. */
export function createSurface(width: number, height: number): Surface {
  const canvas = new OffscreenCanvas(Math.max(1, Math.ceil(width)), Math.max(1, Math.ceil(height)));
  const context = canvas.getContext("2d");
  if (!context) throw new Error(NO_CONTEXT);
  return { canvas, context };
}

/** What both kinds of canvas can do here; their own declarations list other contexts in different ways. */
interface Drawable {
  getContext(kind: "2d", options: { readonly alpha: boolean }): Context2D | null;
}

/** The opaque 2D context of a canvas that is shown. Throws when the browser gives none (too many or too large canvases). */
export function getContext(canvas: Canvas2D): Context2D {
  const shown: Drawable = canvas;
  const context = shown.getContext("2d", { alpha: false });
  if (!context) throw new Error(NO_CONTEXT);
  return context;
}

const NO_CONTEXT = "The browser gave no 2D drawing context.";

/** Frees the pixels at once instead of at the next garbage collection. */
export function releaseSurface(surface: Surface): void {
  surface.canvas.width = 0;
  surface.canvas.height = 0;
}
