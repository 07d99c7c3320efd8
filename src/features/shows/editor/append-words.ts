/** Puts a sentence into the page; backticks mark code in it. */
export function appendWords(parent: HTMLElement, sentence: string): void {
  sentence.split("`").forEach((piece, i) => {
    if (i % 2 === 0) return parent.append(piece);
    const code = document.createElement("code");
    code.textContent = piece;
    parent.append(code);
  });
}
