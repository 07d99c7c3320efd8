import { describe, expect, it } from "vitest";
import { buildMonths } from "./month.ts";

describe("buildMonths", () => {
  const nights = [
    { date: "2026-11-30", closedReason: null },
    { date: "2026-12-01", closedReason: "Market day" },
    { date: "2026-12-31", closedReason: null },
  ];
  const [november, december] = buildMonths(nights, [{ date: "2026-11-30" }, { date: "2026-11-30" }]);

  it("puts each date under its weekday, Monday first", () => {
    // 1 December 2026 is a Tuesday, 30 November a Monday (perpetual calendar).
    expect(december?.weeks[0]?.[0]).toBeNull();
    expect(december?.weeks[0]?.[1]?.day).toBe(1);
    expect(november?.weeks.at(-1)?.[0]?.day).toBe(30);
  });

  it("counts shows, keeps the reason of a dark night and leaves other days outside the season", () => {
    expect(november?.weeks.at(-1)?.[0]?.shows).toBe(2);
    expect(december?.weeks[0]?.[1]?.closedReason).toBe("Market day");
    expect(december?.weeks[0]?.[2]?.closedReason).toBeUndefined();
  });

  it("has whole weeks and all days of the month", () => {
    const days = december?.weeks.flat().filter((day) => day !== null);
    expect(days).toHaveLength(31);
    expect(december?.weeks.every((week) => week.length === 7)).toBe(true);
  });
});
