import type { Point, Rect } from "./shapes.ts";
import type { PartShape } from "./strings.ts";

/** The tree: layers of branches from the lowest to the top, and the box its star stands in. */
export interface Tree extends Rect {
  readonly groundY: number;
  readonly trunk: Rect;
  /** Each layer as a closed outline, lowest first. */
  readonly layers: readonly (readonly Point[])[];
  readonly star: Rect;
}

const LAYERS = 6;

/** Half the width of the branches at a height: 0 is the lowest branch, 1 the tip. */
const halfWidth = (tree: Rect, share: number): number => (tree.width / 2) * (1 - share * 0.94);

function layer(box: Rect, foot: number, index: number): Point[] {
  const middle = box.x + box.width / 2;
  const rise = box.height * 0.86;
  const low = foot - (rise * index) / (LAYERS + 1);
  const half = halfWidth(box, index / (LAYERS + 0.5));
  const high = low - box.height * 0.29 * (1 - index * 0.06);
  const teeth = Math.max(5, 9 - index);
  const edge = Array.from({ length: 2 * teeth + 1 }, (_, i) => {
    const share = i / (2 * teeth);
    const sag = Math.sin(Math.PI * share) * box.height * 0.03;
    return { x: middle + half - 2 * half * share, y: low + sag * 0.7 + (i % 2 === 1 ? box.height * 0.022 : 0) };
  });
  return [{ x: middle, y: high }, ...edge];
}

/** A tree of this height with its foot in the middle of (`x`, `groundY`). */
export function treeAt(x: number, groundY: number, height: number): Tree {
  const width = height * 0.46;
  const box: Rect = { x: x - width / 2, y: groundY - height, width, height };
  const foot = groundY - height * 0.08;
  const star = height * 0.09;
  return {
    ...box,
    groundY,
    trunk: { x: x - width * 0.035, y: foot - height * 0.02, width: width * 0.07, height: height * 0.1 },
    layers: Array.from({ length: LAYERS }, (_, i) => layer(box, foot, i)),
    star: { x: x - star / 2, y: groundY - height - star * 0.35, width: star, height: star },
  };
}

/** A garland that hangs between two heights, swinging from edge to edge. `from` and `to`: 0 foot, 1 tip. */
function garland(tree: Tree, from: number, to: number): Point[][] {
  const turns = 2;
  const middle = tree.x + tree.width / 2;
  const foot = tree.groundY - tree.height * 0.1;
  const rise = tree.height * 0.8;
  return Array.from({ length: turns }, (_, turn) => {
    const share = to - ((to - from) * (turn + 0.5)) / turns;
    const half = halfWidth(tree, share) * 0.84;
    return Array.from({ length: 17 }, (_, i) => {
      const across = (i / 16) * 2 - 1;
      return { x: middle + across * half, y: foot - rise * share + (1 - across * across) * tree.height * 0.035 };
    });
  });
}

/**
 * What a part of the tree is made of. "star" is its tip; all others share the height of the tree
 * among them, in the order given, the first one highest.
 */
export function treePart(tree: Tree, part: string, parts: readonly string[]): PartShape {
  if (part === "star") {
    const { x, y, width, height } = tree.star;
    const spokes = 5;
    const radius = width / 2;
    const points = Array.from({ length: spokes * 2 + 1 }, (_, i) => {
      const reach = i % 2 === 0 ? radius : radius * 0.45;
      const turn = (Math.PI * i) / spokes - Math.PI / 2;
      return { x: x + radius + reach * Math.cos(turn), y: y + radius + reach * Math.sin(turn) };
    });
    return {
      panes: [{ shape: "round", x: x + width * 0.2, y: y + height * 0.2, width: width * 0.6, height: height * 0.6 }],
      paths: [points],
    };
  }
  const bands = parts.filter((name) => name !== "star");
  const place = bands.indexOf(part);
  return { panes: [], paths: garland(tree, 1 - (place + 1) / bands.length, 1 - place / bands.length) };
}
