import type { Facade } from "./facade.ts";
import type { Bead, Pane, Point } from "./shapes.ts";
import { everyStep, inParts, overPane, paneArea, pathLength } from "./shapes.ts";
import { hashText } from "./stable-chance.ts";

/** What one part of a front is made of: areas that light up and lines that strings of lamps follow. */
export interface PartShape {
  readonly panes: readonly Pane[];
  readonly paths: readonly (readonly Point[])[];
}

/** The drawn shape of one light. */
export interface LightShape {
  readonly panes: readonly Pane[];
  readonly beads: readonly Bead[];
  /** Luminous area in square pixels of the view: panes and lamps, each lamp as wide as its distance to the next. */
  readonly area: number;
}

/** Distance between two lamps of a string, in pixels of the view. */
export function beadStep(unit: number): number {
  return Math.max(4, unit * 0.021);
}

function roofPaths(facade: Facade): Point[][] {
  const inset = Math.max(1, facade.unit * 0.006);
  const line = facade.roof.map((point) => ({
    x: Math.min(facade.x + facade.width - inset, Math.max(facade.x + inset, point.x)),
    y: point.y + inset,
  }));
  if (!facade.tower) return [line];
  const { body, cap } = facade.tower;
  const corner = (x: number): Point[] => [
    { x, y: body.y + body.height },
    { x, y: body.y },
  ];
  return [line, [...corner(body.x), ...cap, ...corner(body.x + body.width).toReversed()]];
}

function windowParts(facade: Facade): PartShape {
  const gap = Math.max(1, facade.unit * 0.006);
  return {
    panes: facade.openings.map(({ shape, x, y, width, height }) => ({ shape, x, y, width, height })),
    paths: facade.openings.map((opening) =>
      opening.kind === "shop" ? overPane(opening, gap).slice(1, 3) : overPane(opening, gap),
    ),
  };
}

/** A colour strip: up the left edge, along under the eave, down the right edge. */
function stripPath(facade: Facade): Point[] {
  const inset = facade.width * 0.03;
  const left = facade.x + inset;
  const right = facade.x + facade.width - inset;
  const foot = facade.groundY - facade.unit * 0.02;
  const under = facade.eaveY + facade.unit * 0.022;
  return [
    { x: left, y: foot },
    { x: left, y: under },
    { x: right, y: under },
    { x: right, y: foot },
  ];
}

/** A part with a name of its own: a string across the wall, at a height that its name decides. */
function wallPath(facade: Facade, part: string): Point[] {
  const share = 0.15 + 0.7 * ((hashText(part) % 97) / 96);
  const y = facade.groundY - facade.groundFloor - (facade.groundY - facade.groundFloor - facade.eaveY) * share;
  const inset = facade.width * 0.06;
  return [
    { x: facade.x + inset, y },
    { x: facade.x + facade.width - inset, y },
  ];
}

/** What a part of a house is made of. Any name has a place; those below have one of their own. */
export function partShape(facade: Facade, part: string): PartShape {
  const gap = Math.max(1, facade.unit * 0.007);
  switch (part) {
    case "roof":
      return { panes: [], paths: roofPaths(facade) };
    case "windows":
      return windowParts(facade);
    case "door": {
      const { shape, x, y, width, height } = facade.door;
      return { panes: [{ shape, x, y, width, height }], paths: [overPane(facade.door, gap)] };
    }
    case "sign": {
      const pane: Pane = { shape: "rect", ...facade.sign };
      return { panes: [pane], paths: [overPane(pane, gap)] };
    }
    case "awning": {
      const { x, y, width, height } = facade.awning;
      return {
        panes: [],
        paths: [
          [
            { x, y },
            { x, y: y + height },
            { x: x + width, y: y + height },
            { x: x + width, y },
          ],
        ],
      };
    }
    case "strip":
      return { panes: [], paths: [stripPath(facade)] };
    default:
      return { panes: [], paths: [wallPath(facade, part)] };
  }
}

function withArea(panes: readonly Pane[], beads: readonly Bead[]): LightShape {
  const area =
    panes.reduce((sum, pane) => sum + paneArea(pane), 0) +
    beads.reduce((sum, bead) => sum + Math.PI * bead.radius * bead.radius, 0);
  return { panes, beads, area };
}

/** The shape of a light that is a whole outlet: all panes, and lamps along every path. */
export function outletShape(part: PartShape, step: number): LightShape {
  const beads = part.paths.flatMap((path) => everyStep(path, step).map((point) => ({ ...point, radius: step / 2 })));
  return withArea(part.panes, beads);
}

/** The shapes of the pixels of a strip on this part, first to last along its paths. */
export function pixelShapes(part: PartShape, pixels: number): LightShape[] {
  const length = part.paths.reduce((sum, path) => sum + pathLength(path), 0);
  const radius = length / pixels / 2;
  return inParts(part.paths.flat(), pixels).map((point) => withArea([], [{ ...point, radius }]));
}
