import { MidiFileError } from "./midi-file.ts";

/** Reads big-endian numbers from a run of bytes and says in words when they end too soon. */
export class ByteReader {
  readonly #bytes: Uint8Array;
  #at: number;
  readonly #end: number;

  constructor(bytes: Uint8Array, start = 0, end = bytes.length) {
    this.#bytes = bytes;
    this.#at = start;
    this.#end = end;
  }

  /** The place of the next byte in the whole file. */
  get offset(): number {
    return this.#at;
  }

  get isAtEnd(): boolean {
    return this.#at >= this.#end;
  }

  /** A number of `width` bytes, the highest first. */
  number(width: number): number {
    let value = 0;
    for (let i = 0; i < width; i += 1) value = value * 256 + this.byte();
    return value;
  }

  byte(): number {
    const value = this.#at < this.#end ? this.#bytes[this.#at] : undefined;
    if (value === undefined) throw new MidiFileError("The file ends in the middle. Export it again.", this.#at);
    this.#at += 1;
    return value;
  }

  /** The next byte, left where it is. */
  peek(): number {
    const value = this.byte();
    this.#at -= 1;
    return value;
  }

  bytes(count: number): Uint8Array {
    if (this.#at + count > this.#end)
      throw new MidiFileError("The file ends in the middle. Export it again.", this.#at);
    this.#at += count;
    return this.#bytes.subarray(this.#at - count, this.#at);
  }

  /** A reader for the next `count` bytes only. */
  part(count: number): ByteReader {
    const start = this.#at;
    this.bytes(count);
    return new ByteReader(this.#bytes, start, start + count);
  }

  /** Four bytes as letters: the kind of a chunk. */
  letters(): string {
    return String.fromCharCode(...this.bytes(4));
  }

  /** A number of variable length (RP-001): seven bits a byte, the top bit says that more follow. */
  variableLength(): number {
    let value = 0;
    for (let i = 0; i < 4; i += 1) {
      const byte = this.byte();
      value = value * 128 + (byte & 0x7f);
      if ((byte & 0x80) === 0) return value;
    }
    throw new MidiFileError("A length in the file is longer than four bytes. Export it again.", this.#at);
  }
}
