import { RangeSet, StateEffect, StateField, type EditorState, type Extension, type Range } from "@codemirror/state";
import { type EditorView, gutter, GutterMarker, layer, type LayerMarker } from "@codemirror/view";
import { GlowBook } from "./glow-book.ts";

const setActLines = StateEffect.define<readonly number[]>();

/** Marks a line that lit the square in the last run; it moves with the text. */
class BeadMarker extends GutterMarker {
  readonly line: number;
  readonly #book: GlowBook;

  constructor(line: number, book: GlowBook) {
    super();
    this.line = line;
    this.#book = book;
  }

  override eq(other: GutterMarker): boolean {
    return other instanceof BeadMarker && other.line === this.line;
  }

  override toDOM(): Node {
    const bead = document.createElement("span");
    bead.className = "glow-bead";
    this.#book.add(this.line, bead);
    return bead;
  }

  override destroy(dom: Node): void {
    this.#book.delete(this.line, dom);
  }
}

/** Pixels from the upper edge of the scrolled content; a layer has no width of its own. */
interface SheetBox {
  readonly top: number;
  readonly height: number;
  readonly width: number;
}

/** The lamplight behind one line: outside the text, so that a frame costs no editor update. */
class GlowSheet implements LayerMarker {
  readonly #line: number;
  readonly #box: SheetBox;
  readonly #book: GlowBook;

  constructor(line: number, box: SheetBox, book: GlowBook) {
    this.#line = line;
    this.#box = box;
    this.#book = book;
  }

  eq(other: LayerMarker): boolean {
    if (!(other instanceof GlowSheet) || other.#line !== this.#line) return false;
    const { top, height, width } = other.#box;
    return top === this.#box.top && height === this.#box.height && width === this.#box.width;
  }

  draw(): HTMLElement {
    const sheet = document.createElement("div");
    sheet.className = "glow-sheet";
    this.#place(sheet);
    this.#book.add(this.#line, sheet);
    return sheet;
  }

  update(sheet: HTMLElement, before: LayerMarker): boolean {
    if (!(before instanceof GlowSheet) || before.#line !== this.#line) return false;
    this.#place(sheet);
    return true;
  }

  #place(sheet: HTMLElement): void {
    sheet.style.top = `${this.#box.top}px`;
    sheet.style.height = `${this.#box.height}px`;
    sheet.style.width = `${this.#box.width}px`;
  }
}

/** Glow lines of an editor: an extension, and what tells it which lines there are. */
export interface GlowLines {
  readonly extension: Extension;
  readonly book: GlowBook;
  /** The lines (from 1) that wrote cues in the run that is on stage. */
  setLines(view: EditorView, lines: readonly number[]): void;
}

export function createGlowLines(): GlowLines {
  const book = new GlowBook();
  const beads = StateField.define<RangeSet<BeadMarker>>({
    create: () => RangeSet.empty,
    update(set, transaction) {
      let next = set.map(transaction.changes);
      for (const effect of transaction.effects)
        if (effect.is(setActLines)) next = RangeSet.of(listMarkers(transaction.state, effect.value, book));
      return next;
    },
  });
  const sheets = layer({
    above: false,
    class: "glow-layer",
    update: (update) =>
      update.docChanged ||
      update.viewportChanged ||
      update.geometryChanged ||
      update.startState.field(beads) !== update.state.field(beads),
    markers: (view) => listSheets(view, view.state.field(beads), book),
  });
  const beadGutter = gutter({
    class: "glow-gutter",
    markers: (view) => view.state.field(beads),
    initialSpacer: () => new BeadMarker(0, book),
  });
  return {
    extension: [beads, sheets, beadGutter],
    book,
    setLines: (view, lines) => view.dispatch({ effects: setActLines.of(lines) }),
  };
}

function listMarkers(state: EditorState, lines: readonly number[], book: GlowBook): Range<BeadMarker>[] {
  return [...new Set(lines)]
    .filter((line) => line >= 1 && line <= state.doc.lines)
    .sort((a, b) => a - b)
    .map((line) => new BeadMarker(line, book).range(state.doc.line(line).from));
}

function listSheets(view: EditorView, beads: RangeSet<BeadMarker>, book: GlowBook): GlowSheet[] {
  const found: GlowSheet[] = [];
  const top = view.documentTop - view.scrollDOM.getBoundingClientRect().top + view.scrollDOM.scrollTop;
  const { from, to } = view.viewport;
  beads.between(from, to, (position, _end, marker) => {
    const block = view.lineBlockAt(position);
    // A problem under the line belongs to its block; the glow is behind the text only.
    const text = view.elementAtHeight(block.top);
    found.push(
      new GlowSheet(
        marker.line,
        { top: top + block.top, height: text.height, width: view.scrollDOM.clientWidth },
        book,
      ),
    );
  });
  return found;
}
