import { linearToSrgb, yToLevel } from "../../../../sandbox/timeline/colour.ts";

/**
 * A light's colour of the moment as the stage draws it: how much (`alpha`) of which full colour.
 * Full means that the strongest channel is at its top. Channels are kept to 5 bits, so that a slow
 * fade of colour makes a few dozen tints and not thousands.
 */
export interface ShownColour {
  /** 0 to 1, as seen: half is half as bright. */
  readonly alpha: number;
  /** 0xRRGGBB, coarse. */
  readonly colour: number;
}

const DARK: ShownColour = { alpha: 0, colour: 0 };
/** Below this nothing is to be seen on the stage. */
const LEAST_ALPHA = 0.01;

/** From linear channels, 0 to 1. */
export function toShownColour(red: number, green: number, blue: number): ShownColour {
  const peak = Math.max(red, green, blue);
  if (peak <= 0) return DARK;
  const alpha = Math.min(1, yToLevel(peak) / 100);
  if (alpha < LEAST_ALPHA) return DARK;
  return { alpha, colour: (coarse(red / peak) << 16) | (coarse(green / peak) << 8) | coarse(blue / peak) };
}

function coarse(share: number): number {
  const step = Math.round((linearToSrgb(share) / 255) * 31);
  return Math.round((step / 31) * 255);
}
