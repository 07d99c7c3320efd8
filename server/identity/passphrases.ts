import { randomInt } from "node:crypto";
import { PASSPHRASE_WORDS } from "../../shared/passphrase-words.ts";

const WORDS_PER_PASSPHRASE = 4;
/** Letters and digits that are not mistaken for each other when read from paper: no 0, 1, I, L, O. */
const CODE_LETTERS = "ABCDEFGHJKMNPQRSTUVWXYZ23456789";
const CODE_LENGTH = 8;

/** Four different words joined by hyphens, each order equally likely: 40 bits from 1 024 words. */
export function dealPassphrase(): string {
  const words = new Set<string>();
  while (words.size < WORDS_PER_PASSPHRASE) {
    const word = PASSPHRASE_WORDS[randomInt(PASSPHRASE_WORDS.length)];
    if (word !== undefined) words.add(word);
  }
  return [...words].join("-");
}

/** A one-time code of 8 characters out of 31 that are hard to mistake: 39 bits. */
export function dealOneTimeCode(): string {
  return Array.from({ length: CODE_LENGTH }, () => CODE_LETTERS[randomInt(CODE_LETTERS.length)]).join("");
}
