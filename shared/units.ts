/**
 * Branded units of time. A bare `number` for a time does not say what it counts; these do.
 *
 * - `Ticks`: 1/960 of a beat, whole; what a timeline stores.
 * - `Seconds`: seconds from the start of the song's audio.
 */
export type Ticks = number & { readonly __unit: "ticks" };
export type Seconds = number & { readonly __unit: "seconds" };

/** Ticks in one beat: 960 divides by 2, 3, 4, 5, 6, 8 and 16, so common note lengths are whole. */
export const TICKS_PER_BEAT = 960;
