/** Who made a show, as far as it matters to the public. */
export interface NamedAuthors {
  readonly authors: readonly { readonly displayName: string; readonly isNamePublic: boolean }[];
  readonly className: string;
  readonly schoolShortName: string;
}

/**
 * What the public reads of a show's makers: first names and the school ("Wren, Tarn Road") when every
 * author's family agreed, else the class ("class 7B, Tarn Road"). One missing consent hides all of
 * them, since the others would tell who is left out.
 */
export function toPublicName({ authors, className, schoolShortName }: NamedAuthors): string {
  const isPublic = authors.length > 0 && authors.every((author) => author.isNamePublic);
  if (!isPublic) return `class ${className.replace(/^class /i, "")}, ${schoolShortName}`;
  const names = authors.map((author) => author.displayName.split(" ")[0] ?? author.displayName);
  const joined = names.length < 2 ? names.join("") : `${names.slice(0, -1).join(", ")} and ${names.at(-1)}`;
  return `${joined}, ${schoolShortName}`;
}
