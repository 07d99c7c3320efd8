import { CHOOSING_SHOWS } from "./choosing-shows.ts";
import { COUNTING_SHOWS } from "./counting-shows.ts";
import type { DemoScript } from "./demo-script.ts";
import { FIRST_SHOWS } from "./first-shows.ts";
import { LAYERED_SHOWS } from "./layered-shows.ts";
import { SONG_SHOWS } from "./song-shows.ts";
import { TROUBLED_SHOWS } from "./troubled-shows.ts";

/** Every show of the demo world, the easiest first. */
export const DEMO_SCRIPTS: readonly DemoScript[] = [
  ...FIRST_SHOWS,
  ...COUNTING_SHOWS,
  ...CHOOSING_SHOWS,
  ...SONG_SHOWS,
  ...LAYERED_SHOWS,
  ...TROUBLED_SHOWS,
];

/** A show of the demo world by its id. */
export function demoScript(id: string): DemoScript {
  const script = DEMO_SCRIPTS.find((one) => one.id === id);
  if (!script) throw new RangeError(`The demo world has no show "${id}".`);
  return script;
}
