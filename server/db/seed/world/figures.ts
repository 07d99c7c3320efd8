import type { BoxKind } from "../../../../shared/contracts/square.ts";

/**
 * Every figure of the demo world that stands for something real: mains, circuits, lamps, places.
 * All of it is invented; the watts are typical of such lamps (common practice, no source).
 */

export const TOWN = "Quillhaven";
export const EVENT_NAME = "Quillhaven Winter Lights";
export const SQUARE_NAME = "Quillhaven town square";
export const SCHOOL_NAMES = ["Tarn Road Middle School", "Quillhaven Intermediate"] as const;
/** The one time zone of the demo world (IANA name). */
export const TIME_ZONE = "America/New_York";

export interface MainsProfile {
  readonly volts: number;
  readonly hertz: 50 | 60;
  /** The two sizes of breaker on the square, in amperes. */
  readonly largeBreakerAmps: number;
  readonly smallBreakerAmps: number;
}

/** The mains of Quillhaven. */
export const MAINS_120: MainsProfile = { volts: 120, hertz: 60, largeBreakerAmps: 20, smallBreakerAmps: 15 };
/** The same square wired for 230 V and 50 Hz: for tests of everything that counts volts or cycles. */
export const MAINS_230: MainsProfile = { volts: 230, hertz: 50, largeBreakerAmps: 16, smallBreakerAmps: 10 };

/** Share of a breaker that a load of three hours or more may use in this plan: the 80 % rule. */
export const CONTINUOUS_SHARE = 0.8;

/** Pixels of each colour strip on the town's square. */
export const STRIP_PIXELS = 60;
/** Pixels of each colour strip on the larger square that serves tests and measurements. */
export const LARGE_STRIP_PIXELS = 150;

/** Watts at full level of a whole string with filament lamps, by where it hangs. */
const FILAMENT_WATTS: { readonly [part: string]: number } = {
  roof: 175,
  windows: 150,
  door: 60,
  awning: 75,
  sign: 90,
  star: 40,
};

/** Watts at full level of a whole string with three-colour diodes, by where it hangs. */
const COLOUR_WATTS: { readonly [part: string]: number } = {
  roof: 45,
  windows: 40,
  door: 20,
  awning: 25,
  sign: 30,
  top: 45,
  middle: 60,
  bottom: 75,
};

/** Watts at full level of one pixel of a strip. */
const PIXEL_WATTS = 0.72;

/** Watts at full level of the string at this part, fed by a box of this kind. */
export function stringWatts(kind: BoxKind, part: string): number {
  const watts = (kind === "colour" ? COLOUR_WATTS : FILAMENT_WATTS)[part];
  if (watts === undefined) throw new RangeError(`The demo world has no ${kind} string at "${part}".`);
  return watts;
}

/** Watts at full level of a strip of so many pixels. */
export function stripWatts(pixels: number): number {
  return Math.round(pixels * PIXEL_WATTS * 10) / 10;
}
