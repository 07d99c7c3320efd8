import { SIDES, type Side } from "../../shared/contracts/square.ts";
import type { Finding } from "../engine/model.ts";
import { sideGeometry } from "../square/geometry.ts";
import type { Light } from "../square/lights.ts";
import type { LightCurve } from "../timeline/curves.ts";
import type { CheckContext } from "./context.ts";
import { buildFinding, linesAt } from "./finding.ts";
import { isWithinSecond, sortRises, type Rise } from "./rises.ts";
import { findTransitions } from "./transitions.ts";
import { nameBar } from "../timeline/words.ts";

/**
 * The street rule: what flashes on the real square, whatever the picture on a screen shows.
 *
 * - A *transition* is one light's change by at least 10 % of its full light from valley to peak or
 *   back, with the darker state below 80 % (WCAG 2.2, general flash). For a colour light both its
 *   luminance and its strongest channel are looked at, and the worse counts: a saturated blue or red
 *   flash has little luminance and is a flash all the same.
 * - Rising transitions within 20 ms (TRACE, 2024) of lights that together are at least 25 % of what
 *   is in view make one *event*: 25 % of the luminous area in the reference picture, or 25 % of the
 *   lights by number (a strip's pixels count as one together). The picture gives windows most of the
 *   area; on the street a roof line of lamps is as bright, so each measure stands in for the other.
 * - More than 3 events in any half-open second are a stop, also when different lights take turns.
 *
 * A view is one side of the square; what stands free in the middle is seen from every side. The view
 * of all sides together is a warning only. A show that passes here is not proved safe: lamps, viewing
 * angle and reflections differ, so the event's safety officer decides.
 *
 * What flashes on a screen that shows the square is a rule of its own, `picture-flash.ts`.
 */
export interface FlashEvent {
  readonly tick: number;
  readonly seconds: number;
  /** Light indexes that rise together. */
  readonly lights: readonly number[];
}

/** What was counted in one view. */
export interface FlashCount {
  /** null: all sides together. */
  readonly side: Side | null;
  /** Rising events, in order. */
  readonly events: readonly FlashEvent[];
  /** Most events in any half-open second. */
  readonly worst: number;
  /** Longest time in seconds without a break in which each second holds as many events as allowed, or more. */
  readonly longestRun: number;
}

/** Several rules and the evidence ask for the same counts. */
const countsOf = new WeakMap<CheckContext, readonly FlashCount[]>();

/** Gives the flash counts of every side that has lights, and of the whole square when it has several sides. Worked out once for a context. */
export function countStreetFlashes(context: CheckContext): readonly FlashCount[] {
  const counts = countsOf.get(context) ?? countViews(context);
  countsOf.set(context, counts);
  return counts;
}

function countViews(context: CheckContext): readonly FlashCount[] {
  const rises = listRises(context);
  const sides = SIDES.filter((side) => context.lights.some((light) => light.side === side));
  const areas = measureAreas(context, sides);
  const views: readonly (Side | null)[] = sides.length === 1 ? sides : [...sides, null];
  return views.map((side) => {
    const weights = listWeights(context, side, areas);
    const counts = rises.map((measure) => countView(context, side, weights, measure));
    return counts.reduce((worse, count) =>
      count.worst > worse.worst || (count.worst === worse.worst && count.longestRun > worse.longestRun) ? count : worse,
    );
  });
}

/** Shares of what is in view, by light index: of the luminous area, and of the number of lights. */
type Weights = ReadonlyMap<number, { readonly area: number; readonly number: number }>;

/** Luminous area of every light in the reference picture of its side, in square pixels. */
function measureAreas({ layout }: CheckContext, sides: readonly Side[]): ReadonlyMap<number, number> {
  return new Map(
    sides.flatMap((side) =>
      sideGeometry(layout, side).flatMap((front) =>
        front.lights.map((light) => [light.lightIndex, light.area] as const),
      ),
    ),
  );
}

/** What stands on no side is in every view. */
function listWeights({ lights }: CheckContext, side: Side | null, areas: ReadonlyMap<number, number>): Weights {
  const inView = lights.filter((light) => side === null || light.side === side || light.side === null);
  const areaOf = (light: Light) => areas.get(light.index) ?? 0;
  const numberOf = (light: Light) => 1 / (light.pixels ?? 1);
  const sum = (measure: (light: Light) => number) => inView.reduce((total, light) => total + measure(light), 0) || 1;
  const [area, number] = [sum(areaOf), sum(numberOf)];
  return new Map(
    inView.map((light) => [light.index, { area: areaOf(light) / area, number: numberOf(light) / number }]),
  );
}

/** Rising transitions of all lights by time: once by luminance, once by the strongest channel. */
function listRises(context: CheckContext): readonly (readonly Rise[])[] {
  const { rules, tempo, lights } = context;
  const rule = { step: rules.flashStep, darkerBelow: rules.flashDarkerBelow };
  const curves = context.curves();
  const measures = lights.some((light) => light.hasColour)
    ? (["luminance", "strongest"] as const)
    : (["luminance"] as const);
  return measures.map((measure) => {
    const known = new Map<LightCurve, readonly number[]>();
    const rises = curves.flatMap((curve, light) => {
      const ticks =
        known.get(curve) ??
        findTransitions(curve.tick, curve[measure], rule, 0)
          .filter((transition) => transition.isRising)
          .map((transition) => transition.time);
      known.set(curve, ticks);
      return ticks.map((tick) => ({ light, tick, seconds: tempo.toSeconds(tick) }));
    });
    return sortRises(rises);
  });
}

function countView({ rules }: CheckContext, side: Side | null, weights: Weights, rises: readonly Rise[]): FlashCount {
  const inView = rises.filter(({ light }) => weights.has(light));
  const events = groupRises(inView, weights, rules.flashShare, rules.flashTogetherSeconds);
  let worst = 0;
  let oldest = 0;
  events.forEach(({ seconds }, newest) => {
    while (!isWithinSecond(events[oldest]?.seconds ?? 0, seconds)) oldest++;
    worst = Math.max(worst, newest - oldest + 1);
  });
  return { side, events, worst, longestRun: longestRunAtLimit(events, rules.flashesPerSecond) };
}

/** From the earliest on: rises within 20 ms are one event when their lights weigh enough. */
function groupRises(rises: readonly Rise[], weights: Weights, needed: number, together: number): FlashEvent[] {
  const events: FlashEvent[] = [];
  for (let start = 0; start < rises.length;) {
    const first = rises[start];
    if (first === undefined) break;
    const lights = new Set<number>();
    let [area, number] = [0, 0];
    let end = start;
    for (let rise = rises[end]; rise !== undefined && rise.seconds - first.seconds <= together; rise = rises[++end]) {
      if (lights.has(rise.light)) continue;
      lights.add(rise.light);
      const weight = weights.get(rise.light);
      area += weight?.area ?? 0;
      number += weight?.number ?? 0;
    }
    // A sum of thirds may lack the last digit of a quarter.
    if (Math.max(area, number) >= needed - 1e-9) {
      events.push({ tick: first.tick, seconds: first.seconds, lights: [...lights] });
      start = end;
    } else {
      start++;
    }
  }
  return events;
}

/** The longest stretch in which events follow each other so that `limit` of them fall in each second. */
function longestRunAtLimit(events: readonly FlashEvent[], limit: number): number {
  let longest = 0;
  let from: number | null = null;
  for (let event = limit - 1; event < events.length; event++) {
    const first = events[event - limit + 1]?.seconds ?? 0;
    const last = events[event]?.seconds ?? 0;
    if (isWithinSecond(first, last)) {
      from ??= first;
      longest = Math.max(longest, last - from);
    } else {
      from = null;
    }
  }
  return longest;
}

/** Finds views with more events a second than allowed, and long runs at the limit. */
export function findStreetFlashes(context: CheckContext): Finding[] {
  const { rules } = context;
  const counts = countStreetFlashes(context);
  const findings: Finding[] = [];
  const isAnySideOver = counts.some(({ side, worst }) => side !== null && worst > rules.flashesPerSecond);
  for (const count of counts) {
    if (count.worst > rules.flashesPerSecond) {
      if (count.side === null && isAnySideOver) continue;
      findings.push(describeOver(context, count));
    } else if (count.side !== null && count.longestRun > rules.flashLongRunSeconds) {
      findings.push(
        buildFinding(context, "street-flash-long-run", {
          sentence: `The ${count.side} side flashes ${rules.flashesPerSecond} times a second for ${Math.round(count.longestRun)} seconds.`,
          hint: "That keeps the limit. A calm bar in between is kinder to people who are sensitive to flashes.",
          measured: { value: Math.round(count.longestRun * 10) / 10, limit: rules.flashLongRunSeconds, unit: "s" },
          moments: count.events.slice(0, 1).map(({ tick }) => tick),
        }),
      );
    }
  }
  return findings;
}

function describeOver(context: CheckContext, { side, events, worst }: FlashCount): Finding {
  const limit = context.rules.flashesPerSecond;
  const bad = events.filter((event, index) => {
    const fourth = events[index + limit];
    return fourth !== undefined && isWithinSecond(event.seconds, fourth.seconds);
  });
  const first = bad[0];
  const startsAt = first === undefined ? 0 : events.indexOf(first);
  const together = events.slice(startsAt, startsAt + limit + 1);
  const where = first === undefined ? "" : ` in ${nameBar(context.song, first.tick)}`;
  const who = side === null ? `The sides together flash` : `The ${side} side flashes`;
  return buildFinding(context, side === null ? "street-flash-all-sides" : "street-flash", {
    sentence: `${who} ${worst} times in one second${where}. More than ${limit} can harm people.`,
    hint: "Pulse on whole beats, let fewer lights pulse at once, or use fades. The event's safety officer decides.",
    measured: { value: worst, limit, unit: "flashes a second" },
    moments: bad.map(({ tick }) => tick),
    lights: together.flatMap(({ lights }) => lights),
    lines: together.flatMap(({ tick, lights }) => linesAt(context, tick, lights)),
  });
}
