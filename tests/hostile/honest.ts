import type { RunInput } from "../../sandbox/engine/model.ts";
import { SMALL_LAYOUT, SMALL_SONG } from "../support/run-script.ts";

/** An honest script without types, so that it runs straight in the engine too. */
export const HONEST =
  'for (const front of square.fronts) {\n  front.pulse(1, "gold");\n  wait(roll(3));\n}\nsquare.all.shuffled().off();';

/** What a script is run on. */
export function toInput(source: string): RunInput {
  return { source, songId: "small", song: SMALL_SONG, layout: SMALL_LAYOUT, seed: 7 };
}
