import { LayoutSchema } from "../../../../shared/contracts/square.ts";
import { SIDES } from "../../../../shared/sides.ts";
import type { Box, Circuit, Front, Layout, Side } from "../../../../shared/contracts/square.ts";
import { silhouetteFor } from "../../../../sandbox/square/silhouette.ts";
import {
  LARGE_STRIP_PIXELS,
  MAINS_120,
  MAINS_230,
  SQUARE_NAME,
  STRIP_PIXELS,
  stringWatts,
  stripWatts,
} from "./figures.ts";
import type { MainsProfile } from "./figures.ts";
import { SIDE_ROWS, TREE_ROW } from "./fronts.ts";
import type { BoxRow, FrontRow } from "./fronts.ts";

/** Fronts of a side on its first, larger circuit; the rest hang on the second, smaller one. */
const ON_FIRST_CIRCUIT = 5;
const TREE_CIRCUIT = "tree-1";

const kebab = (name: string): string => name.replaceAll(" ", "-");

function buildBox(front: FrontRow, row: BoxRow, circuit: string, stripPixels: number): Box {
  return {
    id: `${kebab(front.name)}-${row.kind}`,
    kind: row.kind,
    outlets: row.parts.map((part, n) =>
      part === "strip"
        ? { number: n + 1, part, circuit, watts: stripWatts(stripPixels), pixels: stripPixels }
        : { number: n + 1, part, circuit, watts: stringWatts(row.kind, part) },
    ),
  };
}

function buildFront(row: FrontRow, side: Side | null, order: number, circuit: string, stripPixels: number): Front {
  const parts = row.boxes.flatMap((box) => box.parts);
  const look = row.silhouette ?? silhouetteFor(row.name);
  return {
    id: kebab(row.name),
    name: row.name,
    side,
    order,
    // A string needs something to hang on: an awning or a sign is drawn wherever a light has that name.
    silhouette: {
      ...look,
      awning: parts.includes("awning") ? Math.max(1, look.awning) : look.awning,
      sign: look.sign || parts.includes("sign"),
    },
    boxes: row.boxes.map((box) => buildBox(row, box, circuit, stripPixels)),
  };
}

function buildCircuits(mains: MainsProfile): Circuit[] {
  const sides = SIDES.flatMap((side) => [
    { id: `${side}-1`, volts: mains.volts, breakerAmps: mains.largeBreakerAmps },
    { id: `${side}-2`, volts: mains.volts, breakerAmps: mains.smallBreakerAmps },
  ]);
  return [...sides, { id: TREE_CIRCUIT, volts: mains.volts, breakerAmps: mains.smallBreakerAmps }];
}

/** The square of the demo world with strips of so many pixels and these mains. */
export function buildSquare(name: string, stripPixels: number, mains: MainsProfile): Layout {
  const houses = SIDES.flatMap((side) =>
    SIDE_ROWS[side].map((row, order) =>
      buildFront(row, side, order, `${side}-${order < ON_FIRST_CIRCUIT ? 1 : 2}`, stripPixels),
    ),
  );
  return LayoutSchema.parse({
    version: 1,
    name,
    mains: { volts: mains.volts, hertz: mains.hertz },
    circuits: buildCircuits(mains),
    fronts: [...houses, buildFront(TREE_ROW, null, 0, TREE_CIRCUIT, stripPixels)],
  });
}

/** The square of Quillhaven: 40 fronts and the tree, 121 outlets, 239 single lights. */
export const DEMO_SQUARE: Layout = buildSquare(SQUARE_NAME, STRIP_PIXELS, MAINS_120);

/** The same square with longer strips, 419 single lights: for tests and measurements. */
export const LARGE_SQUARE: Layout = buildSquare(`${SQUARE_NAME}, long strips`, LARGE_STRIP_PIXELS, MAINS_120);

/** The square of Quillhaven wired for 230 V and 50 Hz: for tests. */
export const SQUARE_230: Layout = buildSquare(`${SQUARE_NAME}, 230 V`, STRIP_PIXELS, MAINS_230);
