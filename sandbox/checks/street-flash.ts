import type { Side } from "../../shared/contracts/square.ts";
import type { Finding } from "../engine/model.ts";
import type { Light } from "../square/lights.ts";
import { joinWords, nameBar } from "../timeline/words.ts";
import { createRecall } from "./check-memory.ts";
import type { CheckContext } from "./context.ts";
import { buildFinding, linesAt, MOST_PLACES } from "./finding.ts";
import { groupLights, type LightGroup } from "./light-groups.ts";
import { isWithinSecond, listEvents, listRises } from "./rises.ts";
import type { EventRules } from "./rules.ts";
import { measureSides, type SideMeasure } from "./side-measures.ts";

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
  /** Light indexes that rise together; lights that do the same share a list. */
  readonly lights: readonly (readonly number[])[];
}

/** What was counted in one view. */
export interface FlashCount {
  /** null: all sides together. */
  readonly side: Side | null;
  /** Rising events, in order. */
  readonly events: readonly FlashEvent[];
  /** Most events in any half-open second. */
  readonly worst: number;
  /** Longest time in seconds without a break in which each second holds as many events as allowed, or more; and the index of its first event. */
  readonly longestRun: number;
  readonly longestRunAt: number;
}

const recallCount = createRecall<FlashCount>();

/** Gives the flash counts of every side that has lights, and of the whole square when it has several sides. */
export function countStreetFlashes(context: CheckContext): readonly FlashCount[] {
  const measures = measureSides(context.layout);
  const views: readonly (Side | null)[] =
    measures.length === 1 ? measures.map(({ side }) => side) : [...measures.map(({ side }) => side), null];
  const facts = context.facts();
  return views.map((side) => {
    // What stands on no side is in every view.
    const inView = context.lights.filter((light) => side === null || light.side === side || light.side === null);
    const told = inView.map(({ index }) => facts[index]);
    return recallCount(context.memory, side ?? "all", told, () => countView(context, side, inView, measures));
  });
}

function countView(
  context: CheckContext,
  side: Side | null,
  inView: readonly Light[],
  measures: readonly SideMeasure[],
): FlashCount {
  const { rules, tempo } = context;
  const groups = groupLights(context, inView);
  const weights = weighGroups(inView, groups, listAreas(measures, side));
  const counts = (["byLuminance", "byStrongest"] as const).map((measure) => {
    const rises = listRises(
      groups.map((group) => group.facts[measure].rising),
      tempo,
    );
    const events = listEvents(rises, rules.flashTogetherSeconds, {
      weights,
      // A sum of thirds may lack the last digit of a quarter.
      isEvent: ([area = 0, number = 0]) => Math.max(area, number) >= rules.flashShare - 1e-9,
    });
    return countEvents(
      side,
      events.map(({ tick, seconds, groups: rising }) => ({
        tick,
        seconds,
        lights: rising.map((group) => groups[group]?.lights ?? []),
      })),
      rules,
    );
  });
  return counts.reduce((worse, count) =>
    count.worst > worse.worst || (count.worst === worse.worst && count.longestRun > worse.longestRun) ? count : worse,
  );
}

/** Luminous area of every light in view, in square pixels of its side's reference picture. */
function listAreas(measures: readonly SideMeasure[], side: Side | null): ReadonlyMap<number, number> {
  return new Map(measures.flatMap((measure) => (side === null || measure.side === side ? [...measure.area] : [])));
}

/** Shares of what is in view, by group: of the luminous area, and of the number of lights. A strip's pixels are one light together. */
function weighGroups(
  inView: readonly Light[],
  groups: readonly LightGroup[],
  areas: ReadonlyMap<number, number>,
): readonly [Float64Array, Float64Array] {
  const pixelsOf = new Map(inView.map(({ index, pixels }) => [index, pixels ?? 1]));
  const share = (measure: (light: number) => number): Float64Array => {
    const total = inView.reduce((sum, { index }) => sum + measure(index), 0) || 1;
    return Float64Array.from(groups, ({ lights }) => lights.reduce((sum, light) => sum + measure(light), 0) / total);
  };
  return [share((light) => areas.get(light) ?? 0), share((light) => 1 / (pixelsOf.get(light) ?? 1))];
}

function countEvents(side: Side | null, events: readonly FlashEvent[], rules: EventRules): FlashCount {
  let worst = 0;
  let oldest = 0;
  events.forEach(({ seconds }, newest) => {
    while (!isWithinSecond(events[oldest]?.seconds ?? 0, seconds)) oldest++;
    worst = Math.max(worst, newest - oldest + 1);
  });
  const run = findLongestRun(events, rules.flashesPerSecond);
  return { side, events, worst, longestRun: run.seconds, longestRunAt: run.first };
}

/** The longest stretch in which events follow each other so that `limit` of them fall in each second. */
function findLongestRun(
  events: readonly FlashEvent[],
  limit: number,
): { readonly seconds: number; readonly first: number } {
  let longest = { seconds: 0, first: 0 };
  let from: number | null = null;
  for (let event = limit - 1; event < events.length; event++) {
    const first = event - limit + 1;
    const last = events[event]?.seconds ?? 0;
    if (!isWithinSecond(events[first]?.seconds ?? 0, last)) {
      from = null;
      continue;
    }
    from ??= first;
    const seconds = last - (events[from]?.seconds ?? 0);
    if (seconds > longest.seconds) longest = { seconds, first: from };
  }
  return longest;
}

/** Finds views with more events a second than allowed, one finding for all sides, and long runs at the limit. */
export function findStreetFlashes(context: CheckContext): Finding[] {
  const { flashesPerSecond, flashLongRunSeconds } = context.rules;
  const counts = countStreetFlashes(context);
  const sides = counts.filter(({ side }) => side !== null);
  const over = sides.filter(({ worst }) => worst > flashesPerSecond);
  const together = counts.filter(({ side, worst }) => side === null && worst > flashesPerSecond);
  const long = sides.filter(({ worst, longestRun }) => worst <= flashesPerSecond && longestRun > flashLongRunSeconds);
  return [
    ...(over.length > 0 ? [describeOver(context, "street-flash", over, nameSides(over, sides.length))] : []),
    ...(over.length === 0 && together.length > 0
      ? [describeOver(context, "street-flash-all-sides", together, "The sides together flash")]
      : []),
    ...long.map((count) => describeLongRun(context, count)),
  ];
}

/** "The north side flashes", "The north and south sides flash", "3 sides flash". */
function nameSides(counts: readonly FlashCount[], all: number): string {
  const names = counts.flatMap(({ side }) => side ?? []);
  if (names.length === 1) return `The ${names[0]} side flashes`;
  if (names.length === all && all > 2) return "All sides flash";
  return names.length > 2 ? `${names.length} sides flash` : `The ${joinWords(names)} sides flash`;
}

function describeOver(
  context: CheckContext,
  rule: "street-flash" | "street-flash-all-sides",
  counts: readonly FlashCount[],
  who: string,
): Finding {
  const limit = context.rules.flashesPerSecond;
  const bad = counts.flatMap(({ events }) => listCrowded(events, limit));
  const worst = Math.max(...counts.map((count) => count.worst));
  const [first] = bad.toSorted((a, b) => a.seconds - b.seconds);
  const where = first === undefined ? "" : ` in ${nameBar(context.song, first.tick)}`;
  return buildFinding(context, rule, {
    sentence: `${who} ${worst} times in one second${where}. More than ${limit} can harm people.`,
    hint: "Pulse on whole beats, let fewer lights pulse at once, or use fades. The event's safety officer decides.",
    measured: { value: worst, limit, unit: "flashes a second" },
    ...placesOf(context, bad),
  });
}

/** The events that begin a second with more of them than allowed. */
function listCrowded(events: readonly FlashEvent[], limit: number): FlashEvent[] {
  return events.filter((event, index) => {
    const next = events[index + limit];
    return next !== undefined && isWithinSecond(event.seconds, next.seconds);
  });
}

function describeLongRun(context: CheckContext, { side, events, longestRun, longestRunAt }: FlashCount): Finding {
  const { flashesPerSecond, flashLongRunSeconds } = context.rules;
  const start = events.slice(longestRunAt, longestRunAt + flashesPerSecond);
  return buildFinding(context, "street-flash-long-run", {
    sentence: `The ${side} side flashes ${flashesPerSecond} times a second for ${Math.round(longestRun)} seconds.`,
    hint: "That keeps the limit. A calm bar in between is kinder to people who are sensitive to flashes.",
    measured: { value: Math.round(longestRun * 10) / 10, limit: flashLongRunSeconds, unit: "s" },
    ...placesOf(context, start),
    moments: start.slice(0, 1).map(({ tick }) => tick),
  });
}

/** When, where and by which lines some events happen; of very many the first ones. */
function placesOf(context: CheckContext, events: readonly FlashEvent[]) {
  const shown = events.toSorted((a, b) => a.seconds - b.seconds).slice(0, MOST_PLACES);
  return {
    moments: shown.map(({ tick }) => tick),
    lights: shown.flatMap(({ lights }) => lights.flat()),
    lines: shown.flatMap(({ tick, lights }) => linesAt(context, tick, lights.flat())),
  };
}
