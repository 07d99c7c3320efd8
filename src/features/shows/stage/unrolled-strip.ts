import { SIDES, type Layout, type Side } from "../../../../shared/contracts/square.ts";
import { sideGeometry, viewFrame, type FrontGeometry } from "../../../../sandbox/square/geometry.ts";
import { LightPainter } from "./light-painter.ts";
import { paintBeads } from "./paint-beads.ts";
import { paintHouse } from "./paint-house.ts";
import { paintTree } from "./paint-tree.ts";
import { createSurface, getContext, releaseSurface, type Surface } from "./surface.ts";

/** Pixels of a strip that are drawn: every fourth, more do not fit. */
const PIXEL_STEP = 4;
/** Ground below the houses, in CSS pixels. */
const GROUND = 7;

/** Where a side lies in the strip, in CSS pixels. */
export interface SideSpan {
  readonly side: Side;
  readonly x: number;
  readonly width: number;
}

/** Width of what stands free, as a share of the height of the houses. */
const FREE_WIDTH = 0.5;

function gapOf(width: number): number {
  return Math.max(5, width * 0.009);
}

/** Where the sides lie in a strip of this size; what stands free has a place at its right end. */
export function listSideSpans(layout: Layout, size: { readonly width: number; readonly height: number }): SideSpan[] {
  const gap = gapOf(size.width);
  const hasFree = layout.fronts.some((front) => front.side === null);
  const free = hasFree ? (size.height - GROUND) * FREE_WIDTH + gap : 0;
  const width = Math.max(0, (size.width - gap * (SIDES.length + 1) - free) / SIDES.length);
  return SIDES.map((side, i) => ({ side, x: gap + i * (width + gap), width }));
}

interface Block {
  /** Shift of the block's own view in the strip. */
  readonly x: number;
  readonly y: number;
  readonly lights: LightPainter;
}

/** The whole square unrolled below the stage: four sides in walking order, then what stands free. */
export class UnrolledStrip {
  readonly #canvas: HTMLCanvasElement;
  readonly #context: CanvasRenderingContext2D;
  #layout: Layout;
  #size = { width: 0, height: 0, dpr: 1 };
  #base: Surface | null = null;
  #blocks: Block[] = [];

  constructor(canvas: HTMLCanvasElement, layout: Layout) {
    this.#canvas = canvas;
    this.#context = getContext(canvas, false);
    this.#layout = layout;
  }

  setSize(size: { readonly width: number; readonly height: number; readonly dpr: number }): void {
    const dpr = Math.min(2, Math.max(1, size.dpr));
    this.#size = { ...size, dpr };
    this.#canvas.width = Math.max(1, Math.round(size.width * dpr));
    this.#canvas.height = Math.max(1, Math.round(size.height * dpr));
    this.#build();
  }

  setLayout(layout: Layout): void {
    if (layout === this.#layout) return;
    this.#layout = layout;
    if (this.#size.width > 0) this.#build();
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
