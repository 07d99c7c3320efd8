import { Lights } from "./lights.ts";
import { failAt } from "./state.ts";

/** Items of a list, or -1 for what is no list. */
function lengthOf(list: unknown): number {
  if (Array.isArray(list)) return list.length;
  return Lights.is(list) ? list.length : -1;
}

/**
 * `list[place]` where the script goes on to use what it finds. A place that the list does not have
 * would be the engine's "cannot read property of undefined"; here it still has its numbers.
 */
export function missingItem(list: unknown, place: unknown, site: number): unknown {
  const item = (list as { [place: string]: unknown })[place as string];
  if (item !== undefined || typeof place !== "number") return item;
  const length = lengthOf(list);
  if (length < 0 || (Number.isInteger(place) && place >= 0 && place < length)) return item;
  return failAt(site, length === 0 ? "list-is-empty" : "not-in-list", { place, last: length - 1 });
}
