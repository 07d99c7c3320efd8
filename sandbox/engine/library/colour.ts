import { describe, number, unknownName } from "./arguments.ts";
import { fail, state } from "./state.ts";

const HEX = /^#[0-9a-fA-F]{6}$/;
const MAX_KEPT = 4096;
/** Colours and angles already worked out: shows use the same few, and each has its steps. */
const parsed = new Map<unknown, number>();
const angles = new Map<unknown, string>();
let names: string[] | null = null;

function keep<T>(kept: Map<unknown, T>, key: unknown, value: T): T {
  if (kept.size >= MAX_KEPT) kept.clear();
  kept.set(key, value);
  return value;
}

/** 0xRRGGBB of a CSS name or `#rrggbb`. */
export function parseColour(word: string, value: unknown, argument: number): number {
  const before = parsed.get(value);
  if (before !== undefined) return before;
  if (typeof value !== "string") return fail("wants-a-colour", { word, got: describe(value) }, argument);
  const known = state.tables.colours[value];
  if (known !== undefined && Object.hasOwn(state.tables.colours, value)) return keep(parsed, value, known);
  if (HEX.test(value)) return keep(parsed, value, Number.parseInt(value.slice(1), 16));
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
  const before = angles.get(degrees);
  if (before !== undefined) return before;
  const turned = ((number("hue", degrees, 0) % 360) + 360) % 360;
  const value = (channel(turned, 0) << 16) | (channel(turned, 8) << 8) | channel(turned, 4);
  const text = `#${value.toString(16).padStart(6, "0")}`;
  keep(parsed, text, value);
  return keep(angles, degrees, text);
}
