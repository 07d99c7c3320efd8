/**
 * Simple shapes of the drawn square, free of any drawing surface. Lengths are in pixels of the view
 * they were made for; x grows to the right, y downwards.
 */

export interface Point {
  readonly x: number;
  readonly y: number;
}

export interface Rect extends Point {
  readonly width: number;
  readonly height: number;
}

/** A lit or cut-out area: "arch" is a rectangle under a half circle, "round" an ellipse in its box. */
export interface Pane extends Rect {
  readonly shape: "rect" | "arch" | "round";
}

/** One lamp of a string. */
export interface Bead extends Point {
  readonly radius: number;
}

/** Area of a pane in square pixels. */
export function paneArea(pane: Pane): number {
  const box = pane.width * pane.height;
  if (pane.shape === "rect") return box;
  if (pane.shape === "round") return (Math.PI / 4) * box;
  // The corners that a half circle leaves free in the top of an arch.
  const radius = Math.min(pane.width / 2, pane.height);
  return box - (2 - Math.PI / 2) * radius * radius;
}

/** Length of a chain of points. */
export function pathLength(points: readonly Point[]): number {
  let length = 0;
  for (let i = 1; i < points.length; i += 1) length += distance(points[i - 1], points[i]);
  return length;
}

function distance(a: Point | undefined, b: Point | undefined): number {
  return a && b ? Math.hypot(b.x - a.x, b.y - a.y) : 0;
}

/** The points at the given distances (rising) from the start of a chain of points. */
function pointsAt(points: readonly Point[], distances: readonly number[]): Point[] {
  const found: Point[] = [];
  let segment = 1;
  let passed = 0;
  for (const wanted of distances) {
    while (segment < points.length - 1 && passed + distance(points[segment - 1], points[segment]) < wanted) {
      passed += distance(points[segment - 1], points[segment]);
      segment += 1;
    }
    const from = points[segment - 1];
    const to = points[segment] ?? from;
    if (!from || !to) return found;
    const length = distance(from, to);
    const share = length === 0 ? 0 : Math.min(1, (wanted - passed) / length);
    found.push({ x: from.x + (to.x - from.x) * share, y: from.y + (to.y - from.y) * share });
  }
  return found;
}

/** Points along a chain, one every `step`, half a step in from either end; at least one. */
export function everyStep(points: readonly Point[], step: number): Point[] {
  const length = pathLength(points);
  return inParts(points, Math.max(1, Math.round(length / step)));
}

/** The middles of `count` equal parts of a chain of points, from its start to its end. */
export function inParts(points: readonly Point[], count: number): Point[] {
  const length = pathLength(points);
  return pointsAt(
    points,
    Array.from({ length: count }, (_, n) => (length * (n + 0.5)) / count),
  );
}

/** The outline of a pane from its lower left corner, up, over and down, set out by `gap`. */
export function overPane(pane: Pane, gap: number): Point[] {
  const left = pane.x - gap;
  const right = pane.x + pane.width + gap;
  const foot = pane.y + pane.height;
  if (pane.shape === "rect") {
    const top = pane.y - gap;
    return [
      { x: left, y: foot },
      { x: left, y: top },
      { x: right, y: top },
      { x: right, y: foot },
    ];
  }
  const steps = 12;
  const centre = {
    x: pane.x + pane.width / 2,
    y: pane.shape === "arch" ? pane.y + pane.width / 2 : pane.y + pane.height / 2,
  };
  const radius = pane.width / 2 + gap;
  const turn = pane.shape === "arch" ? Math.PI : 2 * Math.PI;
  const curve = Array.from({ length: steps + 1 }, (_, n) => ({
    x: centre.x + radius * Math.cos(Math.PI + (turn * n) / steps),
    y: centre.y + radius * Math.sin(Math.PI + (turn * n) / steps),
  }));
  return pane.shape === "arch" ? [{ x: left, y: foot }, ...curve, { x: right, y: foot }] : curve;
}
