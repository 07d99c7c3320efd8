import type { Layout } from "../../../../shared/contracts/square.ts";
import { SIDES, type Side } from "../../../../shared/sides.ts";

/** Ground below the houses, in CSS pixels. */
export const GROUND = 7;

/** Where a side lies in the strip, in CSS pixels. */
export interface SideSpan {
  readonly side: Side;
  readonly x: number;
  readonly width: number;
}

/** Width of what stands free, as a share of the height of the houses. */
export const FREE_WIDTH = 0.5;

/** Between two sides, in CSS pixels, in a strip so wide. */
export function gapOf(width: number): number {
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
