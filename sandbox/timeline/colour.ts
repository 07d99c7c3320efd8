/**
 * Colour and brightness as numbers.
 *
 * - A *level* is lightness as seen (CIE L*), 0 to 100.
 * - *Y* is light itself, relative to full, 0 to 1 (CIE relative luminance).
 * - A *linear* channel is light, 0 to 1; an *sRGB* channel is what screens and scripts write, 0 to 255.
 */

/** CIE 15: below this Y the lightness is a straight line, (6/29) cubed. */
const LINEAR_Y_LIMIT = (6 / 29) ** 3;
/** CIE 15: slope of that straight line, (29/3) cubed. */
const LINEAR_SLOPE = (29 / 3) ** 3;
/** The same limit as a level. */
const LINEAR_LEVEL_LIMIT = LINEAR_Y_LIMIT * LINEAR_SLOPE;

/** The colour of a plain string of lamps: filament white, as the ribbon and the stage draw it. */
export const WARM_WHITE = 0xff_d7_9a;

/** The colour that a colour light starts with. */
export const WHITE = 0xff_ff_ff;

/** Gives the light Y (0 to 1) that is seen as `level` (0 to 100). Source: CIE 15, L* inverted. */
export function levelToY(level: number): number {
  if (level <= LINEAR_LEVEL_LIMIT) return level <= 0 ? 0 : level / LINEAR_SLOPE;
  const root = (level + 16) / 116;
  return root * root * root;
}

/** Gives the level (0 to 100) as which the light `y` (0 to 1) is seen. Source: CIE 15, L*. */
export function yToLevel(y: number): number {
  if (y <= LINEAR_Y_LIMIT) return y <= 0 ? 0 : y * LINEAR_SLOPE;
  return 116 * Math.cbrt(y) - 16;
}

/** Gives the linear channel (0 to 1) of an sRGB channel `value` (0 to 255). Source: IEC 61966-2-1. */
export function srgbToLinear(value: number): number {
  const c = value / 255;
  return c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4;
}

/** Gives the sRGB channel (0 to 255, not rounded) of a linear channel (0 to 1). Source: IEC 61966-2-1. */
export function linearToSrgb(linear: number): number {
  const c = linear <= 0 ? 0 : linear >= 1 ? 1 : linear;
  return 255 * (c <= 0.0031308 ? 12.92 * c : 1.055 * c ** (1 / 2.4) - 0.055);
}

/** Linear channel of every whole sRGB value: sampling reads this instead of taking powers. */
const LINEAR_OF_BYTE: Float64Array = Float64Array.from({ length: 256 }, (_, value) => srgbToLinear(value));

/** Gives the linear channel (0 to 1) of the lowest eight bits of `value`, an sRGB channel. */
export function channelToLinear(value: number): number {
  return LINEAR_OF_BYTE[value & 0xff] ?? 0;
}

/** Gives the linear red, green and blue (0 to 1) of a colour 0xRRGGBB. */
export function colourToLinear(colour: number): readonly [number, number, number] {
  return [channelToLinear(colour >>> 16), channelToLinear(colour >>> 8), channelToLinear(colour)];
}

/** Gives the colour 0xRRGGBB nearest to three linear channels (0 to 1; clamped). */
export function linearToColour(red: number, green: number, blue: number): number {
  return (
    (Math.round(linearToSrgb(red)) << 16) | (Math.round(linearToSrgb(green)) << 8) | Math.round(linearToSrgb(blue))
  );
}

/** Gives `#rrggbb` of a colour 0xRRGGBB. */
export function colourToHex(colour: number): string {
  return `#${(colour & 0xff_ff_ff).toString(16).padStart(6, "0")}`;
}

/** Gives the relative luminance (0 to 1) of three linear channels. Source: WCAG 2.2, "relative luminance". */
export function relativeLuminance(red: number, green: number, blue: number): number {
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
}
