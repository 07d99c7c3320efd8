import type { Silhouette } from "../../shared/contracts/square.ts";
import type { Pane, Point, Rect } from "./shapes.ts";
import { roofPoints } from "./roof-points.ts";
import { hashText } from "./stable-chance.ts";

/** A hole in a facade. `columns` and `rows` say how bars divide it. */
export interface Opening extends Pane {
  readonly kind: "window" | "attic" | "shop" | "door";
  readonly columns: number;
  readonly rows: number;
}

/** The clock tower on a "tower" roof. */
export interface Tower {
  readonly body: Rect;
  /** The pointed cap, left to right. */
  readonly cap: readonly Point[];
  readonly clock: Point & { readonly radius: number };
  readonly belfry: Pane;
}

/** Where everything of one house is, in pixels of the view. Nothing here depends on its lights. */
export interface Facade extends Rect {
  /** y of the ground, the eave and the highest point of the roof. */
  readonly groundY: number;
  readonly eaveY: number;
  readonly topY: number;
  /** Height of the ground floor. */
  readonly groundFloor: number;
  /** Pixels of one unit of the silhouette. */
  readonly unit: number;
  readonly roof: readonly Point[];
  /** All openings but the door. */
  readonly openings: readonly Opening[];
  readonly sills: readonly Rect[];
  readonly door: Opening;
  /** The cloth over the ground floor, where there is one (or where a light hangs on one). */
  readonly awning: Rect;
  /** The board or pennant, where there is one (or where a light hangs on one). */
  readonly sign: Rect;
  readonly chimney: Rect | null;
  readonly tower: Tower | null;
}

interface Frame {
  readonly silhouette: Silhouette;
  readonly x: number;
  readonly width: number;
  readonly unit: number;
  readonly groundY: number;
  readonly eave: number;
  readonly top: number;
  readonly groundFloor: number;
  /** A stable number of this house, for its small differences. */
  readonly mark: number;
}

function windowSize(frame: Frame, floorHeight: number): { width: number; height: number } {
  const { silhouette, unit } = frame;
  const bay = (frame.width * 0.86) / silhouette.bays;
  const isWide = silhouette.window === "wide";
  const isTall = silhouette.window === "tall";
  const width = Math.min(bay * (isWide ? 0.74 : isTall ? 0.42 : 0.54), unit * 0.1);
  return { width, height: Math.min(floorHeight * (isTall ? 0.86 : 0.66), width * (isWide ? 1.1 : isTall ? 5 : 2)) };
}

function upperWindows(frame: Frame): Opening[] {
  const { silhouette, unit, groundY } = frame;
  const low = frame.groundFloor + unit * 0.028;
  const high = frame.eave - unit * (silhouette.roof === "parapet" || silhouette.roof === "deco" ? 0.035 : 0.02);
  const floorHeight = Math.max(1, (high - low) / silhouette.floors);
  const bay = (frame.width * 0.86) / silhouette.bays;
  const size = windowSize(frame, floorHeight);
  const found: Opening[] = [];
  for (let floor = 0; floor < silhouette.floors; floor += 1) {
    for (let b = 0; b < silhouette.bays; b += 1) {
      found.push({
        kind: "window",
        shape: silhouette.window === "arch" ? "arch" : "rect",
        x: frame.x + frame.width * 0.07 + bay * (b + 0.5) - size.width / 2,
        y: groundY - low - floorHeight * (floor + 0.5) - size.height / 2,
        ...size,
        columns: silhouette.window === "wide" ? 3 : 2,
        rows: silhouette.window === "tall" ? 5 : 2,
      });
    }
  }
  return found;
}

function atticWindow(frame: Frame): Opening[] {
  const { silhouette, unit, groundY, x, width } = frame;
  const rise = frame.top - frame.eave;
  const middle = x + width / 2;
  const round = (radius: number, height: number): Opening[] => [
    {
      kind: "attic",
      shape: "round",
      x: middle - radius,
      y: groundY - height - radius,
      width: 2 * radius,
      height: 2 * radius,
      columns: 1,
      rows: 1,
    },
  ];
  if (silhouette.roof === "round") return round(Math.min(width * 0.13, rise * 0.36), frame.eave + rise * 0.34);
  if (silhouette.roof === "pediment") return round(rise * 0.24, frame.eave + rise * 0.36);
  if (!["gable", "step", "bell"].includes(silhouette.roof) || rise <= unit * 0.1) return [];
  const size = Math.min(width * 0.2, rise * 0.36);
  const y = groundY - frame.eave - rise * 0.26;
  if (frame.mark % 2 === 0) return round(size * 0.5, frame.eave + rise * 0.26);
  return [
    {
      kind: "attic",
      shape: "arch",
      x: middle - size / 2,
      y: y - size * 0.75,
      width: size,
      height: size * 1.3,
      columns: 2,
      rows: 1,
    },
  ];
}

/** Two openings beside a door in the middle, centred at these shares of the width. */
function besideDoor(
  frame: Frame,
  shares: readonly number[],
  box: { width: number; top: number; height: number },
  shape: "rect" | "arch",
  rows: number,
): Opening[] {
  return shares.map((share) => ({
    kind: "window",
    shape,
    x: frame.x + frame.width * share - box.width / 2,
    y: frame.groundY - box.top,
    width: box.width,
    height: box.height,
    columns: 2,
    rows,
  }));
}

function groundFloor(frame: Frame): { openings: Opening[]; door: Opening } {
  const { silhouette, unit, x, width, groundY } = frame;
  const g = frame.groundFloor;
  const leaf = Math.min(width * 0.2, unit * 0.075);
  const door = (left: number, share: number, shape: "rect" | "arch"): Opening => ({
    kind: "door",
    shape,
    x: left,
    y: groundY - g * 0.72,
    width: leaf * share,
    height: g * 0.72,
    columns: 1,
    rows: 1,
  });
  const middle = x + width / 2;
  switch (silhouette.ground) {
    case "shop": {
      const isFlipped = frame.mark % 3 === 0;
      const left = isFlipped ? x + width * 0.17 + leaf : x + width * 0.09;
      const glass = width * 0.74 - leaf;
      const shop: Opening = {
        kind: "shop",
        shape: "rect",
        x: left,
        y: groundY - g * 0.7,
        width: glass,
        height: g * 0.56,
        columns: Math.max(2, Math.round(glass / (unit * 0.055))),
        rows: 1,
      };
      return { openings: [shop], door: door(isFlipped ? x + width * 0.1 : x + width * 0.9 - leaf, 1, "rect") };
    }
    case "door": {
      const pane = Math.min(width * 0.2, unit * 0.09);
      return {
        openings: besideDoor(frame, [0.2, 0.8], { width: pane, top: g * 0.72, height: g * 0.46 }, "rect", 2),
        door: door(middle - leaf * 0.6, 1.2, "arch"),
      };
    }
    case "marquee":
      return {
        openings: besideDoor(frame, [0.16, 0.84], { width: width * 0.18, top: g * 0.62, height: g * 0.44 }, "rect", 1),
        door: door(middle - leaf * 0.75, 1.5, "rect"),
      };
    case "arches":
    case "columns": {
      const shape = silhouette.ground === "arches" ? "arch" : "rect";
      return {
        openings: besideDoor(frame, [0.18, 0.82], { width: width * 0.15, top: g * 0.74, height: g * 0.62 }, shape, 2),
        door: door(middle - leaf * 0.6, 1.2, "arch"),
      };
    }
  }
}

function tower(frame: Frame): Tower | null {
  if (frame.silhouette.roof !== "tower") return null;
  const { unit, x, width, groundY } = frame;
  const middle = x + width / 2;
  const wide = width * 0.26;
  const base = groundY - frame.eave - (frame.top - frame.eave) * 0.5;
  const top = groundY - unit * 0.86;
  const left = middle - wide / 2;
  return {
    body: { x: left, y: top, width: wide, height: base - top },
    cap: [
      { x: left - wide * 0.1, y: top },
      { x: middle, y: groundY - unit * 0.985 },
      { x: left + wide * 1.1, y: top },
    ],
    clock: { x: middle, y: top + wide * 0.62, radius: wide * 0.36 },
    belfry: { shape: "arch", x: middle - wide * 0.22, y: top + wide * 1.12, width: wide * 0.44, height: wide * 0.62 },
  };
}

function chimney(frame: Frame): Rect | null {
  const { silhouette, unit, x, width, groundY } = frame;
  if (silhouette.chimney === 0) return null;
  const isSteep = ["gable", "step", "bell"].includes(silhouette.roof);
  const fromMiddle = Math.abs(2 * silhouette.chimney - 1);
  const height = isSteep ? frame.top + (frame.eave - frame.top) * fromMiddle : frame.top;
  return {
    x: x + width * silhouette.chimney,
    y: groundY - height - unit * 0.05,
    width: Math.max(2, width * 0.085),
    height: unit * 0.16,
  };
}

function sills(openings: readonly Opening[], unit: number): Rect[] {
  return openings
    .filter((opening) => opening.kind !== "shop" && opening.shape !== "round")
    .map((opening) => ({
      x: opening.x - opening.width * 0.18,
      y: opening.y + opening.height,
      width: opening.width * 1.36,
      height: unit * 0.007,
    }));
}

/** Where a house is put: its left edge, width, the ground, and the pixels of one silhouette unit. */
export interface Plot {
  readonly x: number;
  readonly width: number;
  readonly groundY: number;
  readonly unit: number;
}

/** Every line of a house on its plot. `name` decides its small differences (which way a shop faces). */
export function facadeOf(name: string, silhouette: Silhouette, plot: Plot): Facade {
  const { x, width, unit, groundY } = plot;
  const eave = silhouette.eave * unit;
  const top = silhouette.top * unit;
  const g = Math.min(unit * 0.185, eave * 0.42);
  const frame: Frame = { silhouette, x, width, unit, groundY, eave, top, groundFloor: g, mark: hashText(name) };
  const ground = groundFloor(frame);
  const openings = [...upperWindows(frame), ...atticWindow(frame), ...ground.openings];
  const isMarquee = silhouette.ground === "marquee";
  return {
    x,
    width,
    groundY,
    unit,
    y: groundY - top,
    height: top,
    eaveY: groundY - eave,
    topY: groundY - top,
    groundFloor: g,
    roof: roofPoints(silhouette.roof, { width, eave, top }).map((point) => ({ x: x + point.x, y: groundY - point.y })),
    openings,
    sills: sills(openings, unit),
    door: ground.door,
    awning: { x: x + width * 0.05, y: groundY - g * 0.95, width: width * 0.9, height: g * 0.2 },
    sign: isMarquee
      ? { x: x + width * 0.1, y: groundY - g - unit * 0.075, width: width * 0.8, height: unit * 0.06 }
      : { x: x + width * 0.5 - unit * 0.075, y: groundY - g - unit * 0.004, width: unit * 0.15, height: unit * 0.036 },
    chimney: chimney(frame),
    tower: tower(frame),
  };
}
