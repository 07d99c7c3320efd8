import { state } from "./state.ts";

/**
 * Luck: one sfc32 stream for each statement of the script, keyed by the seed and by the statement's
 * own tokens, so that adding a roll leaves the others alone (rules 26 and 27).
 * Source: sfc32 (small fast counter, 32 bits) from Chris Doty-Humphrey's PractRand, written from memory
 * like its twelve rounds of warm-up; the test has a second version in whole numbers.
 */
const WARM_UP_ROUNDS = 12;
const streams: (Uint32Array | undefined)[] = [];

function step(s: Uint32Array): number {
  const a = s[0] ?? 0;
  const b = s[1] ?? 0;
  const c = s[2] ?? 0;
  const counter = s[3] ?? 0;
  const result = (((a + b) | 0) + counter) >>> 0;
  s[3] = counter + 1;
  s[0] = b ^ (b >>> 9);
  s[1] = c + (c << 3);
  s[2] = ((c << 21) | (c >>> 11)) + result;
  return result;
}

function open(index: number): Uint32Array {
  const key = state.luck.streams[index] ?? [0, 0, 0];
  const stream = new Uint32Array([key[0] ^ state.luck.seed, key[1], key[2], 1]);
  for (let round = 0; round < WARM_UP_ROUNDS; round++) step(stream);
  streams[index] = stream;
  return stream;
}

/** The next number of the statement's stream: 0 <= x < 1, a multiple of 1 / 2^32. */
export function draw(): number {
  const index = state.luck.streamOf[state.frames.site()] ?? 0;
  return step(streams[index] ?? open(index)) / 0x1_00_00_00_00;
}

/** The next whole number of the stream: 0 <= x < `count`. */
export function drawBelow(count: number): number {
  return Math.floor(draw() * count);
}
