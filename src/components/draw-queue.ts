const SLICE_MS = 8;

const waiting = new Set<() => void>();
let isBooked = false;

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
  // After the next paint: text and buttons are on screen first. Idle callbacks starve while a street plays.
  requestAnimationFrame(() => setTimeout(work, 0));
}

/**
 * Draws after the next paint, in slices of 8 ms a frame, so that sixty pictures on a board never hold
 * up a keystroke. Returns the way to call it off.
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
