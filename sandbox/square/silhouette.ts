import type { Silhouette } from "../../shared/contracts/square.ts";
import type { Roof } from "./roof-points.ts";
import { hashText, numbersFrom } from "./stable-chance.ts";

const ROOF_CHOICES: readonly Roof[] = ["gable", "step", "parapet", "bell", "hip", "pediment", "twin", "round", "deco"];
const WINDOWS: readonly Silhouette["window"][] = ["sash", "arch", "wide", "sash", "tall"];
const GROUNDS: readonly Silhouette["ground"][] = ["shop", "shop", "door", "arches", "shop", "columns"];
const STEEP: readonly Roof[] = ["gable", "step", "bell"];

function pick<Item>(list: readonly Item[], share: number): Item {
  const item = list[Math.min(list.length - 1, Math.floor(share * list.length))];
  if (item === undefined) throw new RangeError("There is nothing to pick from.");
  return item;
}

function rise(roof: Roof, share: number): number {
  if (roof === "parapet") return 0.06;
  return STEEP.includes(roof) ? 0.17 + share * 0.06 : 0.12;
}

const cents = (value: number): number => Math.round(value * 100) / 100;

/**
 * How a front looks when nobody has drawn it: worked out from its name, so that the same name gives
 * the same house for ever. Lengths are in units of the stage's height.
 */
export function silhouetteFor(name: string): Silhouette {
  const next = numbersFrom(hashText(name));
  const roof = pick(ROOF_CHOICES, next());
  const width = cents(0.78 + next() * 0.46);
  const eave = cents(0.4 + next() * 0.2);
  const top = cents(eave + rise(roof, next()));
  const ground = pick(GROUNDS, next());
  return {
    width,
    eave,
    top,
    roof,
    floors: eave > 0.52 ? 3 : 2,
    bays: width > 1.05 ? 4 : width > 0.9 ? 3 : 2,
    window: pick(WINDOWS, next()),
    ground,
    awning: ground === "shop" && next() < 0.6 ? 1 + Math.floor(next() * 2) : 0,
    chimney: next() < 0.5 ? cents(0.15 + next() * 0.6) : 0,
    sign: next() < 0.5,
  };
}
