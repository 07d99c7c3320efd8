import { describe, expect, it } from "vitest";
import { parseNameLines } from "./name-lines.ts";

describe("parseNameLines", () => {
  it("takes one name a line, without numbers, spaces and empty lines", () => {
    expect(parseNameLines("1. Ada\r\n\r\n  2) Oren   Vale \n3\tJune\n", [])).toEqual({
      names: ["Ada", "Oren Vale", "June"],
      problems: [],
    });
  });

  it("names every bad line by its number in the text", () => {
    const { names, problems } = parseNameLines(`Ada\nada\n...\n${"x".repeat(41)}\nwren@school.example\nDara`, ["Dara"]);
    expect(names).toEqual(["Ada"]);
    expect(problems.map(({ line, reason }) => `${line} ${reason}`)).toEqual([
      "2 is on line 1 already",
      "3 has no letter",
      "4 is too long: 41 characters, 40 are the most",
      "5 looks like an e-mail address; students need none",
      "6 is in the class already",
    ]);
  });

  it("gives nothing for an empty text", () => {
    expect(parseNameLines(" \n ", [])).toEqual({ names: [], problems: [] });
  });
});
