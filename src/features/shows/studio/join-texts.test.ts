import { describe, expect, it } from "vitest";
import { joinTexts, listOwnLines } from "./join-texts.ts";

const mine = "const a = 1;\nsquare.all.on();\n";
const theirs = "const a = 1;\nsquare.all.off();\n  wait(2);\n";

describe("listOwnLines", () => {
  it("numbers the lines that only this text has, whatever their indent", () => {
    expect(listOwnLines(theirs, mine)).toEqual([2, 3]);
    expect(listOwnLines("  square.all.on();", mine)).toEqual([]);
  });
});

describe("joinTexts", () => {
  it("keeps mine as it runs, and theirs as comments", () => {
    const joined = joinTexts(mine, theirs);
    expect(joined.startsWith(mine.trimEnd())).toBe(true);
    for (const line of ["// square.all.off();", "//   wait(2);"]) expect(joined.split("\n")).toContain(line);
    expect(joined).not.toContain("// const a");
  });

  it("changes nothing when theirs has nothing of its own", () => {
    expect(joinTexts(mine, "const a = 1;")).toBe(mine);
  });
});
