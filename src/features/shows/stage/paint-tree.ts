import type { FrontGeometry } from "../../../../sandbox/square/geometry.ts";
import type { PaintScale } from "./paint-house.ts";
import { cutSheet, layGrain, mixInk, toCss, type Ink } from "./paper.ts";
import { closedPath } from "./paths.ts";
import type { Context2D } from "./surface.ts";

const LOW: Ink = [33, 50, 66];
const HIGH: Ink = [58, 78, 98];

/** Paints an unlit tree: layers of branches, each a sheet on the one below, and a pale tip. */
export function paintTree(context: Context2D, front: FrontGeometry, scale: PaintScale): void {
  const { tree } = front;
  if (!tree) return;
  const soft = scale.isSmall ? 0.3 : 1;
  context.fillStyle = "#1a2036";
  context.fillRect(tree.trunk.x, tree.trunk.y, tree.trunk.width, tree.trunk.height);
  tree.layers.forEach((layer, i) =>
    cutSheet(context, closedPath(layer), {
      fill: toCss(mixInk(LOW, HIGH, i / tree.layers.length)),
      blur: 10 * scale.dpr * soft,
      drop: 3 * scale.dpr * soft,
      alpha: 0.6,
    }),
  );
  const { x, y, width, height } = tree.star;
  const tip = new Path2D();
  tip.arc(x + width / 2, y + height / 2, width * 0.26, 0, 2 * Math.PI);
  cutSheet(context, tip, { fill: "#a9adbf", blur: 5 * scale.dpr * soft, drop: 2 * scale.dpr * soft });
  if (!scale.isSmall)
    layGrain(context, "source-atop", 0.6, {
      x: tree.x - 40,
      y: tree.y - 40,
      width: tree.width + 80,
      height: tree.height + 80,
    });
}
