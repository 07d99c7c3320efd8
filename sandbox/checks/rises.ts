/** One light's rising transition: half a flash. */
export interface Rise {
  readonly light: number;
  readonly tick: number;
  readonly seconds: number;
}

/** Beats are whole microseconds, so four events "a second apart" may lack a few of them. */
const ROUNDING_SECONDS = 0.0005;

/** Says whether two moments lie in one half-open second. */
export function isWithinSecond(first: number, last: number): boolean {
  return last - first < 1 - ROUNDING_SECONDS;
}

/** Gives rises in order of time, then of lights; sorts in place. */
export function sortRises(rises: Rise[]): readonly Rise[] {
  return rises.sort((a, b) => a.seconds - b.seconds || a.light - b.light);
}
