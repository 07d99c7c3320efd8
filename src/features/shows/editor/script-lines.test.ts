import { describe, expect, it } from "vitest";
import { GlowBook } from "./glow-book.ts";
import { listScriptLines } from "./script-lines.ts";

describe("listScriptLines", () => {
  it("gives back every letter of the script, line by line", () => {
    const source = 'for (const front of square.side("north")) {\n  front.pulse(1, "gold"); // up\n\n}\n';
    const lines = listScriptLines(source);
    expect(lines.map((pieces) => pieces.map((piece) => piece.text).join("")).join("\n")).toBe(source);
  });

  it("tells texts, numbers, words and calls apart", () => {
    const [line] = listScriptLines('const a = wait(0.5, "gold"); // x');
    const classOf = (text: string) => line?.find((piece) => piece.text === text)?.className;
    expect(classOf("const")).toBe("syn-keyword");
    expect(classOf("wait")).toBe("syn-call");
    expect(classOf("0.5")).toBe("syn-number");
    expect(classOf('"gold"')).toBe("syn-string");
    expect(classOf("// x")).toBe("syn-comment");
  });

  it("does not stumble over half a script", () => {
    expect(listScriptLines('square.front("').map((pieces) => pieces.map((piece) => piece.text).join(""))).toEqual([
      'square.front("',
    ]);
  });
});

describe("GlowBook", () => {
  it("shows a line's glow on every element of it, in steps", () => {
    const book = new GlowBook();
    const [bead, other] = [document.createElement("i"), document.createElement("i")];
    document.body.append(bead, other);
    book.add(3, bead);
    book.add(4, other);
    book.set([0, 0, 0, 0.73, 0.02]);
    expect(bead.style.getPropertyValue("--g")).toBe("0.75");
    expect(bead.classList.contains("is-lit")).toBe(true);
    expect(other.classList.contains("is-lit")).toBe(false);
    book.set([]);
    expect(bead.classList.contains("is-lit")).toBe(false);
  });

  it("gives an element that scrolls into view the glow of the moment", () => {
    const book = new GlowBook();
    const first = document.createElement("i");
    document.body.append(first);
    book.add(1, first);
    book.set([0, 1]);
    const late = document.createElement("i");
    book.add(1, late);
    expect(late.style.getPropertyValue("--g")).toBe("1.00");
  });
});
