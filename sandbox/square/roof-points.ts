import type { ROOFS } from "../../shared/contracts/square.ts";
import type { Point } from "./shapes.ts";

/** One of the ways a front ends against the sky. */
export type Roof = (typeof ROOFS)[number];

/** Width, eave and top of a roof, in one unit; heights are measured upwards from the ground. */
interface RoofSize {
  readonly width: number;
  readonly eave: number;
  readonly top: number;
}

/** Pairs of (share of the width, share of the rise from eave to top). */
type Profile = readonly (readonly [number, number])[];

const STRAIGHT: { readonly [R in Exclude<Roof, "round" | "bell" | "step" | "tree">]: Profile } = {
  gable: [
    [0, 0],
    [0.5, 1],
    [1, 0],
  ],
  parapet: [
    [0, 0],
    [0.3, 0],
    [0.3, 1],
    [0.7, 1],
    [0.7, 0],
    [1, 0],
  ],
  pediment: [
    [0, 0],
    [0.06, 0],
    [0.5, 1],
    [0.94, 0],
    [1, 0],
  ],
  hip: [
    [0, 0],
    [0.13, 1],
    [0.87, 1],
    [1, 0],
  ],
  twin: [
    [0, 0],
    [0.25, 1],
    [0.5, 0.12],
    [0.75, 1],
    [1, 0],
  ],
  deco: [
    [0, 0],
    [0.16, 0],
    [0.16, 0.4],
    [0.33, 0.4],
    [0.33, 1],
    [0.67, 1],
    [0.67, 0.4],
    [0.84, 0.4],
    [0.84, 0],
    [1, 0],
  ],
  tower: [
    [0, 0],
    [0.06, 0],
    [0.34, 0.86],
    [0.66, 0.86],
    [0.94, 0],
    [1, 0],
  ],
};

/** Stairs up to the middle and down again. */
function stepProfile(): Profile {
  const steps = 4;
  const tread = 1 / (2 * steps + 1);
  const up: [number, number][] = [];
  for (let i = 0; i <= steps; i += 1) {
    up.push([i * tread, i / steps]);
    if (i < steps) up.push([(i + 1) * tread, i / steps]);
  }
  return [...up, ...up.toReversed().map(([x, y]): [number, number] => [1 - x, y])];
}

function curveProfile(points: number, rise: (fromMiddle: number) => number): Profile {
  return Array.from({ length: points + 1 }, (_, i): [number, number] => {
    const x = i / points;
    return [x, rise(Math.abs(2 * x - 1))];
  });
}

const roundRise = (v: number): number => (v > 0.72 ? 0 : 0.12 + 0.88 * Math.sqrt(Math.max(0, 1 - (v / 0.72) ** 2)));

function bellRise(v: number): number {
  if (v < 0.3) return 0.72 + 0.28 * Math.sqrt(1 - (v / 0.3) ** 2);
  if (v < 0.34) return 0.62;
  return 0.62 * (0.5 + 0.5 * Math.cos((Math.PI * (v - 0.34)) / 0.66));
}

function profileOf(roof: Exclude<Roof, "tree">): Profile {
  if (roof === "step") return stepProfile();
  if (roof === "round") return curveProfile(40, roundRise);
  if (roof === "bell") return curveProfile(44, bellRise);
  return STRAIGHT[roof];
}

/**
 * The line of a roof from its left eave to its right eave. x runs from 0 to `width`; y is a height
 * above the ground. A tree has no roof line: it gets its two feet and its tip.
 */
export function roofPoints(roof: Roof, size: RoofSize): Point[] {
  const { width, eave, top } = size;
  if (roof === "tree")
    return [
      { x: 0, y: 0 },
      { x: width / 2, y: top },
      { x: width, y: 0 },
    ];
  return profileOf(roof).map(([x, y]) => ({ x: x * width, y: eave + (top - eave) * y }));
}
