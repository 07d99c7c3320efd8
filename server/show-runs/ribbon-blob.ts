import type { RibbonPicture } from "../../shared/contracts/common.ts";
import { decodeRibbon, type RibbonCells, shrinkRibbon, toRibbonPicture } from "../../sandbox/timeline/ribbon.ts";

/**
 * A ribbon as a row keeps it: the whole picture, then its face for lists. Each is one byte of rows,
 * two bytes of columns (little-endian), then rows x columns x 4 bytes of r, g, b, strength. The face
 * is kept because shrinking thirty ribbons for every list would cost more than the bytes do.
 */
const HEADER_BYTES = 3;

/** Cards draw 10 rows, list rows 4; the whole is shown where one show is read. */
const FACE = { rows: 10, columns: 96 };
const THREADS = { rows: 4, columns: 64 };

/** The bytes that a row keeps of a ribbon. */
export function encodeRibbon(ribbon: RibbonCells): Buffer {
  return Buffer.concat([encodePicture(ribbon), encodePicture(shrinkRibbon(ribbon, FACE))]);
}

/** The whole ribbon of a row for the wire; null where there is none. */
export function presentRibbon(bytes: Buffer | null): RibbonPicture | null {
  return bytes === null ? null : readPicture(bytes, 0).picture;
}

/** The ribbon's face for lists: at most 10 rows of 96 cells. Null where there is none. */
export function presentRibbonFace(bytes: Buffer | null): RibbonPicture | null {
  return bytes === null ? null : readPicture(bytes, readPicture(bytes, 0).end).picture;
}

/** Four threads for the long public programme: a fifth of the face's bytes. Null where there is no ribbon. */
export function presentRibbonThreads(bytes: Buffer | null): RibbonPicture | null {
  const face = presentRibbonFace(bytes);
  return face && toRibbonPicture(shrinkRibbon(decodeRibbon(face), THREADS));
}

function encodePicture({ rows, columns, cells }: RibbonCells): Buffer {
  const header = Buffer.alloc(HEADER_BYTES);
  header.writeUInt8(rows, 0);
  header.writeUInt16LE(columns, 1);
  return Buffer.concat([header, cells]);
}

function readPicture(bytes: Buffer, at: number): { picture: RibbonPicture; end: number } {
  const rows = bytes.readUInt8(at);
  const columns = bytes.readUInt16LE(at + 1);
  const end = at + HEADER_BYTES + rows * columns * 4;
  if (end > bytes.length) throw new Error(`A ribbon of ${rows} x ${columns} is cut off after ${bytes.length} bytes.`);
  return { picture: { rows, columns, cells: bytes.toString("base64", at + HEADER_BYTES, end) }, end };
}
