import type { Clock } from "../../server/clock.ts";

/** A clock that stands still until it is moved. */
export interface TestClock extends Clock {
  /** Moves on by so many milliseconds. */
  advance(milliseconds: number): void;
}

/** Starts in the evening of a school day of the demo season: 2026-12-01, 16:00 UTC. */
export function createTestClock(start = Date.UTC(2026, 11, 1, 16)): TestClock {
  let now = start;
  return {
    now: () => now,
    advance: (milliseconds) => {
      now += milliseconds;
    },
  };
}
