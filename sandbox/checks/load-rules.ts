/**
 * Sums of electrical planning. Figures are a planning aid: plate ratings win, and a licensed
 * electrician and the local authority decide. Source: NEC 210.20(A), 210.19(A) and Article 100
 * (continuous: expected for 3 hours or more), as restated in trade publications.
 */

/** A breaker carries 125 % of the continuous load, so a continuous load may take 80 % of it. */
export const CONTINUOUS_FACTOR = 1.25;

/** Gives the breaker (amperes) that a continuous and another load ask for together. */
export function neededBreakerAmps(continuousAmps: number, otherAmps = 0): number {
  return CONTINUOUS_FACTOR * continuousAmps + otherAmps;
}

/** Gives the watts that may burn for hours on a circuit. */
export function continuousLimitWatts(volts: number, breakerAmps: number, share = 1 / CONTINUOUS_FACTOR): number {
  return volts * breakerAmps * share;
}

/** Gives kilowatt-hours of a load. */
export function energyKilowattHours(watts: number, hours: number): number {
  return (watts * hours) / 1000;
}

/** Gives the share of its electrical life (switchings at rated load) that a relay uses up in so many plays of a show; 1 is all of it. */
export function relayWearShare({
  cyclesPerShow,
  plays,
  lifeCycles,
}: {
  readonly cyclesPerShow: number;
  readonly plays: number;
  readonly lifeCycles: number;
}): number {
  return (cyclesPerShow * plays) / lifeCycles;
}
