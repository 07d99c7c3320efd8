/**
 * Text in MIDI files: the standard names no code for letters, so files hold UTF-8 or Latin-1. A run
 * of bytes that is well-formed UTF-8 is taken as such, anything else letter by letter as Latin-1.
 * Written out here because pure sandbox code has no text decoder.
 */

const latin1 = (bytes: Uint8Array): string => Array.from(bytes, (byte) => String.fromCharCode(byte)).join("");

/** The bytes as percent-escapes, which the language itself can decode as UTF-8. */
const escaped = (bytes: Uint8Array): string =>
  Array.from(bytes, (byte) => `%${byte.toString(16).padStart(2, "0")}`).join("");

/** The text of some bytes: control characters become spaces, runs of space one, ends trimmed. */
export function readText(bytes: Uint8Array): string {
  let text: string;
  try {
    text = decodeURIComponent(escaped(bytes));
  } catch {
    text = latin1(bytes);
  }
  return text.replace(/[\u0000-\u001f\u007f-\u009f\s]+/g, " ").trim();
}

/** The UTF-8 bytes of a text. */
export function writeText(text: string): number[] {
  return Array.from(encodeURIComponent(text).matchAll(/%([0-9A-F]{2})|([^%])/g), ([, hex, letter]) =>
    hex === undefined ? (letter ?? "").charCodeAt(0) : Number.parseInt(hex, 16),
  );
}
