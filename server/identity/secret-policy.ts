import { COMMON_PASSWORDS, CONTEXT_WORDS, KEYBOARD_RUNS } from "./common-passwords.ts";

/** A chosen passphrase is made of words; four of them are what a card has. */
const LEAST_WORDS = 4;
const LEAST_LENGTH = 15;
/** What is left after taking out words that anybody would try first. */
const LEAST_REST = 8;

/**
 * Says what is wrong with a new password in a sentence for its owner, or null. No rules about kinds of
 * characters; what counts is that nobody would try it early. `personal` are the owner's own words
 * (name, e-mail, school). Source: NIST SP 800-63B-4, 3.1.1.2: length, and a list of expected values.
 */
export function findPasswordFault(password: string, personal: readonly string[]): string | null {
  const context = [...CONTEXT_WORDS, ...KEYBOARD_RUNS, ...personal.flatMap(toWords)];
  return findGuessable(password, context);
}

/** Says what is wrong with words that a student chose, or null. */
export function findPassphraseFault(passphrase: string, personal: readonly string[]): string | null {
  const words = passphrase.split("-").filter((word) => word !== "");
  if (words.length < LEAST_WORDS) return "Use four words.";
  if (new Set(words).size < LEAST_WORDS) return "Use four different words.";
  if (passphrase.length < LEAST_LENGTH) return "Use longer words: 15 letters at least, hyphens counted.";
  // Every word on its own is a common one, and may be: four dealt words are strong together.
  return findGuessable(passphrase, personal.flatMap(toWords));
}

function findGuessable(secret: string, context: readonly string[]): string | null {
  const plain = toPlain(secret);
  if (COMMON_PASSWORDS.has(plain)) return "This is on the lists that are tried first. Choose another.";
  if (isRepeated(plain)) return "This repeats the same few characters. Choose a sentence of your own.";
  const longestFirst = [...context].sort((a, b) => b.length - a.length);
  const rest = longestFirst.reduce((text, word) => text.replaceAll(word, ""), plain);
  return rest.length < LEAST_REST ? "This is easy to guess from names and common words. Add words of your own." : null;
}

/** Small letters without marks and separators, with the usual stand-ins read as letters. */
function toPlain(text: string): string {
  return text
    .normalize("NFKD")
    .toLowerCase()
    .replace(/\p{M}|[\s_.,;:!?'"()-]/gu, "")
    .replaceAll("@", "a")
    .replaceAll("$", "s")
    .replaceAll("0", "o");
}

function toWords(text: string): string[] {
  return text
    .split(/[^\p{L}\d]+/u)
    .map(toPlain)
    .filter((word) => word.length >= 3);
}

/** True for one to four characters over and over, also when the last round is cut off. */
function isRepeated(text: string): boolean {
  for (let length = 1; length <= 4; length++) {
    const unit = text.slice(0, length);
    if (text === unit.repeat(Math.ceil(text.length / length)).slice(0, text.length)) return true;
  }
  return false;
}
