/** One figure of the benchmark. `ratio` compares with `against`, measured in the same run on the same machine. */
export interface Figure {
  readonly name: string;
  readonly value: number;
  readonly unit: string;
  /** What it is compared with; null for a figure that stands alone. */
  readonly against: string | null;
  readonly ratio: number | null;
}

/** The middle of some numbers. Throws on none. */
export function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  const middle = sorted[Math.floor(sorted.length / 2)];
  if (middle === undefined) throw new Error("There is no median of nothing.");
  return middle;
}

/** The value that a share of the numbers does not pass. */
export function percentile(values: readonly number[], share: number): number {
  const sorted = [...values].sort((a, b) => a - b);
  const found = sorted[Math.min(sorted.length - 1, Math.ceil(sorted.length * share) - 1)];
  if (found === undefined) throw new Error("There is no percentile of nothing.");
  return found;
}

/**
 * Milliseconds of each of several ways to do a thing, taken in turns so that whatever else the machine
 * does falls on all of them alike. Gives the median of each way.
 */
export async function timeInTurns<Name extends string>(
  rounds: number,
  ways: Readonly<Record<Name, () => unknown>>,
): Promise<Record<Name, number>> {
  const names = Object.keys(ways) as Name[];
  const times = new Map<Name, number[]>(names.map((name) => [name, []]));
  for (let round = 0; round <= rounds; round += 1) {
    for (const name of names) {
      const start = performance.now();
      await ways[name]();
      // The first round warms up and does not count.
      if (round > 0) times.get(name)?.push(performance.now() - start);
    }
  }
  return Object.fromEntries(names.map((name) => [name, median(times.get(name) ?? [])])) as Record<Name, number>;
}
