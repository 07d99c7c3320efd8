import { MAX_NOTE_LENGTH } from "../guest.ts";
import { Lights } from "./lights.ts";
import { Section, song } from "./song.ts";
import { Front, square } from "./square.ts";
import { keepNote } from "./state.ts";

const MAX_DEPTH = 3;
const MAX_ITEMS = 100;

/** Text that grows to a length and no further, so that a note can not eat the memory. */
class NoteText {
  text = "";

  add(piece: string): void {
    if (!this.isFull()) this.text += piece.length > MAX_NOTE_LENGTH ? piece.slice(0, MAX_NOTE_LENGTH + 1) : piece;
  }

  isFull(): boolean {
    return this.text.length > MAX_NOTE_LENGTH;
  }
}

function writeNumber(value: number): string {
  if (Number.isInteger(value) || !Number.isFinite(value)) return String(value);
  // Sums of fractions end in ...0000001: nobody wants to read that.
  return String(Number(value.toPrecision(10)));
}

function write(out: NoteText, value: unknown, depth: number): void {
  if (out.isFull()) return;
  if (typeof value === "string") out.add(depth === 0 ? value : `"${value}"`);
  else if (typeof value === "number") out.add(writeNumber(value));
  else if (typeof value === "function") out.add(value.name === "" ? "a function" : `function ${value.name}`);
  else if (typeof value !== "object" || value === null) out.add(String(value));
  else if (Front.isFront(value)) out.add(`front "${value.name}"`);
  else if (Lights.is(value)) {
    const count = Lights.indexesOf(value).length;
    out.add(count === 1 ? "1 light" : `${count} lights`);
  } else if (Section.is(value)) out.add(`section "${value.name}"`);
  else if (value === song) out.add("song");
  else if (value === square) out.add("square");
  else if (value instanceof Error) out.add(String(value.message));
  else if (depth >= MAX_DEPTH) out.add("...");
  else if (Array.isArray(value) || value instanceof Set)
    writeList(out, value instanceof Set ? [...value] : value, depth);
  else if (value instanceof Map) writeFields(out, [...value], depth);
  else writeFields(out, Object.entries(value), depth);
}

function writeList(out: NoteText, list: readonly unknown[], depth: number): void {
  out.add("[");
  for (let i = 0; i < list.length && i < MAX_ITEMS; i++) {
    if (i > 0) out.add(", ");
    write(out, list[i], depth + 1);
  }
  if (list.length > MAX_ITEMS) out.add(", ...");
  out.add("]");
}

function writeFields(out: NoteText, fields: readonly (readonly [unknown, unknown])[], depth: number): void {
  out.add("{");
  for (let i = 0; i < fields.length && i < MAX_ITEMS; i++) {
    const field = fields[i];
    if (field === undefined) continue;
    out.add(i > 0 ? ", " : " ");
    write(out, field[0], 0);
    out.add(": ");
    write(out, field[1], depth + 1);
  }
  out.add(fields.length === 0 ? "}" : " }");
}

/** The word `console`: its notes are read beside the script. */
export const scriptConsole = Object.freeze({
  log(...values: readonly unknown[]): void {
    const out = new NoteText();
    for (let i = 0; i < values.length; i++) {
      if (i > 0) out.add(" ");
      write(out, values[i], 0);
    }
    keepNote(out.isFull() ? `${out.text.slice(0, MAX_NOTE_LENGTH)}...` : out.text);
  },
});
