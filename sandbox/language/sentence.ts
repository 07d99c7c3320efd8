/** Names and numbers that a sentence is filled with. */
export type SentenceValues = { readonly [name: string]: string | number };

const OPTIONAL = /\[\?(.*?)\?\]/g;
const PLACE = /\{([a-zA-Z]+)\}/g;

/**
 * A sentence of the catalogue with its places filled. `{name}` takes the value; a stretch between
 * `[?` and `?]` is left out when one of its values is missing. Throws when any other is missing.
 */
export function fillSentence(template: string, values: SentenceValues): string {
  const chosen = template.replace(OPTIONAL, (_, part: string) =>
    [...part.matchAll(PLACE)].every(([, name]) => name !== undefined && Object.hasOwn(values, name)) ? part : "",
  );
  return chosen.replace(PLACE, (_, name: string) => {
    const value = values[name];
    if (value === undefined) throw new Error(`The sentence "${template}" needs a value for "${name}".`);
    return String(value);
  });
}
