/** The name of a file for a title: letters and digits of any script, the rest is a hyphen. */
export function nameFile(title: string, ending: string): string {
  const name = title
    .toLowerCase()
    .replaceAll(/[^\p{L}\p{N}]+/gu, "-")
    .replaceAll(/^-|-$/g, "");
  return `${name || "show"}.${ending}`;
}

/** Hands a file to the person by the browser's own way of saving. */
export function saveFile(name: string, file: Blob): void {
  const link = document.createElement("a");
  link.href = URL.createObjectURL(file);
  link.download = name;
  link.click();
  // The browser has taken the file over by then; at once would be too early for some.
  setTimeout(() => URL.revokeObjectURL(link.href), 60_000);
}

/** Saves a script as a file of text, as it is. */
export function saveScript(title: string, source: string): void {
  saveFile(nameFile(title, "ts"), new Blob([source], { type: "text/plain" }));
}
