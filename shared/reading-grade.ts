/** How hard a text is to read, for a check on everything that learners are told. */

/** What is counted of a text. */
export interface TextCount {
  readonly sentences: number;
  readonly words: number;
  readonly syllables: number;
}

/** Syllables of an English word, by its groups of vowels: a rule of thumb, at least one. */
export function countSyllables(word: string): number {
  const letters = word.toLowerCase().replace(/[^a-z]/g, "");
  if (letters.length <= 3) return 1;
  const spoken = letters.replace(/(?:[^laeiouy]es|[^td]ed|[^laeiouy]e)$/, "").replace(/^y/, "");
  return Math.max(1, spoken.match(/[aeiouy]{1,2}/g)?.length ?? 1);
}

/** Counts a text. `code` in backticks is one word of one syllable, however long it is. */
export function countText(text: string): TextCount {
  const plain = text.replace(/`[^`]*`/g, "code");
  const words = plain.match(/[\p{L}\p{N}'-]+/gu) ?? [];
  const sentences = plain.match(/[^.!?:]+[.!?:]+|[^.!?:]+$/g)?.filter((one) => /\p{L}/u.test(one)) ?? [];
  return {
    sentences: Math.max(1, sentences.length),
    words: words.length,
    syllables: words.reduce((sum, word) => sum + countSyllables(word), 0),
  };
}

/** The reading grade of a text (Flesch-Kincaid: .39 words a sentence + 11.8 syllables a word - 15.59). */
export function readingGrade({ sentences, words, syllables }: TextCount): number {
  if (words === 0) return 0;
  return 0.39 * (words / sentences) + 11.8 * (syllables / words) - 15.59;
}
