import type { HouseSheet } from "./paint-house.ts";
import { cutSheet, ROOM, shade } from "./paper.ts";
import { addPane, addPoints, closedPath, rectPath } from "./paths.ts";
import type { Context2D } from "./surface.ts";

export function paintChimney(context: Context2D, { facade, ink, soft }: HouseSheet): void {
  if (!facade.chimney) return;
  const { x, y, width, height } = facade.chimney;
  const path = rectPath(x, y, width, height);
  path.rect(x - width * 0.18, y - facade.unit * 0.012, width * 1.36, facade.unit * 0.016);
  cutSheet(context, path, { fill: shade(ink, -0.3), blur: soft(8), drop: soft(2) });
}

export function paintTower(context: Context2D, house: HouseSheet): void {
  const { facade, ink, soft, isSmall } = house;
  if (!facade.tower) return;
  const { body, cap, belfry, clock } = facade.tower;
  const room = rectPath(body.x + 1, body.y + 1, body.width - 2, body.height);
  cutSheet(context, room, { fill: ROOM, blur: 0, drop: 0 });
  const wall = rectPath(body.x, body.y, body.width, body.height + 4);
  if (!isSmall) addPane(wall, belfry);
  cutSheet(context, wall, { fill: shade(ink, 0.06), blur: soft(12), drop: soft(3), alpha: 0.55, rule: "evenodd" });
  cutSheet(context, closedPath(cap), { fill: shade(ink, -0.24), blur: soft(8), drop: soft(3) });
  const face = new Path2D();
  face.arc(clock.x, clock.y, Math.max(1, clock.radius), 0, 2 * Math.PI);
  cutSheet(context, face, { fill: isSmall ? "#b9bccb" : "#c9cbd6", blur: soft(6), drop: soft(2) });
  if (!isSmall) paintClock(context, house);
}

function paintClock(context: Context2D, { facade, ink, soft }: HouseSheet): void {
  if (!facade.tower) return;
  const { body, clock } = facade.tower;
  const { x, y, radius } = clock;
  const tip = Math.min(...facade.tower.cap.map((point) => point.y));
  context.fillStyle = shade(ink, 0.2);
  context.fillRect(x - 0.8, tip - facade.unit * 0.022, 1.6, facade.unit * 0.03);
  const ledge = rectPath(
    body.x - body.width * 0.06,
    body.y + body.width * 1.02,
    body.width * 1.12,
    facade.unit * 0.009,
  );
  cutSheet(context, ledge, { fill: shade(ink, 0.14), blur: soft(4), drop: soft(2) });
  context.strokeStyle = "#2a3152";
  context.lineWidth = Math.max(1, radius * 0.1);
  context.beginPath();
  context.arc(x, y, radius * 0.86, 0, 2 * Math.PI);
  for (let hour = 0; hour < 12; hour += 1) {
    const turn = (hour / 12) * 2 * Math.PI;
    context.moveTo(x + radius * 0.66 * Math.cos(turn), y + radius * 0.66 * Math.sin(turn));
    context.lineTo(x + radius * 0.78 * Math.cos(turn), y + radius * 0.78 * Math.sin(turn));
  }
  context.stroke();
  context.lineWidth = Math.max(1.2, radius * 0.13);
  context.lineCap = "round";
  context.beginPath();
  context.moveTo(x - radius * 0.3, y + radius * 0.34);
  context.lineTo(x, y);
  context.lineTo(x - radius * 0.36, y - radius * 0.5);
  context.stroke();
}

/** A hip roof is a darker sheet of its own, with scallops for tiles. */
export function paintTiles(context: Context2D, { facade, front, ink, soft }: HouseSheet): void {
  if (front.silhouette.roof !== "hip") return;
  const roof = new Path2D();
  addPoints(roof, [
    { x: facade.x - 2, y: facade.eaveY },
    ...facade.roof.slice(1, -1),
    { x: facade.x + facade.width + 2, y: facade.eaveY },
  ]);
  roof.closePath();
  cutSheet(context, roof, { fill: shade(ink, -0.26), blur: soft(7), drop: soft(2) });
  context.save();
  context.clip(roof);
  context.strokeStyle = "rgba(200,210,245,.09)";
  context.lineWidth = 1;
  const size = facade.unit * 0.024;
  let row = 0;
  for (let y = facade.topY + size; y < facade.eaveY + size; y += size * 0.8) {
    for (let x = facade.x - size + ((row % 2) * size) / 2; x < facade.x + facade.width + size; x += size) {
      context.beginPath();
      context.arc(x, y - size * 0.5, size / 2, 0, Math.PI);
      context.stroke();
    }
    row += 1;
  }
  context.restore();
}
