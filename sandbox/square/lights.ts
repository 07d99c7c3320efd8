import { SIDES } from "../../shared/sides.ts";
import type { Box, BoxKind, Front, Layout, Outlet, Side } from "../../shared/contracts/square.ts";

/**
 * The lights of a square in walking order. A timeline stores indexes into this list, so the order is
 * part of the language (LANGUAGE rule 10) and may never change for a frozen layout.
 */

/** One thing a script can address: a string on one outlet, or one pixel of a colour strip. */
export interface Light {
  /** Place in walking order, from 0: what a timeline stores. */
  readonly index: number;
  /** `front/part`, or `front/part/n` for a pixel (n from 1): what findings and comments store. */
  readonly id: string;
  /** Place of its front in walking order, from 0. */
  readonly frontIndex: number;
  readonly frontId: string;
  readonly frontName: string;
  /** null: its front is on no side (the tree). */
  readonly side: Side | null;
  readonly part: string;
  /** Which pixel of its strip, from 1; null when the light is a whole outlet. */
  readonly pixel: number | null;
  /** How many pixels its strip has; null when the light is a whole outlet. */
  readonly pixels: number | null;
  readonly boxId: string;
  readonly boxKind: BoxKind;
  /** The outlet's number on its box. */
  readonly outlet: number;
  /** Id of the circuit that feeds the outlet. */
  readonly circuit: string;
  /** Watts of this one light at full level: a strip's watts are shared out over its pixels. */
  readonly watts: number;
  /** Whether it can show a colour; other lights ignore colours (LANGUAGE rule 20). */
  readonly hasColour: boolean;
  /** Whether it can only be on or off (LANGUAGE rule 20). */
  readonly isSwitched: boolean;
}

/** A front in walking order, with the places of its lights in the list of all lights. */
export interface WalkedFront {
  /** Place in walking order, from 0. */
  readonly index: number;
  readonly front: Front;
  /** Indexes into `listLights(layout)`, in walking order. */
  readonly lights: readonly number[];
}

/** What a script reads as `front.box`: the kind of its boxes, or "mixed" when they differ. */
export type FrontBox = BoxKind | "mixed";

const sidePlace = (front: Front): number => (front.side === null ? SIDES.length : SIDES.indexOf(front.side));

/** The fronts in walking order: sides clockwise from the north-west, each left to right, the tree last. */
function walk(layout: Layout): Front[] {
  // Array sort is stable, so two fronts of one order stay as they are in the layout.
  return layout.fronts.toSorted((a, b) => sidePlace(a) - sidePlace(b) || a.order - b.order);
}

function outletLights(front: Front, frontIndex: number, box: Box, outlet: Outlet): Omit<Light, "index">[] {
  const pixels = outlet.pixels ?? null;
  const count = pixels ?? 1;
  return Array.from({ length: count }, (_, n) => ({
    id: pixels === null ? `${front.id}/${outlet.part}` : `${front.id}/${outlet.part}/${n + 1}`,
    frontIndex,
    frontId: front.id,
    frontName: front.name,
    side: front.side,
    part: outlet.part,
    pixel: pixels === null ? null : n + 1,
    pixels,
    boxId: box.id,
    boxKind: box.kind,
    outlet: outlet.number,
    circuit: outlet.circuit,
    watts: outlet.watts / count,
    hasColour: box.kind === "colour",
    isSwitched: box.kind === "relay" || box.kind === "solid-state",
  }));
}

/**
 * Every single light of a layout in walking order: fronts as walked, then parts as in the layout
 * (boxes, then outlets, as listed), pixels left to right. `lights[i].index === i`.
 */
export function listLights(layout: Layout): readonly Light[] {
  return walk(layout)
    .flatMap((front, frontIndex) =>
      front.boxes.flatMap((box) => box.outlets.flatMap((outlet) => outletLights(front, frontIndex, box, outlet))),
    )
    .map((light, index) => ({ index, ...light }));
}

/** The fronts of a layout in walking order, each with the indexes of its lights. */
export function listFronts(layout: Layout): readonly WalkedFront[] {
  let next = 0;
  return walk(layout).map((front, index) => {
    const count = front.boxes.reduce(
      (sum, box) => sum + box.outlets.reduce((inBox, outlet) => inBox + (outlet.pixels ?? 1), 0),
      0,
    );
    const lights = Array.from({ length: count }, (_, n) => next + n);
    next += count;
    return { index, front, lights };
  });
}

/** The kind of a front's boxes as a script reads it: "mixed" when they are of several kinds. */
export function frontBox(front: Front): FrontBox {
  const kinds = new Set(front.boxes.map((box) => box.kind));
  const [kind] = kinds;
  return kinds.size === 1 && kind !== undefined ? kind : "mixed";
}
