import type { RibbonPicture } from "../../shared/contracts/common.ts";
import type { Layout } from "../../shared/contracts/square.ts";
import { listFronts, listLights, type Light } from "../square/lights.ts";
import { fromBase64, toBase64 } from "./base64.ts";
import { levelToY, linearToSrgb } from "./colour.ts";
import { createLightsCursor, type Frame } from "./cursor.ts";
import type { Timeline } from "./model.ts";
import { buildTracks } from "./tracks.ts";

/**
 * The ribbon: the picture of a timeline, a row per front (or few fronts) in walking order, time from
 * left to right over the whole song. A cell is the mean over its fronts and its span of time: its
 * colour the mean of the lights' colours, each counted with its level; its strength the mean level
 * to the power 0.56, so that single pulses stay visible. A dark cell has strength 0: bare weave.
 */
export interface RibbonCells {
  readonly rows: number;
  readonly columns: number;
  /** Row by row, four bytes a cell: red, green, blue (sRGB) and strength, 0 to 255. */
  readonly cells: Uint8Array;
}

/** Rows and columns that are stored: enough for every size at which a ribbon is drawn. */
export const RIBBON_ROWS = 40;
export const RIBBON_COLUMNS = 320;

/** Chosen by eye: lifts a mean of few lit lights over the weave. */
const STRENGTH_POWER = 0.56;
/** Moments looked at in each cell; a pulse of half a beat is met in a song of any usual length. */
const LOOKS_PER_CELL = 4;

/** How many cells, and of which stretch of the song: ticks from `start` up to `end`, all of it when left out. */
export interface RibbonSize {
  readonly rows: number;
  readonly columns: number;
  readonly stretch?: { readonly start: number; readonly end: number };
}

/**
 * Gives the ribbon's cells of a timeline; at most one row a front. An incomplete timeline has bare
 * weave after its last cue. Four frames a column are sampled.
 */
export function ribbonCells(
  timeline: Timeline,
  layout: Layout,
  size: RibbonSize = { rows: RIBBON_ROWS, columns: RIBBON_COLUMNS },
): RibbonCells {
  const lights = listLights(layout);
  const cursor = createLightsCursor(timeline, lights, buildTracks(timeline));
  const fronts = listFronts(layout);
  const rows = Math.min(size.rows, fronts.length);
  const { columns, stretch = { start: 0, end: timeline.endTick } } = size;
  const rowOfLight = Uint16Array.from(lights, (light) => Math.floor((light.frontIndex * rows) / fronts.length));
  const shares = shareOfLights(lights, rowOfLight, rows);
  const sums = new Float64Array(rows * columns * 4);
  const { count, tick } = timeline.cues;
  const until = timeline.isComplete ? timeline.endTick : count > 0 ? (tick[count - 1] ?? 0) + 1 : 0;
  for (let column = 0; column < columns; column++) {
    for (let look = 0; look < LOOKS_PER_CELL; look++) {
      const share = (column + (look + 0.5) / LOOKS_PER_CELL) / columns;
      const at = stretch.start + share * (stretch.end - stretch.start);
      if (at >= until) break;
      const frame = cursor.seek(at);
      for (let light = 0; light < lights.length; light++) {
        const level = frame.level[light] ?? 0;
        if (level <= 0) continue;
        addLight(
          sums,
          ((rowOfLight[light] ?? 0) * columns + column) * 4,
          frame,
          light,
          (level / 100) * ((shares[light] ?? 0) / LOOKS_PER_CELL),
        );
      }
    }
  }
  return { rows, columns, cells: toCells(sums, rows * columns) };
}

/** Share of each light in its row: every outlet counts once, a strip's pixels share theirs. */
function shareOfLights(lights: readonly Light[], rowOfLight: Uint16Array, rows: number): Float64Array {
  const shares = Float64Array.from(lights, (light) => 1 / (light.pixels ?? 1));
  const perRow = new Float64Array(rows);
  shares.forEach((share, light) => {
    const row = rowOfLight[light] ?? 0;
    perRow[row] = (perRow[row] ?? 0) + share;
  });
  return shares.map((share, light) => share / (perRow[rowOfLight[light] ?? 0] ?? 1));
}

/** sRGB of 1025 steps of a linear channel: the power would be taken half a million times a ribbon. */
const STEPS = 1024;
const SRGB_OF_STEP: Float64Array = Float64Array.from({ length: STEPS + 1 }, (_, step) => linearToSrgb(step / STEPS));

function addLight(sums: Float64Array, cell: number, frame: Frame, light: number, weight: number): void {
  const full = levelToY(frame.level[light] ?? 0);
  for (let channel = 0; channel < 3; channel++) {
    const linear = Math.min(1, (frame.rgb[light * 3 + channel] ?? 0) / full);
    sums[cell + channel] = (sums[cell + channel] ?? 0) + weight * (SRGB_OF_STEP[Math.round(linear * STEPS)] ?? 0);
  }
  sums[cell + 3] = (sums[cell + 3] ?? 0) + weight;
}

/** Turns sums (colour x level, mean level 0 to 1) into cells. */
function toCells(sums: Float64Array, count: number): Uint8Array {
  const cells = new Uint8Array(count * 4);
  for (let cell = 0; cell < count * 4; cell += 4) {
    const level = sums[cell + 3] ?? 0;
    if (level <= 0) continue;
    for (let channel = 0; channel < 3; channel++)
      cells[cell + channel] = Math.round((sums[cell + channel] ?? 0) / level);
    cells[cell + 3] = Math.max(1, Math.round(255 * Math.min(1, level) ** STRENGTH_POWER));
  }
  return cells;
}

/**
 * Gives a smaller ribbon of a ribbon: each new cell is the mean of the cells it covers, in levels,
 * not in strengths. Sizes that are not smaller are kept. Fresh.
 */
export function shrinkRibbon(
  ribbon: RibbonCells,
  size: { readonly rows: number; readonly columns: number },
): RibbonCells {
  const rows = Math.min(size.rows, ribbon.rows);
  const columns = Math.min(size.columns, ribbon.columns);
  const sums = new Float64Array(rows * columns * 4);
  const covers = (index: number, now: number, before: number): readonly [number, number] => [
    Math.floor((index * before) / now),
    Math.max(Math.floor((index * before) / now) + 1, Math.floor(((index + 1) * before) / now)),
  ];
  for (let row = 0; row < rows; row++) {
    const [top, bottom] = covers(row, rows, ribbon.rows);
    for (let column = 0; column < columns; column++) {
      const [left, right] = covers(column, columns, ribbon.columns);
      const share = 1 / ((bottom - top) * (right - left));
      const to = (row * columns + column) * 4;
      for (let y = top; y < bottom; y++)
        for (let x = left; x < right; x++) {
          const from = (y * ribbon.columns + x) * 4;
          const weight = share * ((ribbon.cells[from + 3] ?? 0) / 255) ** (1 / STRENGTH_POWER);
          for (let channel = 0; channel < 3; channel++)
            sums[to + channel] = (sums[to + channel] ?? 0) + weight * (ribbon.cells[from + channel] ?? 0);
          sums[to + 3] = (sums[to + 3] ?? 0) + weight;
        }
    }
  }
  return { rows, columns, cells: toCells(sums, rows * columns) };
}

/** Gives a ribbon as it travels and is stored. */
export function toRibbonPicture(ribbon: RibbonCells): RibbonPicture {
  return { rows: ribbon.rows, columns: ribbon.columns, cells: toBase64(ribbon.cells) };
}

/** Gives the cells of a stored ribbon. Throws `RangeError` when its bytes do not fit its size. */
export function decodeRibbon(picture: RibbonPicture): RibbonCells {
  const cells = fromBase64(picture.cells);
  const wanted = picture.rows * picture.columns * 4;
  if (cells.length !== wanted)
    throw new RangeError(
      `The ribbon has ${cells.length} bytes; ${picture.rows} rows of ${picture.columns} cells have ${wanted}.`,
    );
  return { rows: picture.rows, columns: picture.columns, cells };
}
