import type { BoxKind, Side, Silhouette } from "../../../../shared/contracts/square.ts";

/** The parts that one box feeds, in the order of its outlets. */
export interface BoxRow {
  readonly kind: BoxKind;
  readonly parts: readonly string[];
}

/** One front as the demo world lists it. */
export interface FrontRow {
  readonly name: string;
  readonly boxes: readonly BoxRow[];
  /** Drawn by hand; the others get the look that their name gives. */
  readonly silhouette?: Silhouette;
}

/** "colour: roof windows" as a box. */
function box(kind: BoxKind, parts: string): BoxRow {
  return { kind, parts: parts.split(" ") };
}

type Look = Pick<Silhouette, "width" | "eave" | "top" | "roof" | "floors" | "bays" | "window" | "ground"> &
  Partial<Silhouette>;

function drawn(look: Look): Silhouette {
  return { awning: 0, chimney: 0, sign: false, ...look };
}

const NORTH: readonly FrontRow[] = [
  {
    name: "bakery",
    boxes: [box("dimmer", "roof windows door")],
    silhouette: drawn({
      width: 0.92,
      eave: 0.43,
      top: 0.62,
      roof: "gable",
      floors: 2,
      bays: 2,
      window: "sash",
      ground: "shop",
      awning: 1,
      chimney: 0.74,
    }),
  },
  {
    name: "bookshop",
    boxes: [box("colour", "roof windows door")],
    silhouette: drawn({
      width: 0.84,
      eave: 0.55,
      top: 0.75,
      roof: "step",
      floors: 3,
      bays: 2,
      window: "sash",
      ground: "shop",
      sign: true,
    }),
  },
  {
    name: "ironmonger",
    boxes: [box("relay", "roof windows awning")],
    silhouette: drawn({
      width: 1.02,
      eave: 0.5,
      top: 0.56,
      roof: "parapet",
      floors: 2,
      bays: 3,
      window: "wide",
      ground: "shop",
      awning: 2,
      chimney: 0.12,
    }),
  },
  {
    name: "library",
    boxes: [box("dimmer", "roof windows door")],
    silhouette: drawn({
      width: 1.22,
      eave: 0.5,
      top: 0.64,
      roof: "pediment",
      floors: 2,
      bays: 4,
      window: "arch",
      ground: "columns",
    }),
  },
  {
    name: "town hall",
    boxes: [box("solid-state", "roof windows door"), box("colour", "strip")],
    silhouette: drawn({
      width: 1.22,
      eave: 0.56,
      top: 0.66,
      roof: "tower",
      floors: 2,
      bays: 4,
      window: "arch",
      ground: "arches",
    }),
  },
  {
    name: "post office",
    boxes: [box("relay", "roof windows door sign")],
    silhouette: drawn({
      width: 1,
      eave: 0.5,
      top: 0.66,
      roof: "hip",
      floors: 2,
      bays: 3,
      window: "sash",
      ground: "door",
      sign: true,
      chimney: 0.3,
    }),
  },
  {
    name: "tea room",
    boxes: [box("colour", "roof windows awning")],
    silhouette: drawn({
      width: 0.8,
      eave: 0.46,
      top: 0.68,
      roof: "bell",
      floors: 2,
      bays: 2,
      window: "arch",
      ground: "shop",
      awning: 1,
    }),
  },
  {
    name: "cinema",
    boxes: [box("colour", "strip windows sign")],
    silhouette: drawn({
      width: 1.16,
      eave: 0.58,
      top: 0.72,
      roof: "deco",
      floors: 1,
      bays: 3,
      window: "tall",
      ground: "marquee",
      sign: true,
    }),
  },
  {
    name: "clockmaker",
    boxes: [box("solid-state", "roof windows door")],
    silhouette: drawn({
      width: 0.74,
      eave: 0.6,
      top: 0.82,
      roof: "gable",
      floors: 3,
      bays: 2,
      window: "sash",
      ground: "shop",
      sign: true,
      chimney: 0.2,
    }),
  },
  {
    name: "florist",
    boxes: [box("colour", "roof windows door")],
    silhouette: drawn({
      width: 0.92,
      eave: 0.44,
      top: 0.58,
      roof: "round",
      floors: 2,
      bays: 3,
      window: "arch",
      ground: "shop",
      awning: 2,
    }),
  },
];

const EAST: readonly FrontRow[] = [
  { name: "apothecary", boxes: [box("solid-state", "roof windows door")] },
  { name: "grocer", boxes: [box("relay", "windows door awning")] },
  { name: "old inn", boxes: [box("dimmer", "roof windows door")] },
  { name: "cobbler", boxes: [box("colour", "roof windows")] },
  { name: "bank", boxes: [box("dimmer", "roof windows door")] },
  { name: "toy shop", boxes: [box("colour", "roof windows"), box("relay", "sign")] },
  { name: "barber", boxes: [box("relay", "windows door")] },
  { name: "hat shop", boxes: [box("colour", "roof windows door")] },
  { name: "fishmonger", boxes: [box("solid-state", "roof windows awning")] },
  { name: "pottery", boxes: [box("dimmer", "roof windows door")] },
];

const SOUTH: readonly FrontRow[] = [
  { name: "museum", boxes: [box("dimmer", "roof windows door")] },
  { name: "tailor", boxes: [box("relay", "roof windows")] },
  { name: "dairy", boxes: [box("solid-state", "roof windows door")] },
  { name: "music hall", boxes: [box("colour", "roof windows"), box("dimmer", "door sign")] },
  { name: "printer", boxes: [box("relay", "windows door sign")] },
  { name: "corner cafe", boxes: [box("colour", "roof windows awning")] },
  { name: "bicycles", boxes: [box("solid-state", "roof windows door")] },
  { name: "candle shop", boxes: [box("dimmer", "roof windows door")] },
  { name: "butcher", boxes: [box("relay", "roof windows")] },
  { name: "ropewalk", boxes: [box("colour", "roof windows")] },
];

const WEST: readonly FrontRow[] = [
  { name: "school", boxes: [box("dimmer", "windows door"), box("relay", "roof")] },
  { name: "chapel", boxes: [box("dimmer", "roof windows door")] },
  { name: "weaver", boxes: [box("colour", "roof windows door")] },
  { name: "market hall", boxes: [box("colour", "roof windows awning")] },
  { name: "surgery", boxes: [box("solid-state", "windows door")] },
  { name: "sweet shop", boxes: [box("colour", "roof windows door")] },
  { name: "locksmith", boxes: [box("relay", "roof windows sign")] },
  { name: "gallery", boxes: [box("dimmer", "roof windows door")] },
  { name: "greengrocer", boxes: [box("solid-state", "roof windows awning")] },
  { name: "boathouse", boxes: [box("colour", "roof windows door")] },
];

/** The houses of the square by side, each side left to right as faced from its middle. */
export const SIDE_ROWS: { readonly [S in Side]: readonly FrontRow[] } = {
  north: NORTH,
  east: EAST,
  south: SOUTH,
  west: WEST,
};

/** The tree in the middle of the square, on no side. */
export const TREE_ROW: FrontRow = {
  name: "tree",
  boxes: [box("dimmer", "star"), box("colour", "top middle bottom")],
  silhouette: drawn({
    width: 1,
    eave: 0.1,
    top: 0.56,
    roof: "tree",
    floors: 1,
    bays: 1,
    window: "sash",
    ground: "door",
  }),
};
