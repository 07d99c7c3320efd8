import { describe, expect, it } from "vitest";
import { formatAgo, formatLocalDate, formatNames } from "./format.ts";

describe("formatAgo", () => {
  const now = 1_000 * 60 * 60 * 24 * 400;
  it("changes unit at a minute, an hour and a day", () => {
    expect(formatAgo(now - 59_999, now)).toBe("just now");
    expect(formatAgo(now - 60_000, now)).toBe("1 min ago");
    expect(formatAgo(now - 3_600_000, now)).toBe("1 h ago");
    expect(formatAgo(now - 24 * 3_600_000, now)).toMatch(/^[A-Z][a-z]+day \d+ [A-Z]/);
  });
});

describe("formatNames", () => {
  it("joins the last with and", () => {
    expect(formatNames(["Wren"])).toBe("Wren");
    expect(formatNames(["Wren", "Idris"])).toBe("Wren and Idris");
    expect(formatNames(["Wren", "Idris", "June"])).toBe("Wren, Idris and June");
  });
});

describe("formatLocalDate", () => {
  // Checked against the perpetual calendar: 11 December 2026 is a Friday, 29 February 2028 a Tuesday.
  it("names the weekday of the date itself, in any zone", () => {
    expect(formatLocalDate("2026-12-11")).toEqual({
      weekday: "Fri",
      day: "11",
      month: "Dec",
      full: "Friday 11 December",
    });
    expect(formatLocalDate("2028-02-29").weekday).toBe("Tue");
  });
});
