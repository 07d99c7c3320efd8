import type { Draw } from "./grammar.ts";

/** Numbers that a seed decides (mulberry32, from memory). */
export function seededDraw(seed: number): Draw {
  let state = seed >>> 0;
  return (below) => {
    state = (state + 0x6d_2b_79_f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return Math.floor((((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32) * below);
  };
}
