/** One half of a flash: a change from a valley up, or from a peak down. */
export interface Transition {
  /** Where the change since the last extreme reached the step; in the unit of the series. */
  readonly time: number;
  readonly isRising: boolean;
}

/** What counts as a change. */
export interface TransitionRule {
  /** Least change from peak to valley. */
  readonly step: number;
  /** The darker of the two states is below this. */
  readonly darkerBelow: number;
}

/** WCAG 2.2, "general flash": at least 10 % of the maximum relative luminance, the darker state below 0.80. */
export const GENERAL_FLASH: TransitionRule = { step: 0.1, darkerBelow: 0.8 };

/** Sums of doubles are not exact: a change this little short of the step is the step. */
const ROUNDING = 1e-9;

/**
 * Gives the transitions of a series of points joined by straight lines, in order; rising and falling
 * take turns. Measured from extreme to extreme, not from point to point: a slow climb in many small
 * steps is one transition (WCAG 2.2, note to "general flash and red flash thresholds"). The series
 * starts from `before`; without it from its own first value.
 */
export function findTransitions(
  times: ArrayLike<number>,
  values: ArrayLike<number>,
  rule: TransitionRule,
  before?: number,
): Transition[] {
  const transitions: Transition[] = [];
  let low = before ?? values[0] ?? 0;
  let high = low;
  let isRising: boolean | null = null;
  for (let point = 0; point < times.length; point++) {
    const value = values[point] ?? 0;
    if (isRising !== true) {
      const isStep = value - low >= rule.step - ROUNDING && low < rule.darkerBelow;
      if (isStep) {
        transitions.push({ time: crossing(times, values, point, low + rule.step), isRising: true });
        isRising = true;
        high = value;
        continue;
      }
    }
    if (isRising !== false) {
      const isStep = high - value >= rule.step - ROUNDING && value < rule.darkerBelow;
      if (isStep) {
        transitions.push({
          time: crossing(times, values, point, Math.min(high - rule.step, rule.darkerBelow)),
          isRising: false,
        });
        isRising = false;
        low = value;
        continue;
      }
    }
    low = Math.min(low, value);
    high = Math.max(high, value);
  }
  return transitions;
}

/** Where the line into `point` reaches `target`. */
function crossing(times: ArrayLike<number>, values: ArrayLike<number>, point: number, target: number): number {
  const end = times[point] ?? 0;
  if (point === 0) return end;
  const start = times[point - 1] ?? 0;
  const from = values[point - 1] ?? 0;
  const to = values[point] ?? 0;
  const share = to === from ? 1 : (target - from) / (to - from);
  return start + Math.min(1, Math.max(0, share)) * (end - start);
}
