const SLICE_MS = 6;
const LATEST_MS = 300;

const waiting = new Set<() => void>();
let isBooked = false;

const bookIdle: (run: () => void) => void =
  typeof requestIdleCallback === "function" ? (run) => requestIdleCallback(run, { timeout: LATEST_MS }) : (run) => setTimeout(run, 1);

function work() {
  isBooked = false;
  const start = performance.now();
  for (const draw of waiting) {
    waiting.delete(draw);
    draw();
    if (performance.now() - start > SLICE_MS) break;
  }
  if (waiting.size > 0) book();
}

function book() {
  if (isBooked) return;
  isBooked = true;
  bookIdle(work);
}

/**
 * Draws when the page has nothing better to do, in slices of 6 ms, so that sixty pictures on a board
 * never hold up a keystroke. Returns the way to call it off.
 */
export function queueDrawing(draw: () => void): () => void {
  waiting.add(draw);
  book();
  return () => waiting.delete(draw);
}

/** Draws everything that waits, now: before printing. */
export function flushDrawings() {
  for (const draw of waiting) {
    waiting.delete(draw);
    draw();
  }
}

if (typeof window !== "undefined") window.addEventListener("beforeprint", flushDrawings);
