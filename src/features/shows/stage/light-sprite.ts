import type { FrontGeometry, LightGeometry } from "../../../../sandbox/square/geometry.ts";
import type { Pane } from "../../../../sandbox/square/shapes.ts";
import { colourToHex } from "../../../../sandbox/timeline/colour.ts";
import { getGlowLayers, tintLayers, type GlowLayers } from "./glow-sprite.ts";
import { barThickness, wallClip } from "./paint-house.ts";
import { listBars, panesPath } from "./paths.ts";
import { createSurface, releaseSurface, type Surface, type Context2D } from "./surface.ts";

/** Measures of light in a view. */
export interface LightScale {
  readonly dpr: number;
  readonly unit: number;
  readonly isSmall: boolean;
}

interface Box {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

/**
 * The picture of one light at full level: baked once in white, tinted when its colour changes, then
 * one `drawImage` a frame. The memory is two layers and one tinted copy, whatever the colours.
 */
export class LightSprite {
  readonly #box: Box;
  readonly #layers: GlowLayers;
  readonly #tinted: Surface;
  #colour = -1;

  constructor(front: FrontGeometry, light: LightGeometry, scale: LightScale) {
    this.#box = boxOf(light, scale);
    this.#layers = bakeLayers(front, light, this.#box, scale);
    this.#tinted = createSurface(this.#layers.tint.width, this.#layers.tint.height);
  }

  /** Draws the light at `alpha` (0 to 1) in `colour` (0xRRGGBB); the context is in view pixels. */
  draw(context: Context2D, colour: number, alpha: number): void {
    if (colour !== this.#colour) {
      tintLayers(this.#tinted.context, this.#layers, colourToHex(colour));
      this.#colour = colour;
    }
    const { x, y, width, height } = this.#box;
    context.globalAlpha = alpha;
    context.drawImage(this.#tinted.canvas, x, y, width, height);
  }

  dispose(): void {
    releaseSurface(this.#tinted);
    this.#layers.tint.width = 0;
    this.#layers.hot.width = 0;
  }
}

/** How far a lamp's halo reaches, in view pixels. */
export function haloRadius({ unit, isSmall }: LightScale): number {
  return isSmall ? 6 : Math.max(9, unit * 0.036);
}

function boxOf(light: LightGeometry, scale: LightScale): Box {
  const pad = scale.isSmall ? 8 : haloRadius(scale) * 2.2;
  const xs = [...light.beads.map((bead) => bead.x), ...light.panes.flatMap((pane) => [pane.x, pane.x + pane.width])];
  const ys = [...light.beads.map((bead) => bead.y), ...light.panes.flatMap((pane) => [pane.y, pane.y + pane.height])];
  const left = Math.min(...xs) - pad;
  const top = Math.min(...ys) - pad;
  return { x: left, y: top, width: Math.max(...xs) + pad - left, height: Math.max(...ys) + pad - top };
}

function bakeLayers(front: FrontGeometry, light: LightGeometry, box: Box, scale: LightScale): GlowLayers {
  const tint = createSurface(box.width * scale.dpr, box.height * scale.dpr);
  const hot = createSurface(box.width * scale.dpr, box.height * scale.dpr);
  // The surface was rounded up to whole pixels; stretch so that drawing it back into `box` is exact.
  for (const { context, canvas } of [tint, hot]) {
    context.scale(canvas.width / box.width, canvas.height / box.height);
    context.translate(-box.x, -box.y);
  }
  if (!scale.isSmall) bakeWash(tint.context, front, light, scale);
  bakePanes(tint.context, hot.context, front, light, scale);
  bakeLamps(tint.context, hot.context, light, scale);
  return { tint: tint.canvas, hot: hot.canvas };
}

/** Strength of the wash: windows have many lamps, so each throws less on the wall. */
const WASH: { readonly [part: string]: number } = { windows: 0.034, door: 0.085 };

/** Light falling on the paper of the house, and no further. */
function bakeWash(context: Context2D, front: FrontGeometry, light: LightGeometry, scale: LightScale): void {
  const clip = wallClip(front);
  if (!clip) return;
  const reach = haloRadius(scale) * 3.4;
  const wash = createSurface(reach * 2, reach * 2);
  const strength = WASH[light.part] ?? 0.1;
  const gradient = wash.context.createRadialGradient(reach, reach, 0, reach, reach, reach);
  gradient.addColorStop(0, `rgba(255,255,255,${strength})`);
  gradient.addColorStop(0.5, `rgba(255,255,255,${strength * 0.42})`);
  gradient.addColorStop(1, "rgba(255,255,255,0)");
  wash.context.fillStyle = gradient;
  wash.context.fillRect(0, 0, reach * 2, reach * 2);
  context.save();
  context.clip(clip);
  light.beads.forEach(({ x, y }, i) => {
    if (i % 2 === 0) context.drawImage(wash.canvas, x - reach, y - reach * 0.7, reach * 2, reach * 2);
  });
  context.restore();
  releaseSurface(wash);
}

/** Paper panes lit from the room: pale in the middle, deep at the rim. Bars stay dark. */
function bakePanes(
  tint: Context2D,
  hot: Context2D,
  front: FrontGeometry,
  light: LightGeometry,
  scale: LightScale,
): void {
  if (light.panes.length === 0) return;
  if (light.part === "door" || light.part === "sign") {
    tint.fillStyle = `rgba(255,255,255,${scale.isSmall ? 0.5 : light.part === "sign" ? 0.42 : 0.22})`;
    tint.fill(panesPath(light.panes));
    return;
  }
  for (const pane of light.panes) bakePane(tint, hot, pane);
  if (scale.isSmall || !front.facade) return;
  const thickness = barThickness(front.facade.unit);
  for (const context of [tint, hot])
    for (const opening of front.facade.openings)
      for (const bar of listBars(opening, thickness)) context.clearRect(bar.x, bar.y, bar.width, bar.height);
}

function bakePane(tint: Context2D, hot: Context2D, pane: Pane): void {
  const path = panesPath([pane]);
  const x = pane.x + pane.width / 2;
  const y = pane.y + pane.height * 0.56;
  const reach = Math.max(pane.width, pane.height) * 0.8;
  const glow = tint.createRadialGradient(x, y, 0, x, y, reach);
  glow.addColorStop(0, "rgba(255,255,255,.98)");
  glow.addColorStop(0.55, "rgba(255,255,255,.9)");
  glow.addColorStop(1, "rgba(255,255,255,.78)");
  tint.fillStyle = glow;
  tint.fill(path);
  const heart = hot.createRadialGradient(x, y, 0, x, y, reach);
  heart.addColorStop(0, "rgba(255,240,205,.34)");
  heart.addColorStop(0.55, "rgba(255,240,210,.1)");
  heart.addColorStop(0.6, "rgba(120,60,30,.04)");
  heart.addColorStop(1, "rgba(120,60,30,.22)");
  hot.fillStyle = heart;
  hot.fill(path);
}

function bakeLamps(tint: Context2D, hot: Context2D, light: LightGeometry, scale: LightScale): void {
  const isWindows = light.part === "windows";
  const radius = haloRadius(scale);
  const glow = getGlowLayers(Math.ceil(radius * scale.dpr));
  const drawn = radius * (isWindows ? 0.8 : 1);
  tint.globalAlpha = scale.isSmall ? 0.6 : isWindows ? 0.7 : 1;
  hot.globalAlpha = scale.isSmall ? 0.6 : 1;
  // So small, the lamps round a window would hide it.
  const every = scale.isSmall && isWindows ? 3 : 1;
  for (const [i, { x, y }] of light.beads.entries()) {
    if (i % every !== 0) continue;
    tint.drawImage(glow.tint, x - drawn, y - drawn, drawn * 2, drawn * 2);
    hot.drawImage(glow.hot, x - drawn, y - drawn, drawn * 2, drawn * 2);
  }
  tint.globalAlpha = 1;
  hot.globalAlpha = 1;
}
