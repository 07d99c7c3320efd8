const DIGITS = "ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz0123456789+/";

/** Gives bytes as base64 with padding. Source: RFC 4648, section 4. */
export function toBase64(bytes: Uint8Array): string {
  const groups: string[] = [];
  for (let at = 0; at < bytes.length; at += 3) {
    const left = bytes.length - at;
    const value = ((bytes[at] ?? 0) << 16) | ((bytes[at + 1] ?? 0) << 8) | (bytes[at + 2] ?? 0);
    const digit = (shift: number) => DIGITS[(value >> shift) & 63] ?? "";
    groups.push(digit(18) + digit(12) + (left > 1 ? digit(6) : "=") + (left > 2 ? digit(0) : "="));
  }
  return groups.join("");
}

/** Gives the bytes of base64 text. Throws `RangeError` on text that is not base64 with padding. */
export function fromBase64(text: string): Uint8Array {
  if (text.length % 4 !== 0 || !/^[A-Za-z0-9+/]*={0,2}$/.test(text)) throw new RangeError("The text is not base64.");
  const padding = text.endsWith("==") ? 2 : text.endsWith("=") ? 1 : 0;
  const bytes = new Uint8Array((text.length / 4) * 3 - padding);
  for (let at = 0, out = 0; at < text.length; at += 4, out += 3) {
    let value = 0;
    for (let place = 0; place < 4; place++) value = (value << 6) | Math.max(0, valueOf(text.charCodeAt(at + place)));
    bytes[out] = (value >> 16) & 0xff;
    if (out + 1 < bytes.length) bytes[out + 1] = (value >> 8) & 0xff;
    if (out + 2 < bytes.length) bytes[out + 2] = value & 0xff;
  }
  return bytes;
}

const VALUES: Int8Array = new Int8Array(128).fill(-1);
for (let value = 0; value < DIGITS.length; value++) VALUES[DIGITS.charCodeAt(value)] = value;
const valueOf = (code: number) => VALUES[code] ?? -1;
