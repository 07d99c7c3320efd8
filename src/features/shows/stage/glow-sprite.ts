import { createSurface, type Surface, type Canvas2D, type Context2D } from "./surface.ts";

/**
 * Light is baked as two layers: a *tint* layer, white with alpha, that takes the colour of the
 * moment, and a *hot* layer drawn over it as it is (the near-white heart of a lamp, the pale middle
 * of a lit pane).
 */
export interface GlowLayers {
  readonly tint: Canvas2D;
  readonly hot: Canvas2D;
}

const layers = new Map<number, GlowLayers>();

/** The two layers of one lamp with its halo, `radius` device pixels wide; made once a radius. */
export function getGlowLayers(radius: number): GlowLayers {
  const known = layers.get(radius);
  if (known) return known;
  const tint = createSurface(radius * 2, radius * 2);
  const halo = tint.context.createRadialGradient(radius, radius, 0, radius, radius, radius);
  for (const [at, alpha] of [
    [0, 0.62],
    [0.16, 0.34],
    [0.36, 0.12],
    [0.66, 0.035],
    [1, 0],
  ] as const)
    halo.addColorStop(at, `rgba(255,255,255,${alpha})`);
  fill(tint, halo, radius);
  const rim = tint.context.createRadialGradient(radius, radius, 0, radius, radius, radius * 0.17);
  for (const [at, alpha] of [
    [0, 1],
    [0.5, 1],
    [0.8, 0.85],
    [1, 0],
  ] as const)
    rim.addColorStop(at, `rgba(255,255,255,${alpha})`);
  fill(tint, rim, radius);
  const hot = createSurface(radius * 2, radius * 2);
  const heart = hot.context.createRadialGradient(radius, radius, 0, radius, radius, radius * 0.17);
  for (const [at, alpha] of [
    [0, 0.8],
    [0.5, 0.5],
    [0.8, 0.12],
    [1, 0],
  ] as const)
    heart.addColorStop(at, `rgba(255,255,255,${alpha})`);
  fill(hot, heart, radius);
  const made = { tint: tint.canvas, hot: hot.canvas };
  layers.set(radius, made);
  return made;
}

function fill(surface: Surface, gradient: CanvasGradient, radius: number): void {
  surface.context.fillStyle = gradient;
  surface.context.fillRect(0, 0, radius * 2, radius * 2);
}

/** Lays a colour into a white layer and puts the hot layer over it. `into` must be as large. */
export function tintLayers(into: Context2D, from: GlowLayers, css: string): void {
  into.globalCompositeOperation = "copy";
  into.drawImage(from.tint, 0, 0);
  into.globalCompositeOperation = "source-in";
  into.fillStyle = css;
  into.fillRect(0, 0, into.canvas.width, into.canvas.height);
  into.globalCompositeOperation = "source-over";
  into.drawImage(from.hot, 0, 0);
}

/** How many tinted lamps of one radius are kept; the longest unused goes first. */
const KEPT_LAMPS = 512;

/** Tinted single lamps by colour, for the pixels of colour strips. */
export class LampCache {
  readonly #radius: number;
  readonly #lamps = new Map<number, Canvas2D>();

  constructor(radius: number) {
    this.#radius = radius;
  }

  /** `colour` is 0xRRGGBB, already coarse, else the cache is of no use. */
  get(colour: number, css: () => string): Canvas2D {
    const known = this.#lamps.get(colour);
    if (known) return known;
    if (this.#lamps.size >= KEPT_LAMPS) {
      const oldest = this.#lamps.keys().next().value;
      if (oldest !== undefined) this.#lamps.delete(oldest);
    }
    const lamp = createSurface(this.#radius * 2, this.#radius * 2);
    tintLayers(lamp.context, getGlowLayers(this.#radius), css());
    this.#lamps.set(colour, lamp.canvas);
    return lamp.canvas;
  }
}
