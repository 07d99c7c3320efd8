/** One bar of drums: for each drum a row of marks that share the bar evenly; "x" a stroke, "X" an accent. */
export type DrumBar = { readonly [D in Drum]?: string };

/** Drums by the key that General MIDI gives them. */
export const DRUM_KEYS = { kick: 36, snare: 38, lowTom: 45, hat: 42, highTom: 48, crash: 49, jingles: 54 } as const;
export type Drum = keyof typeof DRUM_KEYS;

/** Bars of four. */
export const FOUR = {
  soft: { kick: "x...", jingles: "x.x." },
  steady: { kick: "x...x...", snare: "..x...x.", hat: "xxxxxxxx" },
  full: { kick: "X..xx...", snare: "..X...X.", hat: "xxxxxxxx", jingles: "x.x.x.x." },
  first: { crash: "x.......", kick: "X..xx...", snare: "..X...X.", hat: ".xxxxxxx", jingles: "x.x.x.x." },
  fill: { kick: "x...x...", snare: "..x.....", highTom: "....xx..", lowTom: "......xx", hat: "xxxx...." },
  sleigh: { kick: "x.x.", jingles: "xxxxxxxx" },
  last: { kick: "X...", crash: "x...", jingles: "xxxx" },
} as const satisfies { readonly [name: string]: DrumBar };

/** Bars of three. */
export const THREE = {
  soft: { kick: "x..", jingles: ".xx" },
  full: { kick: "X..", snare: ".xx", hat: "x.x.x." },
  first: { crash: "x..", kick: "X..", snare: ".xx", hat: "..x.x." },
  last: { kick: "X..", crash: "x.." },
} as const satisfies { readonly [name: string]: DrumBar };

/** Bars of six eighths, counted in two. */
export const SIX = {
  soft: { kick: "x.....", jingles: "x..x.." },
  full: { kick: "X.....", snare: "...X..", hat: "xxxxxx" },
  first: { crash: "x.....", kick: "X.....", snare: "...X..", hat: ".xxxxx" },
  fill: { kick: "x.....", snare: "...xxx", highTom: "xx....", lowTom: "..x..." },
  last: { kick: "X.....", crash: "x....." },
} as const satisfies { readonly [name: string]: DrumBar };
