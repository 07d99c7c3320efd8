import { TimelineFormatError, isId } from "./bytes.ts";
import { ACTIONS, NO_COLOUR, type Timeline } from "./model.ts";

/** Light indexes are stored in 16 bits. */
export const MAX_LIGHTS = 65_536;
/** Levels are stored times 100. */
export const FULL_LEVEL = 10_000;

/**
 * Checks that a timeline keeps its promises: cues sorted by tick and before the end, every index in
 * range, levels 0 to 10 000, colours of 24 bits, no light twice in a selection, lines from 1.
 * Throws `TimelineFormatError` that names the first thing wrong. Cost: one pass.
 */
export function assertTimeline(timeline: Timeline): void {
  if (!isId(timeline.songId)) fail("The song id is missing or not printable ASCII.");
  if (!isId(timeline.layoutHash)) fail("The layout hash is missing or not printable ASCII.");
  assertWhole(timeline.language, "The language number", 1, 0xff_ff);
  assertWhole(timeline.seed, "The seed", 0, 0xff_ff_ff_ff);
  assertWhole(timeline.lightCount, "The number of lights", 0, MAX_LIGHTS);
  assertWhole(timeline.endTick, "The end", 0, 0xff_ff_ff_ff);
  assertSelections(timeline);
  timeline.chains.forEach((chain, index) => {
    for (const line of chain) assertWhole(line, `A line of chain ${index}`, 1, 0xff_ff_ff_ff);
  });
  assertCues(timeline);
}

function assertSelections({ selections, lightCount }: Timeline): void {
  const seenIn = new Int32Array(lightCount).fill(-1);
  selections.forEach((lights, index) => {
    if (lights.length === 0) fail(`Selection ${index} is empty.`);
    for (const light of lights) {
      if (light >= lightCount) fail(`Selection ${index} names light ${light}, but there are ${lightCount} lights.`);
      if (seenIn[light] === index) fail(`Selection ${index} names light ${light} twice.`);
      seenIn[light] = index;
    }
  });
}

function assertCues({ cues, selections, chains, endTick }: Timeline): void {
  assertWhole(cues.count, "The number of cues", 0, 0xff_ff_ff_ff);
  for (const column of ["tick", "action", "selection", "level", "length", "colour", "chain"] as const)
    if (cues[column].length < cues.count) fail(`The column "${column}" is shorter than the ${cues.count} cues.`);
  let previous = 0;
  for (let cue = 0; cue < cues.count; cue++) {
    const tick = cues.tick[cue] ?? 0;
    if (tick < previous) fail(`Cue ${cue} is at tick ${tick}, before the cue in front of it (${previous}).`);
    if (tick >= endTick) fail(`Cue ${cue} is at tick ${tick}, not before the end (${endTick}).`);
    previous = tick;
    if ((cues.action[cue] ?? 0) >= ACTIONS.length) fail(`Cue ${cue} has the unknown action ${cues.action[cue]}.`);
    if ((cues.selection[cue] ?? 0) >= selections.length) fail(`Cue ${cue} has no selection ${cues.selection[cue]}.`);
    if ((cues.chain[cue] ?? 0) >= chains.length) fail(`Cue ${cue} has no chain ${cues.chain[cue]}.`);
    if ((cues.level[cue] ?? 0) > FULL_LEVEL) fail(`Cue ${cue} has the level ${cues.level[cue]}, above ${FULL_LEVEL}.`);
    const colour = cues.colour[cue] ?? 0;
    if (colour > 0xff_ff_ff && colour !== NO_COLOUR) fail(`Cue ${cue} has a colour of more than 24 bits.`);
  }
}

function assertWhole(value: number, what: string, least: number, most: number): void {
  if (!Number.isInteger(value) || value < least || value > most)
    fail(`${what} is ${value}; it has to be a whole number from ${least} to ${most}.`);
}

function fail(message: string): never {
  throw new TimelineFormatError(message);
}
