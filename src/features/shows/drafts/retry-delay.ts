/** Pauses between tries, in seconds; the last one repeats for ever. */
const RETRY_SECONDS = [1, 2, 4, 8, 15, 30] as const;

/**
 * The pause before try number `attempt` (1 is the first repeat), in milliseconds: the table's value
 * times 0.75 to 1.25, so that a class whose server came back does not knock all at once.
 * `random` gives 0 to 1.
 */
export function getRetryDelayMs(attempt: number, random: () => number): number {
  const step = Math.min(Math.max(attempt, 1), RETRY_SECONDS.length) - 1;
  const seconds = RETRY_SECONDS[step] ?? 30;
  return Math.round(seconds * 1000 * (0.75 + random() * 0.5));
}
