import type { Layout, Side } from "../../shared/contracts/square.ts";
import { REFERENCE_VIEW, sideGeometry } from "../square/geometry.ts";
import { paneArea } from "../square/shapes.ts";

/** Side of a cell of the reference picture, in pixels. Blocks are looked at in steps of a cell. */
const CELL = 16;
const COLUMNS = Math.ceil(REFERENCE_VIEW.width / CELL);
const ROWS = Math.ceil(REFERENCE_VIEW.height / CELL);
/** WCAG 2.2: any 341 x 256 pixels of a picture of 1024 x 768 stand for a field of view of 10 degrees. */
const BLOCK_COLUMNS = Math.round(341 / CELL);
const BLOCK_ROWS = Math.round(256 / CELL);
/** WCAG 2.2, technique G176: a quarter of that block, 21 824 pixels. */
export const FLASH_AREA_PIXELS = 21_824;

/** Number of places of the block in a picture. */
export const BLOCK_COUNT = (COLUMNS - BLOCK_COLUMNS + 1) * (ROWS - BLOCK_ROWS + 1);

/** Where the lights of one side shine in its reference picture: pixels lit in cells, by light index. */
export type PictureAreas = ReadonlyMap<number, readonly (readonly [cell: number, pixels: number])[]>;

/** Gives the lit cells of every light in the reference picture of a side, those that stand free included. */
export function listPictureAreas(layout: Layout, side: Side): PictureAreas {
  const areas = new Map<number, readonly (readonly [number, number])[]>();
  for (const front of sideGeometry(layout, side))
    for (const { lightIndex, panes, beads } of front.lights) {
      const cells = new Map<number, number>();
      const add = (column: number, row: number, pixels: number) => {
        if (column < 0 || row < 0 || column >= COLUMNS || row >= ROWS) return;
        const cell = row * COLUMNS + column;
        cells.set(cell, (cells.get(cell) ?? 0) + pixels);
      };
      for (const pane of panes) {
        const filled = paneArea(pane) / Math.max(1e-9, pane.width * pane.height);
        for (let column = Math.floor(pane.x / CELL); column * CELL < pane.x + pane.width; column++)
          for (let row = Math.floor(pane.y / CELL); row * CELL < pane.y + pane.height; row++)
            add(column, row, filled * overlap(pane.x, pane.width, column) * overlap(pane.y, pane.height, row));
      }
      for (const { x, y, radius } of beads) add(Math.floor(x / CELL), Math.floor(y / CELL), Math.PI * radius * radius);
      areas.set(lightIndex, [...cells]);
    }
  return areas;
}

/** Length of a stretch inside one cell. */
function overlap(start: number, length: number, cell: number): number {
  return Math.max(0, Math.min(start + length, (cell + 1) * CELL) - Math.max(start, cell * CELL));
}

/** Gives the lit pixels of a few lights together in every block: by block, left to right and top to bottom. */
export function sumBlocks(areas: PictureAreas, lights: Iterable<number>): Float64Array {
  const cells = new Float64Array(COLUMNS * ROWS);
  for (const light of lights)
    // Lights that overlap do not light a pixel twice.
    for (const [cell, pixels] of areas.get(light) ?? [])
      cells[cell] = Math.min(CELL * CELL, (cells[cell] ?? 0) + pixels);
  const wide = COLUMNS + 1;
  const sums = new Float64Array(wide * (ROWS + 1));
  for (let row = 0; row < ROWS; row++)
    for (let column = 0; column < COLUMNS; column++)
      sums[(row + 1) * wide + column + 1] =
        (cells[row * COLUMNS + column] ?? 0) +
        (sums[row * wide + column + 1] ?? 0) +
        (sums[(row + 1) * wide + column] ?? 0) -
        (sums[row * wide + column] ?? 0);
  const blocks = new Float64Array(BLOCK_COUNT);
  let block = 0;
  for (let row = 0; row + BLOCK_ROWS <= ROWS; row++)
    for (let column = 0; column + BLOCK_COLUMNS <= COLUMNS; column++) {
      const at = (y: number, x: number) => sums[y * wide + x] ?? 0;
      blocks[block++] =
        at(row + BLOCK_ROWS, column + BLOCK_COLUMNS) -
        at(row, column + BLOCK_COLUMNS) -
        at(row + BLOCK_ROWS, column) +
        at(row, column);
    }
  return blocks;
}

/** Gives the lit pixels of a few lights all together: no block has more. */
export function sumAll(areas: PictureAreas, lights: Iterable<number>): number {
  let sum = 0;
  for (const light of lights) for (const [, pixels] of areas.get(light) ?? []) sum += pixels;
  return sum;
}
