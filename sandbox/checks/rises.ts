import type { Tempo } from "../timeline/tempo.ts";

/** Transitions of one direction (halves of flashes) of several groups of lights, in order of time. */
export interface Rises {
  readonly count: number;
  /** May be fractional. */
  readonly tick: Float64Array;
  readonly seconds: Float64Array;
  /** Index of the group. */
  readonly group: Uint32Array;
}

/** Beats are whole microseconds, so four events "a second apart" may lack a few of them. */
const ROUNDING_SECONDS = 0.0005;

/** Says whether two moments lie in one half-open second. */
export function isWithinSecond(first: number, last: number): boolean {
  return last - first < 1 - ROUNDING_SECONDS;
}

/** Gives the rises (or the falls) of groups in order of time; `ticks` holds those of each group, in order. */
export function listRises(ticks: readonly Float64Array[], tempo: Tempo): Rises {
  const count = ticks.reduce((sum, { length }) => sum + length, 0);
  const [tick, seconds, group] = [new Float64Array(count), new Float64Array(count), new Uint32Array(count)];
  let at = 0;
  ticks.forEach((own, index) => {
    for (const moment of own) {
      tick[at] = moment;
      seconds[at] = tempo.toSeconds(moment);
      group[at++] = index;
    }
  });
  const order = Uint32Array.from(group.keys()).sort((a, b) => (tick[a] ?? 0) - (tick[b] ?? 0));
  return {
    count,
    tick: tick.map((_, place) => tick[order[place] ?? 0] ?? 0),
    seconds: seconds.map((_, place) => seconds[order[place] ?? 0] ?? 0),
    group: group.map((_, place) => group[order[place] ?? 0] ?? 0),
  };
}

/** Rises that count as one: of `first` up to, not including, `end`. */
export interface RiseEvent {
  readonly tick: number;
  readonly seconds: number;
  /** Indexes of the groups that rise, each once. */
  readonly groups: readonly number[];
}

/** What makes rises an event. */
export interface EventMeasure {
  /** One or more weights of each group. */
  readonly weights: readonly Float64Array[];
  /**
   * Whether groups whose weights add up to `totals` make an event. Must hold for more groups when it
   * holds for some. `listGroups` costs as much as there are rises; call it last.
   */
  isEvent(totals: Float64Array, listGroups: () => readonly number[]): boolean;
}

/**
 * Gives the events of some rises, from the earliest on: those within `together` seconds of the first
 * one are taken together when the measure says so; else the first is left out and the next one tried.
 */
export function listEvents(rises: Rises, together: number, { weights, isEvent }: EventMeasure): RiseEvent[] {
  const { count, tick, seconds, group } = rises;
  const events: RiseEvent[] = [];
  const [groupCount, measures] = [weights[0]?.length ?? 0, weights.length];
  const inWindow = new Uint32Array(groupCount);
  const totals = new Float64Array(measures);
  let end = 0;
  let refusedUntil = -1;
  const add = (rise: number) => {
    const index = group[rise] ?? 0;
    const known = inWindow[index] ?? 0;
    inWindow[index] = known + 1;
    if (known > 0) return;
    for (let at = 0; at < measures; at++) totals[at] = (totals[at] ?? 0) + (weights[at]?.[index] ?? 0);
  };
  const remove = (rise: number) => {
    const index = group[rise] ?? 0;
    const left = (inWindow[index] ?? 1) - 1;
    inWindow[index] = left;
    if (left > 0) return;
    for (let at = 0; at < measures; at++) totals[at] = (totals[at] ?? 0) - (weights[at]?.[index] ?? 0);
  };
  for (let start = 0; start < count;) {
    while (end < count && (seconds[end] ?? 0) - (seconds[start] ?? 0) <= together) add(end++);
    const listGroups = () => [...new Set(group.subarray(start, end))];
    // Fewer rises of what was refused are refused, too.
    if (end > refusedUntil && isEvent(totals, listGroups)) {
      events.push({ tick: tick[start] ?? 0, seconds: seconds[start] ?? 0, groups: listGroups() });
      for (; start < end; start++) inWindow[group[start] ?? 0] = 0;
    } else {
      refusedUntil = end;
      remove(start++);
    }
    // Adding and taking away again leaves a rest of rounding behind.
    if (start === end) totals.fill(0);
  }
  return events;
}
