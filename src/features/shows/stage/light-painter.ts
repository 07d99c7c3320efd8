import type { FrontGeometry, LightGeometry } from "../../../../sandbox/square/geometry.ts";
import { colourToHex } from "../../../../sandbox/timeline/colour.ts";
import { LampCache } from "./glow-sprite.ts";
import { haloRadius, LightSprite, type LightScale } from "./light-sprite.ts";
import { toShownColour } from "./shown-colour.ts";
import type { Context2D } from "./surface.ts";

/** Baking runs in slices of this length, so that a page with a running show stays smooth. */
const BAKE_SLICE_MS = 8;

export interface LightPainterOptions {
  readonly fronts: readonly FrontGeometry[];
  readonly scale: LightScale;
  /** Draws every n-th pixel of a colour strip only: the strip of all fronts is too small for more. */
  readonly pixelStep?: number;
}

interface PaintedLight {
  readonly front: FrontGeometry;
  readonly light: LightGeometry;
  sprite: LightSprite | null;
}

/** Whether a light is one pixel of a colour strip: its id has a number behind the part. */
export function isPixel(light: Pick<LightGeometry, "lightId">): boolean {
  return light.lightId.split("/").length === 3;
}

/** Draws the lights of some fronts from a frame's colours. */
export class LightPainter {
  readonly #scale: LightScale;
  readonly #lights: PaintedLight[] = [];
  readonly #pixels: LightGeometry[] = [];
  readonly #lamps: LampCache;
  readonly #lampRadius: number;
  #bakeTimer: ReturnType<typeof setTimeout> | undefined;

  constructor({ fronts, scale, pixelStep = 1 }: LightPainterOptions) {
    this.#scale = scale;
    this.#lampRadius = scale.isSmall ? 3 : haloRadius(scale) * 1.25;
    this.#lamps = new LampCache(Math.max(6, Math.ceil(this.#lampRadius * scale.dpr)));
    for (const front of fronts)
      for (const light of front.lights) {
        if (!isPixel(light)) this.#lights.push({ front, light, sprite: null });
        else if (light.lightIndex % pixelStep === 0) this.#pixels.push(light);
      }
    this.#bakeRest();
  }

  /**
   * Adds all that is lit; `rgb` holds three linear channels a light, by index in walking order. The
   * context is in view pixels and should add light ("lighter"). Gives back how many lights were lit.
   */
  draw(context: Context2D, rgb: Float32Array): number {
    let lit = 0;
    for (const entry of this.#lights) {
      const { alpha, colour } = shownAt(rgb, entry.light.lightIndex);
      if (alpha === 0) continue;
      lit += 1;
      this.#bake(entry).draw(context, colour, alpha);
    }
    const radius = this.#lampRadius;
    for (const light of this.#pixels) {
      const { alpha, colour } = shownAt(rgb, light.lightIndex);
      const [bead] = light.beads;
      if (alpha === 0 || !bead) continue;
      lit += 1;
      context.globalAlpha = alpha;
      const lamp = this.#lamps.get(colour, () => colourToHex(colour));
      context.drawImage(lamp, bead.x - radius, bead.y - radius, radius * 2, radius * 2);
    }
    context.globalAlpha = 1;
    return lit;
  }

  dispose(): void {
    clearTimeout(this.#bakeTimer);
    for (const { sprite } of this.#lights) sprite?.dispose();
  }

  #bake(entry: PaintedLight): LightSprite {
    entry.sprite ??= new LightSprite(entry.front, entry.light, this.#scale);
    return entry.sprite;
  }

  #bakeRest(): void {
    const end = performance.now() + BAKE_SLICE_MS;
    for (const entry of this.#lights) {
      if (entry.sprite) continue;
      if (performance.now() > end) {
        this.#bakeTimer = setTimeout(() => this.#bakeRest(), BAKE_SLICE_MS);
        return;
      }
      this.#bake(entry);
    }
  }
}

function shownAt(rgb: Float32Array, light: number) {
  return toShownColour(rgb[light * 3] ?? 0, rgb[light * 3 + 1] ?? 0, rgb[light * 3 + 2] ?? 0);
}
