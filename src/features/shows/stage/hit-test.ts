import type { FrontGeometry, LightGeometry } from "../../../../sandbox/square/geometry.ts";

/** What lies under a place of the stage: a front, and the light of it if one is near enough. */
export interface StageHit {
  readonly front: FrontGeometry;
  readonly light: LightGeometry | null;
}

/** A lamp is hit within this many view pixels; fingers are wide. */
const REACH = 7;

/** The front and light at a place in view pixels, or null. Trees stand before the houses. */
export function findHit(fronts: readonly FrontGeometry[], x: number, y: number): StageHit | null {
  const front = fronts.findLast((candidate) => isOnFront(candidate, x, y));
  return front ? { front, light: findLight(front, x, y) } : null;
}

function isOnFront(front: FrontGeometry, x: number, y: number): boolean {
  const { tree, facade } = front;
  if (y > front.groundY) return false;
  if (tree) {
    const share = (y - tree.y) / tree.height;
    return share >= -0.05 && Math.abs(x - tree.x - tree.width / 2) <= Math.max(0.12, share) * (tree.width / 2) + 4;
  }
  if (x < front.x || x > front.x + front.width) return false;
  if (y >= front.y) return true;
  if (!facade?.tower) return false;
  const { body, cap } = facade.tower;
  return x >= body.x && x <= body.x + body.width && y >= Math.min(...cap.map((point) => point.y));
}

function findLight(front: FrontGeometry, x: number, y: number): LightGeometry | null {
  let nearest: LightGeometry | null = null;
  let least = REACH;
  for (const light of front.lights)
    for (const bead of light.beads) {
      const distance = Math.hypot(bead.x - x, bead.y - y);
      if (distance < least) [least, nearest] = [distance, light];
    }
  return nearest ?? front.lights.find((light) => light.panes.some((pane) => isInPane(pane, x, y))) ?? null;
}

function isInPane(pane: { x: number; y: number; width: number; height: number }, x: number, y: number): boolean {
  return x >= pane.x && x <= pane.x + pane.width && y >= pane.y && y <= pane.y + pane.height;
}
