import { COLOUR_NAMES } from "../language/colour-names.ts";
import type { Frame } from "../timeline/cursor.ts";
import { colourToLinear } from "../timeline/colour.ts";

/** How far the shares of red, green and blue may be from those of a colour. */
const NEAR = 0.08;

type Shares = readonly [number, number, number];

/** Red, green and blue as shares of the strongest of them; null for black. */
function shares(red: number, green: number, blue: number): Shares | null {
  const most = Math.max(red, green, blue);
  return most <= 0 ? null : [red / most, green / most, blue / most];
}

/** What a light shows in a frame, without its brightness; null when it is dark. */
function shownShares(frame: Frame, light: number): Shares | null {
  return shares(frame.rgb[light * 3] ?? 0, frame.rgb[light * 3 + 1] ?? 0, frame.rgb[light * 3 + 2] ?? 0);
}

const isNear = (a: Shares, b: Shares): boolean =>
  a.every((share, channel) => Math.abs(share - (b[channel] ?? 0)) <= NEAR);

/** Whether a light shows this colour, at whatever level. `colour` is a CSS name or `#rrggbb`. */
export function showsColour(frame: Frame, light: number, colour: string): boolean {
  const value = COLOUR_NAMES[colour] ?? Number.parseInt(colour.slice(1), 16);
  const wanted = shares(...colourToLinear(value));
  const shown = shownShares(frame, light);
  return wanted !== null && shown !== null && isNear(wanted, shown);
}

/** Counts the colours that are told apart; remembers those seen before. */
export class ColourCounter {
  readonly #seen: Shares[] = [];

  get count(): number {
    return this.#seen.length;
  }

  add(frame: Frame, light: number): void {
    const shown = shownShares(frame, light);
    if (shown !== null && !this.#seen.some((known) => isNear(known, shown))) this.#seen.push(shown);
  }
}
