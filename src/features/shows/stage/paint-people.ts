import type { PictureSize } from "./paint-sky.ts";
import { cutSheet } from "./paper.ts";
import type { Context2D } from "./surface.ts";

type Hat = "brim" | "bobble" | "bun";

interface Onlooker {
  /** Across the picture, 0 to 1. */
  readonly place: number;
  /** Drop below the common line and size, in heads. */
  readonly drop: number;
  readonly size: number;
  readonly hat: Hat;
  readonly isFront: boolean;
}

const ONLOOKERS: readonly Onlooker[] = [
  { place: 0.028, drop: -0.2, size: 0.95, hat: "brim", isFront: false },
  { place: 0.115, drop: 0.3, size: 0.8, hat: "bobble", isFront: false },
  { place: 0.07, drop: 0.55, size: 1.1, hat: "bun", isFront: true },
  { place: 0.165, drop: 1.5, size: 0.74, hat: "bobble", isFront: true },
  { place: 0.885, drop: 0.1, size: 0.95, hat: "bobble", isFront: false },
  { place: 0.93, drop: 0.7, size: 1.12, hat: "brim", isFront: true },
  { place: 0.975, drop: 0.1, size: 1, hat: "bun", isFront: false },
  { place: 0.838, drop: 1.45, size: 0.72, hat: "bobble", isFront: true },
];

/** Onlookers in the nearest, darkest sheet: heads and shoulders, cropped by the lower edge. */
export function paintPeople(context: Context2D, size: PictureSize, unit: number): void {
  const head = unit * 0.041;
  for (const onlooker of ONLOOKERS)
    paintOnlooker(context, size, {
      x: size.width * onlooker.place,
      chin: size.height - head * 2.5 + onlooker.drop * head,
      head: head * onlooker.size,
      hat: onlooker.hat,
      fill: onlooker.isFront ? "#151a33" : "#1c2344",
    });
  const edge = context.createLinearGradient(0, size.height - 12, 0, size.height);
  edge.addColorStop(0, "rgba(6,8,22,0)");
  edge.addColorStop(1, "rgba(6,8,22,.6)");
  context.fillStyle = edge;
  context.fillRect(0, size.height - 12, size.width, 12);
}

interface Figure {
  readonly x: number;
  readonly chin: number;
  readonly head: number;
  readonly hat: Hat;
  readonly fill: string;
}

function paintOnlooker(context: Context2D, size: PictureSize, figure: Figure): void {
  const { x, chin, head: s, fill } = figure;
  const { dpr } = size;
  const foot = size.height + 4;
  const shoulders = new Path2D();
  shoulders.moveTo(x - s * 2.3, foot);
  shoulders.bezierCurveTo(x - s * 2.25, chin + s, x - s * 1.7, chin + s * 0.62, x - s * 0.62, chin + s * 0.42);
  shoulders.lineTo(x - s * 0.5, chin - s * 0.1);
  shoulders.lineTo(x + s * 0.5, chin - s * 0.1);
  shoulders.lineTo(x + s * 0.62, chin + s * 0.42);
  shoulders.bezierCurveTo(x + s * 1.7, chin + s * 0.62, x + s * 2.25, chin + s, x + s * 2.3, foot);
  shoulders.closePath();
  cutSheet(context, shoulders, { fill, blur: 9 * dpr, drop: -dpr });
  const face = new Path2D();
  face.ellipse(x, chin - s * 0.78, s * 0.86, s, 0, 0, 2 * Math.PI);
  cutSheet(context, face, { fill, blur: 0, drop: 0 });
  cutSheet(context, hatPath(figure), {
    fill: figure.hat === "bobble" ? "#252d54" : fill,
    blur: 4 * dpr,
    drop: dpr,
    alpha: 0.4,
  });
  const scarf = new Path2D();
  scarf.roundRect(x - s * 0.78, chin - s * 0.12, s * 1.56, s * 0.58, s * 0.24);
  cutSheet(context, scarf, { fill: "#28305a", blur: 4 * dpr, drop: dpr, alpha: 0.4 });
}

function hatPath({ x, chin, head: s, hat }: Figure): Path2D {
  const y = chin - s * 0.78;
  const path = new Path2D();
  if (hat === "bobble") {
    path.moveTo(x - s * 0.98, y - s * 0.08);
    path.bezierCurveTo(x - s * 0.95, y - s * 1.35, x + s * 0.95, y - s * 1.35, x + s * 0.98, y - s * 0.08);
    path.closePath();
    path.moveTo(x + s * 0.36, y - s * 1.28);
    path.arc(x, y - s * 1.28, s * 0.36, 0, 2 * Math.PI);
  } else if (hat === "brim") {
    path.ellipse(x, y - s * 0.38, s * 1.5, s * 0.2, 0, 0, 2 * Math.PI);
    path.moveTo(x - s * 0.84, y - s * 0.42);
    path.bezierCurveTo(x - s * 0.8, y - s * 1.4, x + s * 0.8, y - s * 1.4, x + s * 0.84, y - s * 0.42);
    path.closePath();
  } else {
    path.arc(x + s * 0.1, y - s * 1.12, s * 0.44, 0, 2 * Math.PI);
  }
  return path;
}
