import { CONTINUOUS_FACTOR } from "./load-rules.ts";

/**
 * The limits that the show check measures against. They are settings of an event; those that keep
 * people safe can only be made stricter (see `tightenRules`). Each says where it comes from; "common practice" has no source that could be cited.
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
  /** Switchings in a relay's life at rated load. Relay datasheets: 100 000. */
  readonly relayLifeCycles: number;
  /** How often a show is played in a season, and the share of a relay's life it may take. Common practice: 6 a night, 30 nights. */
  readonly seasonPlays: number;
  readonly relayWearShare: number;
  /** Share of a breaker that lights may take. NEC 210.20(A): 1 / 1.25 for continuous loads. */
  readonly continuousShare: number;
  /** What a cold filament takes for a moment, in times of its current. Lamp makers: 10 to 15. */
  readonly inrushFactor: number;
  /** What a breaker bears for a moment, in times of its rating. Common practice, no source; plate ratings decide. */
  readonly inrushTimesBreaker: number;
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
  relayLifeCycles: 100_000,
  seasonPlays: 180,
  relayWearShare: 0.5,
  continuousShare: 1 / CONTINUOUS_FACTOR,
  inrushFactor: 12,
  inrushTimesBreaker: 5,
  leastLengthShare: 0.9,
  longestDarkSeconds: 15,
};

/** Limits that an event can lower and not raise, and those that it can raise and not lower. */
const AT_MOST = [
  "flashesPerSecond",
  "flashShare",
  "flashStep",
  "flashLongRunSeconds",
  "continuousShare",
] as const satisfies readonly (keyof EventRules)[];
const AT_LEAST = [
  "flashTogetherSeconds",
  "flashDarkerBelow",
  "relayDwellSeconds",
] as const satisfies readonly (keyof EventRules)[];

/** Gives the rules of an event: its own where it names them, but never looser ones for flashes, load and relays. */
export function tightenRules(own: Partial<EventRules> = {}): EventRules {
  const rules = { ...DEFAULT_RULES, ...own };
  const atMost = AT_MOST.map((limit) => [limit, Math.min(rules[limit], DEFAULT_RULES[limit])] as const);
  const atLeast = AT_LEAST.map((limit) => [limit, Math.max(rules[limit], DEFAULT_RULES[limit])] as const);
  return { ...rules, ...Object.fromEntries([...atMost, ...atLeast]) };
}
