import type { Layout } from "../../shared/contracts/square.ts";
import { SIDES, type Side } from "../../shared/sides.ts";
import { sideGeometry } from "../square/geometry.ts";
import { listPictureCells, type PictureCells } from "./picture-area.ts";

/** What of a side is seen in its reference picture, by light index; what stands free is in every side's. */
export interface SideMeasure {
  readonly side: Side;
  /** Luminous area in square pixels. */
  readonly area: ReadonlyMap<number, number>;
  /** Lit pixels in the cells of the picture. */
  readonly cells: ReadonlyMap<number, PictureCells>;
}

let last: { readonly layout: string; readonly measures: readonly SideMeasure[] } | null = null;

/**
 * Gives the measures of every side that has lights, in the order of sides. Drawing a square costs more
 * than most checks, and a worker gets the same square anew with every message: the last one is kept.
 */
export function measureSides(layout: Layout): readonly SideMeasure[] {
  const key = JSON.stringify(layout);
  if (last?.layout !== key) last = { layout: key, measures: SIDES.flatMap((side) => measureSide(layout, side)) };
  return last.measures;
}

function measureSide(layout: Layout, side: Side): SideMeasure[] {
  const fronts = sideGeometry(layout, side);
  if (!fronts.some((front) => front.side === side && front.lights.length > 0)) return [];
  const lights = fronts.flatMap((front) => front.lights);
  return [
    {
      side,
      area: new Map(lights.map(({ lightIndex, area }) => [lightIndex, area])),
      cells: new Map(lights.map((light) => [light.lightIndex, listPictureCells(light)])),
    },
  ];
}
