import type { RibbonCells } from "../../../sandbox/timeline/ribbon.ts";

type Rgb = readonly [red: number, green: number, blue: number];
/** Level 0 to 1 and the colour's place in the palette, of a row at a moment (both 0 to 1). */
type Pattern = (row: number, moment: number) => readonly [level: number, colour: number];

const ROWS = 40;
const COLUMNS = 320;

function buildSample(palette: readonly Rgb[], pattern: Pattern): RibbonCells {
  const cells = new Uint8Array(ROWS * COLUMNS * 4);
  for (let row = 0; row < ROWS; row++) {
    for (let column = 0; column < COLUMNS; column++) {
      const [level, colour] = pattern(row, column / COLUMNS);
      const [red, green, blue] = palette[colour % palette.length] ?? [0, 0, 0];
      cells.set([red, green, blue, Math.round(255 * level ** 0.56)], (row * COLUMNS + column) * 4);
    }
  }
  return { rows: ROWS, columns: COLUMNS, cells };
}

const noise = (a: number, b: number) => Math.abs(Math.sin(a * 127.1 + b * 311.7) * 43758.5453) % 1;
const trail = (distance: number, length: number) => (distance < length ? 1 - distance / length : 0);

const FOX: Pattern = (row, moment) => {
  if (moment < 0.08) return [0, 0];
  if (moment < 0.4) return [trail((moment * 170 - row + 400) % ROWS, 4), 0];
  if (moment < 0.6) return [noise(row, Math.floor(moment * 90)) < 0.4 ? 0.8 : 0, 1 + (row % 2)];
  return [trail((moment * 560 - row + 400) % ROWS, 9), Math.floor(moment * 12)];
};
const SUN: Pattern = (row, moment) => {
  const wave = Math.max(0, Math.sin(row * 0.45 - moment * 60));
  return [moment < 0.25 ? trail((moment * 320 - row + 400) % ROWS, 5) : wave * wave, Math.floor(row / 10)];
};
const RAIN: Pattern = (row, moment) => [
  Math.max(trail((moment * 200 - row + 400) % ROWS, 5), trail((row + moment * 150 + 400) % ROWS, 5)),
  moment > 0.4 && moment < 0.7 ? 2 : row % 2,
];
const FIRST: Pattern = (row, moment) => (moment < 0.3 ? [trail((moment * 140 - row + 400) % ROWS, 4), 0] : [0, 0]);

/** Invented ribbons for the gallery. */
export const SAMPLE_RIBBONS = {
  foxes: buildSample(
    [
      [255, 138, 60],
      [255, 90, 74],
      [255, 191, 63],
    ],
    FOX,
  ),
  suns: buildSample(
    [
      [255, 191, 63],
      [255, 138, 60],
      [255, 215, 154],
    ],
    SUN,
  ),
  rain: buildSample(
    [
      [95, 155, 255],
      [191, 227, 255],
      [63, 201, 176],
    ],
    RAIN,
  ),
  first: buildSample([[255, 191, 63]], FIRST),
};
