import { CONTINUOUS_FACTOR } from "./load-rules.ts";

/**
 * The limits that the show check measures against. They are settings of an event: an event may make
 * them stricter. Each says where it comes from; "common practice" has no source that could be cited.
 */
export interface EventRules {
  /** Most rising events (see `street-flash.ts`) in any second. WCAG 2.2, success criterion 2.3.1: three. */
  readonly flashesPerSecond: number;
  /** Share of a side's lights that makes an event. WCAG 2.2: 25 % of the field of view. */
  readonly flashShare: number;
  /** Changes within this time are one. TRACE proposed guideline (Jordan and Vanderheiden 2024): 20 ms. */
  readonly flashTogetherSeconds: number;
  /** Least change of a light, as a share of its full light, and the darker state below which it counts. WCAG 2.2: 0.1 and 0.8. */
  readonly flashStep: number;
  readonly flashDarkerBelow: number;
  /** Seconds at the limit after which a run is reported. ITU-R BT.1702 as restated: 5 s may be risky even when compliant. */
  readonly flashLongRunSeconds: number;
  /** Least seconds on, and off between, of a mechanical relay. Common practice. */
  readonly relayDwellSeconds: number;
  /** Most times on a second of a relay, over `relayWindowSeconds`. Rated-load figures of relay datasheets: 1800 an hour. */
  readonly relayCyclesPerSecond: number;
  readonly relayWindowSeconds: number;
  /** Share of a breaker that lights may take. NEC 210.20(A): 1 / 1.25 for continuous loads. */
  readonly continuousShare: number;
  /** A show that is over before this share of its song is noted. Common practice. */
  readonly leastLengthShare: number;
  /** Dark seconds inside a show that are noted. Common practice. */
  readonly longestDarkSeconds: number;
}

export const DEFAULT_RULES: EventRules = {
  flashesPerSecond: 3,
  flashShare: 0.25,
  flashTogetherSeconds: 0.02,
  flashStep: 0.1,
  flashDarkerBelow: 0.8,
  flashLongRunSeconds: 5,
  relayDwellSeconds: 0.5,
  relayCyclesPerSecond: 0.5,
  relayWindowSeconds: 30,
  continuousShare: 1 / CONTINUOUS_FACTOR,
  leastLengthShare: 0.9,
  longestDarkSeconds: 15,
};
