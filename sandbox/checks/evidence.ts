import type { Evidence } from "../../shared/contracts/marking.ts";
import { SIDES } from "../../shared/sides.ts";
import { TICKS_PER_BEAT } from "../../shared/units.ts";
import { listFronts } from "../square/lights.ts";
import { measureSpans } from "../timeline/activity.ts";
import { ACTION_CODE } from "../timeline/model.ts";
import { listBarSpans } from "../timeline/spans.ts";
import { countWord, joinWords } from "../timeline/words.ts";
import { listFunctionCalls } from "./calls.ts";
import { createCheckContext, type CheckContext, type CheckInput } from "./context.ts";
import { lineOfCue, MOST_PLACES } from "./finding.ts";
import { listCircuitLoads } from "./load.ts";
import { countStreetFlashes } from "./street-flash.ts";
import { countRelayCycles, getWearShare } from "./switching.ts";
import { listUses } from "./use.ts";

/** What a fact is about; a rubric's criterion picks the topics that help to judge it. */
export type EvidenceTopic = "coverage" | "music" | "dynamics" | "code" | "safety";

/** One counted fact about a show, for the person who marks it. A fact is no verdict. */
export interface ShowEvidence extends Evidence {
  readonly topic: EvidenceTopic;
}

/** A pulse this near to a hit is on it. Below what people notice as early or late. Common practice, no source. */
const ON_HIT_SECONDS = 0.02;

/**
 * Gives counted facts of a show for marking: what of the square it uses, how it follows the music,
 * how it grows, what the script is made of, what the boxes have to bear. A tick says that a usual
 * aim is met, a triangle that it is clearly not, info only counts.
 */
export function gatherEvidence(input: CheckInput & { readonly source: string }): ShowEvidence[] {
  const context = createCheckContext(input);
  return [
    ...frontsLit(context),
    ...sidesLit(context),
    ...pulsesOnHits(context),
    ...stillBars(context),
    ...sectionsCompared(context),
    ...functionsCalled(input.source),
    ...usesCounted(input.source),
    ...peakLoad(context),
    ...flashesCounted(context),
    ...relayClicks(context),
  ];
}

function fact(
  topic: EvidenceTopic,
  kind: Evidence["kind"],
  text: string,
  places: { readonly lines?: readonly number[]; readonly moments?: readonly number[] } = {},
): ShowEvidence {
  const once = (numbers: readonly number[] = []) => [...new Set(numbers)].sort((a, b) => a - b).slice(0, MOST_PLACES);
  return { topic, kind, text, lines: once(places.lines), moments: once(places.moments) };
}

/** A tick from `good` of the whole on, a triangle below `poor`. */
function byShare(share: number, good: number, poor: number): Evidence["kind"] {
  return share >= good ? "tick" : share < poor ? "triangle" : "info";
}

function litFrontIndexes(context: CheckContext): ReadonlySet<number> {
  const facts = context.facts();
  return new Set(context.lights.filter(({ index }) => facts[index]?.isLit).map(({ frontIndex }) => frontIndex));
}

function frontsLit(context: CheckContext): ShowEvidence[] {
  const fronts = listFronts(context.layout);
  const lit = litFrontIndexes(context);
  const dark = fronts.filter(({ index }) => !lit.has(index)).map(({ front }) => front.name);
  const named = dark.length > 0 && dark.length <= 4 ? ` Dark: ${joinWords(dark)}.` : "";
  return [
    fact(
      "coverage",
      byShare(lit.size / fronts.length, 0.8, 0.4),
      `${lit.size} of ${countWord(fronts.length, "front")} light up.${named}`,
    ),
  ];
}

function sidesLit(context: CheckContext): ShowEvidence[] {
  const lit = litFrontIndexes(context);
  const fronts = listFronts(context.layout);
  const sides = SIDES.filter((side) => fronts.some(({ front }) => front.side === side));
  const dark = sides.filter((side) => !fronts.some(({ front, index }) => front.side === side && lit.has(index)));
  if (sides.length < 2) return [];
  const text =
    dark.length === 0
      ? `All ${sides.length} sides light up.`
      : `${countWord(dark.length, "side")} ${dark.length === 1 ? "stays" : "stay"} dark: ${joinWords(dark)}.`;
  return [fact("coverage", dark.length === 0 ? "tick" : "triangle", text)];
}

/** Of the moments at which something pulses, how many are on a hit of the instrument that fits best. */
function pulsesOnHits(context: CheckContext): ShowEvidence[] {
  const { timeline, song, tempo } = context;
  const { cues } = timeline;
  const pulses = new Map<number, number[]>();
  for (let cue = 0; cue < cues.count; cue++) {
    if (cues.action[cue] !== ACTION_CODE.pulse) continue;
    const tick = cues.tick[cue] ?? 0;
    const lines = pulses.get(tick) ?? [];
    lines.push(lineOfCue(context, cue));
    pulses.set(tick, lines);
  }
  if (pulses.size === 0) return [fact("music", "info", "The script has no pulses.")];
  const fits = song.instruments
    .filter(({ hits }) => hits.length > 0)
    .map(({ name, hits }) => {
      const seconds = hits.map((hit) => tempo.toSeconds(hit * TICKS_PER_BEAT));
      const isOnHit = (tick: number) => nearest(seconds, tempo.toSeconds(tick)) <= ON_HIT_SECONDS + 1e-9;
      const off = [...pulses.keys()].filter((tick) => !isOnHit(tick));
      return { name, off, on: pulses.size - off.length };
    });
  const best = fits.reduce<(typeof fits)[number] | null>(
    (most, fit) => (most === null || fit.on > most.on ? fit : most),
    null,
  );
  if (best === null) return [];
  const lines = best.off.flatMap((tick) => pulses.get(tick) ?? []);
  return [
    fact(
      "music",
      byShare(best.on / pulses.size, 0.6, 0),
      `${best.on} of ${countWord(pulses.size, "pulse moment")} are on a hit of the ${best.name}.`,
      { lines, moments: best.off },
    ),
  ];
}

/** Distance to the nearest of sorted numbers. */
function nearest(sorted: readonly number[], value: number): number {
  let low = 0;
  let high = sorted.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((sorted[middle] ?? 0) < value) low = middle + 1;
    else high = middle;
  }
  return Math.min(Math.abs((sorted[low] ?? Infinity) - value), Math.abs((sorted[low - 1] ?? -Infinity) - value));
}

/** Bars in which no cue lies and no fade moves. */
function stillBars(context: CheckContext): ShowEvidence[] {
  const { timeline, song, lights, tracks } = context;
  const bars = listBarSpans(song).filter(({ start }) => start < timeline.endTick);
  const activities = measureSpans(
    timeline,
    lights,
    tracks,
    bars.map(({ start, end }) => [start, end] as const),
  );
  const changes = new Set<number>();
  for (let cue = 0; cue < timeline.cues.count; cue++) {
    const tick = timeline.cues.tick[cue] ?? 0;
    const bar = bars.findIndex(({ start, end }) => tick >= start && tick < end);
    if (bar >= 0) changes.add(bar);
  }
  const still = bars.filter(
    (_, index) => !changes.has(index) && ["dark", "steady"].includes(activities[index]?.movement ?? "dark"),
  );
  if (still.length === 0) return [fact("music", "tick", "Something changes in every bar.")];
  const numbers = still.map(({ number }) => number);
  const named = numbers.length <= 8 ? `: ${joinWords(numbers.map(String))}` : "";
  return [
    fact(
      "music",
      byShare(1 - still.length / bars.length, 1.1, 0.75),
      `Nothing changes in ${still.length} of ${countWord(bars.length, "bar")}${named}.`,
      { moments: still.map(({ start }) => start) },
    ),
  ];
}

/** The chorus against the verse, or else the loudest against the quietest kind of section. */
function sectionsCompared(context: CheckContext): ShowEvidence[] {
  const { timeline, song, lights, tracks } = context;
  const names = [...new Set(song.sections.map(({ name }) => name))];
  if (names.length < 2) return [];
  const loudness = (name: string) => {
    const values = song.sections
      .filter((section) => section.name === name)
      .flatMap(({ start, end }) => song.loudness.slice(Math.round(start * 4), Math.round(end * 4)));
    return values.reduce((sum, value) => sum + value, 0) / Math.max(1, values.length);
  };
  const byLoudness = names.toSorted((a, b) => loudness(b) - loudness(a));
  const isUsual = names.includes("chorus") && names.includes("verse");
  const [loud, quiet] = isUsual ? ["chorus", "verse"] : [byLoudness[0] ?? "", byLoudness.at(-1) ?? ""];
  const light = (name: string) => {
    const spans = song.sections
      .filter((section) => section.name === name)
      .map(({ start, end }) => [start * TICKS_PER_BEAT, Math.min(end * TICKS_PER_BEAT, timeline.endTick)] as const);
    const activities = measureSpans(timeline, lights, tracks, spans);
    const length = activities.reduce((sum, { start, end }) => sum + end - start, 0);
    return (
      activities.reduce((sum, activity) => sum + activity.light * (activity.end - activity.start), 0) /
      Math.max(1, length)
    );
  };
  const [more, less] = [light(loud), light(quiet)].map((share) => Math.round(share * 100)) as [number, number];
  const kind = more >= less + 5 ? "tick" : "info";
  const starts = song.sections
    .filter(({ name }) => name === loud)
    .map(({ start }) => Math.round(start * TICKS_PER_BEAT));
  return [
    fact("dynamics", kind, `The ${loud} has ${more} % of the light that the square can give, the ${quiet} ${less} %.`, {
      moments: starts,
    }),
  ];
}

function functionsCalled(source: string): ShowEvidence[] {
  const functions = listFunctionCalls(source);
  if (functions.length === 0) return [fact("code", "info", "The script has no function of its own.")];
  return functions.map(({ name, parameters, line, callLines, differentValues }) => {
    const lines = [line, ...callLines];
    if (callLines.length === 0) return fact("code", "info", `\`${name}\` is made but not called by name.`, { lines });
    const values = parameters === 0 ? "" : ` with ${countWord(differentValues, "different set")} of values`;
    return fact(
      "code",
      parameters > 0 && differentValues > 1 ? "tick" : "info",
      `\`${name}\` is called on ${countWord(callLines.length, "line")}${values}.`,
      { lines },
    );
  });
}

function usesCounted(source: string): ShowEvidence[] {
  const uses = listUses(source);
  const count = (kind: (typeof uses)[number]["kind"]) => uses.filter((use) => use.kind === kind);
  const [loops, nested, conditions] = [count("loop"), count("nested-loop"), count("condition")];
  const text = `${countWord(loops.length, "loop")}, ${nested.length} of them inside another, ${countWord(conditions.length, "condition")}.`;
  return [
    fact("code", nested.length > 0 ? "tick" : "info", text, {
      lines: [...loops, ...conditions].map(({ line }) => line),
    }),
  ];
}

function peakLoad(context: CheckContext): ShowEvidence[] {
  const loads = listCircuitLoads(context).filter(({ lights }) => lights.length > 0);
  const fullest = loads.reduce<(typeof loads)[number] | null>(
    (most, load) => (most === null || load.peakAmps / load.limitAmps > most.peakAmps / most.limitAmps ? load : most),
    null,
  );
  if (fullest === null) return [];
  const percent = Math.round((100 * fullest.peakAmps) / fullest.limitAmps);
  return [
    fact(
      "safety",
      percent <= 100 ? "tick" : "triangle",
      `The fullest circuit takes ${percent} % of what it may take (a planning aid).`,
      { moments: [fullest.peakTick] },
    ),
  ];
}

function flashesCounted(context: CheckContext): ShowEvidence[] {
  const sides = countStreetFlashes(context).filter(({ side }) => side !== null);
  const worst = sides.reduce<(typeof sides)[number] | null>(
    (most, count) => (most === null || count.worst > most.worst ? count : most),
    null,
  );
  if (worst === null) return [];
  const limit = context.rules.flashesPerSecond;
  if (worst.worst === 0) return [fact("safety", "tick", "No side flashes.")];
  const longest = Math.max(...sides.map(({ longestRun }) => longestRun));
  const run = longest > 0 ? ` The longest run at the limit lasts ${Math.round(longest)} s.` : "";
  return [
    fact(
      "safety",
      worst.worst <= limit ? "tick" : "triangle",
      `The ${worst.side} side flashes at most ${countWord(worst.worst, "time")} in a second. The limit is ${limit}.${run}`,
      { moments: worst.events.slice(0, 1).map(({ tick }) => tick) },
    ),
  ];
}

function relayClicks(context: CheckContext): ShowEvidence[] {
  const cycles = [...countRelayCycles(context).values()];
  if (cycles.length === 0) return [];
  const total = cycles.reduce((sum, count) => sum + count, 0);
  const busiest = Math.max(...cycles);
  const wear = Math.round(100 * getWearShare(context, busiest));
  return [
    fact(
      "safety",
      "info",
      `The relays come on ${countWord(total, "time")} in a show, the busiest ${countWord(busiest, "time")}: in a season ${wear} % of its life.`,
    ),
  ];
}
