import type { Facade, Opening } from "../../../../sandbox/square/facade.ts";
import type { Pane, Point, Rect } from "../../../../sandbox/square/shapes.ts";

export function addPane(path: Path2D, pane: Pane): void {
  const { x, y, width, height } = pane;
  if (pane.shape === "rect") {
    path.rect(x, y, width, height);
  } else if (pane.shape === "round") {
    path.moveTo(x + width, y + height / 2);
    path.ellipse(x + width / 2, y + height / 2, width / 2, height / 2, 0, 0, 2 * Math.PI);
  } else {
    const radius = width / 2;
    path.moveTo(x, y + height);
    path.lineTo(x, y + radius);
    path.arc(x + radius, y + radius, radius, Math.PI, 0);
    path.lineTo(x + width, y + height);
    path.closePath();
  }
}

export function panesPath(panes: readonly Pane[]): Path2D {
  const path = new Path2D();
  for (const pane of panes) addPane(path, pane);
  return path;
}

export function rectPath(x: number, y: number, width: number, height: number): Path2D {
  const path = new Path2D();
  path.rect(x, y, width, height);
  return path;
}

export function addPoints(path: Path2D, points: readonly Point[]): void {
  points.forEach((point, i) => (i === 0 ? path.moveTo(point.x, point.y) : path.lineTo(point.x, point.y)));
}

export function closedPath(points: readonly Point[]): Path2D {
  const path = new Path2D();
  addPoints(path, points);
  path.closePath();
  return path;
}

/** The whole house as one outline, its tower included. */
export function outlinePath(facade: Facade): Path2D {
  const path = new Path2D();
  addPoints(path, [
    { x: facade.x, y: facade.groundY },
    ...facade.roof,
    { x: facade.x + facade.width, y: facade.groundY },
  ]);
  path.closePath();
  if (facade.tower) {
    const { body, cap } = facade.tower;
    path.rect(body.x, body.y, body.width, body.height);
    addPoints(path, cap);
    path.closePath();
  }
  return path;
}

/** The bars that divide an opening into panes. */
export function listBars(opening: Opening, thickness: number): Rect[] {
  const { x, y, width, height, columns, rows } = opening;
  if (opening.shape === "round") return [];
  const arch = opening.shape === "arch" ? width / 2 : 0;
  const bars: Rect[] = [];
  for (let column = 1; column < columns; column += 1)
    bars.push({
      x: x + (width * column) / columns - thickness / 2,
      y: y + arch,
      width: thickness,
      height: height - arch,
    });
  for (let row = 1; row < rows; row += 1)
    bars.push({ x, y: y + arch + ((height - arch) * row) / rows - thickness / 2, width, height: thickness });
  if (arch > 0) bars.push({ x, y: y + arch - thickness / 2, width, height: thickness });
  return bars;
}
