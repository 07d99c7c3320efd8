import { describe, expect, it } from "vitest";
import { toPublicName } from "./public-name.ts";

const of = (...authors: [string, boolean][]) =>
  toPublicName({
    authors: authors.map(([displayName, isNamePublic]) => ({ displayName, isNamePublic })),
    className: "7B",
    schoolShortName: "Tarn Road",
  });

describe("toPublicName", () => {
  it("names first names and the school when every family agreed", () => {
    expect(of(["Wren Halloway", true])).toBe("Wren, Tarn Road");
    expect(of(["Ash", true], ["Wren", true])).toBe("Ash and Wren, Tarn Road");
    expect(of(["Ash", true], ["June", true], ["Wren", true])).toBe("Ash, June and Wren, Tarn Road");
  });

  it("names the class when one consent is missing, or nobody is left", () => {
    expect(of(["Ash", true], ["Wren", false])).toBe("class 7B, Tarn Road");
    expect(of()).toBe("class 7B, Tarn Road");
  });
});
