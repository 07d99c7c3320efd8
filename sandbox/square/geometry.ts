import { SIDES } from "../../shared/sides.ts";
import type { Layout, Side, Silhouette } from "../../shared/contracts/square.ts";
import { facadeOf } from "./facade.ts";
import type { Facade, Plot } from "./facade.ts";
import { listFronts, listLights } from "./lights.ts";
import type { Light, WalkedFront } from "./lights.ts";
import { beadStep, outletShape, partShape, pixelShapes } from "./strings.ts";
import type { LightShape, PartShape } from "./strings.ts";
import { treeAt, treePart } from "./tree.ts";
import type { Tree } from "./tree.ts";

/**
 * Where everything of one side of the square is drawn. Pure numbers: the stage draws with them, and
 * the flash rule measures lit areas with them in the reference view.
 *
 * Lengths are pixels of the view; x grows to the right, y downwards from the top of the sky.
 */

/** The picture of a side: its size, and which of its fronts it shows. */
export interface View {
  readonly width: number;
  readonly height: number;
  /** Place of the first front shown, from 0 at the left. */
  readonly first?: number;
  /** How many fronts are shown at most; all when left out. */
  readonly count?: number;
}

/**
 * The view in which flashes are measured: 1024 x 768 CSS pixels, for which WCAG 2.2 gives its block
 * of 341 x 256 pixels (the estimate of a 10-degree field; "three flashes or below threshold").
 */
export const REFERENCE_VIEW: View = { width: 1024, height: 768 };

/** A light with its shape in the view. */
export interface LightGeometry extends LightShape {
  /** Index in walking order, as a timeline stores it. */
  readonly lightIndex: number;
  readonly lightId: string;
  readonly part: string;
}

/** A front with its shape in the view: a house has a `facade`, a tree has a `tree`. */
export interface FrontGeometry {
  readonly frontIndex: number;
  readonly frontId: string;
  readonly name: string;
  /** null: it stands free in the middle of the square and is drawn in front of every side. */
  readonly side: Side | null;
  /** Place on the whole side, from 0 at the left; also for a view that shows only some. */
  readonly place: number;
  /** Every second house is drawn as a nearer sheet of paper. */
  readonly isNear: boolean;
  readonly silhouette: Silhouette;
  /** The box around all of it. */
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
  readonly groundY: number;
  readonly facade: Facade | null;
  readonly tree: Tree | null;
  readonly lights: readonly LightGeometry[];
}

/** Measures of a view: the ground line, the pixels of one silhouette unit, the paving below. */
export interface ViewFrame {
  readonly groundY: number;
  readonly unit: number;
  readonly paving: number;
}

const PAVING = 0.235;
const MARGIN = 0.012;
/** Where a tree stands across the view, for each side, so that it hides no front for good. */
const TREE_PLACE: { readonly [S in Side]: number } = { north: 0.655, east: 0.345, south: 0.56, west: 0.44 };
const TREE_HEIGHT = 0.56;
/** A house is never drawn wider than this for its height, however few there are. */
const WIDEST = 0.46;

/** Measures of a view that shows this many fronts. */
export function viewFrame(view: View, shown: number): ViewFrame {
  const paving = view.height * PAVING;
  const groundY = view.height - paving;
  return { groundY, paving, unit: Math.min(groundY * 0.985, (view.width / Math.max(1, shown)) * 3.9) };
}

function lightsOf(
  walked: WalkedFront,
  all: readonly Light[],
  shapeOfPart: (part: string) => PartShape,
  step: number,
): LightGeometry[] {
  const found: LightGeometry[] = [];
  const strips = new Map<string, LightShape[]>();
  for (const index of walked.lights) {
    const light = all[index];
    if (!light) continue;
    const shape = shapeOfPart(light.part);
    if (light.pixels !== null && !strips.has(light.part)) strips.set(light.part, pixelShapes(shape, light.pixels));
    const drawn = light.pixel === null ? outletShape(shape, step) : strips.get(light.part)?.[light.pixel - 1];
    if (drawn) found.push({ lightIndex: index, lightId: light.id, part: light.part, ...drawn });
  }
  return found;
}

function frontAt(walked: WalkedFront, place: number, plot: Plot, all: readonly Light[]): FrontGeometry {
  const { front, index } = walked;
  const base = {
    frontIndex: index,
    frontId: front.id,
    name: front.name,
    side: front.side,
    place,
    silhouette: front.silhouette,
  };
  const step = beadStep(plot.unit);
  if (front.silhouette.roof === "tree") {
    const tree = treeAt(plot.x + plot.width / 2, plot.groundY, front.silhouette.top * plot.unit);
    const parts = [...new Set(front.boxes.flatMap((box) => box.outlets.map((outlet) => outlet.part)))];
    const lights = lightsOf(walked, all, (part) => treePart(tree, part, parts), step);
    const { x, y, width, height } = tree;
    return { ...base, isNear: true, x, y, width, height, groundY: plot.groundY, facade: null, tree, lights };
  }
  const facade = facadeOf(front.name, front.silhouette, plot);
  const lights = lightsOf(walked, all, (part) => partShape(facade, part), step);
  const sidePlace = front.side === null ? 0 : SIDES.indexOf(front.side);
  const { x, y, width, height } = facade;
  return {
    ...base,
    isNear: place % 2 === sidePlace % 2,
    x,
    y,
    width,
    height,
    groundY: plot.groundY,
    facade,
    tree: null,
    lights,
  };
}

function freeStanding(walked: WalkedFront, place: number, of: number, side: Side, view: View, frame: ViewFrame): Plot {
  const width = walked.front.silhouette.width * frame.unit * 0.25;
  const middle = view.width * (TREE_PLACE[side] + (place - (of - 1) / 2) * 0.2);
  return {
    x: middle - width / 2,
    width,
    groundY: frame.groundY + frame.paving * 0.3,
    unit: frame.unit * (walked.front.silhouette.roof === "tree" ? 1 : TREE_HEIGHT),
  };
}

/**
 * The fronts of one side as drawn in a view, left to right as faced from the middle of the square,
 * then those that stand free (the tree), which belong to every side's picture. Each front carries
 * its lights in walking order.
 */
export function sideGeometry(layout: Layout, side: Side, view: View = REFERENCE_VIEW): readonly FrontGeometry[] {
  const all = listLights(layout);
  const fronts = listFronts(layout);
  const whole = fronts.filter(({ front }) => front.side === side);
  const first = view.first ?? 0;
  const shown = whole.slice(first, first + (view.count ?? whole.length));
  const frame = viewFrame(view, shown.length);
  const margin = view.width * MARGIN;
  const total = shown.reduce((sum, { front }) => sum + front.silhouette.width, 0);
  const scale = Math.min((view.width - 2 * margin) / Math.max(total, 0.01), frame.unit * WIDEST);
  let x = (view.width - total * scale) / 2;
  const houses = shown.map((walked, n) => {
    const width = walked.front.silhouette.width * scale;
    const plot: Plot = { x, width, groundY: frame.groundY, unit: frame.unit };
    x += width;
    return frontAt(walked, first + n, plot, all);
  });
  const free = fronts.filter(({ front }) => front.side === null);
  return [
    ...houses,
    ...free.map((walked, n) => frontAt(walked, n, freeStanding(walked, n, free.length, side, view, frame), all)),
  ];
}
