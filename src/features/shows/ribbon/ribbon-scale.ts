/** Where ticks lie across a ribbon whose ends are cut: `tail` pixels at either end carry no time. */
export interface RibbonScale {
  readonly width: number;
  readonly tail: number;
  readonly endTick: number;
}

/** Pixels from the left edge. */
export function toX({ width, tail, endTick }: RibbonScale, tick: number): number {
  return tail + ((width - 2 * tail) * Math.min(Math.max(tick, 0), endTick)) / Math.max(1, endTick);
}

/** The tick at a place, inside the song. */
export function toTick({ width, tail, endTick }: RibbonScale, x: number): number {
  const share = (x - tail) / Math.max(1, width - 2 * tail);
  return Math.round(Math.min(Math.max(share, 0), 1) * endTick);
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
