/**
 * A growing byte buffer and a reader that never reads past its end.
 *
 * Whole numbers are written as variable-length groups of seven bits, lowest first, the top bit set
 * on all but the last; always the shortest form, so equal numbers have equal bytes.
 */

/** Thrown when stored bytes or JSON are not a timeline; the message says what is wrong and where. */
export class TimelineFormatError extends Error {
  override readonly name = "TimelineFormatError";
}

/** Appends bytes; `finish` gives a fresh copy of what was written. */
export class ByteWriter {
  #bytes = new Uint8Array(1024);
  #length = 0;

  #reserve(more: number): void {
    if (this.#length + more <= this.#bytes.length) return;
    const grown = new Uint8Array(Math.max(this.#bytes.length * 2, this.#length + more));
    grown.set(this.#bytes.subarray(0, this.#length));
    this.#bytes = grown;
  }

  byte(value: number): void {
    this.#reserve(1);
    this.#bytes[this.#length++] = value;
  }

  /** Writes a whole number from 0 to 2^32 - 1. */
  whole(value: number): void {
    this.#reserve(5);
    let rest = value;
    while (rest > 0x7f) {
      this.#bytes[this.#length++] = (rest & 0x7f) | 0x80;
      rest = Math.floor(rest / 128);
    }
    this.#bytes[this.#length++] = rest;
  }

  /** Writes 32 bits, low byte first. */
  fixed32(value: number): void {
    for (let shift = 0; shift < 32; shift += 8) this.byte((value >>> shift) & 0xff);
  }

  /** Writes an id of 1 to 255 printable ASCII characters; anything else is a bug of the caller. */
  id(text: string): void {
    if (!isId(text)) throw new TimelineFormatError(`"${text}" is no id: it needs 1 to 255 printable ASCII characters.`);
    this.byte(text.length);
    for (let i = 0; i < text.length; i++) this.byte(text.charCodeAt(i));
  }

  /** The bytes written so far, borrowed: the next write may change them. */
  written(): Uint8Array {
    return this.#bytes.subarray(0, this.#length);
  }

  finish(): Uint8Array {
    return this.#bytes.slice(0, this.#length);
  }
}

/** Says whether a text can be stored as an id: 1 to 255 printable ASCII characters. */
export function isId(text: string): boolean {
  return /^[\x21-\x7e]{1,255}$/.test(text);
}

/** Reads what `ByteWriter` wrote; throws `TimelineFormatError` that names the byte where it stopped. */
export class ByteReader {
  readonly #bytes: Uint8Array;
  #at = 0;

  constructor(bytes: Uint8Array) {
    this.#bytes = bytes;
  }

  get position(): number {
    return this.#at;
  }

  get remaining(): number {
    return this.#bytes.length - this.#at;
  }

  byte(what: string): number {
    const value = this.#bytes[this.#at];
    if (value === undefined) throw new TimelineFormatError(`The bytes end inside ${what} (byte ${this.#at}).`);
    this.#at++;
    return value;
  }

  whole(what: string): number {
    let value = 0;
    let factor = 1;
    for (let group = 0; group < 5; group++) {
      const byte = this.byte(what);
      value += (byte & 0x7f) * factor;
      if (byte < 0x80) {
        const isShortest = group === 0 || byte !== 0;
        if (isShortest && value <= 0xff_ff_ff_ff) return value;
        break;
      }
      factor *= 128;
    }
    throw new TimelineFormatError(`${what} is not a whole number of 32 bits (byte ${this.#at}).`);
  }

  fixed32(what: string): number {
    let value = 0;
    for (let shift = 0; shift < 32; shift += 8) value |= this.byte(what) << shift;
    return value >>> 0;
  }

  id(what: string): string {
    const length = this.byte(what);
    let text = "";
    for (let i = 0; i < length; i++) text += String.fromCharCode(this.byte(what));
    if (!isId(text)) throw new TimelineFormatError(`${what} is no id: it needs 1 to 255 printable ASCII characters.`);
    return text;
  }

  /** A count of things that need at least one byte each, so a damaged count can not ask for more memory than there are bytes. */
  count(what: string): number {
    const value = this.whole(what);
    if (value > this.remaining) throw new TimelineFormatError(`${what} is ${value}, more than the bytes can hold.`);
    return value;
  }
}
