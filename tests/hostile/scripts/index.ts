import type { HostileScript } from "../hostile-script.ts";
import { BUILT_INS } from "./built-ins.ts";
import { ESCAPES } from "./escapes.ts";
import { LATER } from "./later.ts";
import { LOOPS } from "./loops.ts";
import { MEMORY } from "./memory.ts";
import { NESTING } from "./nesting.ts";
import { PATTERNS } from "./patterns.ts";
import { RECURSION } from "./recursion.ts";
import { TEXTS } from "./texts.ts";
import { TOO_MANY } from "./too-many.ts";

/** Every hostile script, by kind. */
export const HOSTILE_SCRIPTS: readonly HostileScript[] = [
  ...LOOPS,
  ...RECURSION,
  ...NESTING,
  ...MEMORY,
  ...BUILT_INS,
  ...PATTERNS,
  ...ESCAPES,
  ...LATER,
  ...TOO_MANY,
  ...TEXTS,
];
