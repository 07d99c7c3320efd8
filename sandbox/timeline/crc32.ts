/** Source: ISO 3309 / ITU-T V.42, polynomial 0x04C11DB7 reflected. */
const TABLE: Uint32Array = Uint32Array.from({ length: 256 }, (_, index) => {
  let value = index;
  for (let bit = 0; bit < 8; bit++) value = value & 1 ? (value >>> 1) ^ 0xed_b8_83_20 : value >>> 1;
  return value;
});

/** Gives the CRC-32 of bytes as a whole number of 32 bits: it finds damage, not malice. */
export function crc32(bytes: Uint8Array): number {
  let value = 0xff_ff_ff_ff;
  for (let i = 0; i < bytes.length; i++) value = (TABLE[(value ^ (bytes[i] ?? 0)) & 0xff] ?? 0) ^ (value >>> 8);
  return (value ^ 0xff_ff_ff_ff) >>> 0;
}
