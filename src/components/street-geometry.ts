/** A point in CSS pixels of the scene, origin top left. */
export type Point = readonly [x: number, y: number];

export interface StreetWindow {
  x: number;
  y: number;
  width: number;
  height: number;
}

export interface StreetFront {
  x: number;
  width: number;
  height: number;
  /** Index into the wall colours. */
  wall: number;
  /** The cut edge of the roof, from the left eave to the right one. */
  roof: readonly Point[];
  windows: readonly StreetWindow[];
  door: StreetWindow | null;
  chimney: StreetWindow | null;
  /** Awning over the ground floor, as left, right and top. */
  awning: { left: number; right: number; y: number; depth: number } | null;
}

export interface Street {
  width: number;
  height: number;
  /** Where the houses meet the paving. */
  ground: number;
  /** The height the houses are measured by. */
  base: number;
  isSmall: boolean;
  isTall: boolean;
  seed: number;
  fronts: readonly StreetFront[];
  /** Outlines behind the street; only in a tall scene. */
  farRoofs: readonly (readonly Point[])[];
}

export interface StreetOptions {
  width: number;
  height: number;
  fronts: number;
  /** The same seed gives the same street for ever. */
  seed: number;
  /** A picture that is mostly sky (sign-in): lower houses, far roofs and a moon. */
  isTall: boolean;
}

const SMALL_HEIGHT_PX = 90;

/** A number in [0, 1) that depends only on the two given ones. */
export function hashUnit(a: number, b: number): number {
  let bits = (a * 374761393 + b * 668265263) | 0;
  bits = Math.imul(bits ^ (bits >>> 13), 1274126177);
  return ((bits ^ (bits >>> 16)) >>> 0) / 4294967296;
}

/** Roof outlines in units of the roof: x over the front's width, y from 0 (ridge) to 1 (eaves). */
const ROOFS: readonly (readonly Point[])[] = [
  [
    [0, 1],
    [0.5, 0],
    [1, 1],
  ],
  [
    [0, 0.5],
    [1, 0.5],
  ],
  [
    [0, 1],
    [0.16, 1],
    [0.16, 0.62],
    [0.33, 0.62],
    [0.33, 0.25],
    [0.67, 0.25],
    [0.67, 0.62],
    [0.84, 0.62],
    [0.84, 1],
    [1, 1],
  ],
  [
    [0, 1],
    [0.18, 0.2],
    [0.82, 0.2],
    [1, 1],
  ],
  [
    [0, 0.8],
    [0.12, 0.62],
    [0.28, 0.52],
    [0.38, 0.22],
    [0.5, 0.08],
    [0.62, 0.22],
    [0.72, 0.52],
    [0.88, 0.62],
    [1, 0.8],
  ],
  [
    [0, 0.7],
    [0.5, 0.2],
    [1, 0.7],
  ],
];

function buildFront(
  x: number,
  width: number,
  base: number,
  ground: number,
  seed: number,
  isSmall: boolean,
): StreetFront {
  const height = base * (0.52 + hashUnit(seed, 2) * 0.4);
  const top = ground - height;
  const roofHeight = Math.min(width * 0.45, height * 0.28);
  const shape = ROOFS[Math.floor(hashUnit(seed, 3) * ROOFS.length)] ?? [];
  const roof = shape.map(([u, v]): Point => [x + u * width, top + v * roofHeight]);
  const floors = height > base * 0.64 ? 3 : 2;
  const bays = Math.max(2, Math.min(4, Math.round(width / (base * 0.2))));
  const wallTop = top + roofHeight + height * 0.05;
  const storey = (ground - wallTop) / (floors + 0.12);
  const paneWidth = width / (bays * 1.75);
  const hasAwning = !isSmall && hashUnit(seed, 6) > 0.58;
  const doorBay = isSmall ? -1 : Math.floor(hashUnit(seed, 7) * bays);
  const windows: StreetWindow[] = [];
  let door: StreetWindow | null = null;
  for (let floor = 0; floor < floors; floor++) {
    for (let bay = 0; bay < bays; bay++) {
      const isGround = floor === floors - 1;
      const left = x + (width * (bay + 0.5)) / bays - paneWidth / 2;
      const y = wallTop + floor * storey + storey * 0.17;
      if (isGround && bay === doorBay)
        door = { x: left, y: y + storey * 0.08, width: paneWidth, height: ground - y - storey * 0.08 };
      else
        windows.push({
          x: left,
          y: isGround && hasAwning ? y + storey * 0.1 : y,
          width: paneWidth,
          height: storey * (isGround ? 0.56 : 0.5),
        });
    }
  }
  const chimneyAt = x + width * (hashUnit(seed, 8) > 0.5 ? 0.72 : 0.16);
  return {
    x,
    width,
    height,
    wall: Math.floor(hashUnit(seed, 4) * 5),
    roof,
    windows,
    door,
    chimney:
      !isSmall && hashUnit(seed, 9) > 0.45
        ? { x: chimneyAt, y: top + roofHeight * 0.02, width: width * 0.1, height: roofHeight }
        : null,
    awning: hasAwning
      ? {
          left: x + width * 0.06,
          right: x + width * 0.94,
          y: wallTop + (floors - 1) * storey + storey * 0.06,
          depth: storey * 0.17,
        }
      : null,
  };
}

/** The whole street, fitted to the scene's width: widths and heights vary by seed, the same for the same options. */
export function buildStreet({ width, height, fronts, seed, isTall }: StreetOptions): Street {
  const isSmall = height < SMALL_HEIGHT_PX;
  const ground = height * (isTall ? 0.9 : 0.88);
  const base = isTall ? Math.min(height * 0.42, width * 0.42) : height * 0.74;
  const shares = Array.from({ length: fronts }, (_, index) => 0.75 + hashUnit(index + seed, 1) * 0.6);
  const total = shares.reduce((sum, share) => sum + share, 0);
  let x = 0;
  const built = shares.map((share, index) => {
    const front = buildFront(x, (share / total) * width, base, ground, index + seed * 7, isSmall);
    x += front.width;
    return front;
  });
  const farCount = isTall ? fronts + 3 : 0;
  const farRoofs = Array.from({ length: farCount }, (_, index) => {
    const farWidth = width / farCount;
    const top = ground - base * (0.72 + hashUnit(index + seed, 51) * 0.5);
    const left = index * farWidth + (hashUnit(index, 53) - 0.5) * farWidth * 0.4;
    const pitch = farWidth * (index % 2 ? 0.5 : 0.22);
    return [
      [left, ground],
      [left, top + pitch],
      [left + farWidth * 0.45, top],
      [left + farWidth * 0.9, top + pitch],
      [left + farWidth * 0.9, ground],
    ] satisfies Point[];
  });
  return { width, height, ground, base, isSmall, isTall, seed, fronts: built, farRoofs };
}
