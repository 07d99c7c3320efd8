import { hashUnit, type Point, type Street, type StreetFront } from "./street-geometry.ts";

const WALLS = ["#252e55", "#2a345f", "#222a4c", "#2f3a69", "#283159"];
const DARK_PANE = "#1a2040";
const SKY = "#1b2138";
const CLOUDS = { low: ["#222a48", "#2b355d", "#384473"], tall: ["#212946", "#2a345b", "#384574", "#4c5a8d"] };
const PAVING = "#12162a";
const CUT_EDGE = "rgb(160 175 225 / 0.3)";

type Pen = CanvasRenderingContext2D;

function trace(pen: Pen, points: readonly Point[]) {
  points.forEach(([x, y], index) => (index ? pen.lineTo(x, y) : pen.moveTo(x, y)));
}

/** Cuts a sheet: fills the shape with a soft shadow to its right, as paper lying on paper throws one. */
function paintSheet(pen: Pen, colour: string, hasShadow: boolean, shape: () => void) {
  pen.save();
  if (hasShadow) {
    pen.shadowColor = "rgb(8 10 24 / 0.55)";
    pen.shadowBlur = 8;
    pen.shadowOffsetX = 3;
    pen.shadowOffsetY = 1;
  }
  pen.fillStyle = colour;
  pen.beginPath();
  shape();
  pen.closePath();
  pen.fill();
  pen.restore();
}

function paintSky(pen: Pen, street: Street) {
  const { width, height, ground, base, isTall, isSmall, seed } = street;
  pen.fillStyle = SKY;
  pen.fillRect(0, 0, width, height);
  if (!isSmall) {
    pen.fillStyle = "#d5dbef";
    for (let star = 0; star < (isTall ? 46 : 22); star++) {
      const size = 0.7 + hashUnit(star, 33) * 0.9;
      pen.globalAlpha = 0.25 + hashUnit(star, 31) * 0.5;
      pen.fillRect(hashUnit(star, 41) * width, hashUnit(star, 43) * (ground - base) * 0.9, size, size);
    }
    pen.globalAlpha = 1;
  }
  CLOUDS[isTall ? "tall" : "low"].forEach((colour, layer) => {
    const level = ground - base * (isTall ? 1.75 : 1.06) + layer * base * (isTall ? 0.36 : 0.25);
    paintSheet(pen, colour, !isSmall, () => {
      pen.moveTo(-20, height);
      for (let step = 0; step <= 8; step++) {
        pen.lineTo(-20 + (step * (width + 40)) / 8, level + (hashUnit(step + layer * 9, seed) - 0.5) * base * 0.16);
      }
      pen.lineTo(width + 20, height);
    });
  });
  if (isTall) paintMoon(pen, width * 0.8, Math.max(46, height * 0.14), 27 * Math.min(1, height / 500));
}

function paintMoon(pen: Pen, x: number, y: number, radius: number) {
  paintSheet(pen, "#f3e7cc", true, () => {
    pen.arc(x, y, radius, -1.25, 2.8);
    pen.bezierCurveTo(
      x + radius * 0.07,
      y + radius * 0.74,
      x + radius * 0.81,
      y + radius * 0.07,
      x + radius * Math.cos(-1.25),
      y + radius * Math.sin(-1.25),
    );
  });
}

function paintHouse(pen: Pen, front: StreetFront, street: Street) {
  const { ground, isSmall } = street;
  const wall = WALLS[front.wall] ?? WALLS[0] ?? SKY;
  const { chimney } = front;
  if (chimney) paintSheet(pen, wall, true, () => pen.rect(chimney.x, chimney.y, chimney.width, chimney.height));
  paintSheet(pen, wall, !isSmall, () => {
    pen.moveTo(front.x, ground);
    front.roof.forEach(([x, y]) => pen.lineTo(x, y));
    pen.lineTo(front.x + front.width, ground);
  });
  pen.strokeStyle = CUT_EDGE;
  pen.lineWidth = isSmall ? 0.6 : 1;
  pen.beginPath();
  trace(pen, front.roof);
  pen.stroke();
  pen.fillStyle = DARK_PANE;
  front.windows.forEach((pane) => pen.fillRect(pane.x, pane.y, pane.width, pane.height));
  if (!isSmall) {
    // The upper lip of a cut window is in shade, its sill catches light.
    front.windows.forEach((pane) => {
      pen.fillStyle = "rgb(8 10 24 / 0.45)";
      pen.fillRect(pane.x, pane.y, pane.width, 1.5);
      pen.fillStyle = "rgb(160 175 225 / 0.2)";
      pen.fillRect(pane.x - 1, pane.y + pane.height, pane.width + 2, 1);
    });
  }
  const { door, awning } = front;
  if (door) {
    pen.fillStyle = "#151a30";
    pen.fillRect(door.x, door.y, door.width, door.height);
  }
  if (awning) {
    paintSheet(pen, "#35416f", true, () =>
      trace(pen, [
        [awning.left + 3, awning.y],
        [awning.right - 3, awning.y],
        [awning.right, awning.y + awning.depth],
        [awning.left, awning.y + awning.depth],
      ]),
    );
  }
}

/** Paints everything that does not change: sky, clouds, far roofs, dark houses, paving. */
export function paintBackdrop(pen: Pen, street: Street) {
  const { width, height, ground } = street;
  paintSky(pen, street);
  street.farRoofs.forEach((outline, index) =>
    paintSheet(pen, index % 2 ? "#3b487a" : "#34406f", true, () => trace(pen, outline)),
  );
  street.fronts.forEach((front) => paintHouse(pen, front, street));
  pen.fillStyle = PAVING;
  pen.fillRect(0, ground, width, height - ground);
  pen.fillStyle = "rgb(160 175 225 / 0.22)";
  pen.fillRect(0, ground, width, 1);
  pen.fillStyle = "#4a5789";
  street.fronts.forEach((front) => forEachBead(front, street, (x, y, radius) => dot(pen, x, y, radius)));
}

function dot(pen: Pen, x: number, y: number, radius: number) {
  pen.beginPath();
  pen.arc(x, y, radius, 0, Math.PI * 2);
  pen.fill();
}

/** Walks the string of beads along the roof's cut edge. */
function forEachBead(
  front: StreetFront,
  { isSmall, base }: Street,
  visit: (x: number, y: number, radius: number) => void,
) {
  const spacing = isSmall ? 3.4 : Math.max(6, base / 26);
  const radius = isSmall ? 0.9 : Math.max(1.3, base / 130);
  front.roof.slice(1).forEach(([toX, toY], index) => {
    const [fromX, fromY] = front.roof[index] ?? [toX, toY];
    const count = Math.max(1, Math.round(Math.hypot(toX - fromX, toY - fromY) / spacing));
    for (let bead = 0; bead < count; bead++) {
      const along = (bead + 0.5) / count;
      visit(fromX + (toX - fromX) * along, fromY + (toY - fromY) * along + (isSmall ? 1 : 2), radius);
    }
  });
}

/** Paints one front at full light, in one colour ("r g b"), over nothing: drawn once, then laid over the backdrop at the level of the moment. */
export function paintFrontLight(pen: Pen, front: StreetFront, street: Street, colour: string) {
  const { ground, height, isSmall, base } = street;
  const centre = front.x + front.width / 2;
  const reach = Math.max(front.width, front.height) * 0.85;
  const wash = pen.createRadialGradient(
    centre,
    ground - front.height * 0.5,
    0,
    centre,
    ground - front.height * 0.5,
    reach,
  );
  wash.addColorStop(0, `rgb(${colour} / ${isSmall ? 0.2 : 0.13})`);
  wash.addColorStop(1, `rgb(${colour} / 0)`);
  pen.fillStyle = wash;
  pen.fillRect(
    centre - reach,
    ground - front.height * 0.5 - reach,
    reach * 2,
    Math.min(reach * 2, front.height * 0.5 + reach),
  );

  front.windows.forEach((pane, index) => {
    const strength = index % 3 === 1 ? 0.72 : 1;
    pen.save();
    if (!isSmall) {
      pen.shadowColor = `rgb(${colour} / ${0.85 * strength})`;
      pen.shadowBlur = Math.max(6, pane.width * 0.9);
    }
    pen.fillStyle = `rgb(${colour} / ${strength})`;
    pen.fillRect(pane.x, pane.y, pane.width, pane.height);
    pen.restore();
    if (isSmall || pane.width <= 6) return;
    pen.fillStyle = "rgb(20 24 46 / 0.55)";
    pen.fillRect(pane.x + pane.width / 2 - 0.5, pane.y, 1, pane.height);
    pen.fillRect(pane.x, pane.y + pane.height * 0.42, pane.width, 1);
  });
  pen.fillStyle = `rgb(${colour})`;
  pen.shadowColor = `rgb(${colour} / 0.9)`;
  pen.shadowBlur = isSmall ? 0 : base / 40;
  forEachBead(front, street, (x, y, radius) => dot(pen, x, y, radius));
  pen.shadowBlur = 0;

  // The wet paving gives the light back, widened and broken off at the kerb.
  pen.save();
  pen.beginPath();
  pen.rect(0, ground, street.width, height - ground);
  pen.clip();
  pen.translate(centre, ground);
  pen.scale(front.width * 0.72, Math.max(6, (height - ground) * 0.95));
  const pool = pen.createRadialGradient(0, 0, 0, 0, 0, 1);
  pool.addColorStop(0, `rgb(${colour} / 0.5)`);
  pool.addColorStop(1, `rgb(${colour} / 0)`);
  pen.fillStyle = pool;
  pen.fillRect(-1, 0, 2, 1);
  pen.restore();
}
