import type { FrontGeometry } from "../../../../sandbox/square/geometry.ts";
import type { Context2D } from "./surface.ts";

/** Strings that are not lit: dull beads on a thin wire. */
export function paintBeads(context: Context2D, front: FrontGeometry, unit: number, isSmall: boolean): void {
  const radius = isSmall ? 0.5 : Math.max(0.95, unit * 0.0036);
  const isTree = front.tree !== null;
  for (const light of front.lights) {
    const isPixel = light.lightId.split("/").length === 3;
    const size = radius * (isPixel ? 1.25 : isTree ? 1.1 : 1);
    context.fillStyle = isSmall ? "rgba(150,156,184,.35)" : isPixel ? "#8f95ae" : isTree ? "#8088a6" : "#7d84a3";
    context.beginPath();
    for (const { x, y } of light.beads) {
      context.moveTo(x + size, y);
      context.arc(x, y, size, 0, 2 * Math.PI);
    }
    context.fill();
    if (isSmall || isTree) continue;
    context.fillStyle = "rgba(225,230,248,.55)";
    for (const { x, y } of light.beads)
      context.fillRect(x - radius * 0.6, y - radius * 0.7, radius * 0.6, radius * 0.6);
  }
}
