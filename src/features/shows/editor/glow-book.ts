/** Glow moves in these steps: finer ones are not seen and cost a style change each. */
const STEP = 0.05;

/**
 * Which elements show the glow of which script line, and how strong it is. Elements come and go with
 * scrolling; a new one takes on the glow of the moment. Both `--g` and a class are set, so that
 * the bead in the margin fills: colour is not the only sign.
 */
export class GlowBook {
  readonly #elements = new Map<number, Set<HTMLElement>>();
  readonly #glow = new Map<number, number>();

  add(line: number, element: HTMLElement): void {
    const elements = this.#elements.get(line) ?? new Set();
    this.#elements.set(line, elements.add(element));
    show(element, this.#glow.get(line) ?? 0);
  }

  delete(line: number, element: Node): void {
    if (element instanceof HTMLElement) this.#elements.get(line)?.delete(element);
  }

  /** Shows how strongly lines light the square: 0 to 1 by line number (see `createLinesLit`). */
  set(byLine: ArrayLike<number>): void {
    for (const [line, elements] of this.#elements) {
      const glow = Math.round((byLine[line] ?? 0) / STEP) * STEP;
      if (glow === (this.#glow.get(line) ?? 0)) continue;
      this.#glow.set(line, glow);
      for (const element of elements) {
        // Sheets of a layer are dropped without notice.
        if (element.isConnected) show(element, glow);
        else elements.delete(element);
      }
    }
  }
}

function show(element: HTMLElement, glow: number): void {
  element.style.setProperty("--g", glow.toFixed(2));
  element.classList.toggle("is-lit", glow > STEP);
}
