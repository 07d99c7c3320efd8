import type { Finding } from "../engine/model.ts";
import type { OnSpan } from "../timeline/switching.ts";
import { listOf } from "./by-line.ts";
import type { CheckContext } from "./context.ts";
import { buildFinding, lineOfCue } from "./finding.ts";
import { relayWearShare } from "./load-rules.ts";

/** Beats are whole microseconds, ticks fractions of them: a millisecond short is not short. */
const ROUNDING_SECONDS = 0.001;

/** A stretch on, or off between two, that is shorter than a box should switch. */
interface ShortSpan {
  readonly light: number;
  readonly tick: number;
  readonly seconds: number;
  readonly cue: number;
}

/** Finds relays that switch faster than 500 ms, with one finding a script line. */
export function findRelayDwell(context: CheckContext): Finding[] {
  const limit = context.rules.relayDwellSeconds;
  return byLine(context, listShort(context, "relay", limit)).map(([line, short]) => {
    const shortest = Math.min(...short.map(({ seconds }) => seconds));
    return buildFinding(context, "relay-dwell", {
      sentence: `A relay switches after ${inSeconds(shortest)} here. Relays like ${inSeconds(limit)} or more.`,
      hint: 'Leave relays out: `if (front.box !== "relay") { ... }`, or use longer pulses.',
      measured: { value: Math.round(shortest * 1000), limit: Math.round(limit * 1000), unit: "ms" },
      moments: short.map(({ tick }) => tick),
      lights: short.map(({ light }) => light),
      lines: [line],
    });
  });
}

/** Notes times of a solid-state box that are shorter than a half-cycle of the mains, which is the least it can do. */
export function findHalfCycle(context: CheckContext): Finding[] {
  const half = 1 / (2 * context.layout.mains.hertz);
  return byLine(context, listShort(context, "solid-state", half, 1e-6)).map(([line, short]) => {
    const shortest = Math.min(...short.map(({ seconds }) => seconds));
    return buildFinding(context, "half-cycle", {
      sentence: `A box switches after ${inMillis(shortest)} here. It can only switch every ${inMillis(half)}.`,
      hint: "Use longer times: shorter ones may be lost.",
      measured: { value: Math.round(shortest * 10_000) / 10, limit: Math.round(half * 10_000) / 10, unit: "ms" },
      moments: short.map(({ tick }) => tick),
      lights: short.map(({ light }) => light),
      lines: [line],
    });
  });
}

/** Finds relays that come on more often than they are rated for over half a minute. */
export function findRelayRate(context: CheckContext): Finding[] {
  const { rules, tempo, lights } = context;
  const onSpans = context.onSpans();
  const most = rules.relayCyclesPerSecond * rules.relayWindowSeconds;
  let worst = 0;
  const places: { readonly light: number; readonly span: OnSpan }[] = [];
  for (const { index, boxKind } of lights) {
    if (boxKind !== "relay") continue;
    const spans = onSpans[index] ?? [];
    const times = spans.map(({ start }) => tempo.toSeconds(start));
    let oldest = 0;
    let isOver = false;
    times.forEach((time, newest) => {
      while (time - (times[oldest] ?? time) >= rules.relayWindowSeconds) oldest++;
      const count = newest - oldest + 1;
      if (count > most && !isOver) {
        isOver = true;
        const span = spans[oldest];
        if (span !== undefined) places.push({ light: index, span });
      }
      worst = Math.max(worst, count);
    });
  }
  if (places.length === 0) return [];
  return [
    buildFinding(context, "relay-rate", {
      sentence: `A relay comes on ${worst} times in ${rules.relayWindowSeconds} seconds. ${most} are enough.`,
      hint: "Let relays rest: use them on every second bar, or for longer.",
      measured: { value: worst, limit: most, unit: `times in ${rules.relayWindowSeconds} s` },
      moments: places.map(({ span }) => span.start),
      lights: places.map(({ light }) => light),
      lines: places.map(({ span }) => lineOfCue(context, span.cue)),
    }),
  ];
}

/** Finds relays that a season of this show would wear out too far. */
export function findRelayWear(context: CheckContext): Finding[] {
  const { rules } = context;
  const most = (rules.relayWearShare * rules.relayLifeCycles) / rules.seasonPlays;
  const worn = [...countRelayCycles(context)].filter(([, cycles]) => cycles > most);
  if (worn.length === 0) return [];
  const busiest = Math.max(...worn.map(([, cycles]) => cycles));
  const share = getWearShare(context, busiest);
  const spans = worn.flatMap(([light]) => context.onSpans()[light] ?? []);
  return [
    buildFinding(context, "relay-wear", {
      sentence: `A relay comes on ${busiest} times. A season of that takes ${inPercent(share)} of its life.`,
      hint: 'Relays last longer when they switch less: `if (front.box !== "relay") { ... }`.',
      measured: {
        value: Math.round(share * 100),
        limit: Math.round(rules.relayWearShare * 100),
        unit: "% of its life",
      },
      moments: spans.slice(0, 1).map(({ start }) => start),
      lights: worn.map(([light]) => light),
      lines: spans.map(({ cue }) => lineOfCue(context, cue)),
    }),
  ];
}

/** Gives the share of a relay's life that a season of shows takes in which it comes on so often. */
export function getWearShare({ rules }: Pick<CheckContext, "rules">, cycles: number): number {
  return relayWearShare({ cyclesPerShow: cycles, plays: rules.seasonPlays, lifeCycles: rules.relayLifeCycles });
}

/** Gives how often each relay comes on in the show, by light index: what wear is worked out from. */
export function countRelayCycles(context: CheckContext): ReadonlyMap<number, number> {
  const onSpans = context.onSpans();
  const relays = context.lights.filter(({ boxKind }) => boxKind === "relay");
  return new Map(relays.map(({ index }) => [index, onSpans[index]?.length ?? 0]));
}

function listShort(
  { lights, tempo, onSpans }: CheckContext,
  kind: "relay" | "solid-state",
  limit: number,
  rounding = ROUNDING_SECONDS,
): ShortSpan[] {
  const short: ShortSpan[] = [];
  const add = (light: number, start: number, end: number, cue: number) => {
    const seconds = tempo.toSeconds(end) - tempo.toSeconds(start);
    if (seconds < limit - rounding) short.push({ light, tick: start, seconds, cue });
  };
  for (const { index, boxKind } of lights) {
    if (boxKind !== kind) continue;
    const spans = onSpans()[index] ?? [];
    spans.forEach(({ start, end, cue }, place) => {
      add(index, start, end, cue);
      const next = spans[place + 1];
      if (next !== undefined) add(index, end, next.start, next.cue);
    });
  }
  return short;
}

function byLine(context: CheckContext, short: readonly ShortSpan[]): (readonly [number, ShortSpan[]])[] {
  const lines = new Map<number, ShortSpan[]>();
  for (const span of short) listOf(lines, lineOfCue(context, span.cue)).push(span);
  return [...lines].sort(([a], [b]) => a - b);
}

const inPercent = (share: number) => `${Math.round(share * 100)} %`;
const inSeconds = (seconds: number) => `${Math.round(seconds * 100) / 100} s`;
const inMillis = (seconds: number) => `${Math.round(seconds * 10_000) / 10} ms`;
