/**
 * The timeline: what a run of a script yields, and the only thing that is ever played, checked,
 * drawn or handed over.
 *
 * Encoding. A struct of arrays, one entry a cue, sorted by tick and then by the order in which the
 * script wrote them. Selections and call chains are interned: a cue holds an index. Every number is
 * already rounded, so two hosts that agree on the bytes agree on the show:
 *
 * - `tick`: 1/960 beat from the song's beat 0.
 * - `level`: lightness as seen (CIE L*), times 100: 0 to 10 000.
 * - `length`: ticks of a fade, a colour fade or a pulse; 0 is at once.
 * - `colour`: 0xRRGGBB in sRGB, or `NO_COLOUR` (a pulse in the light's own colour).
 */

export const ACTIONS = ["on", "off", "fadeTo", "pulse", "colour"] as const;
export type Action = (typeof ACTIONS)[number];

/** Index of an action in `ACTIONS`, as stored. */
export const ACTION_CODE: { readonly [A in Action]: number } = { on: 0, off: 1, fadeTo: 2, pulse: 3, colour: 4 };

/** The `colour` of a cue that names none. */
export const NO_COLOUR = 0xff_ff_ff_ff;

/** The language number that this build writes. A version stores the number it was written in. */
export const LANGUAGE_VERSION = 1;

export interface CueTable {
  readonly count: number;
  readonly tick: Uint32Array;
  /** Index into `ACTIONS`. */
  readonly action: Uint8Array;
  /** Index into `Timeline.selections`. */
  readonly selection: Uint32Array;
  readonly level: Uint16Array;
  readonly length: Uint32Array;
  readonly colour: Uint32Array;
  /** Index into `Timeline.chains`. */
  readonly chain: Uint32Array;
}

export interface Timeline {
  readonly version: 1;
  readonly language: number;
  readonly songId: string;
  /** Hash of the layout (see `sandbox/square/layout-hash.ts`); light indexes mean nothing without it. */
  readonly layoutHash: string;
  /** 32 bits: the luck of the show. */
  readonly seed: number;
  /** Single lights of the layout. */
  readonly lightCount: number;
  /** The song's end; at it all is dark. */
  readonly endTick: number;
  /** False when a problem stopped the script: shown, marked incomplete, never played. */
  readonly isComplete: boolean;
  readonly cues: CueTable;
  /** Light indexes in walking order of the selection; each array is distinct. */
  readonly selections: readonly Uint16Array[];
  /** Script lines (from 1), outermost call first; each chain is distinct. Outside the hash. */
  readonly chains: readonly (readonly number[])[];
}
