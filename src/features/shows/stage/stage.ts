import type { Layout, Side } from "../../../../shared/contracts/square.ts";
import { SideScene } from "./side-scene.ts";
import { getContext, type Canvas2D, type Context2D } from "./surface.ts";

/** Finer than this nobody sees, and it costs four times the pixels. */
const LARGEST_DPR = 2;

export interface StageSize {
  /** CSS pixels. */
  readonly width: number;
  readonly height: number;
  /** Device pixels of a CSS pixel; taken up to 2. */
  readonly dpr: number;
  /** Fronts shown at a time; all of the side when left out (a phone shows six). */
  readonly count?: number;
}

/**
 * The dusk square on a canvas: one side at a time, under the light of a frame. It keeps no clock: who
 * owns it says when to draw. `setSize` comes first; `dispose` frees its pixels.
 */
export class Stage {
  readonly #canvas: Canvas2D;
  readonly #context: Context2D;
  readonly #hasBloom: boolean;
  readonly #layout: Layout;
  #side: Side = "north";
  #first = 0;
  #size: StageSize | null = null;
  #scene: SideScene | null = null;

  /** Without bloom the lit areas are those in which flashes are measured. */
  constructor(canvas: Canvas2D, layout: Layout, { hasBloom = true }: { readonly hasBloom?: boolean } = {}) {
    this.#canvas = canvas;
    this.#context = getContext(canvas);
    this.#layout = layout;
    this.#hasBloom = hasBloom;
  }

  setSize(size: StageSize): void {
    const dpr = Math.min(LARGEST_DPR, Math.max(1, size.dpr));
    this.#size = { ...size, dpr };
    this.#canvas.width = Math.max(1, Math.round(size.width * dpr));
    this.#canvas.height = Math.max(1, Math.round(size.height * dpr));
    this.#dropScene();
  }

  /** Turns to a side; `first` is the place of the first front shown where not all fit. */
  look(side: Side, first = 0): void {
    if (side === this.#side && first === this.#first) return;
    this.#side = side;
    this.#first = first;
    this.#dropScene();
  }

  /** Draws the square under `rgb`: three linear channels a light in walking order. */
  draw(rgb: Float32Array): number {
    const scene = this.#getScene();
    return scene ? scene.draw(this.#context, rgb) : 0;
  }

  dispose(): void {
    this.#dropScene();
  }

  #getScene(): SideScene | null {
    if (!this.#size || this.#size.width < 1 || this.#size.height < 1) return null;
    const { width, height, dpr, count } = this.#size;
    this.#scene ??= new SideScene({
      layout: this.#layout,
      side: this.#side,
      view: { width, height, first: this.#first, count },
      dpr,
      hasBloom: this.#hasBloom,
    });
    return this.#scene;
  }

  #dropScene(): void {
    this.#scene?.dispose();
    this.#scene = null;
  }
}
