import { describe, number, unknownName } from "./arguments.ts";
import { fail, state } from "./state.ts";

const HEX = /^#[0-9a-fA-F]{6}$/;
let names: string[] | null = null;

/** 0xRRGGBB of a CSS name or `#rrggbb`. */
export function parseColour(word: string, value: unknown, argument: number): number {
  if (typeof value !== "string") return fail("wants-a-colour", { word, got: describe(value) }, argument);
  const known = state.tables.colours[value];
  if (known !== undefined) return known;
  if (HEX.test(value)) return Number.parseInt(value.slice(1), 16);
  names ??= Object.keys(state.tables.colours);
  return unknownName("unknown-colour", value, names, argument);
}

/** One channel of `hsl(degrees 100% 50%)`. Source: CSS Color 4, section 7.1. */
function channel(degrees: number, offset: number): number {
  const k = (offset + degrees / 30) % 12;
  return Math.round((0.5 - 0.5 * Math.max(-1, Math.min(k - 3, 9 - k, 1))) * 255);
}

/** The colour at an angle of the colour circle, as `#rrggbb`: 0 red, 120 green, 240 blue. */
export function hue(degrees: number): string {
  const turned = ((number("hue", degrees, 0) % 360) + 360) % 360;
  const value = (channel(turned, 0) << 16) | (channel(turned, 8) << 8) | channel(turned, 4);
  return `#${value.toString(16).padStart(6, "0")}`;
}
