import { REFERENCE_VIEW, type LightGeometry } from "../square/geometry.ts";
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

/** Where a light shines in the picture: cells, each once, and the pixels lit in each. */
export interface PictureCells {
  readonly cell: Uint16Array;
  readonly pixels: Float64Array;
}

/** Gives the lit cells of a light as drawn in the reference picture. */
export function listPictureCells({ panes, beads }: Pick<LightGeometry, "panes" | "beads">): PictureCells {
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
  return toCells(cells);
}

/** Gives the cells of several lights as one; what two of them fill is counted twice. */
export function joinCells(parts: readonly PictureCells[]): PictureCells {
  const cells = new Map<number, number>();
  for (const { cell, pixels } of parts)
    cell.forEach((at, place) => cells.set(at, (cells.get(at) ?? 0) + (pixels[place] ?? 0)));
  return toCells(cells);
}

function toCells(cells: ReadonlyMap<number, number>): PictureCells {
  return { cell: Uint16Array.from(cells.keys()), pixels: Float64Array.from(cells.values()) };
}

/** Length of a stretch inside one cell. */
function overlap(start: number, length: number, cell: number): number {
  return Math.max(0, Math.min(start + length, (cell + 1) * CELL) - Math.max(start, cell * CELL));
}

/** Gives the lit pixels of a few lights together in every block: by block, left to right and top to bottom. */
export function sumBlocks(parts: Iterable<PictureCells>): Float64Array {
  const cells = new Float64Array(COLUMNS * ROWS);
  for (const { cell, pixels } of parts)
    for (let place = 0; place < cell.length; place++) {
      const at = cell[place] ?? 0;
      // Lights that overlap do not light a pixel twice.
      cells[at] = Math.min(CELL * CELL, (cells[at] ?? 0) + (pixels[place] ?? 0));
    }
  const wide = COLUMNS + 1;
  const sums = new Float64Array(wide * (ROWS + 1));
  for (let row = 0; row < ROWS; row++)
    for (let column = 0; column < COLUMNS; column++) {
      const at = (row + 1) * wide + column + 1;
      sums[at] =
        (cells[row * COLUMNS + column] ?? 0) +
        (sums[at - wide] ?? 0) +
        (sums[at - 1] ?? 0) -
        (sums[at - wide - 1] ?? 0);
    }
  const blocks = new Float64Array(BLOCK_COUNT);
  let block = 0;
  for (let row = 0; row + BLOCK_ROWS <= ROWS; row++)
    for (let column = 0; column + BLOCK_COLUMNS <= COLUMNS; column++) {
      const top = row * wide + column;
      const bottom = top + BLOCK_ROWS * wide;
      blocks[block++] =
        (sums[bottom + BLOCK_COLUMNS] ?? 0) - (sums[top + BLOCK_COLUMNS] ?? 0) - (sums[bottom] ?? 0) + (sums[top] ?? 0);
    }
  return blocks;
}

/** Gives the lit pixels of some cells all together: no block has more. */
export function sumPixels({ pixels }: PictureCells): number {
  return pixels.reduce((sum, value) => sum + value, 0);
}
