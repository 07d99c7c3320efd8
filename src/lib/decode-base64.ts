/** The bytes that a base64 text stands for. Throws on anything else. */
export function decodeBase64(text: string): Uint8Array {
  return Uint8Array.from(atob(text), (character) => character.charCodeAt(0));
}
