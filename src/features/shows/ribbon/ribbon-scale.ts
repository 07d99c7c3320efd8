/**
 * Where ticks lie across a ribbon whose ends are cut: `tail` pixels at either end carry no time. It shows
 * the stretch from `startTick` to `endTick`.
 */
export interface RibbonScale {
  readonly width: number;
  readonly tail: number;
  readonly startTick: number;
  readonly endTick: number;
}

/** Pixels from the left edge; what lies outside the stretch is at its ends. */
export function toX({ width, tail, startTick, endTick }: RibbonScale, tick: number): number {
  const inside = Math.min(Math.max(tick, startTick), endTick) - startTick;
  return tail + ((width - 2 * tail) * inside) / Math.max(1, endTick - startTick);
}

/** The tick at a place, inside the stretch. */
export function toTick({ width, tail, startTick, endTick }: RibbonScale, x: number): number {
  const share = (x - tail) / Math.max(1, width - 2 * tail);
  return Math.round(startTick + Math.min(Math.max(share, 0), 1) * (endTick - startTick));
}

/** Whether a moment is in the stretch that the ribbon shows. */
export function isInView({ startTick, endTick }: RibbonScale, tick: number): boolean {
  return tick >= startTick && tick <= endTick;
}

/** How many bars lie between two numbers, so that numbers keep `room` pixels apart: 1, 2, 4, 8, 16 ... */
export function findBarStep(scale: RibbonScale, bars: number, room: number): number {
  const each = Math.max(0, scale.width - 2 * scale.tail) / Math.max(1, bars);
  let step = 1;
  while (step < bars && step * each < room) step *= 2;
  return step;
}

/** How the name of a section fits its flag: as it is, small, or not at all. */
export function fitFlag(name: string, width: number): "full" | "tight" | "none" {
  if (width < name.length * 6.2 + 12) return "none";
  return width < name.length * 7.6 + 22 ? "tight" : "full";
}
