import type { Light } from "../square/lights.ts";
import type { CheckContext } from "./context.ts";
import type { LightFacts } from "./light-facts.ts";

/** Lights that do the same all through the show, so that they rise and fall as one. */
export interface LightGroup {
  readonly facts: LightFacts;
  /** Light indexes, in walking order. */
  readonly lights: readonly number[];
}

/** Gives some lights as groups, in the order of their first lights. */
export function groupLights(context: Pick<CheckContext, "facts">, lights: readonly Light[]): readonly LightGroup[] {
  const facts = context.facts();
  const groups = new Map<LightFacts, number[]>();
  for (const { index } of lights) {
    const own = facts[index];
    if (own === undefined) continue;
    const known = groups.get(own);
    if (known === undefined) groups.set(own, [index]);
    else known.push(index);
  }
  return [...groups].map(([own, members]) => ({ facts: own, lights: members }));
}
