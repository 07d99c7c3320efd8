import { describe, expect, it } from "vitest";
import { homeOf, nextPath } from "./home-of.ts";

describe("homeOf", () => {
  it("starts a student at home, staff at their desk", () => {
    expect(homeOf(["student"])).toBe("/home");
    expect(homeOf(["teacher"])).toBe("/classes");
    expect(homeOf(["admin", "coordinator"])).toBe("/lineup");
    expect(homeOf([])).toBe("/");
  });
});

describe("nextPath", () => {
  const next = (value: string) => nextPath(new URLSearchParams({ next: value }), ["student"]);

  it("goes on to the page that was asked for", () => {
    expect(next("/shows/abcd?tab=check")).toBe("/shows/abcd?tab=check");
  });

  it("never leaves the portal", () => {
    for (const away of [
      "https://elsewhere.example",
      "//elsewhere.example",
      "/\\elsewhere.example",
      "javascript:alert(1)",
    ]) {
      expect(next(away)).toBe("/home");
    }
  });
});
