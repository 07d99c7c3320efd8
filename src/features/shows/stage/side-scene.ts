import type { Layout, Side } from "../../../../shared/contracts/square.ts";
import { sideGeometry, viewFrame, type FrontGeometry, type View } from "../../../../sandbox/square/geometry.ts";
import { LightPainter } from "./light-painter.ts";
import { paintBeads } from "./paint-beads.ts";
import { paintHouse } from "./paint-house.ts";
import { paintPaving, createReflectionMask, REFLECTION_SCALE } from "./paint-paving.ts";
import { paintPeople } from "./paint-people.ts";
import { paintSky, type PictureSize } from "./paint-sky.ts";
import { paintTree } from "./paint-tree.ts";
import { layGrain } from "./paper.ts";
import { createSurface, releaseSurface, type Surface, type Context2D } from "./surface.ts";

/** Light spills this far below the foot of the houses, in view pixels. */
const SPILL = 30;
/** Strength of the bloom: the light once more, from a copy a twelfth as large. */
const BLOOM = 0.44;

export interface SceneOptions {
  readonly layout: Layout;
  readonly side: Side;
  readonly view: View;
  readonly dpr: number;
  /** Whether lit lamps glow beyond their edges. */
  readonly hasBloom: boolean;
}

/**
 * One side of the square at one size: everything that is drawn once, and the passes that put light
 * on it. Dispose it when side or size change.
 */
export class SideScene {
  readonly #size: PictureSize;
  readonly #bloom: number;
  readonly #base: Surface;
  readonly #trees: Surface;
  readonly #people: Surface;
  readonly #light: Surface;
  readonly #quarter: Surface;
  readonly #twelfth: Surface;
  readonly #reflection: Surface;
  readonly #mask: Surface;
  readonly #houseLights: LightPainter;
  readonly #treeLights: LightPainter;

  constructor({ layout, side, view, dpr, hasBloom }: SceneOptions) {
    this.#bloom = hasBloom ? BLOOM : 0;
    const { width, height } = view;
    const fronts = sideGeometry(layout, side, view);
    const houses = fronts.filter((front) => front.facade);
    const trees = fronts.filter((front) => front.tree);
    const frame = viewFrame(view, houses.length);
    this.#size = { width, height, groundY: frame.groundY, dpr };
    this.#base = this.#paintBase(side, houses, frame.unit);
    this.#trees = this.#paintLayer((context) => {
      for (const tree of trees) paintTree(context, tree, { dpr, isSmall: false });
      for (const tree of trees) paintBeads(context, tree, frame.unit, false);
    });
    this.#people = this.#paintLayer((context) => paintPeople(context, this.#size, frame.unit));
    const lit = frame.groundY + SPILL;
    this.#light = createSurface(width * dpr, lit * dpr);
    this.#quarter = createSurface(width / 4, lit / 4);
    this.#twelfth = createSurface(width / 12, lit / 12);
    this.#reflection = createSurface(width / REFLECTION_SCALE, frame.paving / REFLECTION_SCALE);
    this.#mask = createReflectionMask(this.#size);
    const scale = { dpr, unit: frame.unit, isSmall: false };
    this.#houseLights = new LightPainter({ fronts: houses, scale });
    this.#treeLights = new LightPainter({ fronts: trees, scale });
  }

  /** Draws the side under a frame's light; gives back how many lights are lit in the picture. */
  draw(context: Context2D, rgb: Float32Array): number {
    const { dpr } = this.#size;
    const lit = this.#drawLight(rgb);
    context.setTransform(1, 0, 0, 1, 0, 0);
    context.globalCompositeOperation = "source-over";
    context.globalAlpha = 1;
    context.drawImage(this.#base.canvas, 0, 0);
    // Laid over, not added: gold stays gold on blue paper.
    context.drawImage(this.#light.canvas, 0, 0);
    this.#shrinkLight();
    context.setTransform(dpr, 0, 0, dpr, 0, 0);
    context.globalCompositeOperation = "lighter";
    this.#drawReflection(context);
    const { width, height, groundY } = this.#size;
    context.globalCompositeOperation = "source-over";
    context.drawImage(this.#trees.canvas, 0, 0, width, height);
    context.globalCompositeOperation = "lighter";
    const litOnTrees = this.#treeLights.draw(context, rgb);
    context.globalAlpha = this.#bloom;
    context.drawImage(this.#twelfth.canvas, 0, 0, width, groundY + SPILL);
    context.globalAlpha = 1;
    context.globalCompositeOperation = "source-over";
    context.drawImage(this.#people.canvas, 0, 0, width, height);
    return lit + litOnTrees;
  }

  dispose(): void {
    this.#houseLights.dispose();
    this.#treeLights.dispose();
    const drawn = [this.#base, this.#trees, this.#people, this.#mask];
    const passes = [this.#light, this.#quarter, this.#twelfth, this.#reflection];
    for (const surface of [...drawn, ...passes]) releaseSurface(surface);
  }

  #paintBase(side: Side, houses: readonly FrontGeometry[], unit: number): Surface {
    const { width, height, dpr } = this.#size;
    const base = createSurface(width * dpr, height * dpr);
    const { context } = base;
    context.scale(dpr, dpr);
    paintSky(context, this.#size, side);
    // Sheets further back first.
    for (const front of houses) if (!front.isNear) paintHouse(context, front, { dpr, isSmall: false });
    for (const front of houses) if (front.isNear) paintHouse(context, front, { dpr, isSmall: false });
    paintPaving(context, this.#size);
    for (const front of houses) paintBeads(context, front, unit, false);
    layGrain(context, "overlay", 0.8, { x: 0, y: 0, width, height });
    return base;
  }

  #paintLayer(paint: (context: Context2D) => void): Surface {
    const { width, height, dpr } = this.#size;
    const layer = createSurface(width * dpr, height * dpr);
    layer.context.scale(dpr, dpr);
    paint(layer.context);
    return layer;
  }

  #drawLight(rgb: Float32Array): number {
    const { context, canvas } = this.#light;
    const { dpr } = this.#size;
    context.setTransform(1, 0, 0, 1, 0, 0);
    context.clearRect(0, 0, canvas.width, canvas.height);
    context.setTransform(dpr, 0, 0, dpr, 0, 0);
    context.globalCompositeOperation = "lighter";
    return this.#houseLights.draw(context, rgb);
  }

  /** Two shrunken copies feed bloom and reflection; their cost does not grow with the lights. */
  #shrinkLight(): void {
    const quarter = this.#quarter;
    const twelfth = this.#twelfth;
    quarter.context.globalCompositeOperation = "copy";
    quarter.context.drawImage(this.#light.canvas, 0, 0, quarter.canvas.width, quarter.canvas.height);
    twelfth.context.globalCompositeOperation = "copy";
    twelfth.context.drawImage(quarter.canvas, 0, 0, twelfth.canvas.width, twelfth.canvas.height);
  }

  #drawReflection(into: Context2D): void {
    const { context, canvas } = this.#reflection;
    const { width, height, groundY } = this.#size;
    const quarter = this.#quarter.canvas;
    const twelfth = this.#twelfth.canvas;
    const share = groundY / (groundY + SPILL);
    context.setTransform(1, 0, 0, 1, 0, 0);
    context.globalCompositeOperation = "source-over";
    context.globalAlpha = 1;
    context.clearRect(0, 0, canvas.width, canvas.height);
    context.save();
    context.scale(1, -1);
    const near = canvas.height * 1.5;
    context.drawImage(quarter, 0, 0, quarter.width, quarter.height * share, 0, -near, canvas.width, near);
    context.globalCompositeOperation = "lighter";
    context.globalAlpha = 0.7;
    const far = canvas.height * 2.1;
    context.drawImage(twelfth, 0, 0, twelfth.width, twelfth.height * share, 0, -far, canvas.width, far);
    context.restore();
    context.globalCompositeOperation = "destination-in";
    context.drawImage(this.#mask.canvas, 0, 0);
    into.drawImage(canvas, 0, groundY, width, height - groundY);
  }
}
