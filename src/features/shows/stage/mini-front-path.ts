import type { Silhouette } from "../../../../shared/contracts/square.ts";
import { roofPoints } from "../../../../sandbox/square/roof-points.ts";

/** Two SVG paths of a front a finger's breadth high: its outline, and its windows and door. */
export interface MiniFrontPath {
  readonly wall: string;
  readonly openings: string;
}

/** Widest silhouette that fills the box; narrower ones keep their share. */
const WIDEST = 1.22;

/** The silhouette of a front in a box of `size` by `size`, standing on its lower edge. */
export function getMiniFrontPath(silhouette: Silhouette, size: number): MiniFrontPath {
  const width = Math.min(size, (size * silhouette.width) / WIDEST);
  const left = (size - width) / 2;
  const isTower = silhouette.roof === "tower";
  const isTree = silhouette.roof === "tree";
  const unit = size * (isTower ? 1 : isTree ? 1.5 : 1.28);
  const outline = isTower
    ? towerOutline(silhouette.eave, width, unit)
    : roofPoints(silhouette.roof, { width, eave: silhouette.eave * unit, top: Math.min(silhouette.top * unit, size) });
  const points = outline.map((point) => `${round(left + point.x)} ${round(size - point.y)}`);
  const wall = `M${round(left)} ${size}L${points.join("L")}L${round(left + width)} ${size}Z`;
  return { wall, openings: isTree ? "" : openingsPath({ silhouette, size, left, width, unit }) };
}

function towerOutline(eave: number, width: number, unit: number): { x: number; y: number }[] {
  const profile = [
    [0, eave],
    [0.34, eave + 0.06],
    [0.34, 0.84],
    [0.5, 0.99],
    [0.66, 0.84],
    [0.66, eave + 0.06],
    [1, eave],
  ] as const;
  return profile.map(([x, y]) => ({ x: x * width, y: y * unit }));
}

interface MiniBox {
  readonly silhouette: Silhouette;
  readonly size: number;
  readonly left: number;
  readonly width: number;
  readonly unit: number;
}

function openingsPath({ silhouette, size, left, width, unit }: MiniBox): string {
  const height = silhouette.eave * unit;
  const windows = Math.min(3, silhouette.bays);
  const top = round(size - height * 0.86);
  const pane = { width: round(width * 0.16), height: round(height * 0.24) };
  const rects = Array.from({ length: windows }, (_, bay) => {
    const x = round(left + (width * (bay + 0.5)) / windows - width * 0.08);
    return `M${x} ${top}h${pane.width}v${pane.height}h-${pane.width}z`;
  });
  const door = { width: round(width * 0.2), height: round(height * 0.34) };
  rects.push(`M${round(left + width / 2 - door.width / 2)} ${size}v-${door.height}h${door.width}v${door.height}z`);
  return rects.join("");
}

function round(value: number): number {
  return Math.round(value * 10) / 10;
}
