/** Bytes of UTF-8 that a script may have. */
export const MAX_SOURCE_BYTES = 64 * 1024;

/**
 * A script as it is kept, hashed and run: no byte order mark, lines end in LF, Unicode in form NFC.
 * Saving a script this way keeps every later position exact.
 */
export function normaliseSource(source: string): string {
  const text = source.charCodeAt(0) === 0xfe_ff ? source.slice(1) : source;
  // U+2028 and U+2029 end a line for the engine but not for an editor.
  return text.replace(/\r\n?|[\u2028\u2029]/g, "\n").normalize("NFC");
}

/** Bytes of a text in UTF-8; a lone surrogate counts three, as the character that replaces it. */
export function utf8Length(text: string): number {
  let bytes = 0;
  for (let i = 0; i < text.length; i++) {
    const unit = text.charCodeAt(i);
    if (unit < 0x80) bytes += 1;
    else if (unit < 0x8_00) bytes += 2;
    else if (unit >= 0xd8_00 && unit < 0xdc_00 && (text.charCodeAt(i + 1) & 0xfc_00) === 0xdc_00) {
      bytes += 4;
      i++;
    } else bytes += 3;
  }
  return bytes;
}
