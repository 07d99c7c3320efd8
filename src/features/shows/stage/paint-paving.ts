import { numbersFrom } from "../../../../sandbox/square/stable-chance.ts";
import type { PictureSize } from "./paint-sky.ts";
import { cutSheet } from "./paper.ts";
import { rectPath } from "./paths.ts";
import { createSurface, type Surface, type Context2D } from "./surface.ts";

const ROWS = 8;
/** The reflection is drawn at half size: wet stone is never sharp. */
export const REFLECTION_SCALE = 2;

/** The lines between rows of stones, nearer ones further apart. */
function stoneRows({ height, groundY }: PictureSize): number[] {
  const paving = height - groundY;
  return Array.from({ length: ROWS + 1 }, (_, i) => groundY + 5 + (paving - 5) * (i / ROWS) ** 1.75);
}

/** Wet paving: a dark mirror of what is drawn above it, stones in perspective, a kerb. */
export function paintPaving(context: Context2D, size: PictureSize): void {
  const { width, height, groundY, dpr } = size;
  const paving = height - groundY;
  const ground = context.createLinearGradient(0, groundY, 0, height);
  ground.addColorStop(0, "#262d4c");
  ground.addColorStop(0.3, "#2b3355");
  ground.addColorStop(1, "#171c32");
  context.fillStyle = ground;
  context.fillRect(0, groundY, width, paving);
  context.save();
  context.beginPath();
  context.rect(0, groundY, width, paving);
  context.clip();
  context.globalAlpha = 0.26;
  context.filter = `blur(${2 * dpr}px)`;
  context.translate(0, groundY);
  context.scale(1, -0.42);
  context.drawImage(context.canvas, 0, 0, width * dpr, groundY * dpr, 0, -groundY, width, groundY);
  context.restore();
  paintStones(context, size);
  cutSheet(context, rectPath(0, groundY - 1, width, Math.max(3, paving * 0.06)), {
    fill: "#3a4468",
    blur: 6 * dpr,
    drop: 2 * dpr,
  });
}

function paintStones(context: Context2D, size: PictureSize): void {
  const { width, height, groundY } = size;
  const paving = height - groundY;
  const rows = stoneRows(size);
  const spread = (y: number) => 1 + ((y - groundY) / paving) * 1.5;
  const stone = width / 26;
  context.strokeStyle = "rgba(12,15,34,.34)";
  context.lineWidth = 1;
  context.beginPath();
  rows.slice(0, -1).forEach((y, row) => {
    const below = rows[row + 1] ?? height;
    context.moveTo(0, y);
    context.lineTo(width, y);
    for (let j = -30; j < 31; j += 1) {
      const from = (j + (row % 2) * 0.5) * stone;
      context.moveTo(width / 2 + from * spread(y), y);
      context.lineTo(width / 2 + from * spread(below), below);
    }
  });
  context.stroke();
  context.strokeStyle = "rgba(190,202,240,.06)";
  context.beginPath();
  for (const y of rows) {
    context.moveTo(0, y + 1);
    context.lineTo(width, y + 1);
  }
  context.stroke();
}

/** Where wet stones throw light back, stone by stone, fading towards the viewer. */
export function createReflectionMask(size: PictureSize): Surface {
  const paving = size.height - size.groundY;
  const mask = createSurface(size.width / REFLECTION_SCALE, paving / REFLECTION_SCALE);
  const { context } = mask;
  const { width, height } = mask.canvas;
  const next = numbersFrom(99);
  const rows = stoneRows(size);
  context.fillStyle = "rgba(255,255,255,.30)";
  context.fillRect(0, 0, width, height);
  rows.slice(0, -1).forEach((y, row) => {
    const top = (y - size.groundY) / REFLECTION_SCALE;
    const bottom = ((rows[row + 1] ?? size.height) - size.groundY) / REFLECTION_SCALE;
    const stone = 6 + (14 * row) / ROWS;
    let x = -next() * stone;
    while (x < width) {
      context.fillStyle = `rgba(255,255,255,${0.12 + next() * 0.72})`;
      context.fillRect(x, top + 0.4, stone * 0.94, bottom - top - 0.8);
      x += stone * (0.7 + next() * 0.6);
    }
  });
  context.globalCompositeOperation = "destination-in";
  const fade = context.createLinearGradient(0, 0, 0, height);
  fade.addColorStop(0, "rgba(0,0,0,1)");
  fade.addColorStop(0.55, "rgba(0,0,0,.62)");
  fade.addColorStop(1, "rgba(0,0,0,.12)");
  context.fillStyle = fade;
  context.fillRect(0, 0, width, height);
  return mask;
}
