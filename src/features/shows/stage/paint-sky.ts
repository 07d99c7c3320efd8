import type { Side } from "../../../../shared/contracts/square.ts";
import { SIDES } from "../../../../shared/sides.ts";
import { numbersFrom } from "../../../../sandbox/square/stable-chance.ts";
import { cutSheet } from "./paper.ts";
import type { Context2D } from "./surface.ts";

/** Size of the picture in view pixels; `groundY` is the foot of the houses. */
export interface PictureSize {
  readonly width: number;
  readonly height: number;
  readonly groundY: number;
  readonly dpr: number;
}

/** The blue hour: a graded sky, a few stars, torn clouds and roofs in the haze. */
export function paintSky(context: Context2D, size: PictureSize, side: Side): void {
  const { width, height, groundY, dpr } = size;
  const sky = context.createLinearGradient(0, 0, 0, groundY);
  sky.addColorStop(0, "#1d2442");
  sky.addColorStop(0.3, "#2b3764");
  sky.addColorStop(0.6, "#4d5d8e");
  sky.addColorStop(1, "#8b97ba");
  context.fillStyle = sky;
  context.fillRect(0, 0, width, height);
  paintStars(context, size);
  const turn = SIDES.indexOf(side) * 13;
  const clouds: [number, number, string, number][] = [
    [0.17, 0.05, "#36437a", 21],
    [0.29, 0.055, "#4a598e", 34],
    [0.42, 0.05, "#6273a3", 8],
  ];
  for (const [y, reach, fill, seed] of clouds)
    cutSheet(context, cloudPath(size, groundY * y, groundY * reach, seed + turn), {
      fill,
      blur: 16 * dpr,
      drop: -2 * dpr,
      alpha: 0.28,
    });
  const roofs: [number, string, number][] = [
    [0.5, "#55648f", 5],
    [0.6, "#475480", 77],
  ];
  for (const [y, fill, seed] of roofs)
    cutSheet(context, farRoofsPath(size, groundY * y, groundY * 0.1, seed + turn), {
      fill,
      blur: 10 * dpr,
      drop: -dpr,
      alpha: 0.3,
    });
}

function paintStars(context: Context2D, { width, groundY }: PictureSize): void {
  const next = numbersFrom(11);
  for (let star = 0; star < 46; star += 1) {
    const y = next() ** 1.8 * groundY * 0.5;
    context.fillStyle = `rgba(226,232,252,${0.18 + next() * 0.5})`;
    context.beginPath();
    context.arc(next() * width, y, 0.5 + next() * 0.6, 0, 2 * Math.PI);
    context.fill();
  }
}

function cloudPath({ width, height }: PictureSize, y: number, reach: number, seed: number): Path2D {
  const next = numbersFrom(seed);
  const path = new Path2D();
  let x = -30;
  path.moveTo(x, height);
  path.lineTo(x, y);
  while (x < width + 30) {
    const puff = 50 + next() * 120;
    const rise = reach * (0.4 + next());
    path.bezierCurveTo(x + puff * 0.2, y - rise, x + puff * 0.8, y - rise, x + puff, y + (next() - 0.5) * reach * 0.5);
    x += puff;
  }
  path.lineTo(width + 30, height);
  path.closePath();
  return path;
}

function farRoofsPath({ width, height }: PictureSize, y: number, reach: number, seed: number): Path2D {
  const next = numbersFrom(seed);
  const path = new Path2D();
  let x = -10;
  path.moveTo(x, height);
  while (x < width + 20) {
    const wide = 16 + next() * 30;
    const top = y - next() * reach;
    const kind = next();
    path.lineTo(x, top);
    if (kind < 0.5) path.lineTo(x + wide / 2, top - wide * 0.5);
    else if (kind < 0.56) {
      path.lineTo(x + wide * 0.4, top);
      path.lineTo(x + wide * 0.5, top - reach * 1.9);
      path.lineTo(x + wide * 0.6, top);
    }
    path.lineTo(x + wide, top);
    x += wide;
  }
  path.lineTo(width + 20, height);
  path.closePath();
  return path;
}
