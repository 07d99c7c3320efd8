import { describe, number, whole } from "./arguments.ts";
import { Lights } from "./lights.ts";
import { draw, drawBelow } from "./luck.ts";
import { fail } from "./state.ts";

/** 1 to `sides`, like a dice. */
export function roll(sides: number): number {
  return 1 + drawBelow(whole("roll", sides, 0, 1));
}

/** True so many times in a hundred. */
export function chance(percent: number): boolean {
  return draw() * 100 < number("chance", percent, 0);
}

/** One thing of a list. An empty group of lights gives itself, which acts on nothing. */
export function oneOf(list: Lights | readonly unknown[]): unknown {
  if (Lights.is(list)) return list.length === 0 ? list : Lights.itemsOf(list)[drawBelow(list.length)];
  if (!Array.isArray(list)) return fail("wants-a-list", { word: "oneOf", got: describe(list) }, 0);
  if (list.length === 0) return fail("empty-list", { word: "oneOf" }, 0);
  return list[drawBelow(list.length)];
}
