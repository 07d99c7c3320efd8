import { describe, expect, it } from "vitest";
import { joinKeptTexts, presentKeptText, type KeptText } from "./kept-text.ts";

const text = (id: string, at: number, by: string | null = null): KeptText => ({
  id,
  at,
  by,
  title: "Draft",
  when: `at ${at}`,
  ribbon: null,
});

describe("joinKeptTexts", () => {
  it("lists newest first, a text that is in two lists once", () => {
    const joined = joinKeptTexts([text("v1", 5)], [text("d2", 9), text("d1", 3)], [text("v1", 5), text("a", 7)]);
    expect(joined.map(({ id }) => id)).toEqual(["d2", "a", "v1", "d1"]);
  });
});

describe("presentKeptText", () => {
  it("names the writer where there are several", () => {
    expect([presentKeptText(text("d", 2)), presentKeptText(text("d", 2, "Wren"))]).toEqual([
      "Draft, at 2",
      "Draft, at 2, Wren",
    ]);
  });
});
