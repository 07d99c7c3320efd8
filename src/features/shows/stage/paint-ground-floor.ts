import { hashText, numbersFrom } from "../../../../sandbox/square/stable-chance.ts";
import type { HouseSheet } from "./paint-house.ts";
import { cutSheet, shade } from "./paper.ts";
import { rectPath } from "./paths.ts";
import type { Context2D } from "./surface.ts";

/** Columns, a shop's board, an awning, a pennant or a marquee: what the street sees first. */
export function paintGroundFloor(context: Context2D, house: HouseSheet): void {
  const { silhouette } = house.front;
  const hasSignLight = house.front.lights.some((light) => light.part === "sign");
  if (silhouette.ground === "columns") paintColumns(context, house);
  if (silhouette.ground === "shop" && silhouette.awning === 0) paintBoard(context, house);
  if (silhouette.sign && silhouette.ground !== "marquee" && !hasSignLight) paintPennant(context, house);
  if (silhouette.awning > 0) paintAwning(context, house);
  if (silhouette.ground === "marquee") paintMarquee(context, house, !hasSignLight);
  if (hasSignLight) paintNameBoard(context, house);
}

function paintColumns(context: Context2D, { facade, ink, soft }: HouseSheet): void {
  const { x, width, groundY, groundFloor: g, unit } = facade;
  for (const share of [0.07, 0.31, 0.63, 0.87]) {
    const left = x + width * share;
    const path = rectPath(left, groundY - g * 0.92, width * 0.06, g * 0.92);
    path.rect(left - width * 0.015, groundY - g * 0.96, width * 0.09, unit * 0.012);
    path.rect(left - width * 0.015, groundY - unit * 0.016, width * 0.09, unit * 0.016);
    cutSheet(context, path, { fill: shade(ink, 0.17), blur: soft(7), drop: soft(3) });
  }
}

/** A shop's board with letters too far away to read. */
function paintBoard(context: Context2D, { facade, front, ink, soft }: HouseSheet): void {
  const { x, width, groundY, groundFloor: g, unit } = facade;
  const board = rectPath(x + width * 0.05, groundY - g * 0.93, width * 0.9, g * 0.16);
  cutSheet(context, board, { fill: shade(ink, -0.2), blur: soft(5), drop: soft(2) });
  const next = numbersFrom(hashText(front.name) + 3);
  context.fillStyle = "rgba(214,220,242,.42)";
  let left = x + width * 0.2;
  while (left < x + width * 0.78) {
    const letters = unit * (0.008 + next() * 0.012);
    context.fillRect(left, groundY - g * 0.875, letters, unit * 0.006);
    left += letters + unit * 0.005;
  }
}

/** An arm with a small pennant, cut from lighter paper. */
function paintPennant(context: Context2D, { facade, ink, soft }: HouseSheet): void {
  const { x, width, groundY, groundFloor, unit, door } = facade;
  const isRight = door.x > x + width / 2;
  const from = x + width * (isRight ? 0.9 : 0.1);
  const way = isRight ? 1 : -1;
  const y = groundY - groundFloor - unit * 0.1;
  const reach = unit * 0.05;
  context.strokeStyle = shade(ink, -0.45);
  context.lineWidth = Math.max(1, unit * 0.0045);
  context.beginPath();
  context.moveTo(from, y);
  context.lineTo(from + way * reach, y);
  context.stroke();
  const size = { width: unit * 0.029, height: unit * 0.05 };
  const left = from + way * reach * 0.62 - size.width / 2;
  const top = y + unit * 0.007;
  const path = new Path2D();
  path.moveTo(left, top);
  path.lineTo(left + size.width, top);
  path.lineTo(left + size.width, top + size.height);
  path.lineTo(left + size.width / 2, top + size.height * 0.74);
  path.lineTo(left, top + size.height);
  path.closePath();
  cutSheet(context, path, { fill: shade(ink, 0.34), blur: soft(7), drop: soft(3), alpha: 0.6 });
  context.fillStyle = shade(ink, -0.3);
  context.fillRect(left + size.width * 0.28, top + size.height * 0.24, size.width * 0.44, size.height * 0.1);
}

function paintAwning(context: Context2D, { facade, front, soft }: HouseSheet): void {
  const { groundFloor: g, unit } = facade;
  const { x, y, width } = facade.awning;
  const isPale = front.silhouette.awning === 1;
  const height = g * 0.26;
  const stripes = Math.max(6, Math.round(width / (unit * 0.034)));
  const stripe = width / stripes;
  const edge = y + height;
  const cloth = new Path2D();
  cloth.moveTo(x + 2, y);
  cloth.lineTo(x + width - 2, y);
  cloth.lineTo(x + width, edge);
  for (let i = stripes - 1; i >= 0; i -= 1) cloth.arc(x + (i + 0.5) * stripe, edge, stripe / 2, 0, Math.PI);
  cloth.closePath();
  cutSheet(context, cloth, { fill: isPale ? "#5d668f" : "#4a5680", blur: soft(12), drop: soft(5), alpha: 0.62 });
  context.save();
  context.clip(cloth);
  context.fillStyle = isPale ? "#8c94b4" : "#6f7ba2";
  for (let i = 0; i < stripes; i += 2) {
    context.beginPath();
    context.moveTo(x + 2 + ((width - 4) * i) / stripes, y);
    context.lineTo(x + 2 + ((width - 4) * (i + 1)) / stripes, y);
    context.lineTo(x + (i + 1) * stripe, edge);
    context.arc(x + (i + 0.5) * stripe, edge, stripe / 2, 0, Math.PI);
    context.closePath();
    context.fill();
  }
  const fall = context.createLinearGradient(0, y, 0, edge + stripe / 2);
  fall.addColorStop(0, "rgba(12,15,36,.05)");
  fall.addColorStop(1, "rgba(12,15,36,.32)");
  context.fillStyle = fall;
  context.fillRect(x - 2, y, width + 4, height + stripe);
  context.restore();
}

function paintMarquee(context: Context2D, house: HouseSheet, isNamed: boolean): void {
  const { facade, ink, soft } = house;
  const { x, width, groundY, groundFloor: g, unit, eaveY, topY } = facade;
  const top = groundY - g * 0.98;
  const height = g * 0.26;
  const roof = new Path2D();
  roof.moveTo(x - width * 0.03, top);
  roof.lineTo(x + width * 1.03, top);
  roof.lineTo(x + width * 1.03, top + height * 0.8);
  roof.lineTo(x + width * 0.94, top + height);
  roof.lineTo(x + width * 0.06, top + height);
  roof.lineTo(x - width * 0.03, top + height * 0.8);
  roof.closePath();
  cutSheet(context, roof, { fill: "#3d4670", blur: soft(16), drop: soft(6), alpha: 0.7 });
  const board = { x: x + width * 0.06, y: top + height * 0.12, width: width * 0.88, height: height * 0.5 };
  cutSheet(context, rectPath(board.x, board.y, board.width, board.height), {
    fill: "#aab0c8",
    blur: soft(3),
    drop: soft(1),
  });
  if (isNamed) paintLetters(context, house.front.name, board);
  const fin = new Path2D();
  fin.roundRect(x + width * 0.44, topY + unit * 0.02, width * 0.12, Math.max(1, eaveY - topY), unit * 0.008);
  cutSheet(context, fin, { fill: shade(ink, 0.2), blur: soft(8), drop: soft(3) });
}

/** The board on which a sign's light hangs. */
function paintNameBoard(context: Context2D, { facade, front, ink, soft }: HouseSheet): void {
  const { x, y, width, height } = facade.sign;
  cutSheet(context, rectPath(x, y, width, height), { fill: shade(ink, -0.3), blur: soft(6), drop: soft(2) });
  context.globalAlpha = 0.5;
  paintLetters(context, front.name, facade.sign, "#d6dcf2");
  context.globalAlpha = 1;
}

function paintLetters(
  context: Context2D,
  text: string,
  box: { readonly x: number; readonly y: number; readonly width: number; readonly height: number },
  fill = "#2a3152",
): void {
  context.fillStyle = fill;
  context.font = `700 ${box.height * 0.8}px "Bricolage Grotesque", sans-serif`;
  context.textAlign = "center";
  context.textBaseline = "middle";
  context.fillText(text.toUpperCase(), box.x + box.width / 2, box.y + box.height * 0.54, box.width * 0.92);
}
