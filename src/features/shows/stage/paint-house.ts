import type { Facade } from "../../../../sandbox/square/facade.ts";
import type { FrontGeometry } from "../../../../sandbox/square/geometry.ts";
import { paintGroundFloor } from "./paint-ground-floor.ts";
import { paintChimney, paintTower, paintTiles } from "./paint-roof.ts";
import { cutSheet, ROOM, shade, sheetOf, toCss, type Ink } from "./paper.ts";
import { addPane, addPoints, listBars, outlinePath, rectPath } from "./paths.ts";
import type { Context2D } from "./surface.ts";

/** Where and how finely a house is painted. */
export interface PaintScale {
  /** Device pixels of one view pixel. */
  readonly dpr: number;
  /** True in the strip of all fronts: no shadows of small things, no ornaments. */
  readonly isSmall: boolean;
}

/** A facade, with what its painters share. */
export interface HouseSheet {
  readonly facade: Facade;
  readonly front: FrontGeometry;
  readonly ink: Ink;
  readonly isSmall: boolean;
  /** A shadow's size in device pixels, from its size in a view of 300 pixels a unit. */
  readonly soft: (size: number) => number;
}

const FLAT_ROOFS = ["parapet", "pediment", "hip", "round", "deco", "tower"];

/** Paints one unlit house: dark rooms, the facade with its windows cut out, and what hangs on it. */
export function paintHouse(context: Context2D, front: FrontGeometry, scale: PaintScale): void {
  if (!front.facade) return;
  const { facade } = front;
  const factor = (scale.isSmall ? 0.25 : facade.unit / 300) * scale.dpr;
  const house: HouseSheet = {
    facade,
    front,
    ink: sheetOf(front.side, front.place),
    isSmall: scale.isSmall,
    soft: (size) => size * factor,
  };
  paintChimney(context, house);
  paintTower(context, house);
  paintWall(context, house);
  if (scale.isSmall) return;
  paintTiles(context, house);
  paintMouldings(context, house);
  paintBars(context, house);
  paintDoor(context, house);
  paintGroundFloor(context, house);
}

function paintWall(context: Context2D, house: HouseSheet): void {
  const { facade, front, ink, soft } = house;
  const { x, y, width, height, groundY, unit } = facade;
  const outline = new Path2D();
  addPoints(outline, [{ x, y: groundY }, ...facade.roof, { x: x + width, y: groundY }]);
  outline.closePath();
  context.save();
  context.clip(outline);
  context.fillStyle = ROOM;
  context.fillRect(x + 1, y, width - 2, height);
  context.restore();
  const cut = new Path2D(outline);
  for (const opening of [...facade.openings, facade.door]) addPane(cut, opening);
  const fill = toCss(ink);
  cutSheet(
    context,
    cut,
    front.isNear
      ? { fill, blur: soft(22), drop: soft(5), alpha: 0.72, rule: "evenodd" }
      : { fill, blur: soft(10), drop: soft(2), alpha: 0.6, rule: "evenodd" },
  );
  context.save();
  context.clip(cut, "evenodd");
  const fall = context.createLinearGradient(0, y, 0, groundY);
  fall.addColorStop(0, "rgba(190,202,240,.10)");
  fall.addColorStop(0.5, "rgba(120,130,180,0)");
  fall.addColorStop(1, "rgba(10,12,30,.34)");
  context.fillStyle = fall;
  context.fillRect(x, y, width, height);
  context.restore();
  // The cut edge catches the sky.
  context.strokeStyle = "rgba(206,214,244,.30)";
  context.lineWidth = house.isSmall ? 0.5 : Math.max(0.8, unit * 0.003);
  context.lineJoin = "round";
  const lip = new Path2D();
  addPoints(
    lip,
    facade.roof.map((point) => ({ x: point.x, y: point.y + 0.5 })),
  );
  context.stroke(lip);
}

function paintMouldings(context: Context2D, house: HouseSheet): void {
  const { facade, front, ink, soft } = house;
  const { x, width, unit, groundY, groundFloor, eaveY } = facade;
  const roof = front.silhouette.roof;
  const band = (y: number, height: number, tone: number, over: number) =>
    cutSheet(context, rectPath(x - over, y, width + 2 * over, height), {
      fill: shade(ink, tone),
      blur: soft(5),
      drop: soft(2),
      alpha: 0.45,
    });
  band(groundY - groundFloor - unit * 0.012, unit * 0.011, 0.12, 1);
  if (FLAT_ROOFS.includes(roof)) band(eaveY - unit * 0.002, unit * 0.012, 0.16, roof === "hip" ? 3 : 1);
  if (roof === "pediment" || roof === "tower") {
    context.strokeStyle = shade(ink, 0.2);
    context.lineWidth = unit * 0.008;
    const edge = new Path2D();
    addPoints(
      edge,
      facade.roof.slice(1, -1).map((point) => ({ x: point.x, y: point.y + unit * 0.008 })),
    );
    context.stroke(edge);
  }
  for (const sill of facade.sills)
    cutSheet(context, rectPath(sill.x, sill.y, sill.width, sill.height), {
      fill: shade(ink, 0.2),
      blur: soft(3),
      drop: soft(1.5),
    });
}

function paintBars(context: Context2D, { facade, ink }: HouseSheet): void {
  context.fillStyle = shade(ink, -0.08);
  for (const opening of facade.openings)
    for (const bar of listBars(opening, barThickness(facade.unit)))
      context.fillRect(bar.x, bar.y, bar.width, bar.height);
}

/** Width of a window bar; lit panes leave the same gap. */
export function barThickness(unit: number): number {
  return Math.max(0.8, unit * 0.0036);
}

function paintDoor(context: Context2D, { facade, ink, soft }: HouseSheet): void {
  const { door, groundY, unit } = facade;
  const hole = new Path2D();
  addPane(hole, door);
  context.save();
  context.clip(hole);
  context.fillStyle = "#242b49";
  context.fillRect(door.x + door.width * 0.1, door.y + door.height * 0.14, door.width * 0.8, door.height);
  context.fillStyle = "#1a2038";
  context.fillRect(door.x + door.width * 0.22, door.y + door.height * 0.26, door.width * 0.56, door.height * 0.26);
  context.restore();
  const step = rectPath(door.x - door.width * 0.18, groundY - unit * 0.008, door.width * 1.36, unit * 0.012);
  cutSheet(context, step, { fill: shade(ink, 0.1), blur: soft(3), drop: soft(1) });
}

/** The clip that keeps light on the paper of its own house. */
export function wallClip(front: FrontGeometry): Path2D | null {
  return front.facade ? outlinePath(front.facade) : null;
}
