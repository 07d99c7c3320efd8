/** A canvas that is never shown, with its drawing context. */
export interface Surface {
  readonly canvas: HTMLCanvasElement;
  readonly context: CanvasRenderingContext2D;
}

/** A fresh, transparent surface of at least one pixel each way. */
export function createSurface(width: number, height: number): Surface {
  const canvas = document.createElement("canvas");
  canvas.width = Math.max(1, Math.ceil(width));
  canvas.height = Math.max(1, Math.ceil(height));
  return { canvas, context: getContext(canvas, true) };
}

/** The 2D context of a canvas. Throws when the browser gives none (too many or too large canvases). */
export function getContext(canvas: HTMLCanvasElement, hasAlpha: boolean): CanvasRenderingContext2D {
  const context = canvas.getContext("2d", { alpha: hasAlpha });
  if (!context) throw new Error("The browser gave no 2D drawing context.");
  return context;
}

/** Frees the pixels at once instead of at the next garbage collection. */
export function releaseSurface(surface: Surface): void {
  surface.canvas.width = 0;
  surface.canvas.height = 0;
}
