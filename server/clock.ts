/** The one source of time on the server; tests and the seed pass their own. UTC milliseconds. */
export interface Clock {
  now(): number;
}

export const systemClock: Clock = { now: () => Date.now() };
