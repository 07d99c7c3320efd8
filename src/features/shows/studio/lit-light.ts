import { COLOUR_NAMES } from "../../../../sandbox/language/colour-names.ts";
import type { Light } from "../../../../sandbox/square/lights.ts";
import { colourToHex } from "../../../../sandbox/timeline/colour.ts";
import type { Frame } from "../../../../sandbox/timeline/cursor.ts";
import { linesOfCue } from "../../../../sandbox/timeline/lines.ts";
import { NO_COLOUR, type Timeline } from "../../../../sandbox/timeline/model.ts";

/** What one light shows at a moment, and which line made it so. */
export interface LitLight {
  readonly part: string;
  /** 1 to 100, whole. */
  readonly level: number;
  /** "gold", "#ff8800"; null for a plain string of lamps. */
  readonly colour: string | null;
  /** The line that acts, from 1; null when it is not known. */
  readonly line: number | null;
  /** The lines that called it, the nearest first: a function's line, then the one that called the function. */
  readonly callers: readonly number[];
}

/** The brightest of some lights at the frame's moment, or null when all of them are dark. */
export function findLitLight(timeline: Timeline, frame: Frame, lights: readonly Light[]): LitLight | null {
  let best: Light | null = null;
  for (const light of lights)
    if ((frame.level[light.index] ?? 0) > (best ? (frame.level[best.index] ?? 0) : 0.5)) best = light;
  if (!best) return null;
  const lines = linesOfCue(timeline, frame.cue[best.index] ?? -1);
  return {
    part: best.pixel === null ? best.part : `${best.part}, light ${best.pixel}`,
    level: Math.max(1, Math.round(frame.level[best.index] ?? 0)),
    colour: best.hasColour ? findColourWord(timeline, frame.colourCue[best.index] ?? -1) : null,
    line: lines.at(-1) ?? null,
    callers: lines.slice(0, -1).reverse(),
  };
}

/** "roof at 73, gold" */
export function presentLitLight({ part, level, colour }: LitLight): string {
  return `${part} at ${level}${colour ? `, ${colour}` : ""}`;
}

function findColourWord(timeline: Timeline, cue: number): string {
  const colour = cue < 0 ? 0xff_ff_ff : (timeline.cues.colour[cue] ?? 0xff_ff_ff);
  if (colour === NO_COLOUR) return "white";
  return Object.entries(COLOUR_NAMES).find(([, value]) => value === colour)?.[0] ?? colourToHex(colour);
}
