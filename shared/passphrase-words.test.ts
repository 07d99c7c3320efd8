import { describe, expect, it } from "vitest";
import { PASSPHRASE_WORDS } from "./passphrase-words.ts";

describe("the words of passphrases", () => {
  it("are 1 024 different words of 3 to 6 letters, sorted", () => {
    expect(PASSPHRASE_WORDS).toHaveLength(1024);
    expect(new Set(PASSPHRASE_WORDS).size).toBe(1024);
    expect(PASSPHRASE_WORDS.filter((word) => !/^[a-z]{3,6}$/.test(word))).toEqual([]);
    expect(PASSPHRASE_WORDS.toSorted()).toEqual([...PASSPHRASE_WORDS]);
  });
});
