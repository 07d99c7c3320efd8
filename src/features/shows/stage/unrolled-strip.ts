import type { Layout } from "../../../../shared/contracts/square.ts";
import { sideGeometry, viewFrame, type FrontGeometry } from "../../../../sandbox/square/geometry.ts";
import { FREE_WIDTH, gapOf, GROUND, listSideSpans } from "./side-spans.ts";
import { LightPainter } from "./light-painter.ts";
import { paintBeads } from "./paint-beads.ts";
import { paintHouse } from "./paint-house.ts";
import { paintTree } from "./paint-tree.ts";
import { createSurface, getContext, releaseSurface, type Surface, type Canvas2D, type Context2D } from "./surface.ts";

/** Pixels of a strip that are drawn: every fourth, more do not fit. */
const PIXEL_STEP = 4;
interface Block {
  /** Shift of the block's own view in the strip. */
  readonly x: number;
  readonly y: number;
  readonly lights: LightPainter;
}

/** The whole square unrolled below the stage: four sides in walking order, then what stands free. */
export class UnrolledStrip {
  readonly #canvas: Canvas2D;
  readonly #context: Context2D;
  readonly #layout: Layout;
  #size = { width: 0, height: 0, dpr: 1 };
  #base: Surface | null = null;
  #blocks: Block[] = [];

  constructor(canvas: Canvas2D, layout: Layout) {
    this.#canvas = canvas;
    this.#context = getContext(canvas);
    this.#layout = layout;
  }

  setSize(size: { readonly width: number; readonly height: number; readonly dpr: number }): void {
    const dpr = Math.min(2, Math.max(1, size.dpr));
    this.#size = { ...size, dpr };
    this.#canvas.width = Math.max(1, Math.round(size.width * dpr));
    this.#canvas.height = Math.max(1, Math.round(size.height * dpr));
    this.#build();
  }

  draw(rgb: Float32Array): void {
    if (!this.#base) return;
    const context = this.#context;
    const { dpr } = this.#size;
    context.setTransform(1, 0, 0, 1, 0, 0);
    context.globalCompositeOperation = "source-over";
    context.globalAlpha = 1;
    context.drawImage(this.#base.canvas, 0, 0);
    context.globalCompositeOperation = "lighter";
    for (const block of this.#blocks) {
      context.setTransform(dpr, 0, 0, dpr, block.x * dpr, block.y * dpr);
      block.lights.draw(context, rgb);
    }
  }

  dispose(): void {
    for (const block of this.#blocks) block.lights.dispose();
    if (this.#base) releaseSurface(this.#base);
    this.#base = null;
    this.#blocks = [];
  }

  #build(): void {
    this.dispose();
    const { width, height, dpr } = this.#size;
    // The sandbox leaves a share of every view to the paving; ask for one that ends at our ground.
    const ground = height - GROUND;
    const viewHeight = height * (ground / viewFrame({ width, height }, 1).groundY);
    const spans = listSideSpans(this.#layout, this.#size);
    const base = createSurface(width * dpr, height * dpr);
    paintBackdrop(base, { width, height, ground, dpr });
    for (const span of spans) {
      const view = { width: span.width, height: viewHeight };
      const fronts = sideGeometry(this.#layout, span.side, view);
      this.#addBlock(
        base,
        span.x,
        fronts.filter((front) => front.side !== null),
      );
      if (span.side !== "west") continue;
      const middle = width - gapOf(width) - (ground * FREE_WIDTH) / 2;
      for (const tree of fronts.filter((front) => front.side === null))
        this.#addBlock(base, middle - tree.x - tree.width / 2, [tree], ground - tree.groundY);
    }
    this.#base = base;
  }

  #addBlock(base: Surface, x: number, fronts: readonly FrontGeometry[], y = 0): void {
    const { dpr } = this.#size;
    const unit = fronts[0]?.facade?.unit ?? 1;
    base.context.setTransform(dpr, 0, 0, dpr, x * dpr, y * dpr);
    for (const front of fronts) paintHouse(base.context, front, { dpr, isSmall: true });
    for (const front of fronts) paintTree(base.context, front, { dpr, isSmall: true });
    for (const front of fronts) paintBeads(base.context, front, unit, true);
    const scale = { dpr, unit, isSmall: true };
    this.#blocks.push({ x, y, lights: new LightPainter({ fronts, scale, pixelStep: PIXEL_STEP }) });
  }
}

function paintBackdrop(base: Surface, size: { width: number; height: number; ground: number; dpr: number }): void {
  const { context } = base;
  context.scale(size.dpr, size.dpr);
  const sky = context.createLinearGradient(0, 0, 0, size.ground);
  sky.addColorStop(0, "#222b4c");
  sky.addColorStop(1, "#4a5680");
  context.fillStyle = sky;
  context.fillRect(0, 0, size.width, size.height);
  context.fillStyle = "#1d2340";
  context.fillRect(0, size.ground, size.width, size.height - size.ground);
}
