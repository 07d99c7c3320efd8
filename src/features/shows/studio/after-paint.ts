/** A new show is on screen by then, on a slow laptop too; nobody waits for what comes later. */
const AFTER_PAINT_MS = 120;

/**
 * Does something once a new show has been drawn: what is worked out of it (check, ribbon, words) would
 * take the processor from its picture. Gives what cancels it.
 */
export function afterPaint(run: () => void): () => void {
  const timer = setTimeout(run, AFTER_PAINT_MS);
  return () => clearTimeout(timer);
}
