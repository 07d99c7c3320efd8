/** The fewest letters to add, drop, change or swap with the neighbour to get from `a` to `b`. */
export function letterDistance(a: string, b: string): number {
  let before: number[] = [];
  let row = Array.from({ length: b.length + 1 }, (_, j) => j);
  for (let i = 1; i <= a.length; i++) {
    const next = [i];
    for (let j = 1; j <= b.length; j++) {
      const same = a[i - 1] === b[j - 1];
      let best = Math.min((row[j] ?? 0) + 1, (next[j - 1] ?? 0) + 1, (row[j - 1] ?? 0) + (same ? 0 : 1));
      if (i > 1 && j > 1 && a[i - 1] === b[j - 2] && a[i - 2] === b[j - 1])
        best = Math.min(best, (before[j - 2] ?? 0) + 1);
      next.push(best);
    }
    before = row;
    row = next;
  }
  return row[b.length] ?? 0;
}

const LONGEST_NAME = 60;

/**
 * The name that was most likely meant: the nearest within a third of the letters written (rule 25), big and
 * small letters counting only in a tie; null when none is near. Of equals the first wins.
 */
export function near(name: string, names: Iterable<string>): string | null {
  if (name.length > LONGEST_NAME) return null;
  const small = name.toLowerCase();
  let best: string | null = null;
  let bestDistance = Infinity;
  for (const candidate of names) {
    if (candidate.length > LONGEST_NAME || candidate === name) continue;
    const distance = letterDistance(small, candidate.toLowerCase());
    if (distance <= name.length / 3 && distance < bestDistance) {
      best = candidate;
      bestDistance = distance;
    }
  }
  return best;
}
